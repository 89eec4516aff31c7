import { lowPdVoltage } from '../gap/low-pd';
import type { Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { BAR_PER_ATM, barToTorr } from '../units/pressure';
import { ok, refused, type Result } from '../units/result';

const EPSILON_0_F_CM = 8.8541878128e-14;
const ATM_TORR = barToTorr(BAR_PER_ATM);
const UM_PER_CM = 1e4;
const STEPS = 400;
const WIDEST_UM = 20_000;

const THICKNESS_RULE = {
  field: 'thickness_um',
  name: 'Thickness',
  unit: '\u00b5m',
  min: 1,
  max: 5000,
} as const;
const PERMITTIVITY_RULE = {
  field: 'eps_r',
  name: 'Relative permittivity',
  unit: '',
  min: 1,
  max: 20_000,
} as const;

/**
 * Voltage from which air at a foil's edge or in a wrinkle may discharge, V peak: the least of V_B(g)(1 + t/(eps_r g))
 * over the width g of the air film, V_B air's curve at 1 atm; physics K6. 0.85 to 1.0 of the recalled
 * 163 (t/eps_r)^0.46 V rms. It starts at 1 to 2 kV on common film, far under what the film itself stands.
 */
export function edgeDischargeInception(thickness_um: number, eps_r: number): Result<Answer> {
  const thickness = checkNumber(thickness_um, THICKNESS_RULE);
  if (!thickness.ok) return thickness;
  const permittivity = checkNumber(eps_r, PERMITTIVITY_RULE);
  if (!permittivity.ok) return permittivity;
  const least = leastOverGaps(thickness.value / permittivity.value);
  if (!least.ok) return least;
  return computed([], () => ({
    value: least.value,
    unit: 'V peak',
    model: 'Air film and sheet in series on the curve for air',
    valid: 'air at 1 atm, DC and pulse; the film\u2019s width is the worst one',
    relative: { below: 0.15, above: 0.2 },
  }));
}

function leastOverGaps(equivalent_um: number): Result<number> {
  let least = Infinity;
  for (let step = 0; step <= STEPS; step += 1) {
    const gap_um = NARROWEST_UM * (WIDEST_UM / NARROWEST_UM) ** (step / STEPS);
    const air = lowPdVoltage('air', (ATM_TORR * gap_um) / UM_PER_CM);
    if (!air.ok) return refused(air.refusal);
    least = Math.min(least, air.value.value * (1 + equivalent_um / gap_um));
  }
  return ok(least);
}

/** Left of the minimum of air's curve a narrower film only needs more. */
const NARROWEST_UM = (0.567 / ATM_TORR) * UM_PER_CM;

/**
 * Voltage at which discharges begin to slide over a thin film above a ground foil, kV: 1.06e-4/C''^0.44, C'' the
 * capacitance per area in F/cm2. Toepler's form, from memory and doubtful; the higher constant 1.35e-4 is in the band.
 */
export function slidingDischargeInception(thickness_um: number, eps_r: number): Result<Answer> {
  return computed([checkNumber(thickness_um, THICKNESS_RULE), checkNumber(eps_r, PERMITTIVITY_RULE)], () => {
    const perArea_F_cm2 = (EPSILON_0_F_CM * eps_r * UM_PER_CM) / thickness_um;
    return {
      value: 1.06e-4 / perArea_F_cm2 ** 0.44,
      unit: 'kV',
      model: 'Sliding discharge over a film',
      valid: 'air, bare edge over a ground foil; from memory',
      relative: { below: 0.2, above: 0.35 },
    };
  });
}

/** Free film beyond the foil in air, mm: 3 mm per kV over a ground foil; common practice, no source. Round up. */
export function edgeMargin(voltage_kV: number): Result<Answer> {
  return computed(
    [checkNumber(voltage_kV, { field: 'voltage_kV', name: 'Voltage', unit: 'kV', min: 0, max: 200 })],
    () => ({
      value: 3 * voltage_kV,
      unit: 'mm',
      model: '3 mm of free film per kV',
      valid: 'common practice, no source; a bare edge in air. Burying the edge in oil or resin is better',
      relative: 0.2,
    }),
  );
}
