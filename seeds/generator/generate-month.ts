import { DEMO_LAB } from '../lab';
import { createBench, type Batch, type OnPurpose } from './bench';
import { createDice } from './dice';
import type { FoundingEntry, MemoryBook } from './memory-book';
import { MONTH_DAYS, planMonth } from './month';
import { weatherOfDay } from './weather';
import { workingDaysUntilYesterday, type WorkingDay } from './working-days';

/** Another number gives another month of the same shape. */
export const DEMO_SEED = 1403;

export interface DemoMonth {
  /** In the order in which they reached the Book. */
  readonly batches: readonly Batch[];
  readonly onPurpose: ReadonlyMap<string, OnPurpose>;
  /** The Book that came of it. */
  readonly book: MemoryBook;
}

export interface MonthSetting {
  /** The month ends on the day before, in the lab's zone. */
  readonly now_ms: number;
  /** Of the lab that is to be filled, with the entries that its server founded it with. */
  readonly epoch: string;
  readonly founding: readonly FoundingEntry[];
  readonly seed?: number;
}

const FOUNDED_AT = 800;
const OPENED_AT = 815;

/** When the lab of a month that ends before `now_ms` is to be founded: on its first morning. */
export function foundingTime(now_ms: number): number {
  const [first] = daysOfMonth(now_ms);
  if (first === undefined) throw new Error('the month has no days');
  return first.at(minutesOf(FOUNDED_AT));
}

/**
 * A month of the demo lab, written entry by entry through the domain's own judge. The same setting gives the same
 * entries, byte for byte. Throws where an entry is met otherwise than its plan says.
 */
export function generateMonth({ now_ms, epoch, founding, seed = DEMO_SEED }: MonthSetting): DemoMonth {
  const days = daysOfMonth(now_ms);
  const lastDay = days.at(-1);
  if (lastDay === undefined) throw new Error('the month has no days');
  const bench = createBench({ epoch, founding }, createDice(seed));
  const plan = planMonth(bench, lastDay);
  for (const [index, day] of days.entries()) {
    const weather = weatherOfDay(bench.dice);
    bench.goTo(day.at(minutesOf(OPENED_AT)));
    bench.openAll();
    for (const [dayOfPlan, time, act] of plan) {
      if (dayOfPlan !== index) continue;
      bench.goTo(day.at(minutesOf(time)) + bench.dice.whole(0, 240_000));
      act(weather);
    }
  }
  return { batches: bench.batches(), onPurpose: bench.onPurpose(), book: bench.book };
}

function daysOfMonth(now_ms: number): readonly WorkingDay[] {
  return workingDaysUntilYesterday(now_ms, DEMO_LAB.zone, MONTH_DAYS);
}

/** Minutes after midnight of a time written as hours and minutes. */
function minutesOf(time: number): number {
  return Math.floor(time / 100) * 60 + (time % 100);
}
