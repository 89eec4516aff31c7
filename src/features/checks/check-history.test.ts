import { describe, expect, it } from 'vitest';
import { CHECK, DEVICE, RIG, stepRecord, trace } from './check.fixture';
import { checkAge, checkWorth, filterChecks } from './check-history';

const at = (minutes: number) => ({ rig: RIG, device: DEVICE, now: trace('now', minutes).stamp });

describe('what an earlier check is worth', () => {
  it('counts while nothing happened, and lapses by idling and by age', () => {
    expect(checkWorth(CHECK, at(20))).toBe('counts for another 20 min without activity');
    expect(checkWorth(CHECK, at(41))).toBe('The check lapsed after 30 min without activity.');
    const busy = { ...RIG, ready_check: { ...RIG.ready_check!, active: trace('reading', 240).stamp } };
    expect(checkWorth(CHECK, { ...at(251), rig: busy })).toBe('The check lapsed after 4 h.');
  });

  it('names what voided it', () => {
    const voided = { code: 'made-safe', words: 'The rig was made safe after the check.', at: null };
    const rig = { ...RIG, ready_check: { ...RIG.ready_check!, voided } };
    expect(checkWorth(CHECK, { ...at(12), rig })).toBe('The rig was made safe after the check.');
  });

  it('does not count on another tablet', () => {
    expect(checkWorth(CHECK, { ...at(12), device: 'another' })).toBe(
      'The check was walked on another tablet.',
    );
  });

  it('tells abandoned, unfinished, replaced and making safe apart', () => {
    const ended = CHECK.ended!;
    expect(checkWorth({ ...CHECK, ended: { ...ended, how: 'abandoned', words: 'gas out' } }, at(12))).toBe(
      'abandoned: gas out',
    );
    expect(checkWorth({ ...CHECK, ended: { ...ended, irregular: 'steps-missing' } }, at(12))).toMatch(
      /steps missing/,
    );
    expect(checkWorth({ ...CHECK, id: 'earlier' }, at(12))).toBe('replaced by a later check');
    expect(checkWorth({ ...CHECK, purpose: 'make-safe' }, at(12))).toBe('declared shorted');
  });

  it('says of a gas change what it voids, and of care that it is done', () => {
    expect(checkWorth({ ...CHECK, purpose: 'gas-change' }, at(12))).toMatch(/before it are void/);
    expect(checkWorth({ ...CHECK, purpose: 'weekly-care' }, at(12))).toBe('done');
  });

  it('is found by purpose, by how it ended, and by what was waived', () => {
    const gas = { ...CHECK, id: 'gas', purpose: 'gas-change' as const };
    const left = { ...CHECK, id: 'left', ended: { ...CHECK.ended!, how: 'abandoned' as const } };
    const waived = { ...CHECK, id: 'waived', steps: { flow: stepRecord({ state: 'waived' }) } };
    const ids = (purpose: 'all' | 'gas-change', end: 'all' | 'closed' | 'abandoned' | 'waived') =>
      filterChecks([CHECK, gas, left, waived], { purpose, end }).map((one) => one.id);
    expect(ids('all', 'all')).toEqual(['check', 'gas', 'left', 'waived']);
    expect(ids('gas-change', 'all')).toEqual(['gas']);
    expect(ids('all', 'abandoned')).toEqual(['left']);
    expect(ids('all', 'waived')).toEqual(['waived']);
    expect(ids('gas-change', 'waived')).toEqual([]);
  });

  it('has an age, or says that there is none to be had', () => {
    expect(checkAge(CHECK, trace('now', 24).stamp)).toBe('14 min ago');
    const restarted = { ...trace('now', 24).stamp, page_life: 'other', time_uncertain: true };
    expect(checkAge(CHECK, restarted)).toBe('age not known');
  });
});
