import { firstRefusal, ok, refused, type Result } from '../units/result';
import { checkNumber } from '../units/check-number';
import type { Feed } from './lumped-verdict';
import { sheetInductance, transitTime } from './strip';

/** A sheet capacitor as its current sees it: pairs of facing foils side by side. */
export interface FeedSheet {
  /** Along the current. */
  readonly along_m: number;
  /** Across the current. */
  readonly across_m: number;
  /** Of all plies between two foils together. */
  readonly thickness_m: number;
  readonly eps_r: number;
  readonly pairs: number;
}

/**
 * What a sheet capacitor adds to the loop of its gap (physics L): inductance mu0 h l/w, shared by the pairs that lie side
 * by side, and one transit along the current. Refused for lengths that are none.
 */
export function sheetFeed({ along_m, across_m, thickness_m, eps_r, pairs }: FeedSheet): Result<Feed> {
  const inductance = sheetInductance({ spacing_m: thickness_m, width_m: across_m, length_m: along_m });
  const transit = transitTime(along_m, eps_r);
  const bad = firstRefusal([
    inductance,
    transit,
    checkNumber(pairs, { field: 'plate_pairs', name: 'Active plate pairs', unit: '', min: 1, max: 1000 }),
  ]);
  if (bad !== undefined || !inductance.ok || !transit.ok) return refused(bad ?? NOTHING);
  return ok({ sheet_H: (inductance.value.value * 1e-9) / pairs, transit_s: transit.value.value * 1e-9 });
}

const NOTHING = { type: 'no-sheet', words: 'Sheet: no figure can be given.' } as const;
