import { describe, expect, it } from 'vitest';
import { readingDoc, SPEC, trace } from './firing.fixture';
import { fitOf, sigmasOf, standingRows } from './reading-fit';

const LAW_ALONE = { spec: SPEC, own: null };

describe('how readings of a firing compare', () => {
  it('gives each self-break the deviation that the judge of plausibility gives it', () => {
    const rows = standingRows([
      readingDoc(1),
      readingDoc(2, { voltage_kV: 17.4 }),
      readingDoc(3, { how: 'set', voltage_kV: 22 }),
    ]);
    const sigmas = sigmasOf(LAW_ALONE, rows);
    expect([...sigmas.keys()]).toEqual([rows[0]!.reading.id, rows[1]!.reading.id]);
    const fit = fitOf(LAW_ALONE, rows, rows[1]!.reading.id);
    expect(fit?.ok === true ? fit.value.sigma : null).toBeCloseTo(sigmas.get(rows[1]!.reading.id)!, 10);
  });

  it('speaks at the second of two readings beyond 2 sigma, not at the first', () => {
    const low = { voltage_kV: 17.1 };
    const rows = standingRows([readingDoc(1), readingDoc(2, low), readingDoc(3, low)]);
    const before = fitOf(LAW_ALONE, rows, rows[1]!.reading.id);
    const after = fitOf(LAW_ALONE, rows, rows[2]!.reading.id);
    expect(before?.ok === true ? before.value.fits : null).toBe(true);
    expect(after?.ok === true ? after.value.fits : null).toBe(false);
    expect(after?.ok === true ? after.value.causes.length : 0).toBeGreaterThan(1);
  });

  it('leaves out what was struck and takes corrections for what they say', () => {
    const struck = { ...readingDoc(1), struck: { ...trace('x'), why: 'typed twice' } };
    const second = readingDoc(2);
    const corrected = {
      ...second,
      corrections: [
        { ...trace('y'), replaces: second.id, values: { ...second.original, voltage_kV: 19.4 }, why: '' },
      ],
    };
    const rows = standingRows([struck, corrected]);
    expect(rows.map((row) => row.values.voltage_kV)).toEqual([19.4]);
  });
});
