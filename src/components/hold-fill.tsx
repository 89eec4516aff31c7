import { useRef } from 'react';
import { electrodePath } from './electrode';
import { steppedProgress, type HoldView } from './hold';
import { useReducedMotion } from './use-reduced-motion';
import { useSize } from './use-size';

/** What is left between the faces while the work behind a hold is not done yet. px */
const HAIR_PX = 6;
/** Parts of the way: past the first the words leave the void, and a failure draws the faces back to the second. */
const ASIDE = 0.5;
const FAILED = 0.14;

/** Two faces that close over the strip, stop a hair short, and touch when what was asked is durable. */
export function HoldFill({ view }: { readonly view: HoldView }) {
  const ref = useRef<SVGSVGElement>(null);
  const { width, height } = useSize(ref);
  const calm = useReducedMotion();
  const closed = view.phase === 'settled';
  const progress = shownProgress(view, calm);
  const reach = closed ? width / 2 + 1 : Math.max(0, (width / 2) * progress - HAIR_PX / 2);
  const nearly = view.phase === 'writing';
  const body = { y: 0, width: reach, height, edge: nearly ? 3 : 7, sagitta: nearly ? 2 : height / 9 };
  const bars =
    reach < 1
      ? ''
      : closed
        ? `M0 0H${width}V${height}H0Z`
        : electrodePath({ ...body, x: 0, facing: 'right' }) +
          electrodePath({ ...body, x: width - reach, facing: 'left' });
  return (
    <div className={`hold-fill${progress > ASIDE ? ' aside' : ''}`} data-phase={view.phase}>
      <svg ref={ref} aria-hidden="true">
        <path d={bars} />
      </svg>
      <span className="hold-fill-words">{words(view)}</span>
      <span className="heard-only" role={view.phase === 'failed' ? 'alert' : 'status'}>
        {view.phase === 'failed' ? view.words : view.phase === 'holding' ? view.label : ''}
      </span>
    </div>
  );
}

function shownProgress(view: HoldView, calm: boolean): number {
  if (view.phase === 'failed') return FAILED;
  return calm && view.phase === 'holding' ? steppedProgress(view.progress) : view.progress;
}

function words(view: HoldView): string {
  if (view.phase === 'failed') return view.words;
  if (view.phase !== 'holding') return view.label;
  return `${view.label}, ${(Math.ceil(view.left_ms / 100) / 10).toFixed(1)}\u2009s`;
}
