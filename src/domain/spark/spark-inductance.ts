import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';

/**
 * Inductance of a spark with its return around it, nH: 2 l ln(b/a) with l in cm. Spark radius 0.1 to 0.5 mm; 10 to
 * 15 nH for every centimetre. Closed form of a coaxial line.
 */
export function sparkInductance(spark: {
  readonly length_cm: number;
  readonly radius_cm: number;
  readonly return_cm: number;
}): Result<Answer> {
  const { length_cm, radius_cm, return_cm } = spark;
  const bad = firstRefusal([
    checkNumber(length_cm, {
      field: 'length_cm',
      name: 'Length of the spark',
      unit: 'cm',
      min: 1e-3,
      max: 1000,
    }),
    checkNumber(radius_cm, {
      field: 'radius_cm',
      name: 'Radius of the spark',
      unit: 'cm',
      min: 1e-4,
      max: 10,
    }),
    checkNumber(return_cm, {
      field: 'return_cm',
      name: 'Radius of the return',
      unit: 'cm',
      min: radius_cm,
      minExcluded: true,
      minReason: 'the radius of the spark',
      max: 1000,
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: 2 * length_cm * Math.log(return_cm / radius_cm),
      unit: 'nH',
      relative: 0.3,
      model: 'Coaxial line with the spark as its core',
      valid: 'return all around; one strap on one side makes it larger',
    }),
  );
}
