import type { RigSpec } from '../../domain/book/rig-spec';

/** Where each part of the drawing stands, in units of the drawing. Rail above, return below. */
export interface CircuitPlan {
  readonly width: number;
  readonly height: number;
  readonly rail: number;
  readonly ground: number;
  /** Small drawings carry symbols and rings alone; every figure stands in the rows below. */
  readonly lettered: boolean;
  readonly supply_x: number;
  readonly ballast: { readonly from: number; readonly to: number };
  readonly bleed_x: number;
  readonly gap: Electrodes;
  readonly channel: Electrodes;
  readonly first: Plates;
  readonly second: Plates;
  readonly second_bleed_x: number | null;
  /** One ring for every node that stays charged by itself. */
  readonly rings: readonly { readonly x: number; readonly y: number }[];
  readonly ring_r: number;
  readonly font: number;
}

/** Upright electrodes stand between rail and return, lying ones in the rail. */
export interface Electrodes {
  readonly upright: boolean;
  /** Middle of the gap. */
  readonly x: number;
  readonly y: number;
  readonly thick: number;
  readonly long: number;
  readonly apart: number;
}

export interface Plates {
  readonly x: number;
  readonly width: number;
}

const WIDE_INVERSION: CircuitPlan = {
  width: 866,
  height: 372,
  rail: 92,
  ground: 352,
  lettered: true,
  supply_x: 62,
  ballast: { from: 112, to: 208 },
  bleed_x: 236,
  gap: { upright: true, x: 330, y: 222, thick: 60, long: 68, apart: 28 },
  first: { x: 516, width: 108 },
  channel: { upright: false, x: 626, y: 92, thick: 34, long: 68, apart: 24 },
  second: { x: 730, width: 88 },
  second_bleed_x: 804,
  rings: [
    { x: 436, y: 92 },
    { x: 767, y: 92 },
  ],
  ring_r: 17,
  font: 22,
};

const WIDE_TRANSFER: CircuitPlan = {
  ...WIDE_INVERSION,
  height: 390,
  first: { x: 340, width: 116 },
  gap: { upright: false, x: 486, y: 92, thick: 60, long: 62, apart: 28 },
  second: { x: 612, width: 92 },
  channel: { upright: true, x: 728, y: 222, thick: 34, long: 68, apart: 24 },
  second_bleed_x: null,
  rings: [
    { x: 286, y: 92 },
    { x: 668, y: 92 },
  ],
};

const SMALL_INVERSION: CircuitPlan = {
  ...WIDE_INVERSION,
  width: 380,
  height: 200,
  rail: 44,
  ground: 184,
  lettered: false,
  supply_x: 22,
  ballast: { from: 40, to: 78 },
  bleed_x: 98,
  gap: { upright: true, x: 140, y: 114, thick: 30, long: 38, apart: 18 },
  first: { x: 222, width: 48 },
  channel: { upright: false, x: 270, y: 44, thick: 20, long: 30, apart: 14 },
  second: { x: 322, width: 44 },
  second_bleed_x: 366,
  rings: [
    { x: 182, y: 44 },
    { x: 344, y: 44 },
  ],
  ring_r: 13,
  font: 18,
};

const SMALL_TRANSFER: CircuitPlan = {
  ...SMALL_INVERSION,
  first: { x: 158, width: 48 },
  gap: { upright: false, x: 216, y: 44, thick: 28, long: 28, apart: 16 },
  second: { x: 276, width: 44 },
  channel: { upright: true, x: 336, y: 114, thick: 20, long: 38, apart: 14 },
  second_bleed_x: null,
  rings: [
    { x: 126, y: 44 },
    { x: 306, y: 44 },
  ],
};

/** Below this many px the letters of the wide drawing would fall under the smallest type of the screen. */
const LETTERED_FROM_PX = 620;

export function circuitPlan(topology: RigSpec['topology'], width_px: number): CircuitPlan {
  const wide = width_px >= LETTERED_FROM_PX;
  if (topology === 'lc-inversion') return wide ? WIDE_INVERSION : SMALL_INVERSION;
  return wide ? WIDE_TRANSFER : SMALL_TRANSFER;
}
