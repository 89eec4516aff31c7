import { describe, expect, it } from 'vitest';
import { readingDoc, SETTINGS, SPEC } from './firing.fixture';
import { firingChart } from './firing-chart';
import { sigmasOf, standingRows } from './reading-fit';
import { EMPTY_DRAFT, enter, firstBase, formValues } from './reading-form';

const base = firstBase(SPEC, '7A', SETTINGS);
const values = formValues(base, EMPTY_DRAFT);

const LAW_ALONE = { spec: SPEC, own: null };

describe('the chart of a firing', () => {
  const rows = standingRows([
    readingDoc(1),
    readingDoc(2, { voltage_kV: 14 }),
    readingDoc(3, { how: 'held' }),
  ]);
  const chart = firingChart({ spec: SPEC, values, rows, sigmas: sigmasOf(LAW_ALONE, rows) });

  it('draws self-breaks alone and rings the one out of family', () => {
    expect(chart?.readings?.map((dot) => [dot.number, dot.odd])).toEqual([
      ['1', undefined],
      ['2', true],
    ]);
  });

  it('holds every reading and the working point within its axes', () => {
    const xs = [...(chart?.readings ?? []).map((dot) => dot.x), chart?.point?.x ?? NaN];
    for (const x of xs) expect(x >= chart!.x.min && x <= chart!.x.max).toBe(true);
    for (const { y } of chart?.readings ?? []) expect(y >= chart!.y.min && y <= chart!.y.max).toBe(true);
  });

  it('puts the working point on the two sides of the law there', () => {
    expect(chart?.point?.low).toBeLessThan(chart!.law!.find(({ x }) => x >= 0.8)!.y);
    expect(chart?.point?.high).toBeGreaterThan(chart!.law!.findLast(({ x }) => x <= 0.8)!.y);
  });

  it('draws nothing without an ambient pressure', () => {
    const bare = { ...values, ambient_bar_abs: null };
    expect(firingChart({ spec: SPEC, values: bare, rows, sigmas: new Map() })).toBeNull();
  });

  it('follows the pressure on the form', () => {
    const moved = formValues(base, enter(EMPTY_DRAFT, 'pressure_bar_g', 1.1));
    expect(firingChart({ spec: SPEC, values: moved, rows, sigmas: new Map() })?.point?.x).toBe(1.1);
  });
});
