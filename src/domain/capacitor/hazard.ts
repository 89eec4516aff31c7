import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { answer, type Answer, type Basis, type Warning } from '../units/answer';
import { CAPACITANCE_RULE, storedEnergy, VOLTAGE_RULE } from './energy';
import { energyText } from './energy-text';
import { touchVerdict, type TouchVerdict } from './touch';

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

/** Arc line, J, from 100 V. Source: the same table, read. */
export function arcThreshold(voltage_V: number): Result<Answer> {
  const voltage = hazardVoltage(voltage_V);
  return voltage.ok ? ok(threshold(10_000, 'Arc line')) : voltage;
}

/** Heat line, J, under 100 V: a short burns. Source: the same table, read. */
export function heatThreshold(voltage_V: number): Result<Answer> {
  const voltage = checkNumber(voltage_V, {
    ...VOLTAGE_RULE,
    max: 100,
    maxReason: 'the other lines hold from there',
  });
  return voltage.ok ? ok(threshold(100, 'Heat line')) : voltage;
}

export type HazardType = 'below-reflex' | 'reflex' | 'serious-injury' | 'may-kill' | 'blast';

/** What stored energy can do to a person, and the sentence for it with the supply beside it. */
export interface HazardBand extends Basis {
  readonly type: HazardType;
  readonly words: string;
  /** The effect alone, for places that show energy and supply beside it already. */
  readonly effect: string;
  readonly exceedsTouchLimit: boolean;
  /** At the supply's limit; round it up. */
  readonly energy: Answer;
  readonly touch: TouchVerdict;
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
  const stored = storedEnergy(capacitance_F, voltage_V);
  if (!stored.ok) return stored;
  const energy_J = stored.value.value;
  const reflex = reflexThreshold(voltage_V);
  if (!reflex.ok) return reflex;
  const touch = touchVerdict(capacitance_F, voltage_V);
  if (!touch.ok) return touch;
  const type = bandOf(energy_J, reflex.value.value);
  const energy = energyText(energy_J);
  return ok({
    type,
    effect: BAND_WORDS[type],
    exceedsTouchLimit: touch.value.exceeds,
    energy: stored.value,
    touch: touch.value,
    model: 'Stored energy against the lines of DOE-HDBK-1092',
    valid: 'a capacitor alone, from 100\u2009V; lines for sorting hazards, the supply counts for itself',
    warnings: warningsOf(voltage_V, touch.value),
    words: `${energy}\u2009J at the supply\u2019s ${String(supply.kV)}\u2009kV and ${String(supply.mA)}\u2009mA: ${BAND_WORDS[type]}`,
  });
}

/** Any vacuum part gives X-rays at such voltages, and glass lets them out from here on; from memory. */
const X_RAY_V = 30_000;

function warningsOf(voltage_V: number, touch: TouchVerdict): readonly Warning[] {
  if (voltage_V <= X_RAY_V) return touch.warnings;
  const words = 'Above 30\u2009kV a vacuum part in the set-up gives X-rays that pass through glass.';
  return [...touch.warnings, { type: 'x-rays', words }];
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
