import { useId, useRef, type ReactNode } from 'react';
import { electrodePath } from './electrode';
import type { GapState } from './gap-mark';
import { useSize } from './use-size';

export interface WideMarkProps {
  readonly state: GapState;
  readonly hatched?: boolean;
  /** The words that have to be read first, above the wire. */
  readonly title: ReactNode;
  readonly children?: ReactNode;
  /** Depth of each body; at most an eighth of the screen. */
  readonly depth_mm?: number;
  readonly solid?: boolean;
}

/** A dashed outline loses its flat back off the screen: only the faces are said to be there. px */
const BLEED_PX = 20;

/** The gap mark as wide as its place: what it says in words stands between the faces. */
export function WideMark({
  state,
  hatched = false,
  title,
  children,
  depth_mm = 19.2,
  solid = false,
}: WideMarkProps) {
  const outer = useRef<HTMLDivElement>(null);
  const inner = useRef<HTMLDivElement>(null);
  const { width, height } = useSize(outer);
  const depth = (width - useSize(inner).width) / 2;
  const id = useId();
  const back = state === 'dashed' ? BLEED_PX : 0;
  const body = { y: 0, width: depth + back, height, edge: height / 11, sagitta: height / 19 };
  const left = electrodePath({ ...body, x: -back, facing: 'right' });
  const right = electrodePath({ ...body, x: width - depth, facing: 'left' });
  return (
    <div
      ref={outer}
      className={`wide-mark ${state}${solid ? ' solid' : ''}`}
      style={{ paddingInline: `min(${depth_mm} * var(--mm), 12vw)` }}
    >
      <svg aria-hidden="true">
        {hatched ? (
          <>
            <pattern
              id={id}
              width="19"
              height="19"
              patternUnits="userSpaceOnUse"
              patternTransform="rotate(45)"
            >
              <path d="M3.5 0V19" stroke="var(--edge)" strokeWidth="7" />
            </pattern>
            <path d={left + right} fill={`url(#${id})`} className="wide-mark-hatch" />
          </>
        ) : null}
        <path
          className={state === 'dashed' ? 'wide-mark-dash' : 'wide-mark-body'}
          d={left + right}
          fillOpacity={hatched ? 0.45 : 1}
        />
      </svg>
      <div ref={inner} className="wide-mark-words">
        <div>{title}</div>
        <Between state={state} />
        {children}
      </div>
    </div>
  );
}

/** What goes from face to face, in a place of its own below the words, so that neither ever crosses the other. */
function Between({ state }: { readonly state: GapState }) {
  const ref = useRef<HTMLDivElement>(null);
  const { width, height } = useSize(ref);
  const y = height * 0.2;
  const step = Math.min(12, width / 20);
  return (
    <div ref={ref} className={`wide-mark-between ${state}`}>
      <svg aria-hidden="true">
        {state === 'bridged' ? (
          <g className="wide-mark-wire">
            <path d={`M-2 ${y}H${step}V${height * 0.7}H${width - step}V${y}H${width + 2}`} />
            <circle cx="-3" cy={y} r="8" />
            <circle cx={width + 3} cy={y} r="8" />
          </g>
        ) : null}
        {state === 'jagged' ? <path className="wide-mark-jag" d={jag(width, height)} /> : null}
      </svg>
    </div>
  );
}

/** Still, never animated: a line from face to face below the words. Parts of the way across and of the height. */
const JAG: readonly (readonly [number, number])[] = [
  [0, 0.5],
  [0.19, 0.3],
  [0.265, 0.86],
  [0.4, 0.08],
  [0.5, 0.98],
  [0.625, 0.04],
  [0.726, 0.88],
  [0.804, 0.34],
  [1, 0.5],
];

const UNDER_FACE_PX = 8;

function jag(width: number, height: number): string {
  const across = width + 2 * UNDER_FACE_PX;
  return JAG.map(([x, y], i) => `${i === 0 ? 'M' : 'L'}${x * across - UNDER_FACE_PX} ${y * height}`).join('');
}
