import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { LARGEST_GAP_OVER_RADIUS, tooSharp } from './curved-gap';
import { DEFAULT_SHAFT_OVER_RADIUS, SHAFT_RULE } from './electrodes';
import type { AxialProfile } from './field-geometry';
import { rodProfile } from './gap-fields';
import { checkedSimilarity, type GapPoint } from './gas-density';
import { AIR_CRITERION } from './streamer-criterion';
import { streamerVoltage_kV } from './streamer';

/**
 * Field factor E_max/(V/d) of two round-ended rods on one axis at equal and opposite voltage; `shaft_over_radius` is
 * the straight part of each. Own charge simulation, within 0.1 %; physics A(c). Up to 1 radius it equals spheres.
 */
export function rodFieldFactor(
  gap_over_radius: number,
  shaft_over_radius = DEFAULT_SHAFT_OVER_RADIUS,
): Result<Answer> {
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
  const shaft = rods.shaft_cm === undefined ? DEFAULT_SHAFT_OVER_RADIUS : rods.shaft_cm / radius.value;
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
    checkNumber(shaft_over_radius, SHAFT_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const profile = rodProfile(gap_over_radius, shaft_over_radius);
  return profile === undefined
    ? refused({
        type: 'no-field',
        field: 'gap_over_radius',
        words: 'The field of these rods could not be computed.',
      })
    : ok(profile);
}
