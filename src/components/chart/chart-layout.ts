/** All in px. */
export interface ChartLayout {
  readonly width: number;
  readonly height: number;
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  /** Width of the hatched wall to the right of the plot. */
  readonly wall: number;
  /** Where the slice stands; null without one, or when it stands above the plot instead of beside it. */
  readonly slice: { readonly left: number; readonly right: number } | null;
}

export interface LayoutNeeds {
  readonly width: number;
  readonly height: number;
  /** Body text, px. */
  readonly font: number;
  /** Words in the slice, px. */
  readonly lead: number;
  /** Letters of the longest words in the slice; 0 without one. */
  readonly slice: number;
  readonly wall: boolean;
  readonly topLabel: boolean;
  /** Letters of the longest figure beside the y axis; as many as two digits and a point take when left out. */
  readonly labels?: number;
}

/** Mean advance of a digit, and what lies between the figures and the plot: ticks and their gaps. em */
const DIGIT_EM = 0.56;
const TICKS_EM = 1.55;

/** Narrower than this the app is on a phone, px: margins shrink and the slice sets its words in body size. */
const PHONE_PX = 500;

/** Narrower than this many letters, figures would leave the slice: it stands above the plot then. */
const SIDE_BY_SIDE_EM = 20;

export function chartLayout(needs: LayoutNeeds): ChartLayout {
  const { width, height, font } = needs;
  const beside = needs.slice > 0 && standsBeside(needs);
  const margin = width < PHONE_PX ? font / 3 : font * 0.55;
  const sliceWidth = sliceRoom(needs);
  const slice = beside ? { left: margin, right: margin + sliceWidth } : null;
  const ticks = Math.max(font * TICKS_EM, font * 0.55 + 21);
  const axis = Math.max(
    font * (width < PHONE_PX ? 2.75 : 3.1),
    ticks + (needs.labels ?? 0) * DIGIT_EM * font,
  );
  const left = (slice?.right ?? 0) + axis;
  const wall = needs.wall ? (width < PHONE_PX ? font * 0.8 : font * 2.36) : 0;
  return {
    width,
    height,
    left,
    right: Math.max(left + 1, width - wall - (needs.wall ? 0 : font * (width < PHONE_PX ? 0.3 : 1.4))),
    top: needs.topLabel ? font * 1.5 : font * 0.6,
    bottom: Math.max(font * 2, height - font * 2.7),
    wall,
    slice,
  };
}

/** Whether the slice has room beside the plot without breaking its words. */
export function standsBeside(needs: Pick<LayoutNeeds, 'width' | 'font' | 'lead' | 'slice'>): boolean {
  const { width, font, lead, slice } = needs;
  if (width / font < SIDE_BY_SIDE_EM) return false;
  // Mean advance of a letter, measured on the words of the gap's slice: 0.44 em at weight 400, 0.47 em at 600.
  const words = width < PHONE_PX ? slice * font * 0.44 + font * 0.6 : slice * lead * 0.47 + font * 2;
  return words <= sliceRoom(needs);
}

function sliceRoom({ width, font, lead }: Pick<LayoutNeeds, 'width' | 'font' | 'lead'>): number {
  return width < PHONE_PX ? width * 0.43 : Math.min(Math.max(font * 14.7, lead * 11.6), width * 0.385);
}

export interface SliceFonts {
  readonly body: number;
  readonly lead: number;
  readonly high: number;
  readonly low: number;
  readonly read: number;
}

export interface SliceNeeds {
  readonly fonts: SliceFonts;
  readonly highNote: boolean;
  readonly lowNote: boolean;
  readonly middle: boolean;
  /** Px across: a note in a narrow slice takes two lines. */
  readonly width: number;
}

export interface SliceHeights {
  readonly high: number;
  readonly low: number;
  readonly void: number;
}

/** Heights that the words in the slice need, whatever the scale says. */
export function sliceHeights({ fonts, highNote, lowNote, middle, width }: SliceNeeds): SliceHeights {
  const pad = fonts.body * 0.7;
  const noteLines = width < fonts.body * 13 ? 2 : 1;
  return {
    high: fonts.lead * 1.2 + fonts.high * 0.98 + pad,
    low: fonts.lead * 1.2 + fonts.low * 0.98 + pad + (lowNote ? fonts.body * 1.3 * noteLines : 0),
    void: (highNote ? fonts.body * 1.3 * noteLines : 0) + (middle ? fonts.read * 1.15 : 0) + pad,
  };
}

/**
 * Where the two faces of the slice stand: on the chart's scale wherever the words leave room, else as near to it as they do.
 * `high_px` and `low_px` are what the scale says.
 */
export function sliceFaces(
  plot: { readonly top: number; readonly bottom: number },
  scale: { readonly high_px: number; readonly low_px: number },
  least: SliceHeights,
): { readonly high: number; readonly low: number } {
  const lowest = plot.bottom - least.low;
  const low = clamp(scale.low_px, plot.top + least.high + least.void, lowest);
  const high = clamp(scale.high_px, plot.top + least.high, low - least.void);
  return { high, low };
}

function clamp(value: number, min: number, max: number): number {
  return Math.max(Math.min(value, max), Math.min(min, max));
}
