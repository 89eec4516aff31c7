import { useId } from 'react';
import { electrodePath } from './electrode';

export type GapState = 'bridged' | 'open' | 'dashed' | 'jagged';

export interface GapMarkProps {
  readonly state: GapState;
  /** Diagonal hatch over whatever the mark shows, cut free of the wire and counterchanged over the faces. */
  readonly hatched?: boolean;
  readonly title?: string;
  readonly className?: string;
}

const WIDTH = 72;
const HEIGHT = 32;
const PROFILE = { y: 0, width: 22, height: HEIGHT, edge: 4.5, sagitta: 2.2 } as const;
const FACES =
  electrodePath({ ...PROFILE, x: 0, facing: 'right' }) +
  electrodePath({ ...PROFILE, x: WIDTH - PROFILE.width, facing: 'left' });
const INSET = { y: 1.6, width: 19.4, height: HEIGHT - 3.2, edge: 4, sagitta: 2 } as const;
const OUTLINES =
  electrodePath({ ...INSET, x: 1.6, facing: 'right' }) +
  electrodePath({ ...INSET, x: WIDTH - 1.6 - INSET.width, facing: 'left' });
const WIRE = 'M20 15H29V26H43V15H52';
const JAG = 'M21 19L30.5 6L39 26L51 12';
const HATCH = Array.from({ length: 10 }, (_, i) => `M${-30 + 11 * i} 42L${22 + 11 * i} -10`).join('');

/** Two blunt electrodes and what lies between them. Drawn in the current colour alone, so it stands on any ground and in print. */
export function GapMark({ state, hatched = false, title, className }: GapMarkProps) {
  const id = useId();
  const label = title === undefined ? { 'aria-hidden': true } : { role: 'img', 'aria-label': title };
  return (
    <svg className={className ?? 'gap-mark'} viewBox={`0 0 ${WIDTH} ${HEIGHT}`} {...label}>
      <mask id={`${id}k`} maskUnits="userSpaceOnUse" x="0" y="0" width={WIDTH} height={HEIGHT}>
        <rect width={WIDTH} height={HEIGHT} fill="#fff" />
        {hatched && state !== 'dashed' ? <path d={HATCH} stroke="#000" strokeWidth="2.6" /> : null}
        {state === 'bridged' ? <WireKeepOut /> : null}
      </mask>
      <mask id={`${id}h`} maskUnits="userSpaceOnUse" x="0" y="0" width={WIDTH} height={HEIGHT}>
        <rect width={WIDTH} height={HEIGHT} fill="#fff" />
        <path
          d={state === 'dashed' ? OUTLINES : FACES}
          fill="#000"
          {...(state === 'dashed' ? { stroke: '#000', strokeWidth: 8 } : {})}
        />
        {state === 'bridged' ? <WireKeepOut /> : null}
        {state === 'jagged' ? <path d={JAG} fill="none" stroke="#000" strokeWidth="9" /> : null}
      </mask>
      {hatched ? <path d={HATCH} stroke="currentColor" strokeWidth="2.6" mask={`url(#${id}h)`} /> : null}
      {state === 'dashed' ? (
        <path d={OUTLINES} fill="none" stroke="currentColor" strokeWidth="3.2" strokeDasharray="5.4 4" />
      ) : (
        <path d={FACES} fill="currentColor" mask={`url(#${id}k)`} />
      )}
      {state === 'jagged' ? <path d={JAG} fill="none" stroke="currentColor" strokeWidth="3.6" /> : null}
      {state === 'bridged' ? (
        <g fill="currentColor">
          <path d={WIRE} fill="none" stroke="currentColor" strokeWidth="3" />
          <circle cx="20" cy="15" r="3.2" />
          <circle cx="52" cy="15" r="3.2" />
        </g>
      ) : null}
    </svg>
  );
}

/** The wire and its contact dots need clear ground round them, or they would melt into the faces. */
function WireKeepOut() {
  return (
    <>
      <path d={WIRE} fill="none" stroke="#000" strokeWidth="8" />
      <circle cx="20" cy="15" r="5" fill="#000" />
      <circle cx="52" cy="15" r="5" fill="#000" />
    </>
  );
}
