import { describe, expect, it } from 'vitest';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { createAsked } from './asked.fixture';
import { shownFields } from './fields';
import { UNITS_LOOKUP as UNITS } from './units-lookup';
import { QUANTITIES } from './units-lookup-table';

const { asked, figure, refusal } = createAsked(UNITS, { spec: HERON_SPEC, settings: DEMO_LAB_SETTINGS });

describe('the units lookup', () => {
  // Exact by definition: 1 in = 25.4 mm, 1 atm = 1.01325 bar = 760 Torr, 1 psi = 6.894757 kPa, 0 C = 273.15 K.
  it.each([
    [{ quantity: 'length', value: 0.125, unit_length: 'in' }, 'mm', 3.175],
    [{ quantity: 'length', value: 5, unit_length: 'thou' }, '\u00b5m', 127],
    [{ value: 1, unit_pressure: 'atm(abs)', ambient_bar_abs: 1 }, 'Torr(abs)', 760],
    [{ value: 1, unit_pressure: 'atm(abs)', ambient_bar_abs: 1 }, 'bar(g)', 0.01325],
    [{ typed: '50 psig', ambient_bar_abs: 0.95 }, 'bar(abs)', 3.447379 + 0.95],
    [{ quantity: 'capacitance', typed: '2,5 nF' }, 'pF', 2500],
    [{ quantity: 'temperature', value: 21, unit_temperature: '\u00b0C' }, 'K', 294.15],
    [{ quantity: 'temperature', value: 212, unit_temperature: '\u00b0F' }, '\u00b0C', 100],
    [{ quantity: 'energy', value: 3.678, unit_energy: 'eV' }, 'J', 5.8928e-19],
    [{ quantity: 'flow', value: 1, unit_flow: 'ft\u00b3/h' }, 'L/min', 0.471947],
    [{ quantity: 'angle', value: 1, unit_angle: '\u00b0' }, 'mrad', 17.4533],
    [{ quantity: 'field', value: 80, unit_field: 'kV/mm' }, 'kV/cm', 800],
  ])('%j is in %s %d', (change, key, value) => {
    expect(figure(key, change).value / value).toBeCloseTo(1, 5);
  });

  it('comes back to the same number by way of every unit', () => {
    for (const { key, units } of QUANTITIES) {
      for (const unit of units) {
        const from = { quantity: key, value: 300, [`unit_${key}`]: unit.label, ambient_bar_abs: 0.966 };
        for (const { key: to, value } of asked(from).figures) {
          const back = { ...from, value, [`unit_${key}`]: to };
          expect(figure(unit.label, back).value, `${unit.label} by ${to}`).toBeCloseTo(300, 6);
        }
      }
    }
  });

  it('never tells gauge from absolute without an ambient', () => {
    const answer = asked({ value: 1, unit_pressure: 'bar(g)', ambient_bar_abs: null });
    expect(answer.figures.every(({ unit }) => unit.endsWith('(g)'))).toBe(true);
    expect(answer.warnings.map(({ type }) => type)).toEqual(['no-ambient']);
    expect(refusal({ typed: '50 psi' })).toMatchObject({ type: 'gauge-or-absolute', field: 'typed' });
  });

  it.each([
    [{ value: -2 }, 'value'],
    [{ typed: '\u22122 bar(g)' }, 'typed'],
    [{ quantity: 'temperature', value: -300 }, 'value'],
    [{ quantity: 'length', typed: '3 kV' }, 'typed'],
    [{ typed: '1,234 psig' }, 'typed'],
    [{ quantity: 'speed' }, 'quantity'],
    [{ unit_pressure: 'bar' }, 'unit_pressure'],
  ])('refuses %j beside %s', (change, field) => {
    expect(refusal(change)).toMatchObject({ field });
  });

  it('asks for a text or for number and unit, never both', () => {
    const keys = (values: Parameters<typeof shownFields>[1]) =>
      shownFields(UNITS, values).map(({ key }) => key);
    expect(keys({ quantity: 'length', typed: '' })).toEqual(['quantity', 'value', 'unit_length', 'typed']);
    expect(keys({ quantity: 'length', typed: '3 mm' })).toEqual(['quantity', 'typed']);
    expect(keys({ quantity: 'angle', typed: '3 mm' })).toEqual(['quantity', 'value', 'unit_angle']);
  });
});
