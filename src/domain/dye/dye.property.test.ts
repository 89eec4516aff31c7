import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { describeSoundness, unsound, type Probes } from '../../../tests/support/sound-results';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import { DYES } from './dyes';
import * as mass from './molar-mass';
import * as solution from './solution';

const FORMULAS = ['C28H31ClN2O3', 'CuSO4.5H2O', 'K4[Fe(CN)6]', 'Xx2', '(', ''];

const PROBES: Probes = {
  molarMass: ([a]) => mass.molarMass(FORMULAS[Math.abs(Math.trunc(a) || 0) % FORMULAS.length] ?? ''),
  dyeMass: ([a, b, c]) => solution.dyeMass({ concentration_M: a / 100, volume_L: b, molarMass_g_mol: c }),
  stockVolume: ([a, b, c]) =>
    solution.stockVolume({ stock_M: (a + b) / 1000, concentration_M: a / 1000, volume_L: c }),
  penetrationDepth: ([a, b]) => solution.penetrationDepth(a, b),
  absorbedFraction: ([a, b, c]) =>
    solution.absorbedFraction({ absorption_L_mol_cm: a, concentration_M: b / 100, length_cm: c }),
};

describeSoundness('dye', PROBES, [mass, solution]);

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const near = (a: number, b: number, tolerance = 1e-9) => Math.abs(a / b - 1) < tolerance;
const more = fc.double({ min: 1.01, max: 5, noNaN: true });

describe('formulas', () => {
  it('of any text give a mass or words, never NaN', () => {
    fc.assert(
      fc.property(
        fc.oneof(fc.string(), fc.stringMatching(/^[A-Z][a-z]?\d{0,3}[([)\]A-Z0-9.]{0,10}$/)),
        (text) => {
          expect(unsound(mass.molarMass(text))).toBeUndefined();
        },
      ),
    );
  });

  it('weigh in a bracket what they weigh without, times its number', () => {
    fc.assert(
      fc.property(fc.constantFrom(...DYES), fc.integer({ min: 1, max: 9 }), ({ formula }, times) =>
        near(value(mass.molarMass(`(${formula})${String(times)}`)), times * value(mass.molarMass(formula))),
      ),
    );
  });

  it('do not mind the order of their parts', () => {
    fc.assert(
      fc.property(
        fc.shuffledSubarray(['C6', 'H12', 'O3', 'N2', 'Cl'], { minLength: 5, maxLength: 5 }),
        (parts) => near(value(mass.molarMass(parts.join(''))), value(mass.molarMass('C6H12O3N2Cl'))),
      ),
    );
  });
});

describe('solutions', () => {
  it('thinned from a stock hold what was wanted: the inverse', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-4, max: 1e-2, noNaN: true }), more, (concentration_M, by) => {
        const stock_M = by * concentration_M;
        const taken_L = value(solution.stockVolume({ stock_M, concentration_M, volume_L: 0.1 }));
        return near((taken_L * stock_M) / 0.1, concentration_M, 1e-6);
      }),
    );
  });

  it('absorb 1 - 1/e over their depth, and more over more', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e3, max: 1e5, noNaN: true }),
        fc.double({ min: 1e-4, max: 1e-2, noNaN: true }),
        (absorption, molar) => {
          const depth_cm = value(solution.penetrationDepth(absorption, molar)) / 1e4;
          const over = (length_cm: number) =>
            value(
              solution.absorbedFraction({
                absorption_L_mol_cm: absorption,
                concentration_M: molar,
                length_cm,
              }),
            );
          return near(over(depth_cm), 1 - 1 / Math.E, 1e-6) && over(2 * depth_cm) > over(depth_cm);
        },
      ),
    );
  });

  it('absorb over two lengths as one after the other', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.01, max: 1, noNaN: true }),
        fc.double({ min: 0.01, max: 1, noNaN: true }),
        (a, b) => {
          const passes = (length_cm: number) =>
            1 -
            value(solution.absorbedFraction({ absorption_L_mol_cm: 1e4, concentration_M: 1e-4, length_cm }));
          return near(passes(a) * passes(b), passes(a + b));
        },
      ),
    );
  });
});
