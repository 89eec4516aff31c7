import type { ReactNode } from 'react';

export interface ThumbZoneProps {
  readonly label: string;
  /** The one big dome at the foot. */
  readonly main: ReactNode;
  /** At most two small domes above it, the lowest first. */
  readonly others?: readonly ReactNode[];
}

/** The corner of the thumb in use. The domes stack upwards from the foot; the spacing round critical ones is by place. */
export function ThumbZone({ label, main, others = [] }: ThumbZoneProps) {
  const [lower, upper] = others;
  return (
    <section className="thumb-zone" aria-label={label}>
      {upper}
      {lower}
      {main}
    </section>
  );
}
