import { gapSensitivity } from '../gap/uniform-law';
import { uniformVoltage_kV, AIR_CRITERION } from '../gap/streamer-criterion';
import type { Answer } from '../units/answer';
import { checkNumber, type NumberRule } from '../units/check-number';
import { computed } from '../units/computed';
import { firstRefusal, mapResult, refused, type Refusal, type Result } from '../units/result';

/** A gap between two straight bars, measured at two places along them. */
export interface MeasuredGap {
  readonly left_mm: number;
  readonly right_mm: number;
  readonly leftPlace_mm: number;
  readonly rightPlace_mm: number;
}

export const BAR_GAP_RULE: NumberRule = { field: 'gap_mm', name: 'Gap', unit: 'mm', min: 0.01, max: 500 };
export const PLACE_RULE: NumberRule = { field: 'place_mm', name: 'Place', unit: 'mm', min: -1e5, max: 1e5 };
const PRESSURE_RULE: NumberRule = {
  field: 'pressure',
  name: 'Pressure',
  unit: 'bar(abs)',
  min: 0.01,
  max: 5,
};
const FEELER_RULE: NumberRule = {
  field: 'feeler_um',
  name: 'Feeler error',
  unit: '\u00b5m',
  min: 0,
  max: 1000,
};

/** What is wrong with a measured gap, or nothing. The two places must differ, or no wedge can be told. */
export function gapRefusal(gap: MeasuredGap): Refusal | undefined {
  return (
    firstRefusal([
      checkNumber(gap.left_mm, { ...BAR_GAP_RULE, field: 'left_mm', name: 'Left gap' }),
      checkNumber(gap.right_mm, { ...BAR_GAP_RULE, field: 'right_mm', name: 'Right gap' }),
      checkNumber(gap.leftPlace_mm, { ...PLACE_RULE, field: 'leftPlace_mm', name: 'Left place' }),
      checkNumber(gap.rightPlace_mm, { ...PLACE_RULE, field: 'rightPlace_mm', name: 'Right place' }),
    ]) ??
    (Math.abs(gap.leftPlace_mm - gap.rightPlace_mm) < 1e-3
      ? {
          type: 'same-place',
          field: 'rightPlace_mm',
          words: 'Places: measure the gap at two different places along the bars.',
        }
      : undefined)
  );
}

/** Straight line through both measurements, at any place. Not checked. */
export function lineAt(gap: MeasuredGap, place_mm: number): number {
  const t = (place_mm - gap.leftPlace_mm) / (gap.rightPlace_mm - gap.leftPlace_mm);
  return gap.left_mm + (gap.right_mm - gap.left_mm) * t;
}

/**
 * Gap at a place along the bars, mm, with the feeler's error carried to it: least between the two places, growing
 * beyond them.
 */
export function gapAlong(gap: MeasuredGap, place_mm: number, feeler_um: number): Result<Answer> {
  const bad = gapRefusal(gap);
  if (bad !== undefined) return refused(bad);
  let error_mm = 0;
  const along = computed([checkNumber(place_mm, PLACE_RULE), checkNumber(feeler_um, FEELER_RULE)], () => {
    const t = (place_mm - gap.leftPlace_mm) / (gap.rightPlace_mm - gap.leftPlace_mm);
    const value = lineAt(gap, place_mm);
    error_mm = (feeler_um / 1000) * Math.hypot(1 - t, t);
    return {
      value,
      unit: 'mm',
      model: 'Straight line through two measurements',
      valid: 'straight bars; a bent one shows only with a third measurement',
      relative: 0,
      warnings:
        value - error_mm <= 0
          ? [{ type: 'bars-meet', words: 'By this line the bars may touch at this place.' }]
          : [],
    };
  });
  return mapResult(along, (line) => withError(line, error_mm));
}

/** Angle between the bars, mrad; above 0 where the right end stands wider. Two feeler errors decide its band. */
export function wedge(gap: MeasuredGap, feeler_um = 0): Result<Answer> {
  const bad = gapRefusal(gap);
  if (bad !== undefined) return refused(bad);
  const span_mm = gap.rightPlace_mm - gap.leftPlace_mm;
  const error_mrad = (Math.SQRT2 * feeler_um) / Math.abs(span_mm);
  const angle = computed([checkNumber(feeler_um, FEELER_RULE)], () => {
    const value = 1000 * Math.atan((gap.right_mm - gap.left_mm) / span_mm);
    return {
      value,
      unit: 'mrad',
      model: 'Angle from two gaps',
      valid: 'straight bars',
      relative: 0,
      warnings:
        error_mrad > 0 && Math.abs(value) < 2 * error_mrad
          ? [{ type: 'within-feeler', words: 'The wedge is within what the feeler can tell.' }]
          : [],
    };
  });
  return mapResult(angle, (one) => withError(one, error_mrad));
}

/** A band of a fixed width, which a share of the value cannot give where the value is 0. */
function withError(one: Answer, error: number): Answer {
  return { ...one, band: { low: one.value - error, high: one.value + error } };
}

/**
 * How differently the two ends break: (V right - V left) over their mean, by the uniform law in air at 20 C. Below 0
 * where the right end is the tight one.
 */
export function breakdownSpread(left_mm: number, right_mm: number, pressure_bar_abs: number): Result<Answer> {
  return computed(
    [
      checkNumber(left_mm, { ...BAR_GAP_RULE, field: 'left_mm', name: 'Left gap' }),
      checkNumber(right_mm, { ...BAR_GAP_RULE, field: 'right_mm', name: 'Right gap' }),
      checkNumber(pressure_bar_abs, PRESSURE_RULE),
    ],
    () => {
      const left = uniformVoltage_kV(AIR_CRITERION, (pressure_bar_abs * left_mm) / 10);
      const right = uniformVoltage_kV(AIR_CRITERION, (pressure_bar_abs * right_mm) / 10);
      return {
        value: (2 * (right - left)) / (right + left),
        unit: '1',
        model: 'Uniform law at both ends',
        valid: 'air; the ratio holds for other gases within a tenth of it',
        relative: 0.1,
      };
    },
  );
}

/**
 * Mismatch of the two ends that keeps their break within a share of each other, um: s g/S. A feeler is itself good to
 * 10 to 20 um. Round it down.
 */
export function allowedMismatch(gap_mm: number, pressure_bar_abs: number, spread: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(gap_mm, BAR_GAP_RULE),
    checkNumber(pressure_bar_abs, PRESSURE_RULE),
    checkNumber(spread, { field: 'spread', name: 'Allowed spread', unit: '', min: 0, max: 0.5 }),
  ]);
  if (bad !== undefined) return refused(bad);
  const slope = gapSensitivity(pressure_bar_abs, gap_mm / 10);
  if (!slope.ok) return slope;
  return computed([], () => ({
    value: (1000 * spread * gap_mm) / slope.value.value,
    unit: '\u00b5m',
    model: 'Share of the gap over the slope of the law',
    valid: 'air, small spreads',
    relative: 0.1,
  }));
}
