import type { ChartData } from '../../components/chart/types';
import { numberAt, numberFieldOf } from '../../domain/lookup/fields';
import type { Figure, Lookup, LookupAnswer, NumberField, Values } from '../../domain/lookup/lookup';
import { sweepOf, sweepXs, type SweepAsk, type SweepRow } from '../../domain/lookup/sweep';
import { sweptField } from '../../domain/lookup/table';
import type { LookupForm } from './lookup-form';

export interface SweepPlan {
  readonly field: NumberField;
  readonly figures: readonly Figure[];
  /** Every figure that may be chosen. */
  readonly candidates: readonly Figure[];
  readonly range: SweepAsk;
  readonly xs: readonly number[];
}

interface At {
  readonly lookup: Lookup;
  readonly form: LookupForm;
  readonly values: Values;
  readonly answer: LookupAnswer;
}

/** Which input is swept against which figures: as chosen, else the active input against the answer's first figure. */
export function planSweep({ lookup, form, values, answer }: At, points?: number): SweepPlan | null {
  const chosen = form.sweep.field === null ? undefined : numberFieldOf(lookup, form.sweep.field);
  const field = chosen ?? sweptField(lookup, values, form.active);
  const candidates = answer.figures.filter((figure) => figure.words === undefined);
  if (field === undefined || candidates.length === 0) return null;
  const wanted = candidates.filter((figure) => form.sweep.figures?.includes(figure.key) ?? false);
  const first =
    candidates.find((figure) => figure.face === 'law') ??
    candidates.find((figure) => figure.weight === 'answer') ??
    candidates[0];
  const figures = wanted.length > 0 ? wanted : first === undefined ? [] : [first];
  const offered = sweepOf(
    field,
    figures.map((figure) => figure.key),
    points,
  );
  const now = numberAt(values, field.key);
  const range: SweepAsk =
    now === null || (offered.scale === 'log' && now <= 0)
      ? offered
      : { ...offered, from: Math.min(offered.from, now), to: Math.max(offered.to, now) };
  return { field, figures, candidates, range, xs: sweepXs(field, range) };
}

/** Adds a figure or takes it away; figures of another unit make room, since the curves share one axis. */
export function toggleFigure(plan: SweepPlan, key: string): readonly string[] {
  const figure = plan.candidates.find((each) => each.key === key);
  const keys = plan.figures.map((each) => each.key);
  if (figure === undefined) return keys;
  if (keys.includes(key)) return keys.length === 1 ? keys : keys.filter((each) => each !== key);
  const sameUnit = plan.figures.filter((each) => each.unit === figure.unit).map((each) => each.key);
  return [...sameUnit, key];
}

const LOG_FROM = 300;
const ROOM = 0.06;

/** The curves over what was swept; null where there is no answer in the whole range. */
export function sweepChart(plan: SweepPlan, rows: readonly SweepRow[], values: Values): ChartData | null {
  const curves = plan.figures.flatMap((figure) => curvesOf(figure, rows, plan.figures.length === 1));
  const ys = curves.flatMap((curve) => curve.points.map((point) => point.y)).filter(Number.isFinite);
  const [first] = plan.figures;
  if (ys.length === 0 || first === undefined) return null;
  const low = Math.min(...ys);
  const high = Math.max(...ys);
  const log = low > 0 && high / low > LOG_FROM;
  const room = (high - low || Math.abs(high) || 1) * ROOM;
  const now = numberAt(values, plan.field.key);
  const { from, to, scale } = plan.range;
  return {
    x: {
      min: Math.max(from, plan.xs[0] ?? from),
      max: to,
      unit: plan.field.unit,
      kind: scale === 'log' && from > 0 ? 'log' : 'linear',
      decimals: decimalsOf((to - from) / plan.xs.length),
    },
    y: {
      min: log ? low / 1.2 : low >= 0 ? Math.max(0, low - room) : low - room,
      max: log ? high * 1.2 : high + room,
      unit: first.unit,
      kind: log ? 'log' : 'linear',
      decimals: first.decimals ?? decimalsOf(log ? low / 100 : Math.max(Math.abs(high), Math.abs(low)) / 500),
    },
    curves,
    ...(now === null ? {} : { readings: [{ x: now, y: first.value, number: 'now' }] }),
  };
}

function curvesOf(figure: Figure, rows: readonly SweepRow[], alone: boolean) {
  const points = (of: 'value' | 'low' | 'high') =>
    // A refused point breaks the line: nothing is drawn across it.
    rows.map(({ x, at }) => ({ x, y: at[figure.key]?.[of] ?? Number.NaN }));
  const banded = alone && rows.some(({ at }) => at[figure.key]?.low !== undefined);
  return [
    { label: figure.label, points: points('value'), weight: 'curve' as const },
    ...(banded
      ? [
          { label: 'low', points: points('low'), weight: 'thin' as const },
          { label: 'high', points: points('high'), weight: 'thin' as const },
        ]
      : []),
  ];
}

function decimalsOf(step: number): number {
  if (!(step > 0) || !Number.isFinite(step)) return 2;
  return Math.max(0, Math.min(9, Math.ceil(-Math.log10(step))));
}
