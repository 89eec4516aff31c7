import { describe, expect, it } from 'vitest';
import { lumpedVerdict } from './lumped-verdict';

const feed = (sheet_H: number, transit_s = 1e-9) => ({ sheet_H, transit_s });

describe('lumpedVerdict', () => {
  it.each([
    [0, 'lumped'],
    [1e-9, 'lumped'],
    [1.001e-9, 'steps'],
    [1e-8, 'steps'],
    [1.001e-8, 'travelling'],
  ])('takes a sheet of %d H on a gap of 10 nH as %s', (sheet_H, type) => {
    expect(lumpedVerdict(1e-8, feed(sheet_H))).toMatchObject({ ok: true, value: { type } });
  });

  it('counts the sheet with a third', () => {
    expect(lumpedVerdict(1e-8, feed(6e-9))).toMatchObject({ value: { loop_H: 1.2e-8 } });
  });

  it('calls a rise under twice the transit a travelling wave, however small the sheet', () => {
    expect(lumpedVerdict(1e-8, feed(1e-10), 2.1e-9)).toMatchObject({ value: { type: 'lumped' } });
    expect(lumpedVerdict(1e-8, feed(1e-10), 1.9e-9)).toMatchObject({ value: { type: 'travelling' } });
  });

  it.each([
    [Number.NaN, feed(1e-9), null, 'gap_H'],
    [1e-8, feed(-1), null, 'sheet_H'],
    [1e-8, feed(1e-9, Infinity), null, 'transit_s'],
    [1e-8, feed(1e-9), Number.NaN, 'rise_s'],
  ])('refuses %d, %j, %d beside its field', (gap_H, sheet, rise_s, field) => {
    expect(lumpedVerdict(gap_H, sheet, rise_s)).toMatchObject({ refusal: { field } });
  });
});
