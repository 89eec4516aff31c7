import { describe, expect, it } from 'vitest';
import { offsetMinutes, workingDaysUntilYesterday } from './working-days';

describe('working days', () => {
  it('end yesterday in the lab’s zone and leave weekends out', () => {
    // Wednesday 20 May 2026.
    const days = workingDaysUntilYesterday(Date.UTC(2026, 4, 20, 9), 'Europe/London', 4);
    expect(days.map(({ date }) => date)).toEqual(['2026-05-14', '2026-05-15', '2026-05-18', '2026-05-19']);
  });

  it('count yesterday even when it was a Saturday', () => {
    const days = workingDaysUntilYesterday(Date.UTC(2026, 4, 17, 9), 'Europe/London', 2);
    expect(days.map(({ date }) => date)).toEqual(['2026-05-15', '2026-05-16']);
  });

  it('take the date from the zone and not from UTC', () => {
    const at = Date.UTC(2026, 6, 1, 23, 30);
    const last = (zone: string) => workingDaysUntilYesterday(at, zone, 1)[0]?.date;
    expect([last('Europe/London'), last('UTC')]).toEqual(['2026-07-01', '2026-06-30']);
  });

  it('put ten o’clock at ten o’clock on both sides of a clock change', () => {
    const days = workingDaysUntilYesterday(Date.UTC(2026, 9, 28, 9), 'Europe/London', 3);
    // Clocks went back on Sunday 25 October 2026.
    expect(days.map((day) => new Date(day.at(600)).toISOString())).toEqual([
      '2026-10-23T09:00:00.000Z',
      '2026-10-26T10:00:00.000Z',
      '2026-10-27T10:00:00.000Z',
    ]);
    expect(days.map((day) => offsetMinutes('Europe/London', day.at(600)))).toEqual([60, 0, 0]);
  });
});
