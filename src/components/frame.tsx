import { createContext, use, type ReactNode } from 'react';
import { ScreenLayout } from './screen-layout';

interface Frame {
  readonly strip: ReactNode;
  /** What hangs from the strip on every screen. */
  readonly tooth: ReactNode;
  readonly places: ReactNode;
}

const FrameContext = createContext<Frame | null>(null);

/** Gives every screen below it the strip on top and the places at the foot. */
export function FrameProvider({ children, ...frame }: Frame & { readonly children: ReactNode }) {
  return <FrameContext value={frame}>{children}</FrameContext>;
}

interface ScreenProps {
  readonly children: ReactNode;
  readonly banner?: ReactNode;
  readonly fields?: ReactNode;
  readonly thumbs?: ReactNode;
}

/** A screen inside the frame: the figure, its fields and its thumb zone. */
export function Screen(props: ScreenProps) {
  const frame = use(FrameContext);
  if (frame === null) throw new Error('Screen needs a FrameProvider above it');
  return <ScreenLayout strip={frame.strip} tooth={frame.tooth} places={frame.places} {...props} />;
}
