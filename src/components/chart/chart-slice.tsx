import { ElectrodeBody } from '../electrode-body';
import { Reading } from '../reading';
import type { ChartLayout } from './chart-layout';
import type { Slice, SliceFace } from './types';

export interface ChartSliceProps {
  readonly slice: Slice;
  /** Null stacks it above the plot, off the scale. */
  readonly place: { readonly layout: ChartLayout; readonly high: number; readonly low: number } | null;
}

/** The answer: two solid bodies with the void between them, cut out of the chart at the working point. */
export function ChartSlice({ slice, place }: ChartSliceProps) {
  const beside = place?.layout.slice ?? null;
  const box =
    place === null || beside === null
      ? {}
      : {
          left: beside.left,
          width: beside.right - beside.left,
          top: place.layout.top,
          height: place.layout.bottom - place.layout.top,
        };
  const upper = place === null ? {} : { height: place.high - place.layout.top };
  const lower = place === null ? {} : { height: place.layout.bottom - place.low };
  return (
    <div className={`chart-slice${place === null ? ' stacked' : ''}`} style={box}>
      <div className="slice-body upper" style={upper}>
        <ElectrodeBody
          facing="down"
          rim={slice.lean === 'high' ? 'face' : 'none'}
          edge={0.05}
          sagitta={0.031}
        />
        <span className="slice-words">{slice.high.words}</span>
        <SliceFigure face={slice.high} lean={slice.lean === 'high'} />
      </div>
      <div className="slice-void">
        {slice.high.note ? <span className="muted">{slice.high.note}</span> : null}
        <span className="slice-middle">
          {slice.middle.map((each) => (
            <span key={each.label} className="nowrap">
              <span className="muted">{each.label}</span> <Reading value={each.value} />
            </span>
          ))}
        </span>
      </div>
      <div className="slice-body lower" style={lower}>
        <ElectrodeBody facing="up" rim={slice.lean === 'low' ? 'face' : 'none'} edge={0.05} sagitta={0.031} />
        <SliceFigure face={slice.low} lean={slice.lean === 'low'} />
        <span className="slice-words">{slice.low.words}</span>
        {slice.low.note ? <span className="muted slice-note">{slice.low.note}</span> : null}
      </div>
    </div>
  );
}

function SliceFigure({ face, lean }: { readonly face: SliceFace; readonly lean: boolean }) {
  return <Reading value={face.value} unit={face.unit} size={lean ? 'lean' : 'answer'} />;
}
