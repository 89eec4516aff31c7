import { describe, expect, it } from 'vitest';
import { gasLaw, lawOrIndication, nitrogenRatio, uniformByLaw_kV } from './gas-law';
import { GAS_NAMES, isGasName, PASCHEN_MINIMA, TOWNSEND_CONSTANTS } from './gas-table';

describe('gasLaw', () => {
  it.each(['air', 'N2', 'SF6', 'CO2', 'H2'])('has a law for %s', (gas) => {
    expect(gasLaw(gas)).toMatchObject({ ok: true, value: { gas, usable: true } });
  });

  it.each(['O2', 'H2O', 'Ar', 'Ne', 'He'])('refuses %s in words, beside the gas', (gas) => {
    const result = gasLaw(gas);
    expect(result).toMatchObject({ ok: false, refusal: { type: 'gas-without-law', field: 'gas' } });
    if (!result.ok) expect(result.refusal.words.length).toBeGreaterThan(40);
  });

  it.each(['Ar', 'Ne', 'He'])('gives an indication for %s only when asked for one', (gas) => {
    expect(lawOrIndication(gas)).toMatchObject({ ok: true, value: { usable: false, relative: 0.4 } });
  });

  it.each(['N2+O2', 'forming gas', '', 'toString', undefined, 7])(
    'refuses the mixture or unknown gas %s',
    (gas) => {
      expect(gasLaw(gas)).toMatchObject({ ok: false, refusal: { type: 'gas-unknown', field: 'gas' } });
    },
  );

  it('has for every named gas a law or a reason', () => {
    for (const gas of GAS_NAMES) {
      const law = lawOrIndication(gas);
      expect(law.ok || law.refusal.words !== '').toBe(true);
    }
  });
});

describe('nitrogenRatio', () => {
  // Physics K4, from memory: N2/air 0.967 at 1, 0.95 at 2, 0.917 at 4 bar cm.
  it.each([
    [0.1, 0.967],
    [1, 0.967],
    [2, 0.9503],
    [4, 0.9169],
    [5, 0.9002],
  ])('is at %d bar cm %d', (x, ratio) => {
    expect(nitrogenRatio(x)).toBeCloseTo(ratio, 10);
  });

  it('is held level beyond 5 bar cm, where nothing founds it', () => {
    expect(nitrogenRatio(50)).toBe(nitrogenRatio(5));
  });
});

describe('relative strength at 1 bar cm', () => {
  // Relative strengths from memory; SF6 near three times air is common practice.
  it.each([
    ['N2', 0.967, 0.001],
    ['CO2', 0.88, 0.001],
    ['H2', 0.52, 0.001],
    ['SF6', 2.86, 0.01],
  ])('%s is %d of air', (gas, share, within) => {
    const law = gasLaw(gas);
    const air = gasLaw('air');
    if (!law.ok || !air.ok) throw new Error('no law');
    expect(Math.abs(uniformByLaw_kV(law.value, 1) / uniformByLaw_kV(air.value, 1) - share)).toBeLessThan(
      within,
    );
  });
});

describe('gas tables', () => {
  it('know a name from another word', () => {
    expect(isGasName('air')).toBe(true);
    expect(isGasName('hasOwnProperty')).toBe(false);
    expect(isGasName(null)).toBe(false);
  });

  it('name a source for every published figure', () => {
    for (const { source } of [...Object.values(PASCHEN_MINIMA), ...Object.values(TOWNSEND_CONSTANTS)]) {
      expect(source.length).toBeGreaterThan(5);
    }
  });

  it('have no Townsend constants for gases that attach electrons', () => {
    expect(TOWNSEND_CONSTANTS['SF6']).toBeUndefined();
    expect(TOWNSEND_CONSTANTS['O2']).toBeUndefined();
  });
});
