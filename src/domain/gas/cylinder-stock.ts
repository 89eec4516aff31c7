import { brent } from '../numerics/brent';
import type { Answer, Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { mapResult, ok, refused, type Refusal, type Result } from '../units/result';
import { freeVolumeIdeal, freeVolumeReal, type Cylinder } from './cylinder';
import { CYLINDER_PRESSURE_RULE } from './nitrogen-state';

/** Gases that stand in cylinders as a gas. Nitrogen is taken as a real gas, the others as ideal ones. */
export const CYLINDER_GASES = ['N2', 'air', 'Ar', 'He', 'Ne', 'H2', 'O2'] as const;
export type CylinderGas = (typeof CYLINDER_GASES)[number];
/** Gases that stand in cylinders as a liquid: the pressure says nothing of what is left. */
export const LIQUEFIED_GASES = ['CO2', 'SF6'] as const;

/** Beyond it the gases without an equation of state here may lie more than the stated fifth off the ideal one. */
const IDEAL_UP_TO_BAR = 250;

/** A cylinder, what is in it, and the pressure at which it is taken off. */
export interface Stock extends Cylinder {
  readonly gas: string;
  readonly rest_bar_abs: number;
}

/**
 * Gas that may be drawn from a cylinder until it is down to its rest pressure, L at 15 C and 1 atm; round it down. Real gas for
 * nitrogen; ideal for the others, within a fifth over 50 bar. Refused for liquefied gases: weigh them.
 */
export function usableGas(stock: Stock): Result<Answer> {
  const { rest_bar_abs, pressure_bar_abs } = stock;
  const rest = checkNumber(rest_bar_abs, {
    ...CYLINDER_PRESSURE_RULE,
    field: 'rest_bar_abs',
    name: 'Rest pressure',
    max: pressure_bar_abs,
    maxReason: 'the pressure that is in it',
  });
  if (!rest.ok) return rest;
  const full = wholeGas(stock);
  if (!full.ok) return full;
  const left = wholeGas({ ...stock, pressure_bar_abs: rest_bar_abs });
  if (!left.ok) return left;
  const value = Math.max(0, full.value.value - left.value.value);
  // The share of the fuller state counts: it is the one that is known worse.
  const share = (full.value.band.high - full.value.value) / full.value.value;
  return computed([], () => ({
    value,
    unit: 'L',
    model: full.value.model,
    valid: full.value.valid,
    relative: Number.isFinite(share) ? share : 0,
    warnings: full.value.warnings,
  }));
}

/** All the gas in a cylinder, L at 15 C and 1 atm, as it would come out if all of it escaped: round it up. */
export function wholeGas({ gas, ...cylinder }: Omit<Stock, 'rest_bar_abs'>): Result<Answer> {
  const known = gasRefusal(gas);
  if (known !== undefined) return refused(known);
  if (gas === 'N2') return freeVolumeReal(cylinder);
  if (cylinder.pressure_bar_abs > IDEAL_UP_TO_BAR) {
    return refused({
      type: 'too-large',
      field: 'pressure',
      words: `Pressure: for ${gas} the ideal gas is taken, and only up to ${IDEAL_UP_TO_BAR}\u2009bar(abs).`,
    });
  }
  return mapResult(freeVolumeIdeal(cylinder), (ideal) => ({
    ...ideal,
    warnings: cylinder.pressure_bar_abs > 50 ? [IDEAL_ONLY] : [],
  }));
}

const IDEAL_ONLY: Warning = {
  type: 'ideal-only',
  words: 'Taken as an ideal gas: at this pressure it may be a fifth more or less.',
};

function gasRefusal(gas: string): Refusal | undefined {
  if (LIQUEFIED_GASES.some((each) => each === gas)) {
    return {
      type: 'liquefied',
      field: 'gas',
      words: `Gas: ${gas} stands in its cylinder as a liquid, so the pressure says nothing of what is left: weigh it.`,
    };
  }
  return CYLINDER_GASES.some((each) => each === gas)
    ? undefined
    : { type: 'unknown-choice', field: 'gas', words: 'Gas: choose one of the list.' };
}

/**
 * Pressure, bar(abs), under which less than `needed_L` may still be drawn: the pressure at which to order. Rounded up it leaves time
 * in hand. Null where not even a full cylinder of this size holds so much.
 */
export function orderPressure(
  stock: Omit<Stock, 'pressure_bar_abs'>,
  needed_L: number,
): Result<number | null> {
  const needed = checkNumber(needed_L, {
    field: 'needed_L',
    name: 'Gas needed',
    unit: 'L',
    min: 0,
    max: 1e12,
  });
  if (!needed.ok) return needed;
  const highest = stock.gas === 'N2' ? CYLINDER_PRESSURE_RULE.max : IDEAL_UP_TO_BAR;
  const at = (pressure_bar_abs: number) => wholeGas({ ...stock, pressure_bar_abs });
  const [rest, most] = [at(stock.rest_bar_abs), at(highest)];
  if (!rest.ok) return rest;
  if (!most.ok) return most;
  if (needed_L === 0) return ok(stock.rest_bar_abs);
  const wanted = rest.value.value + needed_L;
  if (most.value.value < wanted) return ok(null);
  const short = (bar: number) => {
    const whole = at(bar);
    return whole.ok ? whole.value.value - wanted : Number.NaN;
  };
  const bar = brent(short, { low: stock.rest_bar_abs, high: highest });
  // A hair more, so that what is asked for is there.
  return mapResult(bar, (found) => Math.min(highest, found * (1 + 1e-12)));
}
