import type { ReadingValues } from '../book/bodies/firing-bodies';
import { standingReading, type ReadingDoc } from '../book/documents/reading';
import type { RigSpec } from '../book/rig-spec';
import { readingPlausibility } from '../rules/reading-plausibility';

/** One reading of a firing as tables and plots take it. */
export interface FiringRow {
  readonly reading: ReadingDoc;
  readonly no: number;
  readonly state: 'stands' | 'corrected' | 'struck' | 'parted';
  /** What stands now; of a struck or parted reading the original, to be shown as such. */
  readonly values: ReadingValues;
  readonly irregular: boolean;
  /** Deviation from the law in sigmas; null where it was no self-break or the law has no answer. */
  readonly sigma: number | null;
  readonly expected_kV: number | null;
  readonly sigma_kV: number | null;
  /** False only where physics speaks against it. */
  readonly fits: boolean;
  readonly words: string;
  readonly causes: readonly string[];
  /** Shots of the firing up to and with this reading. */
  readonly shots_so_far: number;
}

/** The rows of a firing in the order of their numbers, each compared with the revision that it was fired on. */
export function firingRows(readings: readonly ReadingDoc[], spec: RigSpec): readonly FiringRow[] {
  const rows: FiringRow[] = [];
  const before: number[] = [];
  let shots = 0;
  for (const reading of readings.toSorted((a, b) => a.no - b.no)) {
    const standing = standingReading(reading);
    const values = standing.type === 'stands' ? standing.values : reading.original;
    if (standing.type !== 'struck') shots += values.shots;
    const judged = standing.type === 'stands' ? readingPlausibility(spec, values, before) : null;
    const said = judged?.ok === true ? judged.value : null;
    if (said !== null && said.sigma !== null) before.unshift(said.sigma);
    rows.push({
      reading,
      no: reading.no,
      state: standing.type === 'stands' && standing.corrected ? 'corrected' : standing.type,
      values,
      irregular: reading.irregular !== null,
      sigma: said?.sigma ?? null,
      expected_kV: said?.expected_kV ?? null,
      sigma_kV: said?.sigma_kV ?? null,
      fits: said?.fits ?? true,
      words: said?.words ?? (judged?.ok === false ? judged.refusal.words : ''),
      causes: said?.causes.map((cause) => cause.words) ?? [],
      shots_so_far: shots,
    });
  }
  return rows;
}

/** The big figures of a firing; null where there is nothing to take them from. */
export interface FiringTotals {
  readonly shots: number;
  readonly readings: number;
  readonly self_breaks: number;
  readonly mean_kV: number | null;
  /** One sigma of the self-breaks about the law, shifted by their mean difference from it. */
  readonly scatter_kV: number | null;
  readonly output_uJ: number | null;
  readonly not_fitting: number;
  readonly irregular: number;
}

export function firingTotals(rows: readonly FiringRow[]): FiringTotals {
  const standing = rows.filter((row) => row.state === 'stands' || row.state === 'corrected');
  const breaks = standing.filter((row) => countsForFigures(row) && row.values.how === 'self-break');
  const residuals = breaks.flatMap((row) =>
    row.expected_kV === null ? [] : [row.values.voltage_kV - row.expected_kV],
  );
  const outputs = standing.flatMap((row) => (row.values.output_uJ === null ? [] : [row.values.output_uJ]));
  return {
    shots: rows.at(-1)?.shots_so_far ?? 0,
    readings: rows.length,
    self_breaks: breaks.length,
    mean_kV: mean(breaks.map((row) => row.values.voltage_kV)),
    scatter_kV: deviation(residuals),
    output_uJ: mean(outputs),
    not_fitting: standing.filter((row) => !row.fits).length,
    irregular: rows.filter((row) => row.irregular).length,
  };
}

/** Irregular and ill-fitting readings stay visible and stay out of the averages. */
function countsForFigures(row: FiringRow): boolean {
  return !row.irregular && row.fits && row.values.looked !== 'gap-dark';
}

function mean(values: readonly number[]): number | null {
  return values.length === 0 ? null : values.reduce((sum, value) => sum + value, 0) / values.length;
}

function deviation(values: readonly number[]): number | null {
  const middle = mean(values);
  if (middle === null || values.length < 2) return null;
  return Math.sqrt(values.reduce((sum, value) => sum + (value - middle) ** 2, 0) / (values.length - 1));
}
