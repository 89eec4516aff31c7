import { describe, expect, it } from 'vitest';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { KETTLE_SPEC } from '../../../seeds/rigs/kettle';
import { WREN_SPEC } from '../../../seeds/rigs/wren';
import type { RigSpec } from '../book/rig-spec';
import { derivedFigure, rigDerived } from '../rules/rig-derived';
import { anyValues, notShowable } from './any-values.fixture';
import { CHARGE_LOOKUP } from './charge-lookup';
import type { Figure, LookupAnswer, Values } from './lookup';
import { labSettings as LAB } from './rig.fixture';
import { solveFor } from './solve';

const startOf = (spec: RigSpec | null) => CHARGE_LOOKUP.start({ spec, settings: LAB });

function answered(values: Values): LookupAnswer {
  const result = CHARGE_LOOKUP.answer(values);
  if (!result.ok) throw new Error(`${result.refusal.field}: ${result.refusal.words}`);
  return result.value;
}

function figure(values: Values, key: string): Figure {
  const found = answered(values).figures.find((one) => one.key === key);
  if (found === undefined) throw new Error(`no figure ${key}`);
  return found;
}

const KETTLE = startOf(KETTLE_SPEC).values;
/** Known sides, so that only the charging is asked about. */
const PLAIN: Values = {
  ...startOf(null).values,
  supply_kV: 20,
  supply_mA: 5,
  ballast_Mohm: 10,
  capacitance_nF: 2,
  low_kV: 10,
  break_kV: 12,
  high_kV: 14,
};

describe('the charge lookup, prefilled', () => {
  it.each([
    ['Heron', HERON_SPEC],
    ['Kettle', KETTLE_SPEC],
    ['Wren', WREN_SPEC],
  ])('gives the digits of the rig\u2019s own figures for %s', (_name, spec) => {
    const derived = rigDerived(spec, LAB);
    const own = (key: Parameters<typeof derivedFigure>[1]) => {
      const { figure: one } = derivedFigure(derived, key);
      return one.ok ? one.value : undefined;
    };
    const { values } = startOf(spec);
    expect(figure(values, 'law').value).toBe(own('self_break')?.value);
    expect(figure(values, 'low').value).toBe(own('self_break')?.band.low);
    expect(figure(values, 'high').value).toBe(own('self_break')?.band.high);
    expect(figure(values, 'reachable').value).toBe(own('reach')?.value);
    expect(figure(values, 'rate').value / (own('rate')?.value ?? 0)).toBeCloseTo(1, 12);
    expect(figure(values, 'stored').value / (own('stored')?.value ?? 0)).toBeCloseTo(1, 12);
    const hazard = derived.hazard.ok ? derived.hazard.value.words : '';
    expect(figure(values, 'stored').note).toBe(hazard);
  });

  // The demo's traps: Kettle may not fire at 1.0 bar(g), and at 1.6 it needs 23.7 kV where 23.5 are left.
  it('says that Kettle may not fire, and sits charged at 1.6 bar(g)', () => {
    expect(answered(KETTLE).says).toContain('may not fire');
    const high = answered({ ...KETTLE, pressure: 1.6 });
    expect(high.says).toContain('never fires');
    expect(high.says).toContain('Lower the pressure');
    expect(high.figures.find(({ key }) => key === 'time')?.words).toContain('never');
    expect(high.figures.map(({ key }) => key)).not.toContain('rate');
    expect(high.cautions[0]).toContain('leaves it charged');
    expect(figure({ ...KETTLE, pressure: 1.6 }, 'reachable').value).toBeCloseTo(23.5, 1);
    expect(high.plot?.point).toBeUndefined();
  });

  // Demo lab: 5.3 Hz, computed apart from this code.
  it('lets Kettle fire at 5.3 Hz where nothing was set', () => {
    expect(figure({ ...KETTLE, envelope_Hz: null }, 'rate').value).toBeCloseTo(5.3, 1);
    expect(figure(KETTLE, 'rate')).toMatchObject({ value: 5, note: 'The rate that is allowed holds it.' });
  });
});

describe('the charge lookup', () => {
  it('charges by the exponential through ballast alone', () => {
    // R C ln(Vs/(Vs - Vb)) = 10 M x 2 n x ln(20/8).
    const time = figure(PLAIN, 'time');
    expect(time.value).toBeCloseTo(0.02 * Math.log(2.5), 12);
    expect(time.low).toBeCloseTo(0.02 * Math.log(2), 12);
    expect(time.high).toBeCloseTo(0.02 * Math.log(20 / 6), 12);
    expect(figure(PLAIN, 'by_charging').value).toBeCloseTo(1 / (0.02 * Math.log(2.5)), 9);
  });

  it('names what holds the rate', () => {
    expect(answered(PLAIN).says).toContain('gap holds the rate');
    const blown = { ...PLAIN, blown: 'blown', volume_cm3: 0.5, flow_L_min: 1.8 };
    // Physics M: 0.5 cm3 at 20 Hz wants 1.8 L/min.
    expect(figure(blown, 'by_purge').value).toBeCloseTo(20, 9);
    expect(answered(blown).says).toContain('three volumes');
    expect(answered({ ...blown, flow_L_min: 100 }).says).toContain('Ballast');
    expect(answered({ ...blown, flow_L_min: 100, supply_mA: 0.1 }).says).toContain('current of the supply');
    expect(answered({ ...blown, flow_L_min: 100, supply_W: 0.5 }).says).toContain('power of the supply');
  });

  it('says whether a wanted rate can be had, and what it takes', () => {
    const wanted = { ...PLAIN, wanted_Hz: 5 };
    expect(answered(wanted).says).toContain('can be had');
    // C Vb Vs f.
    expect(figure(wanted, 'power').value).toBeCloseTo(2e-9 * 12e3 * 20e3 * 5, 12);
    expect(figure(wanted, 'current').value).toBeCloseTo(2e-9 * 12e3 * 5 * 1000, 12);
    expect(answered({ ...PLAIN, wanted_Hz: 40 }).says).toContain('cannot be had');
  });

  it('reaches less through a bleed and says so', () => {
    expect(figure({ ...PLAIN, bleed_Mohm: 10 }, 'reachable').value).toBeCloseTo(10, 12);
    expect(answered({ ...PLAIN, bleed_Mohm: 10 }).says).toContain('never fires');
  });

  it.each([
    ['low_kV', 13],
    ['high_kV', 11],
    ['ballast_Mohm', 0],
    ['blown', 'perhaps'],
  ])('refuses %s %s beside its field', (field, value) => {
    expect(CHARGE_LOOKUP.answer({ ...PLAIN, [field]: value })).toMatchObject({ refusal: { field } });
  });

  it('has no ambient of its own', () => {
    const start = CHARGE_LOOKUP.start({ spec: KETTLE_SPEC, settings: null }).values;
    expect(CHARGE_LOOKUP.answer(start)).toMatchObject({ refusal: { field: 'ambient_bar_abs' } });
  });

  it('solves for the ballast of a rate', () => {
    const solvable = CHARGE_LOOKUP.solvable.find((one) => one.field === 'ballast_Mohm')!;
    const found = solveFor(CHARGE_LOOKUP, PLAIN, { solvable, target: 100 });
    if (!found.ok) throw new Error(found.refusal.words);
    expect(figure({ ...PLAIN, ballast_Mohm: found.value.value }, 'by_charging').value).toBeGreaterThanOrEqual(
      100,
    );
    expect(found.value.value).toBeCloseTo(0.01 / 2e-9 / Math.log(2.5) / 1e6, 1);
  });

  it('draws the curve between both sides, up to what the supply reaches', () => {
    const { plot } = answered(PLAIN);
    expect(plot?.point?.x).toBeCloseTo(figure(PLAIN, 'time').value, 9);
    expect(plot?.limit?.y).toBe(20);
    const last = plot?.curves?.[0]?.points.at(-1);
    expect(last?.y).toBeGreaterThan(14);
  });

  it('answers or refuses in words whatever is entered', { timeout: 60_000 }, () => {
    let answers = 0;
    for (const values of anyValues(CHARGE_LOOKUP, { seed: 4, count: 2000 })) {
      const result = CHARGE_LOOKUP.answer(values);
      if (result.ok) answers += 1;
      expect(result.ok ? notShowable(result.value) : result.refusal.words === '' ? ['no words'] : []).toEqual(
        [],
      );
    }
    expect(answers).toBeGreaterThan(300);
  });
});
