const DAY_MS = 86_400_000;
const MINUTE_MS = 60_000;

/** A day of the bench, in the lab's own zone. */
export interface WorkingDay {
  readonly date: string;
  /** Unix ms at so many minutes after local midnight. */
  readonly at: (minutes: number) => number;
}

/** The last `count` working days up to yesterday. Yesterday counts even on a weekend, so that the demo ends fresh. */
export function workingDaysUntilYesterday(
  now_ms: number,
  zone: string,
  count: number,
): readonly WorkingDay[] {
  const yesterday = localMidnightAsUtc(now_ms, zone) - DAY_MS;
  const days: WorkingDay[] = [];
  for (let day = yesterday; days.length < count; day -= DAY_MS) {
    if (day === yesterday || !isWeekend(day)) days.unshift(workingDay(day, zone));
  }
  return days;
}

/** Minutes east of UTC in a zone at a moment. */
export function offsetMinutes(zone: string, at_ms: number): number {
  const second = Math.floor(at_ms / 1000) * 1000;
  return Math.round((localAsUtc(second, zone) - second) / MINUTE_MS);
}

function workingDay(midnightAsUtc: number, zone: string): WorkingDay {
  return {
    date: new Date(midnightAsUtc).toISOString().slice(0, 10),
    at: (minutes) => {
      const local = midnightAsUtc + minutes * MINUTE_MS;
      // Bench hours lie far from the small hours in which clocks change, so one step is exact.
      return local - offsetMinutes(zone, local) * MINUTE_MS;
    },
  };
}

function isWeekend(midnightAsUtc: number): boolean {
  const weekday = new Date(midnightAsUtc).getUTCDay();
  return weekday === 0 || weekday === 6;
}

function localMidnightAsUtc(at_ms: number, zone: string): number {
  return Math.floor(localAsUtc(at_ms, zone) / DAY_MS) * DAY_MS;
}

/** The zone's wall time, read as if it were UTC. */
function localAsUtc(at_ms: number, zone: string): number {
  const parts = new Intl.DateTimeFormat('en-GB', {
    timeZone: zone,
    hourCycle: 'h23',
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    second: 'numeric',
  }).formatToParts(at_ms);
  const part = (type: string) => Number(parts.find((one) => one.type === type)?.value);
  return Date.UTC(part('year'), part('month') - 1, part('day'), part('hour'), part('minute'), part('second'));
}
