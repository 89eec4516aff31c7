import type { ReadingValues } from '../book/bodies/firing-bodies';
import { standingReview, type FiringDoc } from '../book/documents/firing';
import { standingReading, type ReadingDoc } from '../book/documents/reading';
import { latestRevision, revisionById, type RigDoc } from '../book/documents/rig';
import type { RigSpec } from '../book/rig-spec';
import type { SelfBreakReading } from '../calibration/fit-kept';
import { calibratedSelfBreak, fitSelfBreak, type SelfBreakFit } from '../calibration/self-break-fit';
import type { RigGap } from '../calibration/rig-law';
import type { OwnExpectation } from '../calibration/plausibility';
import { mapResult, type Result } from '../units/result';
import { gapSetupOf } from './rig-gap';

/** Why a reading of the rig stays out of its calibration. */
export const LEFT_OUT = [
  'not-self-break',
  'struck',
  'irregular',
  'unready',
  'left-out',
  'sent-back',
  'other-gap',
] as const;
export type LeftOut = (typeof LEFT_OUT)[number];

/** One measured self-break with the way back to where it stands in the Book. */
export interface CalibrationPoint extends SelfBreakReading {
  readonly reading: string;
  readonly firing: string;
  readonly no: number;
}

export interface CalibrationPoints {
  /** By shots, oldest first. */
  readonly points: readonly CalibrationPoint[];
  /** Readings that stay out, by the first reason that holds. */
  readonly left_out: Readonly<Record<LeftOut, number>>;
}

export interface CalibrationSource {
  readonly rig: RigDoc;
  /** Firings of the rig in any order. */
  readonly firings: readonly FiringDoc[];
  readonly readingsOf: (firing: string) => readonly ReadingDoc[];
}

/** A gap's own curve with the readings that it comes from. */
export interface RigCalibration extends CalibrationPoints {
  readonly fit: SelfBreakFit;
}

/** More readings than these no fit needs, and a tablet shall not wait for them: the newest count. */
export const MOST_POINTS = 600;

/** Electrodes, gas and irradiation that a calibration hangs on; its gap may differ from revision to revision. */
export function rigGapOf(spec: RigSpec): RigGap {
  const { gas, electrodes, irradiated } = gapSetupOf(spec, 20);
  return { gas, electrodes, irradiated };
}

/**
 * The measured self-breaks that a calibration may stand on: of firings that were opened ready and were not sent back,
 * logged without an objection, not left out by the standing review, on the electrodes and gas of the newest revision.
 */
export function calibrationPoints({ rig, firings, readingsOf }: CalibrationSource): CalibrationPoints {
  const gap = keyOf(rigGapOf(latestRevision(rig).spec));
  const left_out = Object.fromEntries(LEFT_OUT.map((why) => [why, 0])) as Record<LeftOut, number>;
  const points: CalibrationPoint[] = [];
  let shots = 0;
  for (const firing of firings.toSorted((a, b) => a.opened.stamp.wall_ms - b.opened.stamp.wall_ms)) {
    const spec = revisionById(rig, firing.rig_revision)?.spec;
    const sameGap = spec !== undefined && keyOf(rigGapOf(spec)) === gap;
    let within = 0;
    for (const reading of readingsOf(firing.id).toSorted((a, b) => a.no - b.no)) {
      const now = standingReading(reading);
      const values = now.type === 'stands' ? now.values : null;
      within += values?.shots ?? 0;
      const why = leftOutOf(firing, reading, values);
      if (why !== null) left_out[why] += 1;
      else if (!sameGap || values?.gas !== spec.gap.gas) left_out['other-gap'] += 1;
      else points.push(pointOf({ firing, reading, values, spec }, shots + within));
    }
    shots += firing.shots;
  }
  return { points: points.slice(-MOST_POINTS), left_out };
}

/**
 * Fits the rig's own curve. Refused in words with fewer than three self-breaks, or where one lies outside the law. It says
 * at which voltage the gap will fire; what it holds off stays with the law's low side.
 */
export function rigCalibration(source: CalibrationSource): Result<RigCalibration> {
  const found = calibrationPoints(source);
  const fit = fitSelfBreak(rigGapOf(latestRevision(source.rig).spec), found.points);
  return mapResult(fit, (value) => ({ ...found, fit: value }));
}

/** A setting of the rig at which its own curve is asked for. */
export type CalibratedAt = Pick<ReadingValues, 'pressure_bar_g' | 'ambient_bar_abs' | 'temperature_C'>;

/** What the own curve expects at a setting, kV, with one sigma of single shots. Refused where the law has no answer. */
export function ownExpectation(fit: SelfBreakFit, spec: RigSpec, at: CalibratedAt): Result<OwnExpectation> {
  const answer = calibratedSelfBreak(fit, {
    gap_mm: spec.gap.gap_mm,
    pressure_bar_abs: at.pressure_bar_g + at.ambient_bar_abs,
    temperature_C: at.temperature_C,
  });
  return mapResult(answer, ({ value, warnings }) => ({
    expected_kV: value,
    sigma_kV: value * Math.max(LEAST_SHARE, fit.scatter * Math.sqrt(1 + 1 / fit.used)),
    extrapolated: warnings.some((warning) => warning.type === 'extrapolated'),
  }));
}

/**
 * What a reading is held against: the own curve on its electrodes and gas and among what was read, otherwise the law
 * (undefined).
 */
export function ownFor(
  fit: SelfBreakFit | null,
  spec: RigSpec,
  values: CalibratedAt & Pick<ReadingValues, 'gas'>,
) {
  if (fit === null || values.gas !== spec.gap.gas || !fitsGapOf(fit, spec)) return undefined;
  const own = ownExpectation(fit, spec, values);
  return own.ok ? own.value : undefined;
}

/** Whether a calibration belongs to these electrodes and this gas. */
export function fitsGapOf(fit: SelfBreakFit, spec: RigSpec): boolean {
  return keyOf(fit.rig) === keyOf(rigGapOf(spec));
}

/** A meter of a bench is read no better than this; common practice, no source. */
const LEAST_SHARE = 0.005;

function leftOutOf(firing: FiringDoc, reading: ReadingDoc, values: ReadingValues | null): LeftOut | null {
  if (values === null) return 'struck';
  if (values.how !== 'self-break' || values.looked === 'gap-dark') return 'not-self-break';
  if (firing.unready !== null || firing.opened_irregular !== null) return 'unready';
  if (reading.irregular !== null) return 'irregular';
  const review = standingReview(firing);
  if (review?.verdict === 'sent-back') return 'sent-back';
  return review?.left_out.includes(reading.id) === true ? 'left-out' : null;
}

interface Found {
  readonly firing: FiringDoc;
  readonly reading: ReadingDoc;
  readonly values: ReadingValues;
  readonly spec: RigSpec;
}

function pointOf({ firing, reading, values, spec }: Found, shot: number): CalibrationPoint {
  const { voltage_kV, pressure_bar_g, ambient_bar_abs, temperature_C } = values;
  return {
    name: `${firing.number} no. ${reading.no}`,
    reading: reading.id,
    firing: firing.id,
    no: reading.no,
    shot,
    voltage_kV,
    gap_mm: spec.gap.gap_mm,
    pressure_bar_abs: pressure_bar_g + ambient_bar_abs,
    temperature_C,
  };
}

function keyOf(gap: RigGap): string {
  return JSON.stringify([
    gap.gas,
    gap.irradiated,
    Object.entries(gap.electrodes).toSorted(([a], [b]) => a.localeCompare(b)),
  ]);
}
