import { ok, refused, type Result } from './result';

/** What a number may be: its field for the form, its name and unit for the words, and its range. */
export interface NumberRule {
  readonly field: string;
  /** Starts the sentence, as "Gap". */
  readonly name: string;
  /** Empty for a plain ratio. */
  readonly unit: string;
  readonly min: number;
  readonly max: number;
  /** True when `min` itself is refused. */
  readonly minExcluded?: boolean;
  /** Why the limit is there, as "absolute vacuum". */
  readonly minReason?: string;
  readonly maxReason?: string;
}

/**
 * Refuses anything but a finite number within the rule's range: this is the one door through which numbers
 * enter the physics, so nothing behind it has to think about NaN or Infinity.
 */
export function checkNumber(value: unknown, rule: NumberRule): Result<number> {
  const { field, name } = rule;
  if (typeof value !== 'number' || Number.isNaN(value)) {
    return refused({ type: 'not-a-number', field, words: `${name}: enter a number.` });
  }
  if (!Number.isFinite(value)) {
    return refused({ type: 'not-finite', field, words: `${name}: enter a finite number.` });
  }
  if (value < rule.min || (rule.minExcluded === true && value === rule.min)) {
    const wanted = rule.minExcluded === true ? 'must be above' : 'must be at least';
    const reason = rule.minReason === undefined ? '' : ` (${rule.minReason})`;
    return refused({
      type: 'too-small',
      field,
      words: `${name}: ${wanted} ${withUnit(rule.min, rule.unit)}${reason}.`,
    });
  }
  if (value > rule.max) {
    const reason = rule.maxReason === undefined ? '' : ` (${rule.maxReason})`;
    return refused({
      type: 'too-large',
      field,
      words: `${name}: must be at most ${withUnit(rule.max, rule.unit)}${reason}.`,
    });
  }
  return ok(value);
}

function withUnit(value: number, unit: string): string {
  const figure = String(value).replace('-', '\u2212');
  return unit === '' ? figure : `${figure}\u2009${unit}`;
}
