import { answer, type Answer, type Basis } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, mapResult, ok, refused, type Result } from '../units/result';
import { CAPACITANCE_RULE, VOLTAGE_RULE } from './energy';

const TOUCH_CHARGE_C = 45e-6;
const TOUCH_ENERGY_J = 0.35;
const TOUCH_CAPACITANCE_F = 0.1e-6;
const EXTRA_LOW_V = 42.4;
const CHARGE_FROM_V = 450;
const ENERGY_FROM_V = 15_000;

/** A charged part held against the touch limit that rules at its voltage. Under the limit it is still painful. */
export interface TouchVerdict extends Basis {
  readonly exceeds: boolean;
  /** What the limit is on at this voltage: capacitance, charge or energy. */
  readonly measured: Answer;
  readonly limit: Answer;
}

/**
 * Holds an accessible part against IEC 60335-1, 8.1.4: 0.1 uF up to 450 V, 45 uC up to 15 kV, 350 mJ above; read in
 * quotation. Up to 42.4 V there is no limit on what is stored.
 */
export function touchVerdict(capacitance_F: number, voltage_V: number): Result<TouchVerdict> {
  const bad = firstRefusal([
    checkNumber(capacitance_F, CAPACITANCE_RULE),
    checkNumber(voltage_V, VOLTAGE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const [value, most, unit] = ruling(capacitance_F, voltage_V);
  const exceeds = voltage_V > EXTRA_LOW_V && value > most;
  const figure = (of: number) => answer({ value: of, unit, model: MODEL, valid: VALID, relative: 0 });
  return ok({
    exceeds,
    measured: figure(value),
    limit: figure(most),
    model: MODEL,
    valid: VALID,
    warnings: exceeds
      ? [{ type: 'over-touch-limit', words: 'Over the touch limit of IEC 60335-1: nobody may reach it.' }]
      : [
          {
            type: 'still-painful',
            words: 'Under the touch limit a discharge still hurts and makes a person start.',
          },
        ],
  });
}

/** Whether an accessible part exceeds the touch limit of IEC 60335-1, 8.1.4; the figures are in `touchVerdict`. */
export function exceedsTouchLimit(capacitance_F: number, voltage_V: number): Result<boolean> {
  return mapResult(touchVerdict(capacitance_F, voltage_V), ({ exceeds }) => exceeds);
}

const MODEL = 'IEC 60335-1, 8.1.4';
const VALID = 'accessible parts behind a protective impedance; a line for appliances, not for a bench';

function ruling(
  capacitance_F: number,
  voltage_V: number,
): readonly [value: number, most: number, unit: string] {
  if (voltage_V > ENERGY_FROM_V) return [0.5 * capacitance_F * voltage_V ** 2, TOUCH_ENERGY_J, 'J'];
  if (voltage_V > CHARGE_FROM_V) return [capacitance_F * voltage_V, TOUCH_CHARGE_C, 'C'];
  return [capacitance_F, TOUCH_CAPACITANCE_F, 'F'];
}
