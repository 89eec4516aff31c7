import type { CapacitorSpec } from '../../../domain/book/rig-spec';
import { dielectricStress } from '../../../domain/capacitor/stress';
import { capacitance_F } from '../../../domain/rules/rig-figures';
import { formatFigure, type Rounding } from '../../../domain/units/format-quantity';

export type Sheet = Extract<CapacitorSpec, { kind: 'sheet' }>;

/** A cross-section through the sheet: foils that face each other, and the film between them. */
export interface SheetPlan {
  readonly height: number;
  readonly foils: readonly { readonly y: number; readonly side: 'left' | 'right' }[];
  /** Films between two foils, by pair. */
  readonly pairs: readonly {
    readonly top: number;
    readonly bottom: number;
    readonly plies: readonly number[];
    /** Plies that are there and not drawn. */
    readonly more: number;
  }[];
  /** Pairs that are there and not drawn. */
  readonly more_pairs: number;
}

const MOST_PLIES = 6;
const MOST_PAIRS = 3;
export const PLY_PX = 17;
export const FOIL_PX = 7;
const EDGE_PX = 10;

/** Where foils and plies lie, in px from the top. Beyond what can be told apart the rest is left out, and said so. */
export function sheetPlan(plies: number, plate_pairs: number): SheetPlan {
  const shownPlies = Math.min(plies, MOST_PLIES);
  const shownPairs = Math.min(plate_pairs, MOST_PAIRS);
  const foils: SheetPlan['foils'][number][] = [{ y: EDGE_PX, side: 'left' }];
  const pairs: SheetPlan['pairs'][number][] = [];
  let y = EDGE_PX + FOIL_PX;
  for (let pair = 0; pair < shownPairs; pair += 1) {
    const top = y;
    const bottom = top + shownPlies * PLY_PX;
    pairs.push({
      top,
      bottom,
      plies: Array.from({ length: shownPlies }, (_, i) => top + i * PLY_PX),
      more: plies - shownPlies,
    });
    foils.push({ y: bottom, side: pair % 2 === 0 ? 'right' : 'left' });
    y = bottom + FOIL_PX;
  }
  return { height: y + EDGE_PX, foils, pairs, more_pairs: plate_pairs - shownPairs };
}

export interface SheetWords {
  readonly thickness: string;
  readonly foils: string;
  readonly capacitance: string;
  /** What one more of each would do: the two can then not be taken for each other. */
  readonly one_ply_more: string;
  readonly one_pair_more: string;
}

/** The sheet in words, with what a ply more and a pair more would give. The supply's limit is what stresses it. */
export function sheetWords(sheet: Sheet, supply_kV: number | null): SheetWords {
  const thickness_mm = (sheet.plies * sheet.ply_um) / 1000;
  const layers = sheet.plies === 1 ? '1 ply' : `${sheet.plies} plies`;
  const pairs = sheet.plate_pairs === 1 ? '1 pair' : `${sheet.plate_pairs} pairs`;
  return {
    thickness: `${layers} of ${sheet.ply_um}\u2009µm make ${shown(thickness_mm, 3, 'nearest')}\u2009mm between two foils`,
    foils: `${pairs} of facing foils: ${sheet.plate_pairs + 1} foils`,
    capacitance: nanofarad(sheet),
    one_ply_more: withStress({ ...sheet, plies: sheet.plies + 1 }, supply_kV),
    one_pair_more: withStress({ ...sheet, plate_pairs: sheet.plate_pairs + 1 }, supply_kV),
  };
}

function withStress(sheet: Sheet, supply_kV: number | null): string {
  if (supply_kV === null) return nanofarad(sheet);
  const stress = dielectricStress(supply_kV * 1000, sheet.plies * sheet.ply_um * 1e-6);
  return stress.ok
    ? `${nanofarad(sheet)}, ${shown(stress.value.value, 3, 'up')}\u2009kV/mm`
    : nanofarad(sheet);
}

function nanofarad(sheet: Sheet): string {
  const found = capacitance_F(sheet);
  return found.ok ? `${shown(found.value * 1e9, 3, 'nearest')}\u2009nF` : 'no capacitance';
}

function shown(value: number, significant: number, rounding: Rounding): string {
  return formatFigure(value, { digits: { significant }, rounding });
}
