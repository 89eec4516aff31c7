import { describe, expect, it } from 'vitest';
import { windowFor } from './circuit-parts';

const loop = { topology: 'charge-transfer', first_nF: 5, second_nF: 1.4, gap_nH: 28, feed: null } as const;

describe('windowFor', () => {
  // Half period pi sqrt(L C), C both in series: 17.4 ns here.
  it('shows four half periods, with two counting digits', () => {
    expect(windowFor(loop)).toBe(70);
    expect(windowFor({ ...loop, topology: 'lc-inversion' })).toBe(150);
  });

  it('counts a third of a sheet', () => {
    const feed = { sheet_H: 84e-9, transit_s: 1e-9 };
    expect(windowFor({ ...loop, feed })).toBe(98);
  });

  it('stays within what can be followed, whatever the parts', () => {
    expect(windowFor({ ...loop, gap_nH: 1e-6 })).toBe(40);
    expect(windowFor({ ...loop, gap_nH: 1e12 })).toBe(20_000);
    expect(windowFor({ ...loop, gap_nH: Number.NaN })).toBe(40);
  });
});
