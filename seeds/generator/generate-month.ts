import { DEMO_LAB } from '../lab';
import { createBench, type Batch, type OnPurpose } from './bench';
import { createDice } from './dice';
import type { MemoryBook } from './memory-book';
import { MONTH_DAYS, planMonth } from './month';
import { weatherOfDay } from './weather';
import { workingDaysUntilYesterday } from './working-days';

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
  /** Of the empty lab that is to be filled. */
  readonly epoch: string;
  readonly seed?: number;
}

const OPENED_AT = 815;

/**
 * A month of the demo lab, written entry by entry through the domain's own judge. The same setting gives the same
 * entries, byte for byte. Throws where an entry is met otherwise than its plan says.
 */
export function generateMonth({ now_ms, epoch, seed = DEMO_SEED }: MonthSetting): DemoMonth {
  const days = workingDaysUntilYesterday(now_ms, DEMO_LAB.zone, MONTH_DAYS);
  const lastDay = days.at(-1);
  if (lastDay === undefined) throw new Error('the month has no days');
  const bench = createBench(epoch, createDice(seed));
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

/** Minutes after midnight of a time written as hours and minutes. */
function minutesOf(time: number): number {
  return Math.floor(time / 100) * 60 + (time % 100);
}
