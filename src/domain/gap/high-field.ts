import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { ok, type Result } from '../units/result';

/** From here on roughness and field emission pull breakdown below the law, MV/m at the electrode. */
export const HIGH_FIELD_MV_M = 10;

/** Factor on the low side: 3 % a MV/m above 10, never below 0.70. Source: physics K5, common practice. */
export function highFieldShare(field_MV_m: number): number {
  return Math.max(0.7, 1 - 0.03 * Math.max(0, field_MV_m - HIGH_FIELD_MV_M));
}

/** The same with its input checked. */
export function highFieldFactor(field_MV_m: number): Result<Answer> {
  const field = checkNumber(field_MV_m, {
    field: 'field_MV_m',
    name: 'Field',
    unit: 'MV/m',
    min: 0,
    max: 1000,
  });
  if (!field.ok) return field;
  return ok(
    answer({
      value: highFieldShare(field.value),
      unit: '1',
      relative: 0.1,
      model: 'Allowance for high field at the electrode',
      valid: 'common practice; depends on finish and conditioning',
    }),
  );
}
