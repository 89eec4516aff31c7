import { brent } from '../numerics/brent';
import type { Answer } from '../units/answer';
import { checkNumber, type NumberRule } from '../units/check-number';
import { computed } from '../units/computed';
import { andThen, ok, refused, type Result } from '../units/result';
import { celsiusToKelvin } from '../units/temperature';

const CRITICAL_K = 126.192;
const CRITICAL_MOL_M3 = 11_183.9;
/** The constant that the equation of state was fitted with, not today's. */
const GAS_CONSTANT = 8.31451;
/** Liquid density at the triple point is 2.8 of the critical one; no state of this range lies beyond it. */
const DENSEST = 2.5;
/** Of the density, in the terms below. */
const HIGHEST_POWER = 8;
/** Z is 1 to seven digits there, and the density too small to search for. */
const IDEAL_BELOW_BAR = 1e-3;

export const CYLINDER_PRESSURE_RULE: NumberRule = {
  field: 'pressure',
  name: 'Pressure',
  unit: 'bar(abs)',
  min: 0,
  max: 350,
  maxReason: 'no cylinder in a room holds more',
};
export const GAS_TEMPERATURE_RULE: NumberRule = {
  field: 'temperature_C',
  name: 'Temperature',
  unit: '\u00b0C',
  min: -40,
  max: 100,
};

type Term = readonly [n: number, temperature: number, density: number, damping: number];

/**
 * Residual Helmholtz energy of nitrogen: Span, Lemmon, Jacobsen, Wagner and Yokozeki, J. Phys. Chem. Ref. Data 29
 * (2000) 1361. Its four terms about the critical point are left out: above 230 K they are under 1e-30.
 */
const TERMS: readonly Term[] = [
  [0.924803575275, 0.25, 1, 0],
  [-0.492448489428, 0.875, 1, 0],
  [0.661883336938, 0.5, 2, 0],
  [-1.92902649201, 0.875, 2, 0],
  [-0.0622469309629, 0.375, 3, 0],
  [0.349943957581, 0.75, 3, 0],
  [0.564857472498, 0.5, 1, 1],
  [-1.61720005987, 0.75, 1, 1],
  [-0.481395031883, 2, 1, 1],
  [0.421150636384, 1.25, 3, 1],
  [-0.0161962230825, 3.5, 3, 1],
  [0.172100994165, 1, 4, 1],
  [0.00735448924933, 0.5, 6, 1],
  [0.0168077305479, 3, 6, 1],
  [-0.00107626664179, 0, 7, 1],
  [-0.0137318088513, 2.75, 7, 1],
  [0.000635466899859, 0.75, 8, 1],
  [0.00304432279419, 2.5, 8, 1],
  [-0.0435762336045, 4, 1, 2],
  [-0.0723174889316, 6, 2, 2],
  [0.0389644315272, 6, 3, 2],
  [-0.021220136391, 3, 4, 2],
  [0.00408822981509, 3, 5, 2],
  [-5.51990017984e-5, 6, 8, 2],
  [-0.0462016716479, 16, 4, 3],
  [-0.00300311716011, 11, 5, 3],
  [0.0368825891208, 15, 5, 3],
  [-0.0025585684622, 12, 8, 3],
  [0.00896915264558, 12, 3, 4],
  [-0.0044151337035, 7, 5, 4],
  [0.00133722924858, 4, 6, 4],
  [0.000264832491957, 16, 9, 4],
];

/**
 * Compressibility Z of nitrogen from 0 to 350 bar(abs) and -40 to 100 C, within 0.1 %. Below about 90 bar at room
 * temperature it is under 1 and a cylinder holds a little more than the ideal gas says; above, less.
 */
export function nitrogenCompressibility(pressure_bar_abs: number, temperature_C: number): Result<Answer> {
  return andThen(compressibilityOf(pressure_bar_abs, temperature_C), (value) =>
    computed([], () => ({
      value,
      unit: '1',
      model: 'Equation of state of Span and others, 2000',
      valid: 'pure nitrogen, 0 to 350 bar(abs), \u221240 to 100 \u00b0C',
      relative: 0.001,
    })),
  );
}

/** Z alone, checked. */
export function compressibilityOf(pressure_bar_abs: number, temperature_C: number): Result<number> {
  const pressure = checkNumber(pressure_bar_abs, CYLINDER_PRESSURE_RULE);
  if (!pressure.ok) return pressure;
  const temperature = checkNumber(temperature_C, GAS_TEMPERATURE_RULE);
  if (!temperature.ok) return temperature;
  if (pressure.value < IDEAL_BELOW_BAR) return ok(1);
  const kelvin = celsiusToKelvin(temperature.value);
  const tau = CRITICAL_K / kelvin;
  const scale_bar = (CRITICAL_MOL_M3 * GAS_CONSTANT * kelvin) / 1e5;
  // Only the density changes in the search.
  const weights = TERMS.map(([n, temperature]) => n * tau ** temperature);
  const short = (density: number) => density * scale_bar * factorAt(density, weights) - pressure.value;
  const density = brent(short, { low: 0, high: DENSEST });
  return density.ok && density.value > 0
    ? ok(pressure.value / (density.value * scale_bar))
    : refused({ type: 'no-state', field: 'pressure', words: 'Pressure: no state of the gas was found.' });
}

/** 1 + delta d(alpha)/d(delta), with the part of each term that depends on temperature alone given. */
function factorAt(density: number, weights: readonly number[]): number {
  const powers = [1];
  for (let power = 1; power <= HIGHEST_POWER; power += 1) powers.push((powers[power - 1] ?? 1) * density);
  const dampings = [0, 1, 2, 3, 4].map((damping) => (damping === 0 ? 0 : (powers[damping] ?? 0)));
  const decays = dampings.map((damped) => Math.exp(-damped));
  let sum = 1;
  for (const [index, [, , power, damping]] of TERMS.entries()) {
    const shape = power - damping * (dampings[damping] ?? 0);
    sum += (weights[index] ?? 0) * (powers[power] ?? 0) * (decays[damping] ?? 1) * shape;
  }
  return sum;
}
