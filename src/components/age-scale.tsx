export interface AgeScaleProps {
  /** Null when no age is known: the scale stands without a mark. */
  readonly age_h: number | null;
  readonly span_h?: number;
  /** Steps over the span; the long ones are whole hours. */
  readonly steps?: number;
  /** 'foot' fills from the start, 'face' points. */
  readonly variant?: 'foot' | 'face';
}

/** How old something is, on a scale that can be read: 12 hours across unless told otherwise. */
export function AgeScale({ age_h, span_h = 12, steps = 24, variant = 'foot' }: AgeScaleProps) {
  const perHour = steps / span_h;
  const ticks = Array.from({ length: steps + 1 }, (_, i) => {
    const long = i % perHour === 0;
    const x = (i / steps) * 1000;
    return variant === 'foot' ? `M${x} 10V${long ? 1 : 6}` : `M${x} 0V${long ? 10 : 5}`;
  }).join('');
  const part = age_h === null ? null : Math.min(1, Math.max(0, age_h / span_h));
  return (
    <span className={`age-scale ${variant}`} aria-hidden="true">
      <svg viewBox="0 0 1000 10" preserveAspectRatio="none">
        <path className="ticks" d={ticks} vectorEffect="non-scaling-stroke" />
      </svg>
      {part === null ? null : variant === 'foot' ? (
        <span className="age-bar" style={{ width: `${part * 100}%` }} />
      ) : (
        <svg className="age-pointer" viewBox="0 0 18 16" style={{ left: `${part * 100}%` }}>
          <path d="M9 0L18 16H0Z" />
        </svg>
      )}
    </span>
  );
}
