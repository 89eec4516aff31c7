import { BREAK_DIGITS, breakText } from '../rules/break-text';
import type { GapInput } from '../gap/gap-input';
import type { GapAnswer } from '../gap/self-break';
import type { WorkingPoint } from '../gap/working-point';
import type { Figure } from './lookup';

const KV = { unit: 'kV', digits: BREAK_DIGITS } as const;

export function gapFigures(gap: GapAnswer, input: GapInput): readonly Figure[] {
  const stand = breakText(gap.stand_at_most_kV, 'down');
  return [
    {
      ...KV,
      key: 'low',
      label: 'nothing fires below',
      value: gap.low_kV,
      rounding: 'down',
      weight: 'answer',
      face: 'low',
      note: `stand at most ${stand}\u2009kV`,
    },
    {
      ...KV,
      key: 'law',
      label: 'law',
      value: gap.law_kV,
      low: gap.low_kV,
      high: gap.high_kV,
      rounding: 'nearest',
      weight: 'main',
      face: 'law',
    },
    {
      ...KV,
      key: 'high',
      label: 'may hold up to',
      value: gap.high_kV,
      rounding: 'up',
      weight: 'answer',
      face: 'high',
      note: input.irradiated ? 'with UV on the gap' : 'without UV on the gap',
    },
    {
      ...KV,
      key: 'stand',
      label: 'stand at most',
      value: gap.stand_at_most_kV,
      rounding: 'down',
      weight: 'side',
    },
    {
      key: 'mean_field',
      label: 'mean field at the law',
      value: gap.meanField_MV_m,
      unit: 'kV/mm',
      rounding: 'nearest',
      digits: 3,
      weight: 'side',
    },
    {
      key: 'x',
      label: 'pressure times gap, at 20\u00a0\u00b0C',
      value: gap.x_bar_cm,
      unit: 'bar cm',
      rounding: 'nearest',
      digits: 3,
      weight: 'side',
    },
  ];
}

export function heldFigures(held: WorkingPoint | null): readonly Figure[] {
  if (held === null) return [];
  const { share, margin, earlyBreak } = held;
  return [
    {
      key: 'share',
      label: 'voltage over the low side',
      value: 100 * share.value,
      unit: '%',
      rounding: 'up',
      digits: 3,
      weight: 'main',
    },
    {
      key: 'margin',
      label: 'margin to self-break',
      value: margin.value,
      low: margin.band.low,
      high: margin.band.high,
      unit: margin.unit,
      rounding: 'down',
      digits: 2,
      weight: 'main',
    },
    {
      key: 'early_break',
      label: 'chance of an early break per shot',
      value: earlyBreak.value,
      low: earlyBreak.band.low,
      high: earlyBreak.band.high,
      unit: '',
      rounding: 'up',
      digits: 2,
      weight: 'main',
    },
  ];
}

export function supplyFigures(reachable_kV: number | null): readonly Figure[] {
  if (reachable_kV === null) return [];
  return [
    {
      ...KV,
      key: 'supply',
      label: 'the supply reaches',
      value: reachable_kV,
      rounding: 'down',
      weight: 'side',
      note: 'through ballast and bleed of the rig',
    },
  ];
}
