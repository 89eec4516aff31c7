import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { ballastHeat, repetitionRate, supplyPower } from './relaxation';
import { highestRate, reachableVoltage, supplyReach, type Charging } from './supply-reach';

/** Charging of the demo lab's rigs. Heron's two bleeds are counted as one. */
const HERON: Charging = { supply_kV: 16, supply_mA: 1, ballast_Mohm: 20, bleed_Mohm: 500 };
const KETTLE: Charging = { supply_kV: 25, supply_mA: 1.5, ballast_Mohm: 25, bleed_Mohm: 400 };
const WREN: Charging = { supply_kV: 10, supply_mA: 0.5, ballast_Mohm: 100, bleed_Mohm: 1000 };
const reach = (charging: Charging) => {
  const result = reachableVoltage(charging);
  return result.ok ? result.value.value : Number.NaN;
};

describe('repetitionRate', () => {
  // 1/(R C ln(Vs/(Vs - Vb))), worked by hand: at Vb = (1 - 1/e) Vs the logarithm is 1.
  it('is one over R C at the time constant', () => {
    const result = repetitionRate({
      ballast_ohm: 1e6,
      capacitance_F: 1e-9,
      supply_V: 1000,
      break_V: 1000 * (1 - 1 / Math.E),
    });
    expect(result.ok && result.value.value).toBeCloseTo(1000, 9);
  });

  it.each([10_000, 10_001, 20_000])(
    'refuses a self-break of %d V on a 10 kV supply: it sits charged',
    (break_V) => {
      const result = repetitionRate({ ballast_ohm: 1e6, capacitance_F: 1e-9, supply_V: 10_000, break_V });
      expect(result).toMatchObject({ ok: false, refusal: { type: 'never-fires', field: 'break_V' } });
      expect(!result.ok && result.refusal.words).toContain('sits charged');
    },
  );

  it('gives a finite rate or a refusal for any input', () => {
    const any = fc.double();
    fc.assert(
      fc.property(any, any, any, any, (...[ballast_ohm, capacitance_F, supply_V, break_V]) => {
        const result = repetitionRate({ ballast_ohm, capacitance_F, supply_V, break_V });
        return !result.ok || (Number.isFinite(result.value.value) && result.value.value > 0);
      }),
    );
  });
});

describe('supplyPower', () => {
  it('is C Vb Vs f and not half of it', () => {
    const shot = { capacitance_F: 5e-9, break_V: 12_000, supply_V: 15_000, rate_Hz: 10 };
    const result = supplyPower(shot);
    expect(result.ok && result.value.value).toBeCloseTo(9, 12);
    expect(supplyPower({ ...shot, rate_Hz: Number.NaN })).toMatchObject({ refusal: { field: 'rate_Hz' } });
  });
});

describe('reachableVoltage', () => {
  it.each([
    ['Heron', HERON, 15.38],
    ['Kettle', KETTLE, 23.53],
    ['Wren', WREN, 9.09],
  ])('%s', (_rig, charging, kV) => {
    expect(reach(charging)).toBeCloseTo(kV, 2);
  });

  it('is the supply itself without a bleed', () => {
    expect(reach({ ...KETTLE, bleed_Mohm: null })).toBe(25);
  });

  it.each([
    [{ supply_kV: Number.NaN }, 'supply_kV'],
    [{ supply_mA: -1 }, 'supply_mA'],
    [{ ballast_Mohm: 0 }, 'ballast_Mohm'],
    [{ bleed_Mohm: Infinity }, 'bleed_Mohm'],
  ])('refuses %j beside %s', (change, field) => {
    expect(reachableVoltage({ ...KETTLE, ...change })).toMatchObject({ refusal: { field } });
  });
});

describe('supplyReach', () => {
  // Kettle's gap: law and high side at 0.2, 1.0 and 1.6 bar(g).
  it.each([
    ['reaches', 9, 11],
    ['may-not-fire', 18.78, 24.28],
    ['never-fires', 23.7, 30.6],
  ])('Kettle %s with a law of %d and a high side of %d kV', (type, law_kV, high_kV) => {
    expect(supplyReach(KETTLE, { law_kV, high_kV })).toMatchObject({
      ok: true,
      value: { type, needed_kV: 1.05 * high_kV },
    });
  });

  it('says that a gap which does not fire leaves the rig charged', () => {
    for (const gap of [
      { law_kV: 18.78, high_kV: 24.28 },
      { law_kV: 23.7, high_kV: 30.6 },
    ]) {
      const result = supplyReach(KETTLE, gap);
      expect(result.ok && result.value.words).toContain('sits charged');
    }
  });

  it('refuses bad sides', () => {
    expect(supplyReach(KETTLE, { law_kV: Number.NaN, high_kV: 10 })).toMatchObject({
      refusal: { field: 'law_kV' },
    });
    expect(supplyReach(KETTLE, { law_kV: 10, high_kV: Infinity })).toMatchObject({
      refusal: { field: 'high_kV' },
    });
  });
});

describe('highestRate', () => {
  // Demo lab at its working points.
  it.each([
    ['Heron', HERON, 7.05e-9, 12.184, 4.7],
    ['Kettle', KETTLE, 5e-9, 18.78, 5.31],
    ['Wren', WREN, 0.88e-9, 6.37, 10.4],
  ])('%s', (...[_rig, charging, capacitance_F, break_kV, Hz]) => {
    const result = highestRate(charging, { capacitance_F, break_kV });
    expect(Math.abs((result.ok ? result.value.value : Number.NaN) - Hz)).toBeLessThan(0.05);
  });

  it('is never more than the current of the supply carries', () => {
    const weak = { ...KETTLE, supply_mA: 0.1 };
    const result = highestRate(weak, { capacitance_F: 5e-9, break_kV: 18.78 });
    expect(result.ok && result.value.value).toBeCloseTo(1e-4 / (5e-9 * 18_780), 9);
  });

  it('doubts an unblown gap above 10 Hz', () => {
    expect(highestRate(WREN, { capacitance_F: 0.88e-9, break_kV: 6.37 })).toMatchObject({
      value: { warnings: [{ type: 'gap-recovery' }] },
    });
    expect(highestRate(KETTLE, { capacitance_F: 5e-9, break_kV: 18.78 })).toMatchObject({
      value: { warnings: [] },
    });
  });

  it('refuses what ballast and bleed leave out of reach: Kettle at 23.7 kV', () => {
    expect(highestRate(KETTLE, { capacitance_F: 5e-9, break_kV: 23.7 })).toMatchObject({
      refusal: { type: 'never-fires' },
    });
    expect(highestRate(KETTLE, { capacitance_F: 5e-9, break_kV: Number.NaN }).ok).toBe(false);
  });
});

describe('ballastHeat', () => {
  // Half of the energy goes into the ballast where the gap breaks at the supply; more where it breaks lower: by hand.
  it.each([
    [10_000, 10_000, 0.5],
    [10_000, 5000, 0.75],
    [20_000, 1000, 0.975],
  ])('a supply of %d V and a break of %d V: %d of the power', (supply_V, break_V, share) => {
    const shot = { capacitance_F: 2e-9, break_V, supply_V, rate_Hz: 10 };
    const power = supplyPower(shot);
    const heat = ballastHeat(shot);
    expect(heat.ok && power.ok && heat.value.value / power.value.value).toBeCloseTo(share, 12);
  });

  it('refuses a break above the supply', () => {
    expect(ballastHeat({ capacitance_F: 2e-9, break_V: 11e3, supply_V: 1e4, rate_Hz: 1 })).toMatchObject({
      refusal: { field: 'break_V' },
    });
  });
});

describe('supplyReach', () => {
  it('carries both voltages as answers and what it rests on', () => {
    const verdict = supplyReach(HERON, { law_kV: 12, high_kV: 20 });
    expect(verdict).toMatchObject({
      ok: true,
      value: { type: 'may-not-fire', needed: { unit: 'kV', band: { low: 12 } }, reachable: { unit: 'kV' } },
    });
    expect(verdict.ok && verdict.value.warnings).toHaveLength(1);
  });
});
