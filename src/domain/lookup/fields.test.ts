import { describe, expect, it } from 'vitest';
import { enteredValue, numberText, shownFields, steppedValue, valueText } from './fields';
import { figureLine, figureText } from './figure-text';
import { GAP_LOOKUP } from './gap-lookup';
import type { NumberField } from './lookup';
import { kettleLikeSpec, labSettings } from './rig.fixture';

const { values } = GAP_LOOKUP.start({ spec: kettleLikeSpec, settings: labSettings });
const number = (key: string): NumberField => {
  const field = GAP_LOOKUP.fields.find((each) => each.key === key);
  if (field?.kind !== 'number') throw new Error(`${key} is no number`);
  return field;
};
const enter = (key: string, text: string, unit: string | null = null) =>
  enteredValue(number(key), { text, unit }, values);

describe('entering a field', () => {
  it.each(['', '  ', 'abc', '1e999', '--1', '1,2,3', 'NaN', 'Infinity'])('refuses %j in words', (text) => {
    for (const key of ['gap_mm', 'pressure', 'temperature_C', 'ambient_bar_abs', 'radius_mm']) {
      expect(enter(key, text)).toMatchObject({ ok: false, refusal: { field: key } });
    }
  });

  it('takes a comma, another unit, and nothing where nothing is needed', () => {
    expect(enter('pressure', '0,8')).toEqual({ ok: true, value: 0.8 });
    expect(enter('pressure', '1.966', 'abs')).toEqual({ ok: true, value: 1 });
    expect(enter('voltage_kV', '')).toEqual({ ok: true, value: null });
  });

  it('refuses a unit that cannot be told without the ambient', () => {
    const without = { ...values, ambient_bar_abs: null };
    expect(enteredValue(number('pressure'), { text: '2', unit: 'abs' }, without)).toMatchObject({
      ok: false,
      refusal: { type: 'unit-not-told', field: 'pressure' },
    });
  });

  it('refuses a part of what is only whole', () => {
    const whole = { ...number('gap_mm'), whole: true };
    expect(enteredValue(whole, { text: '1.5', unit: null }, values)).toMatchObject({ ok: false });
  });

  it('steps on the grid without leaving binary dust, and not out of range', () => {
    expect(steppedValue(number('gap_mm'), { gap_mm: 3 }, 1)).toEqual({ ok: true, value: 3.1 });
    expect(steppedValue(number('gap_mm'), { gap_mm: 3.1 }, -1)).toEqual({ ok: true, value: 3 });
    expect(steppedValue(number('gap_mm'), { gap_mm: 0.05 }, -1).ok).toBe(false);
  });
});

describe('writing', () => {
  it('never hides a small value behind its field’s decimals', () => {
    expect([numberText(3, 2), numberText(0.004, 2), numberText(-12.5, 0)]).toEqual([
      '3.00',
      '0.004',
      '\u221212.5',
    ]);
  });

  it('writes choices by their label', () => {
    expect(valueText(GAP_LOOKUP.fields[0] ?? number('gap_mm'), values)).toBe('N2');
  });

  it('shows only fields that have a meaning', () => {
    const keys = shownFields(GAP_LOOKUP, { ...values, electrodes: 'plane' }).map(({ key }) => key);
    expect(keys).not.toContain('radius_mm');
  });

  it('sets what is very small or large as a power of ten, rounded its way', () => {
    const parts = { digits: 2, rounding: 'up' } as const;
    expect(figureText({ ...parts, value: 1.234e-9 })).toEqual({ figure: '1.3', power: -9 });
    expect(figureLine({ ...parts, value: 2.5e8 })).toBe('2.5e8');
    expect(figureLine({ ...parts, value: 0 })).toBe('0.0');
    expect(figureLine({ ...parts, value: 9.42, decimals: 1, rounding: 'down' })).toBe('9.4');
  });
});
