import {
  allowedMismatch,
  breakdownSpread,
  gapAlong,
  type MeasuredGap,
} from '../../domain/alignment/gap-line';
import { planScrews, type ScrewPlan } from '../../domain/alignment/screws';
import type { BodyOf } from '../../domain/book/kinds';
import type { RigSpec } from '../../domain/book/rig-spec';
import type { Result } from '../../domain/units/result';
import { clockwiseScrew, screwTravel_mm, type AlignmentSetting } from './alignment-setting';

/** How differently the two ends may break: even to the eye on most channels; common practice, no source. */
export const ALLOWED_SPREAD = 0.02;

/** Where nothing can be reckoned, a feeler's usual error stands in. */
const FALLBACK_MM = 0.03;

export interface Gaps {
  readonly a_mm: number;
  readonly b_mm: number;
}

export function measuredGap(
  { a_mm, b_mm }: Gaps,
  places: Pick<AlignmentSetting, 'place_a_mm' | 'place_b_mm'>,
): MeasuredGap {
  return { left_mm: a_mm, right_mm: b_mm, leftPlace_mm: places.place_a_mm, rightPlace_mm: places.place_b_mm };
}

/** Turns above 0 are clockwise. Undefined where the rig names no two screws. */
export function planFor(
  gaps: Gaps,
  setting: AlignmentSetting,
  { target_mm, feeler_mm }: { readonly target_mm: number; readonly feeler_mm: number },
): Result<ScrewPlan> | undefined {
  if (setting.screws === null) return undefined;
  const [first, second] = setting.screws;
  const screws = [clockwiseScrew(first), clockwiseScrew(second)] as const;
  return planScrews({ gap: measuredGap(gaps, setting), target_mm, screws }, feeler_mm * 1000);
}

/** Difference of the ends that still breaks evenly, mm, rounded down to the hundredth. */
export function allowedDifference_mm(target_mm: number, ambient_bar_abs: number): number {
  const allowed = allowedMismatch(target_mm, ambient_bar_abs, ALLOWED_SPREAD);
  return allowed.ok ? Math.max(0.01, Math.floor(allowed.value.value / 10) / 100) : FALLBACK_MM;
}

/** How differently the two ends break, B over A, in per cent; null where the law has no answer. */
export function spread_pct(gaps: Gaps, ambient_bar_abs: number): number | null {
  const spread = breakdownSpread(gaps.a_mm, gaps.b_mm, ambient_bar_abs);
  return spread.ok ? spread.value.value * 100 : null;
}

/** What some turns give at the two places of the feeler, whether they are the recommended ones or not. */
export function gapsAfter(
  gaps: Gaps,
  setting: AlignmentSetting,
  eighths: readonly [number, number],
): Gaps | null {
  if (setting.screws === null) return null;
  const [first, second] = setting.screws;
  const [m1, m2] = [screwTravel_mm(first, eighths[0]), screwTravel_mm(second, eighths[1])];
  const moved = (place: number): number =>
    m1 + ((m2 - m1) * (place - first.position_mm)) / (second.position_mm - first.position_mm);
  const after = { a_mm: gaps.a_mm + moved(setting.place_a_mm), b_mm: gaps.b_mm + moved(setting.place_b_mm) };
  return after.a_mm > 0 && after.b_mm > 0 ? after : null;
}

/** The rig with the spacings that were measured, carried to the ends of the active length and rounded to hundredths. */
export function alignedSpec(spec: RigSpec, body: BodyOf<'alignment.measured'>): Result<RigSpec> {
  const gap: MeasuredGap = {
    left_mm: body.gap_a_mm,
    right_mm: body.gap_b_mm,
    leftPlace_mm: body.place_a_mm,
    rightPlace_mm: body.place_b_mm,
  };
  const feeler_um = body.feeler_error_mm * 1000;
  const a = gapAlong(gap, 0, feeler_um);
  if (!a.ok) return a;
  const b = gapAlong(gap, spec.channel.length_mm, feeler_um);
  if (!b.ok) return b;
  const [spacing_a_mm, spacing_b_mm] = [hundredths(a.value.value), hundredths(b.value.value)];
  if (!(spacing_a_mm > 0 && spacing_b_mm > 0)) {
    return {
      ok: false,
      refusal: { type: 'bars-meet', field: 'gap', words: 'By this line the bars touch at an end.' },
    };
  }
  return { ok: true, value: { ...spec, channel: { ...spec.channel, spacing_a_mm, spacing_b_mm } } };
}

function hundredths(value_mm: number): number {
  return Math.round(value_mm * 100) / 100;
}
