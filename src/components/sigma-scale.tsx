import { electrodePath } from './electrode';

export interface SigmaScaleProps {
  /** Deviation in standard deviations; beyond the span the pointer stays at the face it passed. */
  readonly sigma: number;
  readonly span?: number;
  readonly label: string;
  readonly compact?: boolean;
}

const WIDTH = 320;
const FACE = { y: 0, width: 40, height: 32, edge: 5, sagitta: 2.2 } as const;

/** A deviation between its two limits, with one pointer. */
export function SigmaScale({ sigma, span = 3, label, compact = false }: SigmaScaleProps) {
  const at = (WIDTH / 2) * (1 + Math.max(-1.06, Math.min(1.06, sigma / span)));
  const steps = span * 4 + 4;
  const ticks = Array.from({ length: steps + 1 }, (_, i) => {
    const x = (i / steps) * WIDTH;
    return `M${x} 34v${i % 2 === 0 ? 14 : 8}`;
  }).join('');
  const faces =
    electrodePath({ ...FACE, x: 0, facing: 'right' }) +
    electrodePath({ ...FACE, x: WIDTH - FACE.width, facing: 'left' });
  return (
    <svg
      className={`sigma-scale${compact ? ' compact' : ''}`}
      viewBox={`-6 0 ${WIDTH + 12} 50`}
      role="img"
      aria-label={label}
    >
      <path className="sigma-faces" d={faces} />
      {compact ? null : (
        <>
          <path className="sigma-ticks" d={ticks} />
          <text x="18" y="24" textAnchor="middle">{`\u2212${span}`}</text>
          <text x={WIDTH - 18} y="24" textAnchor="middle">{`+${span}`}</text>
        </>
      )}
      <path className="sigma-zero" d={`M${WIDTH / 2} 6V32`} />
      <path className="sigma-pointer" d={`M${at} 32l10 -26h-20Z`} />
    </svg>
  );
}
