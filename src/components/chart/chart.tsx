import { useMemo, useRef, useState } from 'react';
import { useSettled } from '../use-settled';
import { useSize } from '../use-size';
import { ChartAxes } from './chart-axes';
import { ChartCursor, plainWords } from './chart-cursor';
import { chartLayout, sliceFaces, sliceHeights } from './chart-layout';
import { cursorStops, type Plot } from './chart-paths';
import { ChartPlot } from './chart-plot';
import { ChartSlice } from './chart-slice';
import { ChartTable } from './chart-table';
import { scaleOf } from './scale';
import { ticks } from './ticks';
import type { ChartData, ChartWords, CursorValues, Slice } from './types';
import { useFonts } from './use-fonts';

export interface ChartProps {
  readonly title: string;
  readonly data: ChartData;
  readonly words: ChartWords;
  readonly slice?: Slice;
  /** Height of the drawing; it fills its parent when left out. */
  readonly height_mm?: number;
  /** Words for what the cursor reads off; a plain sentence of figures when left out. */
  readonly describe?: (values: CursorValues) => string;
}

/** A hidden table follows once the curve has come to rest; a shown one follows at once. */
const TABLE_RESTS_MS = 250;

/** The one chart of the app: what matters is the void between two solid bodies. */
export function Chart({ title, data, words, slice, height_mm, describe }: ChartProps) {
  const box = useRef<HTMLDivElement>(null);
  const probes = useRef<HTMLSpanElement>(null);
  const size = useSize(box);
  const fonts = useFonts(probes);
  const [at, setAt] = useState<number | null>(null);
  const [asTable, setAsTable] = useState(false);

  const font = fonts.body;
  const drawn = size.width > 0 && size.height > 0 && font > 0;
  const letters = slice === undefined ? 0 : Math.max(slice.high.words.length, slice.low.words.length);
  const yLabels = drawn
    ? ticks(data.y, size.height / (font * 2.4)).map((tick) => tick.label?.length ?? 0)
    : [];
  const layout = chartLayout({
    ...size,
    font,
    labels: Math.max(0, data.y.unit.length * 0.8, ...yLabels),
    lead: fonts.lead,
    slice: letters,
    wall: data.wall !== undefined,
    topLabel: data.wall !== undefined || data.spans !== undefined,
  });
  // Nothing is drawn beyond a wall, so the axis ends there.
  const x = data.wall === undefined ? data.x : { ...data.x, max: Math.min(data.x.max, data.wall.from) };
  const walled: ChartData = { ...data, x };
  const told = useMemo(() => ({ title, data, words }), [title, data, words]);
  const settled = useSettled(told, TABLE_RESTS_MS);
  const tabled = asTable ? told : settled;
  const plot: Plot = {
    ...layout,
    x: scaleOf(x, layout.left, layout.right),
    y: scaleOf(data.y, layout.bottom, layout.top),
  };
  const least =
    slice !== undefined && drawn && layout.slice !== null
      ? sliceHeights({
          fonts: slice.lean === 'high' ? fonts : { ...fonts, high: fonts.low, low: fonts.high },
          highNote: slice.high.note !== undefined,
          lowNote: slice.low.note !== undefined,
          middle: slice.middle.length > 0,
          width: layout.slice.right - layout.slice.left,
        })
      : null;
  const faces =
    least !== null && data.point !== undefined
      ? sliceFaces(layout, { high_px: plot.y.at(data.point.high), low_px: plot.y.at(data.point.low) }, least)
      : null;
  // Stacked above the plot, the slice leaves it a height of its own.
  const minHeight =
    least === null
      ? slice === undefined
        ? {}
        : { minHeight: font * 12 }
      : { minHeight: least.high + least.low + least.void + layout.top + font * 2.7 };
  const height = height_mm === undefined ? {} : { height: `calc(${height_mm} * var(--mm))` };

  return (
    <figure className="chart" aria-label={title}>
      <span ref={probes} className="chart-probes" aria-hidden="true">
        <i className="size-body" />
        <i className="size-lead" />
        <i className="size-lean" />
        <i className="size-answer" />
        <i className="size-read" />
      </span>
      {slice !== undefined && drawn && layout.slice === null ? (
        <ChartSlice slice={slice} place={null} />
      ) : null}
      <div ref={box} className="chart-box" style={{ ...height, ...minHeight }} hidden={asTable}>
        {drawn ? (
          <>
            <svg className="chart-drawing" aria-hidden="true">
              <ChartPlot data={walled} {...{ layout, plot, font }} readOff={faces} />
              <ChartAxes data={walled} {...{ layout, plot, font }} />
            </svg>
            {slice !== undefined && faces !== null ? (
              <ChartSlice slice={slice} place={{ layout, ...faces }} />
            ) : null}
            <ChartCursor
              label={title}
              data={walled}
              {...{ layout, plot, at }}
              stops={cursorStops(walled)}
              onMove={setAt}
              describe={describe ?? ((values) => plainWords(walled, values))}
            />
          </>
        ) : null}
      </div>
      <div className={asTable ? 'chart-table' : 'heard-only'}>
        <ChartTable {...tabled} />
      </div>
      <button
        type="button"
        className="chart-switch"
        aria-pressed={asTable}
        style={asTable || !drawn ? {} : { left: 0, width: layout.left - font * 1.5, height: font * 1.8 }}
        onClick={() => setAsTable(!asTable)}
      >
        {asTable ? words.showChart : words.showTable}
      </button>
    </figure>
  );
}
