import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { GasName } from './gas-table';
import {
  airFromGauge,
  airSibling,
  gapSensitivity,
  gaugeMistakeRatio,
  nitrogenToAirRatio,
  pressureForVoltage,
  uniformBreakdown,
} from './uniform-law';

const point = (pressure_bar_abs: number, gap_cm: number, temperature_C = 20) => ({
  pressure_bar_abs,
  gap_cm,
  temperature_C,
});
const kV = (gas: GasName, ...p: Parameters<typeof point>) => {
  const result = uniformBreakdown(gas, point(...p));
  return result.ok ? result.value.value : Number.NaN;
};

describe('uniform law for air', () => {
  // Near-uniform points of the sphere-gap standard (large spheres, small gap), 1 atm and 20 C, from memory.
  it.each([
    [0.05, 2.8],
    [0.1, 4.7],
    [0.5, 17.0],
    [1, 31.7],
  ])('meets the standard at %d cm: %d kV within 2.5 %', (gap_cm, published) => {
    expect(Math.abs(kV('air', 1.01325, gap_cm) / published - 1)).toBeLessThan(0.025);
  });

  // 24.36 x + 6.72 sqrt x, worked by hand.
  it.each([
    [1, 1, 31.08],
    [4, 1, 4 * 24.36 + 13.44],
    [2.5, 0.4, 31.08],
    [1, 0.25, 6.09 + 3.36],
  ])('at %d bar and %d cm is %d kV', (bar, cm, expected) => {
    expect(kV('air', bar, cm)).toBeCloseTo(expected, 10);
  });

  it('depends on gas density alone', () => {
    expect(kV('air', 1, 1, 20)).toBeCloseTo(kV('air', 373.15 / 293.15, 1, 100), 10);
  });

  it('warns above 10 MV/m and not below', () => {
    expect(uniformBreakdown('air', point(4, 0.1))).toMatchObject({
      value: { warnings: [{ type: 'high-field' }] },
    });
    expect(uniformBreakdown('air', point(1, 1))).toMatchObject({ value: { warnings: [] } });
  });

  it.each([
    [point(0.001, 1), 'pd-too-small'],
    [point(100, 1), 'pd-too-large'],
    [point(-0.2, 1), 'too-small'],
    [point(1, 1e9), 'too-large'],
    [point(Number.NaN, 1), 'not-a-number'],
    [point(1, 1, -300), 'too-small'],
  ])('refuses %j as %s', (where, type) => {
    expect(uniformBreakdown('air', where)).toMatchObject({ ok: false, refusal: { type } });
  });
});

describe('other gases', () => {
  it('N2 meets its published anchor: 30.4 kV at 1 cm, 1 atm (Raju, abstract read)', () => {
    expect(Math.abs(kV('N2', 1.01325, 1) / 30.4 - 1)).toBeLessThan(0.005);
  });

  // 0.38 + 88.5 x, from memory.
  it.each([
    [0.1, 9.23],
    [1, 88.88],
  ])('SF6 at 1 bar and %d cm is %d kV', (cm, expected) => {
    expect(kV('SF6', 1, cm)).toBeCloseTo(expected, 10);
  });

  it('carries its band: CO2 8 %, H2 12 %', () => {
    const co2 = uniformBreakdown('CO2', point(1, 1));
    const h2 = uniformBreakdown('H2', point(1, 1));
    if (!co2.ok || !h2.ok) throw new Error('no law');
    expect(co2.value.band.low / co2.value.value).toBeCloseTo(0.92, 10);
    expect(h2.value.band.high / h2.value.value).toBeCloseTo(1.12, 10);
  });

  it.each<GasName>(['Ar', 'Ne', 'He'])('gives for %s an indication that says so', (gas) => {
    expect(uniformBreakdown(gas, point(1, 1))).toMatchObject({
      value: { warnings: [{ type: 'indicative' }] },
    });
  });

  it.each<GasName>(['O2', 'H2O'])('gives nothing for %s', (gas) => {
    expect(uniformBreakdown(gas, point(1, 1))).toMatchObject({
      ok: false,
      refusal: { type: 'gas-without-law' },
    });
  });

  it('refuses nitrogen beyond 5 bar cm, where its ratio to air is not founded', () => {
    expect(uniformBreakdown('N2', point(5, 1.1))).toMatchObject({ refusal: { type: 'pd-too-large' } });
  });
});

describe('airSibling', () => {
  // 24.22 x + 6.08 sqrt x, read in a public note.
  it.each([
    [1, 30.3],
    [4, 109.04],
  ])('at %d atm cm is %d kV', (x, expected) => {
    const result = airSibling(x);
    expect(result.ok && result.value.value).toBeCloseTo(expected, 10);
  });

  it('reads below our law everywhere: the two are not interchangeable', () => {
    for (const x of [0.05, 0.2, 1, 3, 10]) {
      const sibling = airSibling(x);
      expect(sibling.ok && sibling.value.value).toBeLessThan(kV('air', 1.01325, x));
    }
  });
});

describe('gauge and absolute', () => {
  const gap = { gap_cm: 0.3, temperature_C: 20 };

  it('adds the ambient pressure', () => {
    const result = airFromGauge(1, 1.01325, gap);
    expect(result.ok && result.value.value).toBeCloseTo(kV('air', 2.01325, 0.3), 10);
  });

  it('shows what the mistake costs: 1.0 bar(g) taken as absolute at 3 mm gives 55 %', () => {
    const result = gaugeMistakeRatio(1, 1.01325, gap);
    expect(result.ok && result.value.value).toBeCloseTo(0.5512, 4);
  });

  it.each([
    [1, 101.3, 'ambient'],
    [1, Number.NaN, 'ambient'],
    [-1.05, 1.01325, 'pressure'],
    [Infinity, 1.01325, 'pressure'],
  ])('refuses %d bar(g) with ambient %d beside %s', (reading, ambient, field) => {
    expect(airFromGauge(reading, ambient, gap)).toMatchObject({ ok: false, refusal: { field } });
    expect(gaugeMistakeRatio(reading, ambient, gap).ok).toBe(false);
  });
});

describe('pressureForVoltage', () => {
  it('gives the worked example: 15 kV across 3 mm at 1.447 bar(abs)', () => {
    const result = pressureForVoltage(15, { gap_cm: 0.3, temperature_C: 20 });
    expect(result.ok && result.value.value).toBeCloseTo(1.447, 3);
  });

  it('undoes the law', () => {
    const bar = fc.double({ min: 0.2, max: 10, noNaN: true });
    const cm = fc.double({ min: 0.1, max: 4, noNaN: true });
    fc.assert(
      fc.property(bar, cm, fc.double({ min: -20, max: 60, noNaN: true }), (p, d, T) => {
        const back = pressureForVoltage(kV('air', p, d, T), { gap_cm: d, temperature_C: T });
        return back.ok && Math.abs(back.value.value / p - 1) < 1e-6;
      }),
    );
  });

  it.each([0, -5, Number.NaN, 1e9])('refuses %d kV', (voltage) => {
    expect(pressureForVoltage(voltage, { gap_cm: 0.3, temperature_C: 20 })).toMatchObject({
      refusal: { field: 'voltage_kV' },
    });
  });

  it('refuses a voltage so small that the law does not hold at its answer', () => {
    expect(pressureForVoltage(0.5, { gap_cm: 0.3, temperature_C: 20 })).toMatchObject({
      refusal: { type: 'pd-too-small' },
    });
  });
});

describe('gapSensitivity', () => {
  it('is the slope of the law, here by a small step', () => {
    for (const [bar, cm] of [
      [1, 0.1],
      [2, 0.3],
      [4, 1],
    ] as const) {
      const step = 1e-6;
      const slope = Math.log(kV('air', bar, cm * (1 + step)) / kV('air', bar, cm * (1 - step))) / (2 * step);
      const result = gapSensitivity(bar, cm);
      expect(result.ok && result.value.value).toBeCloseTo(slope, 6);
    }
  });

  it('lies between one half and one', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.02, max: 5, noNaN: true }), (bar) => {
        const result = gapSensitivity(bar, 1);
        return result.ok && result.value.value > 0.5 && result.value.value < 1;
      }),
    );
  });
});

describe('nitrogenToAirRatio', () => {
  it.each([0, -1, 5.01, Number.NaN])('refuses %d bar cm', (x) => {
    expect(nitrogenToAirRatio(x).ok).toBe(false);
  });

  it('reaches up to the tables that put nitrogen above air', () => {
    const result = nitrogenToAirRatio(1);
    expect(result.ok && result.value.band.high).toBeGreaterThan(1.14);
  });
});

describe('every uniform law', () => {
  it('rises with gap and with pressure, and gives a number or a refusal for any input', () => {
    const gas = fc.constantFrom<GasName>('air', 'N2', 'SF6', 'CO2', 'H2');
    fc.assert(
      fc.property(
        gas,
        fc.double({ min: 0.1, max: 2, noNaN: true }),
        fc.double({ min: 0.15, max: 2, noNaN: true }),
        (g, p, d) => {
          return kV(g, p, d * 1.01) > kV(g, p, d) && kV(g, p * 1.01, d) > kV(g, p, d);
        },
      ),
    );
    fc.assert(
      fc.property(gas, fc.double(), fc.double(), fc.double(), (...[g, p, d, T]) => {
        const result = uniformBreakdown(g, point(p, d, T));
        return !result.ok || (Number.isFinite(result.value.value) && result.value.value > 0);
      }),
    );
  });
});
