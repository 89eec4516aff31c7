import type { Gaps } from './alignment-plan';
import type { AlignmentSetting } from './alignment-setting';

interface Box {
  readonly width: number;
  readonly height: number;
}

/** Where everything stands in the drawing, px. */
export interface DrawingPlan {
  /** Length to px. */
  readonly x: (place_mm: number) => number;
  /** Face of the moving bar at a gap, px from the top. */
  readonly face: (gap_mm: number) => number;
  /** Face of the fixed bar. */
  readonly floor: number;
  readonly bar: number;
  /** How many times larger gaps are drawn than lengths. */
  readonly times: number;
}

/** Of the height: the room for screws above, and each bar. */
const ABOVE = 0.15;
const BAR = 0.16;

/** Lengths to scale along the channel; gaps to a larger scale of their own, so that a wedge of hundredths shows. */
export function drawingPlan(
  setting: AlignmentSetting,
  { gaps, target_mm, box }: { readonly gaps: Gaps; readonly target_mm: number; readonly box: Box },
): DrawingPlan {
  const places = [0, setting.length_mm, ...(setting.screws ?? []).map((screw) => screw.position_mm)];
  const [left, right] = [Math.min(...places), Math.max(...places)];
  const margin = box.width * 0.06;
  const px_mm = Math.max(0, box.width - 2 * margin) / Math.max(1, right - left);
  const bar = box.height * BAR;
  const floor = box.height - bar;
  const room = Math.max(1, floor - box.height * ABOVE - bar);
  const widest = Math.max(gaps.a_mm, gaps.b_mm, target_mm, 0.01) * 1.12;
  const gap_px_mm = room / widest;
  return {
    x: (place_mm) => margin + (place_mm - left) * px_mm,
    face: (gap_mm) => floor - Math.max(0, gap_mm) * gap_px_mm,
    floor,
    bar,
    times: px_mm === 0 ? 1 : gap_px_mm / px_mm,
  };
}

/** Two counting digits: a scale is a guide, not a figure. */
export function timesWords(times: number): string {
  if (!Number.isFinite(times) || times <= 0) return '1';
  return String(Number(times.toPrecision(times < 10 ? 1 : 2)));
}
