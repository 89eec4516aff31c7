import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import { standingReading, type ReadingDoc } from '../../domain/book/documents/reading';
import type { RigSpec } from '../../domain/book/rig-spec';
import type { Plausibility } from '../../domain/calibration/plausibility';
import { readingPlausibility } from '../../domain/rules/reading-plausibility';
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

/** How this reading compares, with the self-breaks logged before it in mind. */
export function fitOf(spec: RigSpec, rows: readonly StandingRow[], id: string): Result<Plausibility> | null {
  const at = rows.findIndex((row) => row.reading.id === id);
  const row = rows[at];
  if (row === undefined) return null;
  const before: number[] = [];
  for (let i = at - 1; i >= 0 && before.length < 2; i -= 1) {
    const sigma = sigmaOf(spec, rows[i]);
    if (sigma !== null) before.push(sigma);
  }
  return readingPlausibility(spec, row.values, before);
}

/** Deviations by reading id. Readings at the same setting share one law, so a burst of them costs one evaluation. */
export function sigmasOf(spec: RigSpec, rows: readonly StandingRow[]): ReadonlyMap<string, number> {
  const laws = new Map<string, Law | null>();
  const sigmas = new Map<string, number>();
  for (const { reading, values } of rows) {
    if (!isSelfBreak(values)) continue;
    const { gas, pressure_bar_g, ambient_bar_abs, temperature_C } = values;
    const setting = [gas, pressure_bar_g, ambient_bar_abs, temperature_C].join();
    const known = laws.get(setting);
    const law = known === undefined ? lawOf(spec, values) : known;
    laws.set(setting, law);
    if (law !== null) sigmas.set(reading.id, (values.voltage_kV - law.expected_kV) / law.sigma_kV);
  }
  return sigmas;
}

export function isSelfBreak(values: ReadingValues): boolean {
  return values.how === 'self-break' && values.looked !== 'gap-dark';
}

type Law = Pick<Plausibility, 'expected_kV' | 'sigma_kV'>;

function lawOf(spec: RigSpec, values: ReadingValues): Law | null {
  const fit = readingPlausibility(spec, values, []);
  return fit.ok ? fit.value : null;
}

function sigmaOf(spec: RigSpec, row: StandingRow | undefined): number | null {
  if (row === undefined || !isSelfBreak(row.values)) return null;
  const fit = readingPlausibility(spec, row.values, []);
  return fit.ok ? fit.value.sigma : null;
}
