import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bleedPower, bleedTime, bleedWait, inversionNodes, type ChargedNode } from './bleed';

const AT_HERON = { supply_V: 16_000, discharged_below_V: 50 };
const C1: ChargedNode = { name: 'C1', capacitance_F: 3.89e-9, bleed_ohm: 500e6 };
const C2: ChargedNode = { name: 'C2', capacitance_F: 3.16e-9, bleed_ohm: 500e6 };

const wait = (nodes: readonly ChargedNode[], from = AT_HERON) => {
  const result = bleedWait(nodes, from);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
};

describe('bleedTime', () => {
  // Demo lab, from the supply's limit to 50 V; R C ln(V0/Vs) worked by hand.
  it.each([
    ['Heron, both on one bleed', 500e6, 7.05e-9, 16_000, 20.3],
    ['Kettle', 400e6, 5e-9, 25_000, 12.43],
    ['Wren', 1e9, 0.88e-9, 10_000, 4.66],
  ])('%s: %d ohm, %d F from %d V take %d s', (...[_rig, R, C, V0, s]) => {
    const result = bleedTime({ resistance_ohm: R, capacitance_F: C }, V0, 50);
    expect(Math.abs((result.ok ? result.value.value : Number.NaN) / s - 1)).toBeLessThan(0.003);
  });

  it('is nothing from below', () => {
    expect(bleedTime({ resistance_ohm: 1e6, capacitance_F: 1e-9 }, 40, 50)).toMatchObject({
      value: { value: 0 },
    });
  });

  it.each([
    [{ resistance_ohm: 0, capacitance_F: 1e-9 }, 1000, 50, 'resistance_ohm'],
    [{ resistance_ohm: 1e6, capacitance_F: Number.NaN }, 1000, 50, 'capacitance_F'],
    [{ resistance_ohm: 1e6, capacitance_F: 1e-9 }, Infinity, 50, 'voltage_V'],
    [{ resistance_ohm: 1e6, capacitance_F: 1e-9 }, 1000, 0, 'discharged_below_V'],
  ])('refuses %j from %d to %d beside %s', (...[node, from, to, field]) => {
    expect(bleedTime(node, from, to)).toMatchObject({ refusal: { field } });
  });
});

describe('bleedWait', () => {
  it('is never under 60 s', () => {
    expect(wait([C1, C2])).toMatchObject({ type: 'known', wait_s: 60, slowest: 'C1' });
  });

  it('rounds up to whole seconds beyond that, by the slowest node', () => {
    const slow: ChargedNode = { name: 'probe', capacitance_F: 50e-9, bleed_ohm: 500e6 };
    const result = wait([C1, slow, C2]);
    if (result.type !== 'known') throw new Error('no wait');
    expect(result.slowest).toBe('probe');
    expect(result.computed_s).toBeCloseTo(25 * Math.log(320), 9);
    expect(result.wait_s).toBe(145);
    expect(result.nodes.map(({ name }) => name)).toEqual(['C1', 'probe', 'C2']);
  });

  it('gives no number at all where one bleed is not known', () => {
    const result = wait([C1, { ...C2, bleed_ohm: null }]);
    expect(result).toMatchObject({ type: 'unknown', nodes: ['C2'] });
    expect(result).not.toHaveProperty('wait_s');
    expect(result.type === 'unknown' && result.words).not.toMatch(/\d\s*s\b/);
  });

  it('names the node in a refusal, also behind an unknown bleed', () => {
    const bad = { ...C2, capacitance_F: Number.NaN, bleed_ohm: null };
    const result = bleedWait([C1, bad], AT_HERON);
    expect(result).toMatchObject({ ok: false, refusal: { field: 'capacitance_F' } });
    expect(!result.ok && result.refusal.words.startsWith('C2: ')).toBe(true);
    expect(bleedWait([], AT_HERON)).toMatchObject({ refusal: { type: 'empty' } });
  });

  it('never falls short of any node', () => {
    const node = fc.record({
      name: fc.string(),
      capacitance_F: fc.double({ min: 1e-12, max: 1e-6, noNaN: true }),
      bleed_ohm: fc.double({ min: 1e3, max: 1e11, noNaN: true }),
    });
    fc.assert(
      fc.property(fc.array(node, { minLength: 1, maxLength: 6 }), (nodes) => {
        const result = wait(nodes);
        if (result.type !== 'known') return false;
        return (
          result.wait_s >= 60 &&
          Number.isInteger(result.wait_s) &&
          nodes.every((n) => result.wait_s >= n.bleed_ohm * n.capacitance_F * Math.log(320) * (1 - 1e-12))
        );
      }),
    );
  });
});

describe('inversionNodes', () => {
  it('adds both capacitors on one bleed, in case the other is open: 20 s for Heron', () => {
    const result = wait(inversionNodes(C1, C2));
    if (result.type !== 'known') throw new Error('no wait');
    expect(result.slowest).toBe('C1 and C2 on one bleed');
    expect(result.computed_s).toBeCloseTo(20.3, 1);
    expect(result.nodes[0]?.computed_s).toBeCloseTo(11.2, 1);
  });

  it('takes the weaker bleed, and knows nothing when one is unknown', () => {
    expect(inversionNodes(C1, { ...C2, bleed_ohm: 900e6 })[2].bleed_ohm).toBe(900e6);
    expect(inversionNodes({ ...C1, bleed_ohm: null }, C2)[2].bleed_ohm).toBeNull();
  });
});

describe('bleedPower', () => {
  it('is V squared over R', () => {
    expect(bleedPower(1e7, 15_000)).toMatchObject({ value: { value: 22.5, unit: 'W' } });
    expect(bleedPower(0, 15_000).ok).toBe(false);
  });
});
