import { useRef } from 'react';
import { electrodePath } from './electrode';
import { steppedProgress, type HoldView } from './hold';
import { useReducedMotion } from './use-reduced-motion';
import { useSize } from './use-size';

/** What is left between the faces while the work behind a hold is not done yet. px */
const HAIR_PX = 6;

/** Two faces that close over the strip, stop a hair short, and touch when what was asked is durable. */
export function HoldFill({ view }: { readonly view: HoldView }) {
  const ref = useRef<SVGSVGElement>(null);
  const { width, height } = useSize(ref);
  const calm = useReducedMotion();
  const progress = calm && view.phase === 'holding' ? steppedProgress(view.progress) : view.progress;
  const closed = view.phase === 'settled';
  const reach = closed ? width / 2 + 1 : Math.max(0, (width / 2) * progress - HAIR_PX / 2);
  const body = { y: 0, width: reach, height, edge: 7, sagitta: height / 9 };
  const bars =
    reach < 1
      ? ''
      : closed
        ? `M0 0H${width}V${height}H0Z`
        : electrodePath({ ...body, x: 0, facing: 'right' }) +
          electrodePath({ ...body, x: width - reach, facing: 'left' });
  return (
    <div className="hold-fill" data-phase={view.phase}>
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

function words(view: HoldView): string {
  if (view.phase === 'failed') return view.words;
  if (view.phase !== 'holding') return view.label;
  return `${view.label}, ${(Math.ceil(view.left_ms / 100) / 10).toFixed(1)}\u2009s`;
}
