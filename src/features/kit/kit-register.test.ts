import { describe, expect, it } from 'vitest';
import { DAY_MS, kitDoc, NOW_MS, spareDoc } from './kit.fixture';
import { dueOf, kitGroups, orderText, ordersOf, registerWords } from './kit-register';

const due = (days: number) => dueOf(kitDoc({ due_ms: NOW_MS + days * DAY_MS }), NOW_MS, 'Europe/London');

describe('when a piece is due', () => {
  it.each([
    [-12.5, 'overdue', 'inspection overdue, 12\u00a0d'],
    [-0.2, 'overdue', 'inspection overdue, since today'],
    [0.5, 'soon', 'inspection due today'],
    [9.9, 'soon', 'inspection due in 9\u00a0d'],
    [31, 'fine', 'inspection due 1 Jan 2027'],
  ])('%d days ahead is %s', (days, state, words) => {
    expect(due(days)).toMatchObject({ state, words });
  });

  it('says calibration of a meter, and nothing where nothing is due', () => {
    const meter = kitDoc({ item: { type: 'meter', measures: 'kV', rated_kV: 40 }, due_ms: NOW_MS - 1 });
    expect(dueOf(meter, NOW_MS, 'Etc/UTC').words).toBe('calibration overdue, since today');
    expect(dueOf(kitDoc(), NOW_MS, 'Etc/UTC')).toMatchObject({ state: 'none', words: 'nothing due' });
  });

  it('puts what failed before every date', () => {
    expect(dueOf(kitDoc({ state: 'failed', due_ms: NOW_MS + DAY_MS }), NOW_MS, 'Etc/UTC').state).toBe(
      'failed',
    );
  });
});

describe('the register', () => {
  it('groups by kind, soonest due first, never due last', () => {
    const kit = [
      spareDoc('S1', 3, 1),
      kitDoc({ number: 'E1' }),
      kitDoc({ number: 'E2', due_ms: NOW_MS + DAY_MS }),
      kitDoc({ number: 'E3', due_ms: NOW_MS - DAY_MS }),
      kitDoc({ number: 'E4', state: 'failed' }),
    ];
    expect(kitGroups(kit).map(({ type, kit: rows }) => [type, rows.map((one) => one.number)])).toEqual([
      ['eyewear', ['E4', 'E3', 'E2', 'E1']],
      ['spare', ['S1']],
    ]);
    expect(registerWords([...kit, spareDoc('S2', 0, 1)], NOW_MS)).toBe(
      '1 did not pass, 1 overdue, 1 due within 30 d, 1 to order',
    );
  });

  it('orders what fell below its minimum, back to it', () => {
    const orders = ordersOf([spareDoc('S1', 2, 2), spareDoc('S2', 1, 4)]);
    expect(orders.map(({ missing }) => missing)).toEqual([3]);
    expect(orderText(orders)).toBe('3 x Spare S2 (S2); 1 there, at least 4');
  });
});
