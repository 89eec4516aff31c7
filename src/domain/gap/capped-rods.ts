import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { LARGEST_GAP_OVER_RADIUS, tooSharp } from './curved-gap';
import { fieldFactorOf, profileFrom, sphereProfiles, type AxialProfile } from './field-geometry';
import { checkedSimilarity, type GapPoint } from './gas-density';
import { gasLaw } from './gas-law';
import { checkSetup, type GapInput } from './gap-input';
import { solveRodField } from './rod-field';
import { selfBreakAt, type GapAnswer } from './self-break';
import { AIR_CRITERION } from './streamer-criterion';
import { streamerVoltage_kV } from './streamer';

/** Under this gap over radius the round ends alone decide, and rods are spheres to four digits. */
const SPHERES_BELOW = 0.05;
const LONGEST_SHAFT = 200;
const DEFAULT_SHAFT = 20;

/**
 * Field factor E_max/(V/d) of two round-ended rods on one axis at equal and opposite voltage; `shaft_over_radius` is
 * the straight part of each. Own charge simulation, within 0.1 %; physics A(c). Up to 1 radius it equals spheres.
 */
export function rodFieldFactor(gap_over_radius: number, shaft_over_radius = DEFAULT_SHAFT): Result<Answer> {
  const profile = checkedProfile(gap_over_radius, shaft_over_radius);
  if (!profile.ok) return profile;
  return ok(
    answer({
      value: profile.value.fieldFactor,
      unit: '1',
      relative: 0.002,
      model: 'Charge simulation, round-ended rods',
      valid: 'rods on one axis, equal and opposite; holders far away',
    }),
  );
}

/** Breakdown of two round-ended rods in air by the streamer integral along the axis, kV. Up to 5 radii apart. */
export function rodBreakdown(
  rods: { readonly radius_cm: number; readonly shaft_cm?: number } & GapPoint,
): Result<Answer> {
  const radius = checkNumber(rods.radius_cm, {
    field: 'radius_cm',
    name: 'Radius',
    unit: 'cm',
    min: 0.001,
    max: 1000,
  });
  if (!radius.ok) return radius;
  const x = checkedSimilarity(rods);
  if (!x.ok) return x;
  if (x.value < 0.013 || x.value > 50) {
    return refused({
      type: x.value < 0.013 ? 'pd-too-small' : 'pd-too-large',
      field: 'pressure',
      words: 'Pressure times gap must lie between 0.013 and 50\u2009bar cm for this model.',
    });
  }
  const shape = rods.gap_cm / radius.value;
  if (shape > LARGEST_GAP_OVER_RADIUS) return refused(tooSharp());
  const shaft = rods.shaft_cm === undefined ? DEFAULT_SHAFT : rods.shaft_cm / radius.value;
  const profile = checkedProfile(shape, shaft);
  if (!profile.ok) return profile;
  return ok(
    answer({
      value: streamerVoltage_kV(AIR_CRITERION, x.value, profile.value),
      unit: 'kV',
      relative: shape > 1 ? 0.055 : 0.035,
      model: 'Streamer integral, round-ended rods',
      valid: 'air, 0.013 to 50 bar cm, gap up to 5 radii; above 2 bar by similarity',
    }),
  );
}

/**
 * Self-break of round-ended rods with both sides; physics M. For one rod earthed the low side takes two spheres, which
 * crowd the field more than rods do.
 */
export function rodSelfBreak(
  input: Omit<GapInput, 'electrodes'> & { readonly radius_mm: number; readonly shaft_mm?: number },
): Result<GapAnswer> {
  const { radius_mm, shaft_mm, ...rest } = input;
  const setup = { ...rest, electrodes: { shape: 'sphere', radius_mm } } as const;
  const checked = checkSetup(setup);
  if (!checked.ok) return checked;
  const law = gasLaw(input.gas);
  if (!law.ok) return law;
  const shaft = shaft_mm === undefined ? DEFAULT_SHAFT : shaft_mm / radius_mm;
  const narrow = (input.gap_mm - input.u_gap_mm) / radius_mm;
  const field = checkedProfile(input.gap_mm / radius_mm, shaft);
  const narrowField = checkedProfile(narrow, shaft);
  if (!field.ok) return field;
  if (!narrowField.ok) return narrowField;
  const narrowFields = [narrowField.value, sphereProfiles(narrow).oneEarthed];
  const sides = selfBreakAt(
    { setup, law: law.value, radius_mm, field: field.value, narrowFields },
    input.pressure.bar_abs,
  );
  return sides.ok
    ? ok({
        ...sides.value,
        model: `Law: streamer integral, round-ended rods of ${String(radius_mm)}\u2009mm radius`,
      })
    : sides;
}

function checkedProfile(gap_over_radius: number, shaft_over_radius: number): Result<AxialProfile> {
  const bad = firstRefusal([
    checkNumber(gap_over_radius, {
      field: 'gap_over_radius',
      name: 'Gap over radius',
      unit: '',
      min: 0,
      minExcluded: true,
      max: 20,
      maxReason: 'corona starts long before breakdown',
    }),
    checkNumber(shaft_over_radius, {
      field: 'shaft_over_radius',
      name: 'Straight part over radius',
      unit: '',
      min: 0.5,
      minReason: 'take spheres',
      max: LONGEST_SHAFT,
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  if (gap_over_radius < SPHERES_BELOW) {
    const { symmetric } = sphereProfiles(gap_over_radius);
    return ok({ ...symmetric, fieldFactor: fieldFactorOf('spheres_sym', gap_over_radius) });
  }
  const field = solveRodField(gap_over_radius, shaft_over_radius + 2);
  return field === undefined
    ? refused({
        type: 'no-field',
        field: 'gap_over_radius',
        words: 'The field of these rods could not be computed.',
      })
    : ok(profileFrom(field.fieldFactor, field.fieldAt));
}
