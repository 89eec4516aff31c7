import { useId, useRef } from 'react';
import { electrodeFace, electrodePath, electrodeRim, type ElectrodeShape, type Facing } from './electrode';
import { useSize } from './use-size';

export interface ElectrodeBodyProps {
  readonly facing: Facing;
  /** 'brass' and 'quiet' follow the edges round and can be cut into pieces; 'face' is the line that an answer leans on. */
  readonly rim?: 'brass' | 'quiet' | 'face' | 'none';
  readonly pieces?: 1 | 5 | 10;
  /** Edge radius and sagitta as parts of the face's length. */
  readonly edge?: number;
  readonly sagitta?: number;
  readonly tone?: 'metal' | 'raised' | 'brass' | 'text' | 'solid';
}

const PIECE = 100;
const CUT = { 1: 0, 5: 10, 10: 16 } as const;

/** The line of the face lies inside the body, so that nothing stands over the profile. px */
const FACE_INSET = 2;

/** An electrode that fills its positioned parent, drawn at the size it has, so that its profile is never stretched. */
export function ElectrodeBody({
  facing,
  rim = 'none',
  pieces = 1,
  edge = 1 / 12,
  sagitta = 1 / 20,
  tone = 'metal',
}: ElectrodeBodyProps) {
  const ref = useRef<SVGSVGElement>(null);
  const { width, height } = useSize(ref);
  const clip = useId();
  const face = facing === 'up' || facing === 'down' ? width : height;
  const shape = { x: 0, y: 0, width, height, facing, edge: edge * face, sagitta: sagitta * face };
  const cut = CUT[pieces];
  return (
    <svg ref={ref} className={`electrode-body tone-${tone}`} aria-hidden="true">
      <path className="electrode-fill" d={electrodePath(shape)} />
      {rim === 'face' ? <path className="electrode-face" d={electrodeFace(inset(shape))} /> : null}
      {rim === 'brass' || rim === 'quiet' ? (
        <>
          <clipPath id={clip}>
            <path d={electrodePath(shape)} />
          </clipPath>
          <path
            className={`electrode-rim rim-${rim}`}
            d={electrodeRim(shape)}
            clipPath={`url(#${clip})`}
            pathLength={pieces * PIECE}
            {...(cut > 0 ? { strokeDasharray: `${PIECE - cut} ${cut}`, strokeDashoffset: -cut / 2 } : {})}
          />
        </>
      ) : null}
    </svg>
  );
}

function inset(shape: ElectrodeShape): ElectrodeShape {
  switch (shape.facing) {
    case 'up':
      return { ...shape, y: shape.y + FACE_INSET };
    case 'down':
      return { ...shape, y: shape.y - FACE_INSET };
    case 'left':
      return { ...shape, x: shape.x + FACE_INSET };
    case 'right':
      return { ...shape, x: shape.x - FACE_INSET };
  }
}
