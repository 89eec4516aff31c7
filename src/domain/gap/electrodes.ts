import { checkNumber, type NumberRule } from '../units/check-number';
import { firstRefusal, ok, refused, type Refusal, type Result } from '../units/result';
import { LARGEST_GAP_OVER_RADIUS, tooSharp } from './curved-gap';

/** Domed electrodes are counted as spheres of their face's radius; plane ones need no radius. */
export const ELECTRODE_SHAPES = ['domed', 'sphere', 'cylinder', 'plane'] as const;
export type ElectrodeShape = (typeof ELECTRODE_SHAPES)[number];

/** Electrodes that a radius says all about. */
export interface RoundElectrodes {
  readonly shape: ElectrodeShape;
  readonly radius_mm?: number | null | undefined;
}

/** Two equal hexagonal bars side by side. Sharp edges have no radius to give: break them first. */
export interface HexBarElectrodes {
  readonly shape: 'hex-bars';
  readonly flats_mm?: number | null | undefined;
  readonly corner_mm?: number | null | undefined;
  readonly facing?: 'flats' | 'edges' | null | undefined;
}

/** Two equal round-ended rods on one axis. */
export interface RodElectrodes {
  readonly shape: 'capped-rods';
  readonly radius_mm?: number | null | undefined;
  /** The straight part of each; without it twenty radii are taken, from where on it hardly matters. */
  readonly rod_length_mm?: number | null | undefined;
}

export type Electrodes = RoundElectrodes | HexBarElectrodes | RodElectrodes;

/** The same with all of its numbers there and in range. */
export type CheckedElectrodes =
  | { readonly shape: 'plane' }
  | { readonly shape: 'domed' | 'sphere' | 'cylinder'; readonly radius_mm: number }
  | {
      readonly shape: 'hex-bars';
      readonly flats_mm: number;
      readonly corner_mm: number;
      readonly facing: 'flats' | 'edges';
    }
  | { readonly shape: 'capped-rods'; readonly radius_mm: number; readonly rod_length_mm: number };

/** Narrowest and widest gap that a shape's field is given for. */
export interface GapLimits {
  readonly narrowest_mm: number;
  readonly widest_mm: number;
}

export const DEFAULT_SHAFT_OVER_RADIUS = 20;
export const SHAFT_RULE: NumberRule = {
  field: 'rod_length_mm',
  name: 'Straight part over radius',
  unit: '',
  min: 0.5,
  minReason: 'take spheres',
  max: 200,
};
export const CORNER_OVER_FLATS_RULE: NumberRule = {
  field: 'corner_mm',
  name: 'Corner radius over the width across flats',
  unit: '',
  min: 0.005,
  minReason: 'a sharper edge has no field to give; break the edges',
  max: 0.45,
  maxReason: 'take a round bar',
};
export const GAP_OVER_FLATS_RULE: NumberRule = {
  field: 'gap_mm',
  name: 'Gap over the width across flats',
  unit: '',
  min: 0.02,
  minReason: 'take plane electrodes',
  max: 2,
  maxReason: 'corona starts before breakdown there',
};
const RADIUS_RULE: NumberRule = {
  field: 'radius_mm',
  name: 'Electrode radius',
  unit: 'mm',
  min: 0.1,
  max: 1000,
  maxReason: 'choose plane electrodes',
};
const ROD_LENGTH_RULE: NumberRule = {
  field: 'rod_length_mm',
  name: 'Straight part of the rod',
  unit: 'mm',
  min: 0.05,
  max: 200_000,
};
const FLATS_RULE: NumberRule = {
  field: 'flats_mm',
  name: 'Width across flats',
  unit: 'mm',
  min: 0.5,
  max: 500,
};
const CORNER_RULE: NumberRule = {
  field: 'corner_mm',
  name: 'Corner radius',
  unit: 'mm',
  min: 0.001,
  max: 250,
};

/** Electrodes with their numbers checked; refused by field. */
export function checkElectrodes(electrodes: Electrodes): Result<CheckedElectrodes> {
  switch (electrodes.shape) {
    case 'plane':
      return ok({ shape: 'plane' });
    case 'domed':
    case 'sphere':
    case 'cylinder': {
      const radius = checkNumber(electrodes.radius_mm, RADIUS_RULE);
      return radius.ok ? ok({ shape: electrodes.shape, radius_mm: radius.value }) : radius;
    }
    case 'capped-rods':
      return checkRods(electrodes);
    case 'hex-bars':
      return checkBars(electrodes);
    default:
      return refused({
        type: 'shape-unknown',
        field: 'electrodes',
        words: 'Electrodes: choose domed, sphere, cylinder, plane, capped rods or hexagonal bars.',
      });
  }
}

/** Gaps that these electrodes have a field for. */
export function gapLimits(electrodes: CheckedElectrodes): GapLimits {
  switch (electrodes.shape) {
    case 'plane':
      return { narrowest_mm: 0, widest_mm: Infinity };
    case 'hex-bars':
      return {
        narrowest_mm: GAP_OVER_FLATS_RULE.min * electrodes.flats_mm,
        widest_mm: GAP_OVER_FLATS_RULE.max * electrodes.flats_mm,
      };
    default:
      return { narrowest_mm: 0, widest_mm: LARGEST_GAP_OVER_RADIUS * electrodes.radius_mm };
  }
}

/** What is wrong with a gap between these electrodes, from its narrowest to its widest within the setting error. */
export function badGapFor(
  electrodes: CheckedElectrodes,
  gap: { readonly narrow_mm: number; readonly wide_mm: number },
): Refusal | undefined {
  if (electrodes.shape === 'plane') return undefined;
  if (electrodes.shape === 'hex-bars') {
    return firstRefusal([
      checkNumber(gap.narrow_mm / electrodes.flats_mm, GAP_OVER_FLATS_RULE),
      checkNumber(gap.wide_mm / electrodes.flats_mm, GAP_OVER_FLATS_RULE),
    ]);
  }
  return gap.wide_mm > gapLimits(electrodes).widest_mm ? tooSharp() : undefined;
}

function checkRods({ radius_mm, rod_length_mm }: RodElectrodes): Result<CheckedElectrodes> {
  const radius = checkNumber(radius_mm, RADIUS_RULE);
  if (!radius.ok) return radius;
  const given = rod_length_mm ?? DEFAULT_SHAFT_OVER_RADIUS * radius.value;
  const length = checkNumber(given, ROD_LENGTH_RULE);
  if (!length.ok) return length;
  const shaft = checkNumber(length.value / radius.value, SHAFT_RULE);
  if (!shaft.ok) return shaft;
  return ok({ shape: 'capped-rods', radius_mm: radius.value, rod_length_mm: length.value });
}

function checkBars({ flats_mm, corner_mm, facing }: HexBarElectrodes): Result<CheckedElectrodes> {
  const flats = checkNumber(flats_mm, FLATS_RULE);
  if (!flats.ok) return flats;
  const corner = checkNumber(corner_mm, CORNER_RULE);
  if (!corner.ok) return corner;
  const shape = checkNumber(corner.value / flats.value, CORNER_OVER_FLATS_RULE);
  if (!shape.ok) return shape;
  if (facing !== 'flats' && facing !== 'edges') {
    return refused({
      type: 'facing-unknown',
      field: 'facing',
      words: 'Hexagonal bars: say whether flats or edges face each other.',
    });
  }
  return ok({ shape: 'hex-bars', flats_mm: flats.value, corner_mm: corner.value, facing });
}
