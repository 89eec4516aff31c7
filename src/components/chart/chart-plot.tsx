import { useId } from 'react';
import { electrodePath } from '../electrode';
import type { ChartLayout } from './chart-layout';
import { bandPaths, linePath, type Plot } from './chart-paths';
import type { BandPoint, ChartData, WorkingPoint } from './types';

export interface ChartPlotProps {
  readonly data: ChartData;
  readonly layout: ChartLayout;
  readonly plot: Plot;
  readonly font: number;
  /** Where the reading-off lines end, px; null draws them to the axis. */
  readonly readOff: { readonly high: number; readonly low: number } | null;
}

export function ChartPlot({ data, layout, plot, font, readOff }: ChartPlotProps) {
  const id = useId();
  const { left, right, top, bottom } = layout;
  const band = data.band === undefined ? null : bandPaths(data.band.points, plot);
  return (
    <g className="chart-plot">
      <clipPath id={`${id}p`}>
        <rect x={left} y={top} width={right - left} height={bottom - top} />
      </clipPath>
      <g clipPath={`url(#${id}p)`}>
        {band === null ? null : <path className="chart-body" d={band.above + band.below} />}
        {data.law === undefined ? null : <path className="chart-law" d={linePath(data.law, plot)} />}
      </g>
      {data.point === undefined || data.point.bare === true ? null : (
        <ReadOff {...{ plot, layout, font, readOff }} point={data.point} />
      )}
      <g clipPath={`url(#${id}p)`}>
        {data.limit === undefined ? null : (
          <path className="chart-limit" d={`M${left} ${plot.y.at(data.limit.y)}H${right}`} />
        )}
        {band === null ? null : <path className="chart-curve" d={band.highLine + band.lowLine} />}
        {(data.curves ?? []).map((curve, i) => (
          <path
            key={i}
            className={curve.weight === 'thin' ? 'chart-thin' : 'chart-curve'}
            d={linePath(curve.points, plot)}
          />
        ))}
        {data.own === undefined ? null : <path className="chart-own" d={linePath(data.own.points, plot)} />}
      </g>
      <BandWords {...{ data, layout, plot, font }} />
      {data.limit === undefined ? null : (
        <text
          className="chart-halo"
          textAnchor="end"
          x={right - font * 0.36}
          y={plot.y.at(data.limit.y) - font * 0.36}
        >
          {right - left < font * 10 ? (data.limit.short ?? data.limit.label) : data.limit.label}
        </text>
      )}
      <EndLabels {...{ data, plot, font }} />
      {data.notValid === undefined ? null : (
        <text
          className="muted-text"
          textAnchor="middle"
          x={(plot.x.at(data.notValid.from) + right) / 2}
          y={bottom - font * 0.6}
        >
          {data.notValid.label}
        </text>
      )}
      {data.wall === undefined ? null : <Wall {...{ layout, font }} label={data.wall.label} id={id} />}
      {(data.spans ?? []).map((span) => (
        <Span key={span.label} {...{ plot, font, span }} top={top} />
      ))}
      <Readings {...{ data, plot, font }} />
      {data.point === undefined ? null : <PointMark point={data.point} plot={plot} />}
    </g>
  );
}

function BandWords({ data, layout, plot, font }: Omit<ChartPlotProps, 'readOff'>) {
  const points = data.band?.points ?? [];
  const first = points[0];
  const last = points.at(-1);
  if (data.band === undefined || first === undefined || last === undefined) return null;
  const endX = Math.min(layout.right, plot.x.at(last.x));
  // Each word stands where its body is thickest.
  const rises = last.high >= first.high;
  const left = { x: layout.left + font * 0.55, textAnchor: 'start' as const };
  const right = { x: endX - font * 1.1, textAnchor: 'end' as const };
  return (
    <>
      <text className="muted-text" {...(rises ? left : right)} y={layout.top + font * 1.55}>
        {data.band.above}
      </text>
      <text className="muted-text" {...(rises ? right : left)} y={layout.bottom - font * 1.1}>
        {data.band.below}
      </text>
    </>
  );
}

/**
 * Two lines carry the working point across to the axis, and on to the slice unless its words pushed the face away; one carries
 * it down.
 */
function ReadOff({
  point,
  plot,
  layout,
  font,
  readOff,
}: Omit<ChartPlotProps, 'data'> & { readonly point: BandPoint }) {
  const x = plot.x.at(point.x);
  const high = plot.y.at(point.high);
  const low = plot.y.at(point.low);
  const start = layout.left - font * 0.55;
  const slice = layout.slice?.right;
  const across = (y: number, faceY: number): string =>
    slice === undefined || Math.abs(faceY - y) > font * (layout.width < 500 ? 0.2 : 0.7)
      ? `M${start} ${y}H${x}`
      : `M${slice + 3} ${faceY}L${start} ${y}H${x}`;
  return (
    <path
      className="chart-readoff"
      d={`${across(high, readOff?.high ?? high)}${across(low, readOff?.low ?? low)}M${x} ${low}V${layout.bottom}`}
    />
  );
}

function PointMark({ point, plot }: { readonly point: WorkingPoint; readonly plot: Plot }) {
  const box = { x: plot.x.at(point.x) - 11, width: 22, height: 38, edge: 4, sagitta: 2.1 };
  const high = plot.y.at(point.high);
  const low = plot.y.at(point.low);
  return (
    <>
      <path
        className="chart-point"
        d={
          electrodePath({ ...box, y: high - box.height, facing: 'down' }) +
          electrodePath({ ...box, y: low, facing: 'up' })
        }
      />
      {point.y === undefined ? null : (
        <circle className="chart-dot" cx={box.x + 11} cy={plot.y.at(point.y)} r="6" />
      )}
    </>
  );
}

function Wall({
  layout,
  font,
  label,
  id,
}: {
  readonly layout: ChartLayout;
  readonly font: number;
  readonly label: string;
  readonly id: string;
}) {
  return (
    <>
      <pattern
        id={`${id}w`}
        width="12"
        height="12"
        patternUnits="userSpaceOnUse"
        patternTransform="rotate(45)"
      >
        <path className="chart-hatch" d="M0 0V12" />
      </pattern>
      <rect
        x={layout.right}
        y={layout.top}
        width={layout.wall}
        height={layout.bottom - layout.top}
        fill={`url(#${id}w)`}
      />
      <text textAnchor="end" x={layout.right + layout.wall} y={layout.top - font * 0.4}>
        {label}
      </text>
    </>
  );
}

/** Every named line says its name at its end; where two end together, the later name stands above the earlier one. */
function EndLabels({ data, plot, font }: Pick<ChartPlotProps, 'data' | 'plot' | 'font'>) {
  const named = [...(data.own === undefined ? [] : [data.own]), ...(data.curves ?? [])];
  const placed: { readonly label: string; readonly x: number; readonly y: number }[] = [];
  for (const { label, points } of named) {
    const last = points.findLast((point) => Number.isFinite(point.y));
    if (label === undefined || last === undefined) continue;
    const width = label.length * font * 0.5;
    const x = Math.max(plot.left, Math.min(plot.x.at(last.x) + 6, plot.right - width));
    let y = plot.y.at(last.y) - font * 0.4;
    const meets = (each: { readonly x: number; readonly y: number; readonly label: string }) =>
      Math.abs(each.y - y) < font * 1.1 && each.x < x + width && x < each.x + each.label.length * font * 0.5;
    for (let hit = placed.find(meets); hit !== undefined; hit = placed.find(meets)) y = hit.y - font * 1.15;
    placed.push({ label, x, y });
  }
  return placed.map(({ label, x, y }) => (
    <text key={label} className="chart-halo" x={x} y={y}>
      {label}
    </text>
  ));
}

function Span({
  span,
  plot,
  font,
  top,
}: {
  readonly span: { readonly from: number; readonly to: number; readonly label: string };
  readonly plot: Plot;
  readonly font: number;
  readonly top: number;
}) {
  const from = plot.x.at(span.from);
  const to = plot.x.at(span.to);
  const body = { y: top, height: font * 1.2, width: font * 1.6, edge: 3, sagitta: 1.5 };
  return (
    <>
      <path
        className="chart-body"
        d={
          electrodePath({ ...body, x: from - body.width, facing: 'right' }) +
          electrodePath({ ...body, x: to, facing: 'left' })
        }
      />
      <text textAnchor="middle" x={(from + to) / 2} y={top + font * 0.95}>
        {span.label}
      </text>
    </>
  );
}

function Readings({
  data,
  plot,
  font,
}: {
  readonly data: ChartData;
  readonly plot: Plot;
  readonly font: number;
}) {
  return (
    <>
      {(data.readings ?? []).map((reading, i) => {
        const x = plot.x.at(reading.x);
        const y = plot.y.at(reading.y);
        if (reading.odd !== true) return <circle key={i} className="chart-dot" cx={x} cy={y} r="3.6" />;
        return (
          <g key={i}>
            <circle className="chart-ring" cx={x} cy={y} r="5.4" />
            {reading.number === undefined ? null : (
              <text className="chart-strong" x={x + font * 0.6} y={y + font * 1}>
                {reading.number}
              </text>
            )}
          </g>
        );
      })}
    </>
  );
}
