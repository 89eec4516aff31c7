import type { ReactNode } from 'react';

export interface ReadingProps {
  /** Formatted text: rounding has a direction, and only the caller knows it. */
  readonly value: ReactNode;
  readonly unit?: string;
  readonly size?: 'body' | 'lead' | 'read' | 'pin' | 'answer' | 'lean' | 'face';
  /** Taken over from before and not read anew: light and muted. */
  readonly carried?: boolean;
}

const THIN_SPACE = '\u2009';

/** A figure and its unit, never apart: thin space, unit at 60 %. */
export function Reading({ value, unit = '', size = 'read', carried = false }: ReadingProps) {
  return (
    <span className={`reading size-${size}${carried ? ' carried' : ''}`}>
      {value}
      {unit === '' ? null : (
        <span className="reading-unit">
          {THIN_SPACE}
          {unit}
        </span>
      )}
    </span>
  );
}
