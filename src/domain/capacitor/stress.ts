import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { VOLTAGE_RULE } from './energy';

const THICKNESS_RULE = { field: 'thickness_m', name: 'Thickness', unit: 'm', min: 1e-7, max: 0.1 } as const;

/** Field in the dielectric, kV/mm. Take the voltage at the supply's limit: a gap that stays shut lets it through. */
export function dielectricStress(voltage_V: number, thickness_m: number): Result<Answer> {
  const bad = firstRefusal([checkNumber(voltage_V, VOLTAGE_RULE), checkNumber(thickness_m, THICKNESS_RULE)]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: voltage_V / thickness_m / 1e6,
      unit: 'kV/mm',
      relative: 0,
      model: 'Voltage over thickness',
      valid: 'inside the sheet; edges and air films carry more',
    }),
  );
}

const LEAST_STRESS_KV_MM = 1e-12;

/** How many times the short-term strength exceeds the stress. Below 3 to 4 is too little with reversal (practice). */
export function stressMargin(voltage_V: number, thickness_m: number, strength_kV_mm: number): Result<Answer> {
  const strength = checkNumber(strength_kV_mm, {
    field: 'strength_kV_mm',
    name: 'Strength',
    unit: 'kV/mm',
    min: 0,
    minExcluded: true,
    max: 2000,
  });
  if (!strength.ok) return strength;
  const stress = dielectricStress(voltage_V, thickness_m);
  if (!stress.ok) return stress;
  // Below this the ratio is no figure any more, and no bench has such a voltage.
  if (stress.value.value < LEAST_STRESS_KV_MM) {
    return refused({
      type: 'no-stress',
      field: 'voltage_V',
      words: 'Voltage: without voltage there is no margin to give.',
    });
  }
  const value = strength.value / stress.value.value;
  return ok(
    answer({
      value,
      unit: '1',
      relative: 0.2,
      model: 'Strength over stress',
      valid: 'strength at the thickness tested',
      warnings:
        value < 3
          ? [
              {
                type: 'little-margin',
                words: 'Under 3: too little for duty with reversal. Expect punctures.',
              },
            ]
          : [],
    }),
  );
}

/** Field in an air film in series with a sheet, kV/mm: V/(g + t/eps_r). Above about 3 it discharges. */
export function airFilmField(film: {
  readonly voltage_V: number;
  readonly thickness_um: number;
  readonly eps_r: number;
  readonly air_um: number;
}): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(film.voltage_V, VOLTAGE_RULE),
    checkNumber(film.thickness_um, {
      field: 'thickness_um',
      name: 'Thickness',
      unit: '\u00b5m',
      min: 0.1,
      max: 1e5,
    }),
    checkNumber(film.eps_r, { field: 'eps_r', name: 'Relative permittivity', unit: '', min: 1, max: 20_000 }),
    checkNumber(film.air_um, { field: 'air_um', name: 'Air film', unit: '\u00b5m', min: 0, max: 1e5 }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: film.voltage_V / (film.air_um + film.thickness_um / film.eps_r),
      unit: 'kV/mm',
      relative: 0.05,
      model: 'Air film in series with the sheet',
      valid: 'flat film, no charge on its surface',
    }),
  );
}

/**
 * Minimum strength of PET film at a thickness, kV/mm: 90.8 (t/125 um)^-0.476. Fitted within 4 % to a published
 * data sheet from 75 to 350 um.
 */
export function petMinimumStrength(thickness_um: number): Result<Answer> {
  const thickness = checkNumber(thickness_um, {
    field: 'thickness_um',
    name: 'Thickness',
    unit: '\u00b5m',
    min: 75,
    max: 350,
  });
  if (!thickness.ok) return thickness;
  return ok(
    answer({
      value: 90.8 * (thickness.value / 125) ** -0.476,
      unit: 'kV/mm',
      relative: 0.04,
      model: 'PET film, data sheet minimum',
      valid: '75 to 350 \u00b5m, new film, short test, small electrode',
    }),
  );
}
