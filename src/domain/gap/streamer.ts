import { uniformVoltage_kV, type StreamerCriterion } from './streamer-criterion';
import type { AxialProfile } from './field-geometry';

const MOST_STEPS = 80;
const CLOSE_ENOUGH = 1e-14;

/**
 * Voltage, kV, at which the streamer integral along the axis reaches its criterion; x in bar cm at 20 C, above 0.
 * Without a profile the field is uniform and the answer is the law itself.
 *
 * With s = (V/d)/(Ec p) the condition reads: integral of [s g(t) - 1]+ ^ power dt = K/(Ec^power x), g the field
 * over its mean. The left side depends on the shape alone, so a curve over pressure reuses one profile. It is
 * convex and rising in s, and the uniform answer lies at or above the root, so Newton's method from there cannot
 * miss.
 */
export function streamerVoltage_kV(
  criterion: StreamerCriterion,
  x_bar_cm: number,
  profile: AxialProfile | undefined,
): number {
  const uniform = uniformVoltage_kV(criterion, x_bar_cm);
  if (profile === undefined) return uniform;
  const { Ec_kV_per_bar_cm: Ec, K, power } = criterion;
  const target = K / (Ec ** power * x_bar_cm);
  let s = uniform / (Ec * x_bar_cm);
  for (let step = 0; step < MOST_STEPS; step += 1) {
    const { excess, slope } = integral(profile, s, power);
    const change = (excess - target) / slope;
    s -= change;
    if (Math.abs(change) <= CLOSE_ENOUGH * s) break;
  }
  return s * Ec * x_bar_cm;
}

function integral({ fields, weights }: AxialProfile, s: number, power: 1 | 2) {
  let excess = 0;
  let slope = 0;
  for (let index = 0; index < fields.length; index += 1) {
    const field = fields[index] ?? 0;
    const over = s * field - 1;
    if (over <= 0) continue;
    const weight = weights[index] ?? 0;
    excess += weight * (power === 2 ? over * over : over);
    slope += weight * field * (power === 2 ? 2 * over : 1);
  }
  return { excess, slope };
}
