import type { FigureSpec, FigureTexts } from '../../components/figure-form';
import { readFigure } from '../../components/figure-form';

/** How the next date is given: not at all, in months from now, or as it stands on the label. */
export type DueHow = 'none' | 'months' | 'date';

export const DUE_HOW: readonly { readonly value: DueHow; readonly label: string }[] = [
  { value: 'none', label: 'nothing due' },
  { value: 'months', label: 'in months' },
  { value: 'date', label: 'on a date' },
];

const MONTHS: FigureSpec = {
  key: 'due_months',
  label: 'Next due in',
  unit: 'months',
  step: 1,
  rule: { field: 'due_months', name: 'Next due', unit: 'months', min: 1, max: 120 },
  initial: '12',
};

const DATE: FigureSpec = {
  key: 'due_date',
  label: 'Next due, year month day',
  short: 'Next due',
  unit: 'yyyymmdd',
  step: 1,
  rule: { field: 'due_date', name: 'Next due', unit: '', min: 20_200_101, max: 21_001_231 },
  initial: '',
};

export function dueSpecs(how: DueHow): readonly FigureSpec[] {
  if (how === 'none') return [];
  return [how === 'months' ? MONTHS : DATE];
}

export type DueRead =
  | { readonly type: 'due'; readonly due_ms: number | null }
  | { readonly type: 'refused'; readonly words: string };

/** The end of the day on which it is due, in the lab's zone; it must lie ahead. */
export function readDue(
  how: DueHow,
  texts: FigureTexts,
  { now_ms, zone }: { readonly now_ms: number; readonly zone: string },
): DueRead {
  if (how === 'none') return { type: 'due', due_ms: null };
  const [spec] = dueSpecs(how);
  if (spec === undefined) return { type: 'due', due_ms: null };
  const read = readFigure(spec, texts);
  if (read.type !== 'value') {
    return { type: 'refused', words: read.type === 'refused' ? read.words : 'Next due: enter a number.' };
  }
  if (!Number.isInteger(read.value)) return { type: 'refused', words: 'Next due: a whole number.' };
  const day = how === 'months' ? monthsFrom(now_ms, read.value, zone) : dayOf(read.value);
  if (day === null) return { type: 'refused', words: 'Next due: there is no such day.' };
  const due_ms = endOfDayMs(day, zone);
  return due_ms > now_ms
    ? { type: 'due', due_ms }
    : { type: 'refused', words: 'Next due: the day lies behind.' };
}

interface Day {
  readonly year: number;
  readonly month: number;
  readonly day: number;
}

function dayOf(figure: number): Day | null {
  const day = { year: Math.floor(figure / 10_000), month: Math.floor(figure / 100) % 100, day: figure % 100 };
  const back = new Date(Date.UTC(day.year, day.month - 1, day.day));
  return back.getUTCMonth() === day.month - 1 && back.getUTCDate() === day.day ? day : null;
}

/** The same day so many months on; of a shorter month its last day. */
function monthsFrom(now_ms: number, months: number, zone: string): Day {
  const today = inZone(now_ms, zone);
  const first = new Date(Date.UTC(today.year, today.month - 1 + months, 1));
  const [year, month] = [first.getUTCFullYear(), first.getUTCMonth() + 1];
  const longest = new Date(Date.UTC(year, month, 0)).getUTCDate();
  return { year, month, day: Math.min(today.day, longest) };
}

function endOfDayMs({ year, month, day }: Day, zone: string): number {
  const next = Date.UTC(year, month - 1, day + 1);
  return next - offsetMs(next, zone) - 1;
}

function offsetMs(at_ms: number, zone: string): number {
  const { year, month, day, hour, minute } = inZone(at_ms, zone);
  return Date.UTC(year, month - 1, day, hour, minute) - Math.floor(at_ms / 60_000) * 60_000;
}

function inZone(at_ms: number, zone: string): Day & { readonly hour: number; readonly minute: number } {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    hourCycle: 'h23',
  }).formatToParts(at_ms);
  const part = (type: string): number => Number(parts.find((one) => one.type === type)?.value ?? 0);
  return {
    year: part('year'),
    month: part('month'),
    day: part('day'),
    hour: part('hour'),
    minute: part('minute'),
  };
}
