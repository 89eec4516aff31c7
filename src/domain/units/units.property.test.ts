import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { unsound } from '../../../tests/support/sound-results';
import { answer, withBand } from './answer';
import { formatFigure, roundToSignificant } from './format-quantity';
import { formatLength, formatPressure, formatSi } from './format-si';
import { parseNumber } from './parse-number';
import { parseWithUnit } from './parse-quantity';
import {
  absToGauge,
  ambientBar,
  atmToBar,
  barToAtm,
  barToKilopascal,
  barToPsi,
  barToTorr,
  gaugeToAbs,
  kilopascalToBar,
  pressureAbsBar,
  pressureGaugeBar,
  psiToBar,
  torrToBar,
} from './pressure';
import { celsiusToKelvin, kelvinToCelsius } from './temperature';
import type { Dimension } from './unit-table';

const near = (a: number, b: number, tolerance = 1e-12) =>
  Math.abs(a - b) <= tolerance * Math.max(1, Math.abs(b));
const bar = fc.double({ min: 1e-6, max: 1000, noNaN: true });
const any = fc.oneof(fc.double(), fc.constantFrom(Number.NaN, Infinity, -Infinity, 5e-324, 1.7e308));

describe('units there and back', () => {
  it('are the same pressure', () => {
    fc.assert(
      fc.property(bar, (p) => {
        const back = [
          torrToBar(barToTorr(p)),
          kilopascalToBar(barToKilopascal(p)),
          atmToBar(barToAtm(p)),
          psiToBar(barToPsi(p)),
        ];
        return back.every((one) => near(one, p));
      }),
    );
  });

  it('are the same temperature', () => {
    fc.assert(
      fc.property(fc.double({ min: -273, max: 5000, noNaN: true }), (C) =>
        near(kelvinToCelsius(celsiusToKelvin(C)), C),
      ),
    );
  });

  it('are the same gauge reading at any ambient pressure', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -0.5, max: 20, noNaN: true }),
        fc.double({ min: 0.5, max: 1.1, noNaN: true }),
        (reading, air) => {
          const gauge = pressureGaugeBar(reading);
          const ambient = ambientBar(air);
          if (!gauge.ok || !ambient.ok) return false;
          const absolute = gaugeToAbs(gauge.value, ambient.value);
          return absolute.ok && near(absToGauge(absolute.value, ambient.value), reading);
        },
      ),
    );
  });

  it('refuse every pressure that is none, in words', () => {
    fc.assert(
      fc.property(any, (value) => {
        for (const make of [pressureAbsBar, pressureGaugeBar, ambientBar])
          expect(unsound(make(value))).toBeUndefined();
      }),
    );
  });
});

describe('print and read', () => {
  const pressureUnit = fc.constantFrom('bar', 'mbar', 'kPa', 'Torr', 'psi', 'atm' as const);
  const lengthUnit = fc.constantFrom('m', 'mm', '\u00b5m', 'in' as const);
  const read = (text: string, dimension: Dimension) =>
    parseWithUnit(text.replaceAll(',', ''), { dimension, field: 'x', name: 'Quantity' });

  it('give back a pressure in any unit with its reference', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 100, noNaN: true }),
        pressureUnit,
        fc.constantFrom('gauge', 'absolute' as const),
        (p, unit, reference) => {
          const text = formatPressure(p, reference, { significant: 9, rounding: 'nearest', unit });
          const back = read(text, 'pressure');
          return back.ok && back.value.reference === reference && near(back.value.value / p, 1, 1e-7);
        },
      ),
    );
  });

  it('give back a length in any unit', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 1000, noNaN: true }), lengthUnit, (mm, unit) => {
        const back = read(formatLength(mm, { significant: 9, rounding: 'nearest', unit }), 'length');
        return back.ok && near(back.value.value / mm, 1, 1e-7);
      }),
    );
  });

  it.each<[string, Dimension]>([
    ['V', 'voltage'],
    ['A', 'current'],
    ['F', 'capacitance'],
    ['H', 'inductance'],
    ['\u2126', 'resistance'],
    ['J', 'energy'],
    ['W', 'power'],
    ['s', 'time'],
    ['Hz', 'frequency'],
    ['C', 'charge'],
  ])('give back any quantity in %s', (unit, dimension) => {
    fc.assert(
      fc.property(
        fc.double({ min: -14, max: 11, noNaN: true }).map((power) => 10 ** power),
        (value) => {
          const back = read(formatSi(value, unit, { significant: 9, rounding: 'nearest' }), dimension);
          return back.ok && near(back.value.value / value, 1, 1e-7);
        },
      ),
      { numRuns: 50 },
    );
  });

  it('never print NaN, Infinity or an exponent, whatever the number', () => {
    fc.assert(
      fc.property(
        any,
        fc.integer({ min: 1, max: 6 }),
        fc.constantFrom('nearest', 'down', 'up' as const),
        (value, significant, rounding) => {
          const texts = [
            formatFigure(value, { digits: { significant }, rounding }),
            formatSi(value, 'V', { significant, rounding }),
            formatPressure(value, 'gauge', { significant, rounding, unit: 'psi' }),
            formatLength(value, { significant, rounding, unit: 'in' }),
          ];
          for (const text of texts) expect(text).not.toMatch(/NaN|Infinity|undefined|\de/);
        },
      ),
    );
  });

  it('read a decimal comma as the point, unless it could be a thousand', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: 99_999 }), fc.stringMatching(/^\d{1,6}$/), (whole, decimals) => {
        const comma = parseNumber(`${String(whole)},${decimals}`, 'x', 'X');
        const point = parseNumber(`${String(whole)}.${decimals}`, 'x', 'X');
        const ambiguous = whole > 0 && whole < 1000 && decimals.length === 3;
        return point.ok && (ambiguous ? !comma.ok : comma.ok && comma.value === point.value);
      }),
    );
  });
});

describe('bands and rounding', () => {
  it('hold the value, however they are given', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.double({ min: 0, max: 5, noNaN: true }),
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        (value, relative, end) => {
          const one = answer({ value, unit: 'V', model: 'a law', valid: 'here', relative });
          expect(unsound(one)).toBeUndefined();
          expect(unsound(withBand(one, { low: end, high: end }))).toBeUndefined();
        },
      ),
    );
  });

  it('round a rounded figure to itself', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-6, max: 1e6, noNaN: true }),
        fc.integer({ min: 1, max: 6 }),
        fc.constantFrom('nearest', 'down', 'up' as const),
        (value, significant, rounding) => {
          const once = roundToSignificant(value, significant, rounding);
          return roundToSignificant(once, significant, rounding) === once;
        },
      ),
    );
  });
});
