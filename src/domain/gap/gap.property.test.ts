import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import type { Electrodes } from './electrodes';
import { gapCurve } from './gap-curve';
import type { GapInput } from './gap-input';
import { gapFor, pressureFor } from './gap-solve';
import type { GasName } from './gas-table';
import { selfBreak, type GapAnswer } from './self-break';

// Hundreds of runs: a machine that is busy with other tests takes its time.
vi.setConfig({ testTimeout: 60_000 });

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });
const share = between(0, 1);

/** Electrodes that hold for a gap of 0.6 to 5 mm and a little more, with a size between 10 and 40 mm. */
const ROUND = fc.constantFrom('domed', 'sphere', 'cylinder', 'capped-rods', 'plane');
const round = fc.record({ shape: ROUND, size_mm: between(3, 40), part: share }).map(roundOf);
const bars = fc
  .record({ size_mm: between(10, 25), part: share, facing: fc.constantFrom('flats', 'edges') })
  .map(({ size_mm, part, facing }): Electrodes => ({
    shape: 'hex-bars',
    flats_mm: size_mm,
    corner_mm: size_mm * (0.01 + 0.4 * part),
    facing,
  }));

function roundOf(drawn: {
  readonly shape: 'domed' | 'sphere' | 'cylinder' | 'capped-rods' | 'plane';
  readonly size_mm: number;
  readonly part: number;
}): Electrodes {
  const { shape, size_mm: radius_mm, part } = drawn;
  return shape === 'capped-rods'
    ? { shape, radius_mm, rod_length_mm: radius_mm * (0.6 + 20 * part) }
    : { shape, radius_mm };
}

const settings = {
  gas: fc.constantFrom<GasName>('air', 'N2', 'SF6', 'CO2', 'H2'),
  gap_mm: between(0.8, 5),
  bar_abs: between(0.6, 4.8),
  u_gap_mm: between(0, 0.1),
  irradiated: fc.boolean(),
};
const roundGap = fc.record({ ...settings, electrodes: round });
const barGap = fc.record({ ...settings, electrodes: bars });
type Drawn = typeof roundGap extends fc.Arbitrary<infer T> ? T : never;

const build = ({ bar_abs, ...rest }: Drawn): GapInput => ({
  ...rest,
  pressure: { bar_abs },
  u_pressure_bar: 0.02,
  temperature_C: 21,
  u_temperature_C: 3,
});

const must = (input: GapInput): GapAnswer => {
  const result = selfBreak(input);
  if (!result.ok) throw new Error(`${result.refusal.words} ${JSON.stringify(input)}`);
  return result.value;
};
const at = (drawn: Drawn) => must(build(drawn));

/** Bars take milliseconds a shape: fewer of them. */
const KINDS = [
  ['round electrodes', roundGap, 60],
  ['hexagonal bars', barGap, 8],
] as const;
const SIDES = ['law_kV', 'low_kV', 'high_kV'] as const;
const PURPOSES = [
  ['hold-off-at-least', 'low_kV'],
  ['break-at-most', 'high_kV'],
  ['law', 'law_kV'],
] as const;

describe.each(KINDS)('any gap of %s', (_name, gap, numRuns) => {
  const holds = (property: (drawn: Drawn) => boolean) => {
    fc.assert(fc.property(gap, property), { numRuns });
  };

  it('has its low side under the law and the law under its high side', () => {
    holds((drawn) => {
      const { low_kV, law_kV, high_kV, stand_at_most_kV } = at(drawn);
      return stand_at_most_kV < low_kV && low_kV < law_kV && law_kV < high_kV;
    });
  });

  it('holds more with more pressure and with a wider gap, by all three', () => {
    holds((drawn) => {
      const here = at(drawn);
      const denser = at({ ...drawn, bar_abs: drawn.bar_abs * 1.01 });
      const wider = at({ ...drawn, gap_mm: drawn.gap_mm * 1.01 });
      return SIDES.every((side) => denser[side] > here[side] && wider[side] > here[side]);
    });
  });

  it('has a wider band for a larger setting error, and the same law', () => {
    holds((drawn) => {
      const here = at(drawn);
      const looser = at({ ...drawn, u_gap_mm: drawn.u_gap_mm + 0.05 });
      return looser.law_kV === here.law_kV && looser.low_kV < here.low_kV && looser.high_kV > here.high_kV;
    });
  });

  it('has the same law at twice the size and half the pressure', () => {
    holds((drawn) => {
      const larger = { ...drawn, gap_mm: 2 * drawn.gap_mm, bar_abs: drawn.bar_abs / 2 };
      const scaled = at({ ...larger, electrodes: twice(drawn.electrodes) });
      return Math.abs(scaled.law_kV / at(drawn).law_kV - 1) < 1e-9;
    });
  });

  it.each(PURPOSES)('is solved back for %s within 1e-6, by pressure and by gap', (purpose, side) => {
    holds((drawn) => {
      const input = build(drawn);
      const target = { purpose, voltage_kV: must(input)[side] };
      const pressure = pressureFor(input, target);
      const width = gapFor(input, target);
      return (
        pressure.ok &&
        width.ok &&
        Math.abs(pressure.value.value / drawn.bar_abs - 1) < 1e-6 &&
        Math.abs(width.value.value / drawn.gap_mm - 1) < 1e-6 &&
        pressure.value.all.length === 1 &&
        width.value.all.length === 1
      );
    });
  });

  it('keeps its target with the setting that was found', () => {
    holds((drawn) => {
      const input = build(drawn);
      const { low_kV, high_kV } = must(input);
      const hold = gapFor(input, { purpose: 'hold-off-at-least', voltage_kV: low_kV });
      const fire = pressureFor(input, { purpose: 'break-at-most', voltage_kV: high_kV });
      return hold.ok && fire.ok && hold.value.gap.low_kV >= low_kV && fire.value.gap.high_kV <= high_kV;
    });
  });
});

function twice(electrodes: Electrodes): Electrodes {
  if (electrodes.shape === 'hex-bars') {
    const { flats_mm, corner_mm } = electrodes;
    return { ...electrodes, flats_mm: 2 * (flats_mm ?? 0), corner_mm: 2 * (corner_mm ?? 0) };
  }
  const radius_mm = 2 * (electrodes.radius_mm ?? 0);
  return electrodes.shape === 'capped-rods'
    ? { ...electrodes, radius_mm, rod_length_mm: 2 * (electrodes.rod_length_mm ?? 0) }
    : { ...electrodes, radius_mm };
}

describe('hexagonal bars', () => {
  it('have the same low side and the same high side whatever faces what', () => {
    fc.assert(
      fc.property(barGap, (drawn) => {
        const flats = at({ ...drawn, electrodes: { ...drawn.electrodes, facing: 'flats' } as Electrodes });
        const edges = at({ ...drawn, electrodes: { ...drawn.electrodes, facing: 'edges' } as Electrodes });
        return flats.low_kV === edges.low_kV && flats.high_kV === edges.high_kV;
      }),
      { numRuns: 8 },
    );
  });
});

describe('any numbers at all', () => {
  const any = fc.double();
  const maybe = fc.option(any, { nil: undefined });
  const anyElectrodes: fc.Arbitrary<Electrodes> = fc.oneof(
    fc.record({
      shape: fc.constantFrom('domed', 'sphere', 'cylinder', 'plane'),
      radius_mm: fc.oneof(maybe, between(0.1, 50)),
    }),
    fc.record({
      shape: fc.constant('capped-rods' as const),
      radius_mm: fc.oneof(maybe, between(0.1, 50)),
      rod_length_mm: fc.oneof(maybe, between(0, 500)),
    }),
    fc.record({
      shape: fc.constant('hex-bars' as const),
      flats_mm: fc.oneof(maybe, between(0.5, 50)),
      corner_mm: fc.oneof(maybe, between(0, 10)),
      facing: fc.constantFrom('flats', 'edges', undefined),
    }),
  );
  const number = (min: number, max: number) => fc.oneof(any, between(min, max), between(min, max));
  const anyGap = fc.record({
    gas: fc.constantFrom<GasName>('air', 'N2', 'SF6'),
    electrodes: anyElectrodes,
    gap_mm: number(0.05, 20),
    u_gap_mm: number(0, 0.1),
    pressure: fc.record({ bar_abs: number(0.05, 5) }),
    u_pressure_bar: number(0, 0.05),
    temperature_C: number(-20, 60),
    u_temperature_C: number(0, 5),
    irradiated: fc.boolean(),
  });

  it('are refused in words or give finite sides in their order', () => {
    fc.assert(
      fc.property(anyGap, (input) => {
        const result = selfBreak(input);
        if (!result.ok) return result.refusal.words.length > 0;
        const { law_kV, low_kV, high_kV } = result.value;
        return low_kV > 0 && low_kV < law_kV && law_kV < high_kV && Number.isFinite(high_kV);
      }),
      { numRuns: 150 },
    );
  });

  it('are refused in words or give finite curves and settings', () => {
    const purpose = fc.constantFrom('hold-off-at-least', 'break-at-most', 'law');
    fc.assert(
      fc.property(anyGap, purpose, number(0.5, 60), (input, aim, voltage_kV) => {
        const target = { purpose: aim, voltage_kV };
        const curve = gapCurve(input, [input.pressure.bar_abs, 1]);
        const points = curve.ok ? curve.value : [];
        for (const solved of [pressureFor(input, target), gapFor(input, target)]) {
          if (solved.ok) expect(solved.value.value).toBeGreaterThan(0);
          else expect(solved.refusal.words).not.toBe('');
        }
        return points.every((point) => !point.valid || Number.isFinite(point.low_kV + point.high_kV));
      }),
      { numRuns: 80 },
    );
  });
});
