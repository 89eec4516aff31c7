import { Component, type ErrorInfo, type ReactNode } from 'react';

interface Props {
  readonly area: string;
  readonly children: ReactNode;
}

interface State {
  readonly message: string | null;
}

/** One area failing never hides another: what was logged stays logged, and the person is told what to do. */
export class AreaBoundary extends Component<Props, State> {
  override state: State = { message: null };

  static getDerivedStateFromError(error: unknown): State {
    return { message: error instanceof Error ? error.message : String(error) };
  }

  override componentDidCatch(error: unknown, info: ErrorInfo): void {
    // Rethrown outside React, so that it reaches the console with its stack and nothing is swallowed.
    reportError(new Error(`${this.props.area} failed: ${info.componentStack ?? ''}`, { cause: error }));
  }

  override render(): ReactNode {
    if (this.state.message === null) return this.props.children;
    return (
      <div className="area-failed" role="alert">
        <p>
          <b>{this.props.area} could not be shown.</b>
        </p>
        <p>
          Everything that was logged is kept, and drafts are too. Go to another place, or load the page again.
        </p>
        <p className="muted">{this.state.message}</p>
        <button type="button" className="plain-link" onClick={() => window.location.reload()}>
          Load again
        </button>
      </div>
    );
  }
}
