import { describe, expect, it } from 'vitest';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { KETTLE_SPEC } from '../../../seeds/rigs/kettle';
import { WREN_SPEC } from '../../../seeds/rigs/wren';
import type { RigSpec } from '../book/rig-spec';
import { derivedFigure, rigDerived, type DerivedKey } from '../rules/rig-derived';
import { anyValues, notShowable } from './any-values.fixture';
import { CIRCUIT_LOOKUP } from './circuit-lookup';
import { numberFieldOf } from './fields';
import type { Figure, LookupAnswer, Values } from './lookup';
import { solveFor } from './solve';
import { sweep } from './sweep';

const LAB = {
  name: 'Lab',
  zone: 'UTC',
  ambient_bar_abs: 0.966,
  ambient_C: 21,
  discharged_below_V: 50,
  working_alone: 'forbidden' as const,
  emergency: { isolator: '', ring: [], first_aid: '' },
};

const startOf = (spec: RigSpec | null) => CIRCUIT_LOOKUP.start({ spec, settings: LAB });

function answered(values: Values): LookupAnswer {
  const result = CIRCUIT_LOOKUP.answer(values);
  if (!result.ok) throw new Error(`${result.refusal.field}: ${result.refusal.words}`);
  return result.value;
}

function figure(values: Values, key: string): Figure {
  const found = answered(values).figures.find((one) => one.key === key);
  if (found === undefined) throw new Error(`no figure ${key}`);
  return found;
}

const KETTLE = startOf(KETTLE_SPEC).values;
const HERON = startOf(HERON_SPEC).values;
const WREN = startOf(WREN_SPEC).values;

describe.each([
  ['Heron', HERON_SPEC],
  ['Kettle', KETTLE_SPEC],
  ['Wren', WREN_SPEC],
])('prefilled from %s', (_name, spec) => {
  it('gives the figures of the rig itself', () => {
    const derived = rigDerived(spec, LAB);
    const { values } = startOf(spec);
    const pairs: readonly (readonly [string, DerivedKey, number])[] = [
      ['peak', 'channel_peak', 1],
      ['rise', 'rise', 1],
      ['current_rise', 'current_rise', 1],
      ['time_to_peak', 'time_to_peak', 1],
      ['gap_current', 'gap_current', 1000],
      ['channel_current', 'channel_current', 1000],
      ['ideal_peak', 'ideal_peak', 1],
      ['static', 'channel_static', 1],
    ];
    for (const [key, own, times] of pairs) {
      const { figure: one } = derivedFigure(derived, own);
      if (!one.ok) throw new Error(one.refusal.words);
      const shown = figure(values, key);
      expect((times * shown.value) / one.value.value, key).toBeCloseTo(1, 11);
      if (shown.low !== undefined) expect((times * shown.low) / one.value.band.low, key).toBeCloseTo(1, 9);
    }
  });

  it('draws the wave shape with its rise and breakdown', () => {
    const { plot } = answered(startOf(spec).values);
    expect(plot?.curves?.map(({ label }) => label)).toEqual([
      'channel voltage',
      expect.stringContaining('gap current'),
      expect.stringContaining('channel current'),
    ]);
    expect(plot?.spans?.map(({ label }) => label)).toEqual(['rise']);
    const highest = Math.max(...(plot?.curves?.[0]?.points.map(({ y }) => y) ?? []));
    expect(highest).toBeCloseTo(plot?.point?.y ?? 0, 6);
  });
});

describe('the circuit lookup', () => {
  // Demo lab, computed apart from this code with the usual laws: peaks 16.3, 21.6 and 5.4 kV.
  it.each([
    ['Heron at 0.4 bar(g)', { ...HERON, charge_kV: 12.2, pressure_bar_g: 0.4 }, 16.3],
    ['Kettle', KETTLE, 21.6],
    ['Wren', WREN, 5.4],
  ])('peaks within 1.5 %% of what was computed for %s', (_name, values, peak_kV) => {
    expect(Math.abs(figure(values, 'peak').value / peak_kV - 1)).toBeLessThan(0.015);
  });

  it('accounts for all of the energy', () => {
    const share = (key: string) => figure(KETTLE, key).value;
    expect(
      share('channel_share') + share('gap_share') + share('left_share') + share('feed_share'),
    ).toBeCloseTo(100, 3);
    expect(figure(KETTLE, 'stored').note).toContain('25\u2009kV and 1.5\u2009mA');
    expect(figure({ ...KETTLE, supply_mA: null }, 'stored').words).toContain('supply');
  });

  it('says that a channel which is asked for too much stays dark, and is left charged', () => {
    const misfire = answered({ ...KETTLE, break_by: 'voltage', break_kV: 60 });
    expect(misfire.says).toContain('Misfire');
    expect(misfire.figures.find(({ key }) => key === 'channel_current')?.words).toContain('dark');
    expect(misfire.cautions[0]).toContain('charged');
  });

  it('says what is marginal', () => {
    const top = figure({ ...KETTLE, break_by: 'never' }, 'peak').value;
    const close = answered({ ...KETTLE, break_by: 'voltage', break_kV: 0.99 * top });
    expect(close.says).toContain('Marginal');
  });

  it('takes the second capacitor by the ratio, for a sweep of peak and efficiency', () => {
    const byRatio = { ...KETTLE, second_by: 'ratio', ratio: 5 / 1.4 };
    expect(figure(byRatio, 'peak').value).toBeCloseTo(figure(KETTLE, 'peak').value, 9);
    const field = numberFieldOf(CIRCUIT_LOOKUP, 'ratio')!;
    const dark = { ...byRatio, break_by: 'never' };
    const rows = sweep(CIRCUIT_LOOKUP, dark, {
      field: field.key,
      figures: ['peak', 'efficiency', 'ideal_efficiency'],
      from: 1,
      to: 6,
      points: 6,
      scale: 'linear',
    });
    const peaks = rows.map(({ at }) => at['peak']?.value ?? 0);
    expect(peaks).toEqual(peaks.toSorted((a, b) => a - b));
    // Equal capacitors transfer all of it, without losses; real ones less.
    expect(rows[0]?.at['ideal_efficiency']?.value).toBeCloseTo(100, 9);
    for (const { at } of rows) expect(at['efficiency']!.value).toBeLessThan(at['ideal_efficiency']!.value);
  });

  // Physics L, own check values: 91 nH for 50 x 30 mm of 1 mm wire; 0.84 nH for 2 cm2 over 0.3 m.
  it('takes the inductance from dimensions', () => {
    const loop = { ...KETTLE, gap_by: 'loop', loop_long_mm: 50, loop_short_mm: 30, wire_radius_mm: 1 };
    expect(figure(loop, 'gap_loop').value).toBeCloseTo(91, 0);
    const channel = { ...KETTLE, channel_by: 'loop', section_mm2: 200, channel_length_mm: 300 };
    expect(figure(channel, 'channel_loop').value).toBeCloseTo(0.84, 2);
    const spark = { ...loop, return_mm: 20 };
    // 2 l ln(b/a) with 3 mm of spark of 0.2 mm radius: 0.6 ln 100.
    expect(figure(spark, 'gap_loop').value - figure(loop, 'gap_loop').value).toBeCloseTo(
      0.6 * Math.log(100),
      6,
    );
    const narrow = { ...KETTLE, gap_by: 'straps', strap_width_mm: 10, strap_spacing_mm: 20 };
    const wide = { ...narrow, strap_width_mm: 40 };
    expect(figure(narrow, 'gap_loop').value).toBeGreaterThan(figure(wide, 'gap_loop').value);
  });

  it('gives no wave shape where waves travel on the sheet, and says so', () => {
    const waves = answered({ ...HERON, gap_nH: 0.5 });
    expect(waves.says).toContain('no circuit of lumped parts');
    expect(waves.plot).toBeUndefined();
    expect(waves.figures.find(({ key }) => key === 'peak')?.words).toContain('waves');
    expect(waves.figures.map(({ key }) => key)).toContain('ideal_peak');
    const wanted = answered({ ...HERON, wanted_rise_ns: 1 });
    expect(wanted.says).toContain('twice the transit');
  });

  it('counts a third of a sheet that shows, and warns of steps', () => {
    const shown = answered({ ...HERON, gap_nH: 3 });
    expect(shown.warnings.map(({ type }) => type)).toContain('wave-steps');
  });

  it('judges the gain window for nitrogen and air and for nothing else', () => {
    expect(figure(KETTLE, 'gain').value).toBeGreaterThan(0);
    expect(figure({ ...KETTLE, oxygen_percent: 21 }, 'gain').value).toBeLessThan(
      figure(KETTLE, 'gain').value,
    );
    expect(answered({ ...KETTLE, channel_gas: 'CO2' }).says).toContain('No gain window');
  });

  it('refuses a missing ambient pressure in its own words', () => {
    const start = CIRCUIT_LOOKUP.start({ spec: KETTLE_SPEC, settings: null }).values;
    expect(CIRCUIT_LOOKUP.answer(start)).toMatchObject({
      refusal: { field: 'ambient_bar_abs', words: 'Ambient: enter the ambient pressure; it has no default.' },
    });
    const without = CIRCUIT_LOOKUP.start({ spec: null, settings: null }).values;
    expect(CIRCUIT_LOOKUP.answer({ ...without, ambient_bar_abs: 1 }).ok).toBe(true);
  });

  it('refuses beside a field that is shown', () => {
    const flat = {
      ...KETTLE,
      gap_by: 'strip',
      strap_spacing_mm: 0.001,
      strap_width_mm: 5000,
      strap_length_mm: 1,
    };
    expect(CIRCUIT_LOOKUP.answer(flat)).toMatchObject({ refusal: { field: 'gap_by' } });
  });

  it('solves for the peaking capacitor that reaches a peak', () => {
    const solvable = CIRCUIT_LOOKUP.solvable.find((one) => one.field === 'second_nF')!;
    const found = solveFor(CIRCUIT_LOOKUP, KETTLE, { solvable, target: 22 });
    if (!found.ok) throw new Error(found.refusal.words);
    expect(figure({ ...KETTLE, second_nF: found.value.value }, 'peak').value).toBeGreaterThanOrEqual(22);
    expect(found.value.value).toBeLessThan(1.4);
  });

  it('answers or refuses in words whatever is entered', { timeout: 120_000 }, () => {
    let answers = 0;
    for (const values of anyValues(CIRCUIT_LOOKUP, { seed: 4, count: 600 })) {
      const result = CIRCUIT_LOOKUP.answer(values);
      if (result.ok) answers += 1;
      expect(result.ok ? notShowable(result.value) : result.refusal.words === '' ? ['no words'] : []).toEqual(
        [],
      );
    }
    expect(answers).toBeGreaterThan(150);
  });
});
