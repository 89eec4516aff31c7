/**
 * When an avalanche turns into a spark along a field line:
 * integral of p * [(E/p) - Ec]+ ^ power over the line, in (kV, cm, bar at 20 C), reaches K.
 * In a uniform field this is exactly the uniform law: V = Ec*x + sqrt(K*x) for power 2, Ec*x + K for power 1.
 */
export interface StreamerCriterion {
  readonly Ec_kV_per_bar_cm: number;
  readonly K: number;
  readonly power: 1 | 2;
}

/** Air: the 24.36/6.72 pair. Schumann's form in Kuffel, Zaengl and Kuffel, from memory. */
export const AIR_CRITERION: StreamerCriterion = { Ec_kV_per_bar_cm: 24.36, K: 6.72 ** 2, power: 2 };

/** SF6: net ionisation rises in a straight line above 88.5 kV/(cm bar); constants from memory. */
export const SF6_CRITERION: StreamerCriterion = { Ec_kV_per_bar_cm: 88.5, K: 0.38, power: 1 };

/** Breakdown of a uniform gap by the criterion, kV, for x in bar cm at 20 C. */
export function uniformVoltage_kV(
  { Ec_kV_per_bar_cm, K, power }: StreamerCriterion,
  x_bar_cm: number,
): number {
  return Ec_kV_per_bar_cm * x_bar_cm + (power === 2 ? Math.sqrt(K * x_bar_cm) : K);
}
