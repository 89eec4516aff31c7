import { describe, expect, it } from 'vitest';
import { absolutePressure, changeReference, enterField, gapFormOf, stepField } from './gap-form';
import { gapCurves, gapView, supplyAgainst } from './gap-view';
import { kettleLikeSpec, settings } from './gap-form.fixture';

const form = gapFormOf(kettleLikeSpec, settings);

describe('gap form', () => {
  it('starts from the rig and the lab', () => {
    expect(form.values).toMatchObject({
      gap_mm: 3,
      pressure: 1,
      radius_mm: 12,
      temperature_C: 21,
      ambient_bar_abs: 0.966,
    });
    expect(form.known.gap_mm).toBe('rig');
  });

  it.each(['', '  ', 'abc', '1e999', '--1', '1,2,3', 'NaN', 'Infinity'])(
    'refuses %j in words and keeps the value',
    (text) => {
      for (const field of [
        'gap_mm',
        'pressure',
        'temperature_C',
        'ambient_bar_abs',
        'radius_mm',
        'voltage_kV',
      ] as const) {
        const next = enterField(form, field, text);
        expect(next.refusal).toMatch(/: /);
        expect(next.values).toEqual(form.values);
      }
    },
  );

  it.each([
    ['gap_mm', '-1'],
    ['gap_mm', '0'],
    ['gap_mm', '1e9'],
    ['pressure', '-0.97'],
    ['pressure', '1e9'],
    ['temperature_C', '-300'],
    ['ambient_bar_abs', '0'],
    ['ambient_bar_abs', '7'],
    ['radius_mm', '-12'],
    ['voltage_kV', '0'],
  ] as const)('refuses %s %s by its range', (field, text) => {
    expect(enterField(form, field, text).refusal).not.toBeNull();
  });

  it('names the vacuum of this ambient when a gauge pressure goes below it', () => {
    expect(enterField(form, 'pressure', '-0.98').refusal).toContain('absolute vacuum');
    expect(enterField(form, 'pressure', '-0.5').refusal).toBeNull();
  });

  it('takes a decimal comma and marks the field as what if', () => {
    const next = enterField(form, 'pressure', '0,8');
    expect(next.values.pressure).toBe(0.8);
    expect(next.known.pressure).toBe('what-if');
    expect(next.refusal).toBeNull();
  });

  it('steps on the grid without leaving binary dust', () => {
    expect(stepField(form, 'gap_mm', 1).values.gap_mm).toBe(3.1);
    expect(stepField(stepField(form, 'gap_mm', 1), 'gap_mm', -1).values.gap_mm).toBe(3);
    expect(
      stepField({ ...form, values: { ...form.values, gap_mm: 0.05 } }, 'gap_mm', -1).refusal,
    ).not.toBeNull();
  });

  it('changes between gauge and absolute without changing the pressure', () => {
    const absolute = changeReference(form, 'abs');
    expect(absolute.values.pressure).toBeCloseTo(1.966, 9);
    const before = absolutePressure(form);
    const after = absolutePressure(absolute);
    expect(before.ok && after.ok && Math.abs(before.value - after.value) < 1e-9).toBe(true);
    expect(changeReference(absolute, 'g').values.pressure).toBeCloseTo(1, 9);
  });

  it('asks for the ambient instead of assuming one', () => {
    const without = gapFormOf(kettleLikeSpec, undefined);
    const view = gapView({ ...without, values: { ...without.values, temperature_C: 20 } });
    expect(!view.ok && view.refusal.words).toContain('Ambient');
  });
});

describe('gap view', () => {
  it('answers with two sides around the law', () => {
    const view = gapView(form);
    if (!view.ok) throw new Error(view.refusal.words);
    const { low_kV, law_kV, high_kV } = view.value.answer;
    expect(low_kV).toBeLessThan(law_kV);
    expect(law_kV).toBeLessThan(high_kV);
  });

  it('solves for pressure and gap so that the leaned-on side meets the voltage', () => {
    for (const purpose of ['hold-off-at-least', 'break-at-most'] as const) {
      for (const find of ['pressure', 'gap'] as const) {
        const view = gapView({ ...form, find, purpose, values: { ...form.values, voltage_kV: 17 } });
        if (!view.ok) throw new Error(view.refusal.words);
        const side = purpose === 'hold-off-at-least' ? view.value.answer.low_kV : view.value.answer.high_kV;
        expect(side).toBeCloseTo(17, 4);
      }
    }
  });

  it('refuses a voltage that no pressure in range gives', () => {
    const view = gapView({ ...form, find: 'pressure', values: { ...form.values, voltage_kV: 199 } });
    expect(!view.ok && view.refusal.words).toMatch(/No such pressure/);
  });

  it('draws curves only where the model holds', () => {
    const view = gapView(form);
    if (!view.ok) throw new Error(view.refusal.words);
    const curves = gapCurves(view.value.input, 0.966, { from_bar_g: 0, to_bar_g: 6 });
    expect(curves.notValidFrom).toBeGreaterThan(3.9);
    expect(curves.band.every(({ low, high }) => low < high)).toBe(true);
  });

  it('says when the supply may not reach the high side', () => {
    const view = gapView(form);
    if (!view.ok) throw new Error(view.refusal.words);
    expect(supplyAgainst(kettleLikeSpec, view.value.answer)?.reach.type).toBe('may-not-fire');
  });
});
