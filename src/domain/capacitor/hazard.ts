import { checkNumber } from '../units/check-number';
import { formatFigure } from '../units/format-quantity';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { answer, type Answer } from '../units/answer';
import { CAPACITANCE_RULE, VOLTAGE_RULE } from './energy';

const TOUCH_CHARGE_C = 45e-6;
const TOUCH_ENERGY_J = 0.35;
const TOUCH_CAPACITANCE_F = 0.1e-6;

/**
 * Whether an accessible part exceeds the touch limit of IEC 60335-1, 8.1.4: 45 uC from 450 V to 15 kV, 350 mJ above
 * (read in quotation), 0.1 uF below 450 V (from memory). Under the limit it is still painful.
 */
export function exceedsTouchLimit(capacitance_F: number, voltage_V: number): Result<boolean> {
  const bad = firstRefusal([
    checkNumber(capacitance_F, CAPACITANCE_RULE),
    checkNumber(voltage_V, VOLTAGE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  if (voltage_V > 15_000) return ok(0.5 * capacitance_F * voltage_V ** 2 > TOUCH_ENERGY_J);
  if (voltage_V > 450) return ok(capacitance_F * voltage_V > TOUCH_CHARGE_C);
  return ok(voltage_V > 42.4 && capacitance_F > TOUCH_CAPACITANCE_F);
}

/** Energy from which a touch makes a person start, J: 0.25 above 400 V (NFPA 70E, read), 1 from 100 V (from memory). */
export function reflexThreshold(voltage_V: number): Result<Answer> {
  const voltage = hazardVoltage(voltage_V);
  if (!voltage.ok) return voltage;
  return ok(threshold(voltage.value > 400 ? 0.25 : 1, 'Reflex line'));
}

/** Administrative shock line, J, from 100 V. Never a line below which it is harmless. Source: a laboratory's page, read. */
export function shockThreshold(voltage_V: number): Result<Answer> {
  const voltage = hazardVoltage(voltage_V);
  return voltage.ok ? ok(threshold(10, 'Administrative shock line')) : voltage;
}

/** Arc line, J, from 100 V. Source: the same page, read. */
export function arcThreshold(voltage_V: number): Result<Answer> {
  const voltage = hazardVoltage(voltage_V);
  return voltage.ok ? ok(threshold(10_000, 'Arc line')) : voltage;
}

export type HazardType = 'below-reflex' | 'reflex' | 'serious-injury' | 'may-kill' | 'blast';

/** What stored energy can do to a person, and the sentence for it with the supply beside it. */
export interface HazardBand {
  readonly type: HazardType;
  readonly words: string;
  /** The effect alone, for places that show energy and supply beside it already. */
  readonly effect: string;
  readonly exceedsTouchLimit: boolean;
}

/**
 * The hazard band of a capacitor charged to its supply's limit. The supply is asked for because it is usually the
 * part that kills: no energy is ever called small without it. Bands above 400 V from memory (DOE handbook).
 */
export function hazardBand(
  capacitance_F: number,
  supply: { readonly kV: number; readonly mA: number },
): Result<HazardBand> {
  const bad = firstRefusal([
    checkNumber(capacitance_F, CAPACITANCE_RULE),
    checkNumber(supply.kV, { field: 'supply_kV', name: 'Supply voltage', unit: 'kV', min: 0.1, max: 1000 }),
    checkNumber(supply.mA, { field: 'supply_mA', name: 'Supply current', unit: 'mA', min: 0, max: 1e6 }),
  ]);
  if (bad !== undefined) return refused(bad);
  const voltage_V = supply.kV * 1000;
  const energy_J = 0.5 * capacitance_F * voltage_V ** 2;
  const reflex = reflexThreshold(voltage_V);
  if (!reflex.ok) return reflex;
  const touch = exceedsTouchLimit(capacitance_F, voltage_V);
  if (!touch.ok) return touch;
  const type = bandOf(energy_J, reflex.value.value);
  const energy = formatFigure(energy_J, { digits: { significant: 2 }, rounding: 'up' });
  return ok({
    type,
    effect: BAND_WORDS[type],
    exceedsTouchLimit: touch.value,
    words: `${energy}\u2009J at the supply\u2019s ${String(supply.kV)}\u2009kV and ${String(supply.mA)}\u2009mA: ${BAND_WORDS[type]}`,
  });
}

const BAND_WORDS: Readonly<Record<HazardType, string>> = {
  'below-reflex': 'below the reflex line, still painful, and the supply itself may kill.',
  reflex: 'a touch makes a person start and fall, and the supply itself may kill.',
  'serious-injury': 'a touch injures seriously, and the supply itself may kill.',
  'may-kill': 'a touch may kill.',
  blast: 'a touch may kill, and a fault bursts like a charge.',
};

function bandOf(energy_J: number, reflex_J: number): HazardType {
  if (energy_J >= 1000) return 'blast';
  if (energy_J >= 10) return 'may-kill';
  if (energy_J > 1) return 'serious-injury';
  return energy_J > reflex_J ? 'reflex' : 'below-reflex';
}

function hazardVoltage(voltage_V: number): Result<number> {
  return checkNumber(voltage_V, { ...VOLTAGE_RULE, min: 100, minReason: 'these lines start there' });
}

function threshold(value: number, model: string): Answer {
  return answer({
    value,
    unit: 'J',
    relative: 0,
    model,
    valid: 'a line for sorting hazards; nothing below it is harmless',
  });
}
