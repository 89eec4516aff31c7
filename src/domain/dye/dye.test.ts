import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import { DYES, SOLVENT_CAUTIONS } from './dyes';
import { molarMass } from './molar-mass';
import { absorbedFraction, dyeMass, penetrationDepth, stockVolume } from './solution';

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);

describe('molarMass', () => {
  it.each([
    ['C28H31ClN2O3', 479.02],
    ['C14H17NO2', 231.29],
    ['C16H17NO2', 255.32],
    ['C10H9NO2', 175.19],
    ['C19H17N3O', 303.37],
    ['C20H10Na2O5', 376.28],
  ])('%s weighs %d', (formula, g_mol) => {
    expect(Math.abs(value(molarMass(formula)) - g_mol)).toBeLessThan(0.03);
  });

  it('reads brackets, spaces and water of crystals', () => {
    expect(value(molarMass('Ca(OH)2'))).toBeCloseTo(74.092, 3);
    expect(value(molarMass('K4[Fe(CN)6]'))).toBeCloseTo(368.347, 2);
    expect(value(molarMass('CuSO4\u00b75 H2O'))).toBeCloseTo(
      value(molarMass('CuSO4')) + 5 * value(molarMass('H2O')),
      9,
    );
    expect(value(molarMass('CO'))).not.toBe(value(molarMass('Co')));
  });

  it.each([
    '',
    ' ',
    'Xx2',
    'h2o',
    'C(',
    'C)',
    'C(H]',
    '()',
    '2',
    'C99999999',
    `C${'('.repeat(90)}`,
    'C0',
    '12+3',
  ])('refuses %j in words', (formula) => {
    const result = molarMass(formula);
    expect(result).toMatchObject({ ok: false, refusal: { field: 'formula' } });
    expect(!result.ok && result.refusal.words).toMatch(/^Formula: /);
  });

  it('gives a finite mass or a refusal for any text', () => {
    fc.assert(
      fc.property(fc.oneof(fc.string(), fc.stringMatching(/^[CHNO0-9().]*$/)), (text) => {
        const result = molarMass(text);
        return !result.ok || (Number.isFinite(result.value.value) && result.value.value > 0);
      }),
    );
  });

  it('adds up: a formula written twice weighs twice', () => {
    const formula = fc.constantFrom('C6H6', 'NaCl', 'C2H5OH', 'SO2');
    fc.assert(
      fc.property(
        formula,
        formula,
        (a, b) => Math.abs(value(molarMass(a + b)) - value(molarMass(a)) - value(molarMass(b))) < 1e-9,
      ),
    );
  });

  it('knows every dye of the table, with its caution', () => {
    for (const { formula, caution } of DYES) {
      expect(value(molarMass(formula))).toBeGreaterThan(100);
      expect(caution).toContain('toxic');
    }
    expect(SOLVENT_CAUTIONS.map(({ solvent }) => solvent)).toContain('methanol');
  });
});

describe('solutions', () => {
  it('weigh as worked by hand: 10 mM in 50 mL of 231.29 g/mol', () => {
    expect(value(dyeMass({ concentration_M: 0.01, volume_L: 0.05, molarMass_g_mol: 231.29 }))).toBeCloseTo(
      0.1156,
      4,
    );
    expect(value(stockVolume({ stock_M: 0.01, concentration_M: 0.002, volume_L: 0.05 }))).toBeCloseTo(
      0.01,
      12,
    );
    expect(stockVolume({ stock_M: 0.01, concentration_M: 0.02, volume_L: 1 })).toMatchObject({
      refusal: { field: 'concentration_M' },
    });
  });

  it('let 1/e through one depth', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 10, max: 1e6, noNaN: true }),
        fc.double({ min: 1e-3, max: 1, noNaN: true }),
        (absorption_L_mol_cm, concentration_M) => {
          const length_cm = value(penetrationDepth(absorption_L_mol_cm, concentration_M)) / 1e4;
          const taken = value(absorbedFraction({ absorption_L_mol_cm, concentration_M, length_cm }));
          return Math.abs(taken - (1 - 1 / Math.E)) < 1e-9;
        },
      ),
    );
  });

  it('take a share from 0 to 1, band included', () => {
    fc.assert(
      fc.property(
        fc.double(),
        fc.double(),
        fc.double(),
        (absorption_L_mol_cm, concentration_M, length_cm) => {
          const result = absorbedFraction({ absorption_L_mol_cm, concentration_M, length_cm });
          return !result.ok || (result.value.value >= 0 && result.value.band.high <= 1 + 1e-12);
        },
      ),
    );
    expect(value(absorbedFraction({ absorption_L_mol_cm: 0, concentration_M: 1, length_cm: 1 }))).toBe(0);
  });

  it.each([Number.NaN, Infinity, -1])('are refused at %d', (bad) => {
    expect(dyeMass({ concentration_M: bad, volume_L: 1, molarMass_g_mol: 100 })).toMatchObject({
      refusal: { field: 'concentration_M' },
    });
    expect(penetrationDepth(bad, 0.01).ok).toBe(false);
    expect(absorbedFraction({ absorption_L_mol_cm: 1, concentration_M: 1, length_cm: bad }).ok).toBe(false);
  });
});
