import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import type { FiringDoc } from '../../domain/book/documents/firing';
import type { PartDoc } from '../../domain/book/documents/part';
import type { RigDoc } from '../../domain/book/documents/rig';
import { LOOK_WORDS } from '../../domain/report/words';
import { partLedger, shotsText, usedWords } from '../../domain/rules/part-ledger';
import { firingsEndured } from '../../domain/rules/part-life';
import { formatFigure } from '../../domain/units/format-quantity';
import type { StandingRow } from './reading-fit';

export interface SummaryFigure {
  readonly key: string;
  readonly label: string;
  /** A dash where there is nothing to take it from. */
  readonly words: string;
}

/** The figures of a firing, in the order in which they are read aloud; the same for one firing and for two side by side. */
export function summaryFigures(firing: FiringDoc, rows: readonly StandingRow[]): readonly SummaryFigure[] {
  const values = rows.map((row) => row.values);
  const breaks = rows
    .filter((row) => row.values.how === 'self-break' && row.values.looked !== 'gap-dark')
    .map((row) => row.values.voltage_kV);
  const outputs = known(values, 'output_uJ');
  const misses = known(values, 'trigger_misses');
  const counted = firing.shots - values.reduce((sum, one) => sum + one.shots, 0);
  return [
    { key: 'shots', label: 'Shots', words: whole(firing.shots) },
    { key: 'counted', label: 'of them counted by the burst', words: whole(Math.max(0, counted)) },
    { key: 'readings', label: 'Readings that stand', words: whole(rows.length) },
    { key: 'breaks', label: 'Self-breaks', words: whole(breaks.length) },
    { key: 'kV', label: 'Self-break, mean', words: figure(meanOf(breaks), 2, 'kV') },
    {
      key: 'pressure',
      label: 'Pressure',
      words: rangeWords(
        values.map((one) => one.pressure_bar_g),
        2,
        'bar(g)',
      ),
    },
    { key: 'rate', label: 'Rate', words: rangeWords(known(values, 'rate_Hz'), 1, 'Hz') },
    { key: 'output', label: 'Output by meter, mean', words: figure(meanOf(outputs), 0, 'µJ') },
    {
      key: 'attenuators',
      label: 'Attenuators, a count',
      words: rangeWords(known(values, 'output_attenuators'), 0, ''),
    },
    { key: 'misses', label: 'Triggers missed', words: misses.length === 0 ? '–' : whole(sumOf(misses)) },
  ];
}

/** How often it looked how, the most frequent first: "even 18, arc, A end 2". */
export function looksCounted(
  rows: readonly StandingRow[],
): readonly { readonly looked: string; readonly times: number }[] {
  const counts = new Map<ReadingValues['looked'], number>();
  for (const { values } of rows) counts.set(values.looked, (counts.get(values.looked) ?? 0) + 1);
  return [...counts]
    .map(([looked, times]) => ({ looked: LOOK_WORDS[looked], times }))
    .sort((a, b) => b.times - a.times);
}

export interface FiringPoint {
  readonly x: number;
  readonly y: number;
}

/** Output by meter over the shots of this firing so far; what nobody measured is no point. */
export function outputOverShots(rows: readonly StandingRow[]): readonly FiringPoint[] {
  return overShots(rows, ({ values }) => values.output_uJ);
}

/** Any figure of a reading over the shots of its firing up to it. */
export function overShots(
  rows: readonly StandingRow[],
  figureOf: (row: StandingRow) => number | null,
): readonly FiringPoint[] {
  let shots = 0;
  return rows.flatMap((row) => {
    shots += row.values.shots;
    const y = figureOf(row);
    return y === null ? [] : [{ x: shots, y }];
  });
}

export interface WearLine {
  readonly part: string;
  readonly words: string;
}

/** What this firing added to each part that was fitted then, and what the part has come to since. */
export function wearLines(
  firing: FiringDoc,
  rig: RigDoc,
  at: { readonly parts: readonly PartDoc[]; readonly firings: readonly FiringDoc[] },
): readonly WearLine[] {
  return at.parts
    .filter((part) => firingsEndured(part, [firing]).length === 1)
    .map((part) => {
      const with_ = partLedger(part, rig, at.firings);
      const without = partLedger(
        part,
        rig,
        at.firings.filter((one) => one.id !== firing.id),
      );
      const { all, here } = with_.life;
      const total = all === null ? `${shotsText(here)} here, before that not known` : shotsText(all);
      const added = `${shotsText(firing.shots)} shots added, ${total} in all`;
      const wear =
        with_.wear === null || without.wear === null
          ? ''
          : `; life used ${usedWords(with_.wear.used)}, by this firing ${usedWords(with_.wear.used - without.wear.used)}`;
      return { part: part.fitted.what, words: `${added}${wear}` };
    });
}

type Numeric = 'output_uJ' | 'rate_Hz' | 'output_attenuators' | 'trigger_misses';

function known(values: readonly ReadingValues[], key: Numeric): readonly number[] {
  return values.flatMap((one) => one[key] ?? []);
}

function sumOf(list: readonly number[]): number {
  return list.reduce((sum, one) => sum + one, 0);
}

function meanOf(list: readonly number[]): number | null {
  return list.length === 0 ? null : sumOf(list) / list.length;
}

function whole(value: number): string {
  return formatFigure(value, { digits: { decimals: 0 }, rounding: 'nearest' });
}

function figure(value: number | null, decimals: number, unit: string): string {
  if (value === null) return '–';
  return `${formatFigure(value, { digits: { decimals }, rounding: 'nearest' })}\u2009${unit}`;
}

function rangeWords(values: readonly number[], decimals: number, unit: string): string {
  if (values.length === 0) return '–';
  const shown = (value: number) => formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
  const [low, high] = [Math.min(...values), Math.max(...values)];
  const text = low === high ? shown(low) : `${shown(low)} to ${shown(high)}`;
  return unit === '' ? text : `${text}\u2009${unit}`;
}
