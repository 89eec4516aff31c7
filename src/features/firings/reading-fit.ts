import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import { standingReading, type ReadingDoc } from '../../domain/book/documents/reading';
import type { RigSpec } from '../../domain/book/rig-spec';
import type { Plausibility } from '../../domain/calibration/plausibility';
import { ownFor, type RigCalibration } from '../../domain/rules/rig-calibration';
import { plausibilityAgainst } from '../../domain/rules/reading-plausibility';
import type { Result } from '../../domain/units/result';

/** A reading that stands, with the values that it has now. */
export interface StandingRow {
  readonly reading: ReadingDoc;
  readonly values: ReadingValues;
}

/** Readings that say something, by number: struck ones and those with two corrections against each other are out. */
export function standingRows(readings: readonly ReadingDoc[]): readonly StandingRow[] {
  return readings.flatMap((reading) => {
    const now = standingReading(reading);
    return now.type === 'stands' ? [{ reading, values: now.values }] : [];
  });
}

/** What readings are held against: the revision that they were taken on, and the rig's own curve once it has one. */
export interface Against {
  readonly spec: RigSpec;
  readonly own: RigCalibration | null;
}

/** How this reading compares, with the self-breaks logged before it in mind. */
export function fitOf(
  against: Against,
  rows: readonly StandingRow[],
  id: string,
): Result<Plausibility> | null {
  const at = rows.findIndex((row) => row.reading.id === id);
  const row = rows[at];
  if (row === undefined) return null;
  const before: number[] = [];
  for (let i = at - 1; i >= 0 && before.length < 2; i -= 1) {
    const sigma = sigmaOf(against, rows[i]);
    if (sigma !== null) before.push(sigma);
  }
  return compared(against, row.values, before);
}

/** Deviations by reading id. */
export function sigmasOf(against: Against, rows: readonly StandingRow[]): ReadonlyMap<string, number> {
  const sigmas = new Map<string, number>();
  for (const { row, law } of lawsOf(against, rows))
    sigmas.set(row.reading.id, (row.values.voltage_kV - law.expected_kV) / law.sigma_kV);
  return sigmas;
}

/** What the law expects of each self-break at its own setting, kV, by reading id. */
export function expectedByLaw(spec: RigSpec, rows: readonly StandingRow[]): ReadonlyMap<string, number> {
  const laws = lawsOf({ spec, own: null }, rows);
  return new Map(laws.map(({ row, law }) => [row.reading.id, law.expected_kV]));
}

/** Readings at the same setting share one law, so a burst of them costs one evaluation. */
function lawsOf(against: Against, rows: readonly StandingRow[]) {
  const laws = new Map<string, Law | null>();
  const found: { readonly row: StandingRow; readonly law: Law }[] = [];
  for (const row of rows) {
    const { values } = row;
    if (!isSelfBreak(values)) continue;
    const { gas, pressure_bar_g, ambient_bar_abs, temperature_C } = values;
    const setting = [gas, pressure_bar_g, ambient_bar_abs, temperature_C].join();
    const known = laws.get(setting);
    const law = known === undefined ? lawOf(against, values) : known;
    laws.set(setting, law);
    if (law !== null) found.push({ row, law });
  }
  return found;
}

export function isSelfBreak(values: ReadingValues): boolean {
  return values.how === 'self-break' && values.looked !== 'gap-dark';
}

type Law = Pick<Plausibility, 'expected_kV' | 'sigma_kV'>;

function lawOf(against: Against, values: ReadingValues): Law | null {
  const fit = compared(against, values, []);
  return fit.ok ? fit.value : null;
}

function sigmaOf(against: Against, row: StandingRow | undefined): number | null {
  if (row === undefined || !isSelfBreak(row.values)) return null;
  const fit = compared(against, row.values, []);
  return fit.ok ? fit.value.sigma : null;
}

function compared(
  { spec, own }: Against,
  values: ReadingValues,
  before: readonly number[],
): Result<Plausibility> {
  return plausibilityAgainst(spec, values, { before, own: ownFor(own?.fit ?? null, spec, values) });
}
