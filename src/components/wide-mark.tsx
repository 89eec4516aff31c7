import { useId, useRef, type ReactNode } from 'react';
import { electrodePath } from './electrode';
import type { GapState } from './gap-mark';
import { useSize } from './use-size';

export interface WideMarkProps {
  readonly state: GapState;
  readonly hatched?: boolean;
  /** Depth of each body in px at the reference tablet; wider for the face that is read from across the room. */
  readonly depth_mm?: number;
  readonly solid?: boolean;
  /** How far down the wire is clipped to the faces, 0 to 1: the words stand above it. */
  readonly wireAt?: number;
  readonly children: ReactNode;
}

/** The gap mark as wide as its place: what it says in words stands between the faces. */
export function WideMark(props: WideMarkProps) {
  const { state, hatched = false, depth_mm = 19.2, solid = false, wireAt = 0.5, children } = props;
  const ref = useRef<HTMLDivElement>(null);
  const { width, height } = useSize(ref);
  const id = useId();
  const depth = Math.min(width / 5, (depth_mm * height) / 34);
  const body = { y: 0, width: depth, height, edge: height / 11, sagitta: height / 19 };
  const left = electrodePath({ ...body, x: 0, facing: 'right' });
  const right = electrodePath({ ...body, x: width - depth, facing: 'left' });
  const y = height * wireAt;
  const drop = y + height * 0.085;
  const inset = depth + height * 0.07;
  return (
    <div ref={ref} className={`wide-mark ${state}${solid ? ' solid' : ''}`} style={{ paddingInline: depth }}>
      <svg aria-hidden="true">
        {hatched ? (
          <>
            <pattern id={id} width="19" height="19" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
              <path d="M3.5 0V19" stroke="var(--edge)" strokeWidth="7" />
            </pattern>
            <path d={left + right} fill={`url(#${id})`} className="wide-mark-hatch" />
          </>
        ) : null}
        <path className={state === 'dashed' ? 'wide-mark-dash' : 'wide-mark-body'} d={left + right} fillOpacity={hatched ? 0.45 : 1} />
        {state === 'bridged' ? (
          <g className="wide-mark-wire">
            <path
              d={`M${depth} ${y}H${inset}V${drop}H${width - inset}V${y}H${width - depth}`}
            />
            <circle cx={depth - 3} cy={y} r={8} />
            <circle cx={width - depth + 3} cy={y} r={8} />
          </g>
        ) : null}
        {state === 'jagged' ? <path className="wide-mark-jag" d={jag(width, height, depth)} /> : null}
      </svg>
      <div className="wide-mark-words">{children}</div>
    </div>
  );
}

/** Still, never animated: a line from face to face below the words. Parts of the way across and of the height. */
const JAG: readonly (readonly [number, number])[] = [
  [0, 0.745],
  [0.19, 0.635],
  [0.265, 0.925],
  [0.4, 0.525],
  [0.5, 0.995],
  [0.625, 0.5],
  [0.726, 0.93],
  [0.804, 0.655],
  [1, 0.745],
];

function jag(width: number, height: number, depth: number): string {
  const across = width - 2 * (depth - 4);
  return JAG.map(([x, y], i) => `${i === 0 ? 'M' : 'L'}${depth - 4 + x * across} ${y * height}`).join('');
}
