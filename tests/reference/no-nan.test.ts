import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { evaluate } from './evaluate';
import { FUNCTIONS } from './fn-table';
import { InputProblem, Inputs } from './inputs';

/** Solved over a grid or a circuit: too slow for hundreds of runs, and asked in their own tests. */
const SLOW = /^(circuit\.|gap\.(breakdown|fieldFactor|holdOff|selfBreak|uniform\.isMonotone))/;

const TEXTS: Readonly<Record<string, readonly string[]>> = {
  gas: ['air', 'N2', 'SF6', 'O2', 'nothing'],
  material: ['PET', 'polyimide', 'FR4', 'nothing'],
  formula: ['C6H6', 'NaCl', ''],
  arc_side_sequence: ['L', 'LRL', 'x'],
  geometry: ['uniform', 'spheres', 'nothing'],
};

/** Inputs that answer to any name: a text where one is known, a number otherwise. */
function anyInputs(numbers: readonly number[]): Record<string, unknown> {
  let next = 0;
  const given: Record<string, unknown> = {};
  return new Proxy(given, {
    get: (seen, name) => {
      if (typeof name !== 'string') return undefined;
      const texts = TEXTS[name];
      const number = numbers[next % numbers.length] ?? 0;
      next += 1;
      seen[name] ??= texts === undefined ? number : texts[Math.abs(Math.trunc(number) || 0) % texts.length];
      return seen[name];
    },
  });
}

const tame = fc.oneof(
  fc.double({ min: 1e-3, max: 1e3, noNaN: true }),
  fc.double({ min: 1e-12, max: 1e12, noNaN: true }),
  fc.constantFrom(0, 1, 20, 337.1, 1e-9),
);
const wild = fc.oneof(fc.double(), fc.constantFrom(Number.NaN, Infinity, -Infinity, -1, 5e-324, 1.7e308));

describe('no function of the check format gives NaN', () => {
  const names = Object.keys(FUNCTIONS).filter((name) => !SLOW.test(name));

  const answered = new Set<string>();

  it.each(names)('%s', (name) => {
    const evaluator = FUNCTIONS[name];
    fc.assert(
      fc.property(fc.array(fc.oneof(tame, tame, wild), { minLength: 6, maxLength: 6 }), (numbers) => {
        let got;
        try {
          got = evaluator?.(new Inputs(anyInputs(numbers)));
        } catch (error) {
          return error instanceof InputProblem;
        }
        if (got === undefined || 'skip' in got) return false;
        if (!got.ok) return got.refusal.words.length > 0;
        answered.add(name);
        if (typeof got.value === 'boolean') return true;
        if (typeof got.value === 'number') return Number.isFinite(got.value);
        const { value, band, unit, model, valid } = got.value;
        const finite = [value, band.low, band.high].every(Number.isFinite);
        const around =
          band.low <= value * (1 + Math.sign(value) * 1e-9) &&
          band.high >= value * (1 - Math.sign(value) * 1e-9);
        return finite && around && unit !== '' && model !== '' && valid !== '';
      }),
      { numRuns: 150 },
    );
  });

  it('was not refused everywhere', () => {
    expect(answered.size).toBeGreaterThan(0.8 * names.length);
  });

  it('knows more than a hundred functions', () => {
    expect(names.length).toBeGreaterThan(90);
    expect(Object.keys(FUNCTIONS).length).toBeGreaterThan(100);
    expect(evaluate({ id: 'x', fn: 'gap.none', inputs: {}, expected: 1, tolerance_rel: 0 }).type).toBe(
      'skipped',
    );
  });
});
