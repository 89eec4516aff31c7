import { describe, expect, it } from 'vitest';
import { gapCurve } from './gap-curve';
import type { ElectrodeShape } from './electrodes';
import type { GapInput } from './gap-input';
import { holdOffLow, selfBreak, selfBreakHigh, type GapAnswer } from './self-break';

/** Kettle of the demo lab at 1.00 bar(g), with the setting errors that its screens assume. */
const KETTLE: GapInput = {
  gas: 'N2',
  electrodes: { shape: 'domed', radius_mm: 12 },
  gap_mm: 3,
  u_gap_mm: 0.05,
  pressure: { bar_abs: 1.966 },
  u_pressure_bar: 0.02,
  temperature_C: 21,
  u_temperature_C: 3,
  irradiated: true,
};
const PLANE_AIR: GapInput = {
  ...KETTLE,
  gas: 'air',
  electrodes: { shape: 'plane' },
  temperature_C: 20,
  pressure: { bar_abs: 1.45 },
  irradiated: false,
};

const must = (input: GapInput): GapAnswer => {
  const result = selfBreak(input);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
};
const types = (input: GapInput) => must(input).warnings.map(({ type }) => type);

describe('the demo lab', () => {
  // Own figures of the demo lab, ambient 0.966 bar and 21 C, to the digits they are shown with.
  it.each([
    ['Heron', 'N2', 2.6, 12, 1.166, 10.7],
    ['Heron', 'N2', 2.6, 12, 1.366, 12.2],
    ['Heron', 'N2', 2.6, 12, 1.766, 15.1],
    ['Kettle', 'N2', 3, 12, 1.766, 17.1],
    ['Kettle', 'N2', 3, 12, 1.966, 18.8],
    ['Kettle', 'N2', 3, 12, 2.166, 20.4],
    ['Kettle', 'N2', 3, 12, 2.566, 23.7],
    ['Wren', 'air', 1.6, 5, 0.966, 6.37],
    ['Wren', 'air', 1.6, 5, 0.85, 5.76],
  ] as const)(
    '%s, %s, %d mm, R %d mm at %d bar(abs) breaks at %d kV',
    (...[_rig, gas, gap_mm, radius_mm, bar_abs, kV]) => {
      const law = must({
        ...KETTLE,
        gas,
        gap_mm,
        electrodes: { shape: 'domed', radius_mm },
        pressure: { bar_abs },
      }).law_kV;
      expect(Math.abs(law - kV)).toBeLessThan(kV < 10 ? 0.005 : 0.05);
    },
  );

  it('Kettle at 1.00 bar(g): nothing below 16.7, may hold up to 24.3 kV', () => {
    const { low_kV, high_kV, band, stand_at_most_kV } = must(KETTLE);
    expect(Math.floor(low_kV * 10) / 10).toBe(16.7);
    expect(Math.ceil(high_kV * 10) / 10).toBe(24.3);
    expect(band.below).toBeCloseTo(-0.108, 3);
    expect(band.above).toBeCloseTo(0.293, 3);
    expect(stand_at_most_kV).toBeCloseTo(0.8 * low_kV, 12);
  });
});

describe('selfBreak', () => {
  it('gives the worked example of the rule: law 15.0, low 13.8, high 19.6 kV', () => {
    const { law_kV, low_kV, high_kV } = must(PLANE_AIR);
    expect(law_kV).toBeCloseTo(15.0, 1);
    expect(low_kV).toBeCloseTo(13.79, 2);
    expect(high_kV).toBeCloseTo(19.6, 2);
  });

  it('worked by hand at x = 1 bar cm without setting errors', () => {
    const exact = {
      ...PLANE_AIR,
      gap_mm: 10,
      u_gap_mm: 0,
      u_pressure_bar: 0,
      u_temperature_C: 0,
      pressure: { bar_abs: 1 },
    };
    const { law_kV, low_kV, high_kV } = must(exact);
    expect(law_kV).toBeCloseTo(31.08, 10);
    expect(low_kV).toBeCloseTo(0.95 * 31.08, 10);
    expect(high_kV).toBeCloseTo(1.05 * 1.2 * 31.08, 10);
    expect(must({ ...exact, irradiated: true }).high_kV).toBeCloseTo(1.05 * 31.08, 10);
    expect(must({ ...exact, gas: 'N2', irradiated: true }).low_kV).toBeCloseTo(
      0.95 * 0.97 * 0.967 * 31.08,
      10,
    );
    expect(must({ ...exact, gas: 'N2', irradiated: true }).high_kV).toBeCloseTo(1.05 * 1.15 * 31.08, 10);
    expect(must({ ...exact, gas: 'CO2', irradiated: true }).high_kV).toBeCloseTo(
      1.05 * 1.08 * 0.88 * 31.08,
      10,
    );
    expect(must({ ...exact, gas: 'H2', irradiated: true }).low_kV).toBeCloseTo(
      0.95 * 0.88 * 0.52 * 31.08,
      10,
    );
  });

  it('takes the high field out of the low side: 4 bar across 1 mm, 14 MV/m', () => {
    const exact = {
      ...PLANE_AIR,
      gap_mm: 1,
      u_gap_mm: 0,
      u_pressure_bar: 0,
      u_temperature_C: 0,
      pressure: { bar_abs: 4 },
    };
    const { law_kV, low_kV, highField, meanField_MV_m } = must(exact);
    expect(highField).toBe(true);
    expect(meanField_MV_m).toBeCloseTo(law_kV, 10);
    expect(low_kV).toBeCloseTo(0.95 * law_kV * (1 - 0.03 * (law_kV - 10)), 10);
  });

  it('draws the low side lower for cylinders, and below 0.05 bar cm', () => {
    const small = { ...PLANE_AIR, gap_mm: 1, u_gap_mm: 0, u_pressure_bar: 0, u_temperature_C: 0 };
    const share = (bar_abs: number, shape: ElectrodeShape) => {
      const { law_kV, low_kV } = must({
        ...small,
        pressure: { bar_abs },
        electrodes: { shape, radius_mm: 100 },
      });
      return low_kV / law_kV;
    };
    expect(share(0.49, 'plane')).toBeCloseTo(0.9, 10);
    expect(share(0.51, 'plane')).toBeCloseTo(0.95, 10);
    expect(share(0.51, 'cylinder')).toBeCloseTo(0.92, 10);
    expect(share(0.49, 'cylinder')).toBeCloseTo(0.9, 10);
  });

  it('counts domed electrodes as spheres', () => {
    const sphere = must({ ...KETTLE, electrodes: { shape: 'sphere', radius_mm: 12 } });
    expect(must(KETTLE)).toMatchObject({
      law_kV: sphere.law_kV,
      low_kV: sphere.low_kV,
      high_kV: sphere.high_kV,
    });
  });

  it('says beside the number what weakens it', () => {
    expect(types(PLANE_AIR)).toEqual(['no-uv']);
    expect(types(KETTLE)).toEqual(['nitrogen']);
    expect(types({ ...KETTLE, gas: 'SF6' })).toContain('gas-from-memory');
    expect(types({ ...KETTLE, pressure: { bar_abs: 4.5 } })).toEqual(
      expect.arrayContaining(['high-field', 'by-similarity']),
    );
    expect(types({ ...KETTLE, gap_mm: 5, electrodes: { shape: 'sphere', radius_mm: 2 } })).toContain(
      'wide-gap',
    );
    expect(types({ ...KETTLE, gap_mm: 0.3 })).toContain('setting-error');
    expect(types({ ...KETTLE, gap_mm: 0.3, pressure: { bar_abs: 1 } })).toContain('small-pd');
  });

  it('names model and validity in words', () => {
    expect(must(KETTLE).model).toBe(
      'Law: streamer integral in nitrogen, domed electrodes taken as spheres of 12\u2009mm radius',
    );
    expect(must(PLANE_AIR).model).toBe('Law: uniform field in air, plane electrodes');
    expect(must(KETTLE).valid).toContain('0.05 to 5\u2009bar cm');
  });
});

describe('bad input', () => {
  const bad = (change: Partial<Record<keyof GapInput, unknown>>) =>
    selfBreak({ ...KETTLE, ...change } as GapInput);

  it.each([
    ['gap_mm', [Number.NaN, Infinity, -1, 0, 1e9, '3', undefined]],
    ['u_gap_mm', [Number.NaN, Infinity, -1, 1e9, 3, undefined]],
    ['u_pressure_bar', [Number.NaN, Infinity, -1, 1e9, undefined]],
    ['temperature_C', [Number.NaN, Infinity, -273.15, -300, 1e9, undefined]],
    ['u_temperature_C', [Number.NaN, -1, 1e9, undefined]],
    ['irradiated', [undefined, 'yes', 1]],
    ['gas', ['N2+He', '', undefined, 'O2', 'Ar', 'H2O']],
  ] as const)('is refused beside %s', (field, values) => {
    for (const value of values) {
      expect(bad({ [field]: value }), String(value)).toMatchObject({ ok: false, refusal: { field } });
    }
  });

  it.each([Number.NaN, Infinity, -1, 0, 5.001, 1e9, 0.001])(
    'is refused beside the pressure: %d bar(abs)',
    (bar_abs) => {
      expect(bad({ pressure: { bar_abs } })).toMatchObject({ ok: false, refusal: { field: 'pressure' } });
    },
  );

  it.each([Number.NaN, 0, -5, 1e9, null, undefined])('is refused beside the radius: %s', (radius_mm) => {
    expect(bad({ electrodes: { shape: 'sphere', radius_mm } })).toMatchObject({
      ok: false,
      refusal: { field: 'radius_mm' },
    });
  });

  it('is refused for an unknown shape, and for a gap too wide for its radius', () => {
    expect(bad({ electrodes: { shape: 'needle' } })).toMatchObject({
      refusal: { type: 'shape-unknown', field: 'electrodes' },
    });
    expect(bad({ gap_mm: 25, electrodes: { shape: 'sphere', radius_mm: 2 } })).toMatchObject({
      refusal: { type: 'gap-too-wide-for-radius' },
    });
  });

  it('is refused where pressure times gap leaves the rule, at once or within its errors', () => {
    expect(bad({ gap_mm: 40 })).toMatchObject({ refusal: { type: 'pd-too-large' } });
    expect(bad({ gap_mm: 0.1, u_gap_mm: 0, pressure: { bar_abs: 1 } })).toMatchObject({
      refusal: { type: 'pd-too-small' },
    });
    expect(bad({ gap_mm: 0.15, u_gap_mm: 0.08, pressure: { bar_abs: 1 } })).toMatchObject({
      refusal: { type: 'pd-too-small' },
    });
    expect(bad({ pressure: { bar_abs: 0.3 }, u_pressure_bar: 0.3 })).toMatchObject({
      refusal: { type: 'error-too-large', field: 'u_pressure_bar' },
    });
  });
});

describe('single sides', () => {
  it('are those of selfBreak, with the other as their band', () => {
    const { low_kV, high_kV } = must(KETTLE);
    expect(holdOffLow(KETTLE)).toMatchObject({
      value: { value: low_kV, unit: 'kV', band: { low: low_kV, high: high_kV } },
    });
    expect(selfBreakHigh(KETTLE)).toMatchObject({ value: { value: high_kV } });
    expect(holdOffLow({ ...KETTLE, gap_mm: -1 }).ok).toBe(false);
  });
});

describe('gapCurve', () => {
  it('agrees with selfBreak point by point', () => {
    const curve = gapCurve(KETTLE, [1, 1.966, 4.5]);
    if (!curve.ok) throw new Error(curve.refusal.words);
    for (const point of curve.value) {
      const { law_kV, low_kV, high_kV, highField } = must({
        ...KETTLE,
        pressure: { bar_abs: point.pressure_bar_abs },
      });
      expect(point).toEqual({
        valid: true,
        pressure_bar_abs: point.pressure_bar_abs,
        law_kV,
        low_kV,
        high_kV,
        highField,
      });
    }
  });

  it('keeps points outside the model in their place, with the reason', () => {
    const curve = gapCurve(KETTLE, [0.01, 1, 6, Number.NaN]);
    if (!curve.ok) throw new Error(curve.refusal.words);
    expect(curve.value.map(({ valid }) => valid)).toEqual([false, true, false, false]);
    expect(curve.value[0]).toMatchObject({ refusal: { type: 'pd-too-small' } });
    expect(curve.value[2]).toMatchObject({ refusal: { type: 'too-large', field: 'pressure' } });
  });

  it('is refused as a whole for a gap that is', () => {
    expect(gapCurve({ ...KETTLE, gap_mm: Number.NaN }, [1])).toMatchObject({ refusal: { field: 'gap_mm' } });
    expect(gapCurve(KETTLE, [])).toEqual({ ok: true, value: [] });
  });
});
