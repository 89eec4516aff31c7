import type { RigSpec } from '../../domain/book/rig-spec';
import type { Step } from '../../domain/book/sheet-spec';
import { stepLimits } from '../../domain/rules/check-progress';
import { formatFigure } from '../../domain/units/format-quantity';
import { parseNumber } from '../../domain/units/parse-number';
import { ok, refused, type Result } from '../../domain/units/result';

export type ReadingStep = Extract<Step, { type: 'reading' }>;

/** "0 to 1.2 bar(g), the upper one from the rig", as it stands before anything is entered. */
export function limitWords(step: ReadingStep, spec: RigSpec): string {
  const { lowest, highest } = stepLimits(step, spec);
  const unit = step.unit;
  if (lowest === null && highest === null) return 'no limits';
  if (lowest === null) return `at most ${figure(highest)}\u2009${unit}`;
  if (highest === null) return `at least ${figure(lowest)}\u2009${unit}`;
  return `${figure(lowest)} to ${figure(highest)}\u2009${unit}`;
}

/** Why a value is outside, in words; null when it lies within. Limits themselves are within. */
export function outsideWords(step: ReadingStep, value: number, spec: RigSpec): string | null {
  const { lowest, highest } = stepLimits(step, spec);
  const shown = `${figure(value)}\u2009${step.unit}`;
  if (lowest !== null && value < lowest)
    return `${shown} is below the limit of ${figure(lowest)}\u2009${step.unit}: the step stays open.`;
  if (highest !== null && value > highest)
    return `${shown} is above the limit of ${figure(highest)}\u2009${step.unit}: the step stays open.`;
  return null;
}

/** A typed reading; only what is no number at all is refused here, a value outside its limits is still a reading. */
export function readValue(step: ReadingStep, text: string): Result<number> {
  const value = parseNumber(text, step.key, step.quantity);
  if (value.ok && Math.abs(value.value) > 1e9)
    return refused({
      type: 'too-large',
      field: step.key,
      words: `${step.quantity}: no gauge shows that much.`,
    });
  return value.ok ? ok(value.value) : value;
}

/** The smallest step that a person would turn a dial by: a hundredth of the span, on a decimal grid. */
export function stepSize(step: ReadingStep, spec: RigSpec): number {
  const { lowest, highest } = stepLimits(step, spec);
  const span = lowest !== null && highest !== null ? highest - lowest : Math.abs(highest ?? lowest ?? 1);
  return span > 0 ? 10 ** Math.round(Math.log10(span / 50)) : 0.1;
}

export function figure(value: number | null): string {
  if (value === null) return '';
  const decimals = Math.min(6, String(value).split('.')[1]?.length ?? 0);
  return formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
}
