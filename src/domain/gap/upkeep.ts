import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';

/** Gas flow that renews a blown gap, L/min: `volumes` gap volumes a shot, 3 by common practice. */
export function purgeFlow(gap: {
  readonly volume_cm3: number;
  readonly rate_Hz: number;
  readonly volumes: number;
}): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(gap.volume_cm3, {
      field: 'volume_cm3',
      name: 'Gap volume',
      unit: 'cm\u00b3',
      min: 0,
      minExcluded: true,
      max: 1e5,
    }),
    checkNumber(gap.rate_Hz, { field: 'rate_Hz', name: 'Rate', unit: 'Hz', min: 0, max: 1e5 }),
    checkNumber(gap.volumes, {
      field: 'volumes',
      name: 'Volumes a shot',
      unit: '',
      min: 0,
      minExcluded: true,
      max: 100,
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: (gap.volumes * gap.volume_cm3 * gap.rate_Hz * 60) / 1000,
      unit: 'L/min',
      relative: 0.3,
      model: 'Gap volumes a shot',
      valid: 'common practice, no source',
    }),
  );
}

/**
 * Growth of the gap by erosion, micrometres: yield (microcm3/C) times charge a shot times shots over the worn area.
 * Yields run from 0.4 (copper-tungsten, nitrogen) to 25 (graphite, air), Donaldson 1984; within a factor of 3.
 */
export function erosionGrowth(wear: {
  readonly yield_ucm3_per_C: number;
  readonly charge_C: number;
  readonly shots: number;
  readonly area_cm2: number;
}): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(wear.yield_ucm3_per_C, {
      field: 'yield',
      name: 'Erosion yield',
      unit: '\u00b5cm\u00b3/C',
      min: 0,
      max: 1000,
    }),
    checkNumber(wear.charge_C, { field: 'charge_C', name: 'Charge a shot', unit: 'C', min: 0, max: 1000 }),
    checkNumber(wear.shots, { field: 'shots', name: 'Shots', unit: '', min: 0, max: 1e12 }),
    checkNumber(wear.area_cm2, {
      field: 'area_cm2',
      name: 'Worn area',
      unit: 'cm\u00b2',
      min: 1e-4,
      max: 1e4,
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  const growth_cm = (wear.yield_ucm3_per_C * 1e-6 * wear.charge_C * wear.shots) / wear.area_cm2;
  return ok(
    answer({
      value: growth_cm * 1e4,
      unit: '\u00b5m',
      relative: { below: 2 / 3, above: 2 },
      model: 'Erosion yield times charge, spread evenly',
      valid: 'within a factor of 3; protrusions grow faster than the mean',
    }),
  );
}
