import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import type { FiringDoc } from '../../domain/book/documents/firing';
import type { FiringAnswer, FiringEntry } from '../../domain/report/desk-shapes';
import type { FiringRow } from '../../domain/report/firing-rows';
import { HOW_WORDS, LOOK_WORDS } from '../../domain/report/words';
import { clockWords, dayWords } from '../../domain/report/time-words';
import { formatFigure } from '../../domain/units/format-quantity';
import { revisionById } from '../../domain/book/documents/rig';

/** "14:42 to 15:20", with the day where it ends on another. */
export function spanWords(firing: FiringDoc, zone: string): string {
  const from = firing.opened.stamp.wall_ms;
  const opened = clockWords(from, zone);
  if (firing.closed === null) return `${opened}, still open`;
  const to = firing.closed.stamp.wall_ms;
  const sameDay = dayWords(from, zone) === dayWords(to, zone);
  return `${opened} to ${sameDay ? '' : `${dayWords(to, zone)} `}${clockWords(to, zone)}`;
}

/** Whether check and permit were in order when the firing was opened, or what was missing. */
export function standingWords({ firing, rig, check }: FiringAnswer): string {
  if (firing.unready !== null) {
    const missing = firing.unready.missing.map((one) => one.words).join(' ');
    return `recorded as unready: ${firing.unready.why} Missing: ${missing}`;
  }
  if (firing.opened_irregular !== null) return 'opened against the rules';
  const permit = rig.permits.find((one) => one.entry === firing.permit);
  const checked = check?.ended?.how === 'closed' && check.ended.irregular === null;
  if (checked && permit !== undefined)
    return permit.withdrawn === null ? 'check and permit in order' : 'check in order, permit withdrawn since';
  return checked ? 'check in order, permit not found' : 'check not found, or not closed in order';
}

export function revisionWords({ firing, rig }: FiringAnswer): string {
  return `revision ${revisionById(rig, firing.rig_revision)?.number ?? 'not known'}`;
}

/** Verdict and reason of each entry, by its id. */
export function entriesById(entries: readonly FiringEntry[]): ReadonlyMap<string, FiringEntry> {
  return new Map(entries.map((entry) => [entry.id, entry]));
}

/** What a corrected reading said before, field by field: "kV 17.6, bar(g) 1.00". Empty where nothing differs. */
export function originalWords({ reading, values }: FiringRow): string {
  const { original } = reading;
  return SHOWN.flatMap(([key, name]) => {
    const was = shown(original, key);
    return was === shown(values, key) ? [] : [`${name} ${was}`];
  }).join(', ');
}

const SHOWN = [
  ['voltage_kV', 'kV'],
  ['how', 'how'],
  ['pressure_bar_g', 'bar(g)'],
  ['gas', 'gas'],
  ['flow_L_min', 'L/min'],
  ['rate_Hz', 'Hz'],
  ['shots', 'shots'],
  ['output_uJ', 'µJ'],
  ['looked', 'looked'],
  ['ambient_bar_abs', 'bar(abs)'],
  ['temperature_C', '°C'],
  ['humidity_pct', '%'],
  ['note', 'note'],
] as const;

function shown(values: ReadingValues, key: (typeof SHOWN)[number][0]): string {
  if (key === 'how') return HOW_WORDS[values.how];
  if (key === 'looked') return LOOK_WORDS[values.looked];
  const value = values[key];
  if (value === null || value === '') return 'none';
  return typeof value === 'number' ? asEntered(value) : value;
}

/** A figure as it was entered, with true minus and comma. */
export function asEntered(value: number | null, least = 0): string {
  if (value === null) return '\u2013';
  const decimals = Math.min(6, Math.max(least, String(value).split('.')[1]?.length ?? 0));
  return formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
}

/** "+0.3" or a true minus; a dash where there is no deviation to give. */
export function sigmaWords(sigma: number | null): string {
  if (sigma === null) return '\u2013';
  const text = formatFigure(sigma, { digits: { decimals: 1 }, rounding: 'nearest' });
  return sigma > 0 ? `+${text}` : text;
}
