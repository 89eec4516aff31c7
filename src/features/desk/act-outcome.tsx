import { Link } from 'react-router-dom';
import { paths } from '../../config/paths';
import { useEntryState } from '../../data/use-book';
import type { Forecast } from './use-act';

/** What became of the act that was logged last: it counts when the server has applied it, and not before. */
export function ActOutcome({ entry }: { readonly entry: string }) {
  const state = useEntryState(entry);
  return (
    <p role="status" className="desk-outcome">
      <b>Logged.</b> {state === undefined ? 'Kept on this tablet.' : outcomeWords(state)}{' '}
      {state?.verdict === 'held-back' ? (
        <Link to={paths.deskHeld()} className="underline">
          To what was held back
        </Link>
      ) : null}
    </p>
  );
}

function outcomeWords(state: NonNullable<ReturnType<typeof useEntryState>>): string {
  const at = state.revision === null ? '' : ` at revision ${state.revision}`;
  switch (state.verdict) {
    case 'waiting':
      return 'It waits for the server and has no effect until it is applied.';
    case 'applied':
      return `The server has applied it${at}.`;
    case 'irregular':
      return `In the Book${at}, marked irregular: ${state.reason?.words ?? ''}`;
    case 'held-back':
      return `Held back: ${state.reason?.words ?? ''}`;
    case 'altered':
      return 'Another text stands under its id; both are kept.';
  }
}

/** Said before holding, so that nobody logs an act that is known to be held back. */
export function ForecastWords({ forecast }: { readonly forecast: Forecast }) {
  if (forecast.against !== null) {
    return (
      <p role="note" className="desk-outcome">
        <b>It would be held back.</b> {forecast.against.words}
      </p>
    );
  }
  if (!forecast.waits_for_sign_in) return null;
  return (
    <p role="note" className="desk-outcome muted">
      You are not signed in online: it is kept here and held back for you to confirm until you{' '}
      <Link to={paths.signIn()} className="underline">
        sign in
      </Link>
      .
    </p>
  );
}
