import type { ReactNode } from 'react';

export interface SaysBlockProps {
  /** Set heavy, as the start of the sentence. */
  readonly lead?: string;
  readonly children: ReactNode;
  readonly muted?: boolean;
}

/** A paragraph that speaks. */
export function SaysBlock({ lead, children, muted = false }: SaysBlockProps) {
  return (
    <p className={`says${muted ? ' muted' : ''}`}>
      {lead ? <b>{lead} </b> : null}
      {children}
    </p>
  );
}
