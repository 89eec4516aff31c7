import { describe, expect, it } from 'vitest';
import { readDue } from './due-entry';

const at = { now_ms: Date.UTC(2026, 7, 31, 12), zone: 'Europe/London' };
const shown = (read: ReturnType<typeof readDue>) =>
  read.type === 'due' && read.due_ms !== null ? new Date(read.due_ms + 1).toISOString() : read;

describe('the next date', () => {
  it('is the end of that day in the lab’s zone', () => {
    expect(shown(readDue('date', { due_date: '20270331' }, at))).toBe('2027-03-31T23:00:00.000Z');
    expect(shown(readDue('date', { due_date: '20270120' }, at))).toBe('2027-01-21T00:00:00.000Z');
    const auckland = { ...at, zone: 'Pacific/Auckland' };
    expect(shown(readDue('date', { due_date: '20270120' }, auckland))).toBe('2027-01-20T11:00:00.000Z');
  });

  it('is the same day so many months on, or the last of a shorter one', () => {
    expect(shown(readDue('months', {}, at))).toBe('2027-08-31T23:00:00.000Z');
    expect(shown(readDue('months', { due_months: '6' }, at))).toBe('2027-03-01T00:00:00.000Z');
    expect(readDue('none', {}, at)).toEqual({ type: 'due', due_ms: null });
  });

  it.each([
    ['date', '20270231', 'no such day'],
    ['date', '20260101', 'behind'],
    ['date', '', 'enter a number'],
    ['date', '2027', 'must be at least'],
    ['months', '1.5', 'whole number'],
    ['months', '0', 'must be at least'],
  ] as const)('refuses %s %j in words', (how, text, words) => {
    const read = readDue(how, { due_months: text, due_date: text }, at);
    expect(read).toMatchObject({ type: 'refused', words: expect.stringContaining(words) });
  });
});
