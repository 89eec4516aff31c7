import type { SealedEntry } from '../book/entry';
import { isKind, type Kind } from '../book/kinds';
import { readEntry, type ReadableEntry } from '../book/read-body';
import { formatQuantity } from '../units/format-quantity';
import { envelopeWords } from './permit-words';
import { dayWords } from './time-words';
import { alignmentWords, kitWords, partWords } from './kit-words';
import { LOOK_WORDS, ROLE_WORDS } from './words';

/** What each kind of entry is called where entries stand in a list. */
export const KIND_WORDS: Readonly<Record<Kind, string>> = {
  'rig.created': 'Rig created',
  'rig.revised': 'Rig revised',
  'rig.declared': 'State declared',
  'rig.stood-down': 'Rig stood down',
  'rig.stand-down-retracted': 'Stand-down taken back',
  'rig.returned': 'Rig returned',
  'hands.in': 'Hands in',
  'hands.out': 'Hands out',
  'gas.changed': 'Gas changed',
  'guest.in': 'Guest in',
  'guest.out': 'Guest out',
  'part.fitted': 'Part fitted',
  'part.retired': 'Part retired',
  'alignment.measured': 'Gaps measured',
  'alignment.adjusted': 'Screws turned',
  'alignment.arc-seen': 'Arcs seen',
  'kit.added': 'Kit added',
  'kit.inspected': 'Kit inspected',
  'kit.issued': 'Kit issued',
  'kit.returned': 'Kit returned',
  'note.written': 'Note written',
  'note.amended': 'Note amended',
  'photo.attached': 'Photo attached',
  'trace.attached': 'Trace attached',
  'permit.asked': 'Permit asked',
  'permit.granted': 'Permit granted',
  'permit.withdrawn': 'Permit withdrawn',
  'parting.settled': 'Parting settled',
  'sheet.published': 'Check sheet published',
  'sheet.retired': 'Check sheet retired',
  'check.opened': 'Check opened',
  'check.step-done': 'Step done',
  'check.step-waived': 'Step waived',
  'check.closed': 'Check closed',
  'check.abandoned': 'Check abandoned',
  'firing.opened': 'Firing opened',
  'firing.reading': 'Reading',
  'firing.shots-counted': 'Shots counted',
  'firing.closed': 'Firing closed',
  'firing.reviewed': 'Firing reviewed',
  'firing.sent-back': 'Firing sent back',
  'incident.reported': 'Incident reported',
  'incident.answered': 'Incident answered',
  'incident.closed': 'Incident closed',
  'lab.set': 'Lab settings',
  'person.joined': 'Person joined',
  'person.role-set': 'Role set',
  'person.removed': 'Person removed',
  'person.authorised': 'Person authorised',
  'person.authorisation-ended': 'Authorisation ended',
  'entry.corrected': 'Correction',
  'entry.struck': 'Entry struck',
  'entry.adopted': 'Held-back entry adopted',
  'entry.claimed': 'Entry claimed',
  'lookup.kept': 'Lookup kept',
  'noise.counted': 'Touches ignored',
};

/** The name of a kind; one of a newer app keeps its own. */
export function kindWords(kind: string): string {
  return isKind(kind) ? KIND_WORDS[kind] : kind;
}

/**
 * The substance of an entry in one line: its figures, or the words that were written. Empty where the kind says all;
 * of a text that this app cannot read it says so, and the text itself stays in the Book.
 */
export function entrySubstance(entry: SealedEntry, zone: string): string {
  const outcome = readEntry(entry);
  return outcome.type === 'readable' ? substance(outcome.entry, zone) : outcome.words;
}

/** The fields of a body as they were written, for whoever has to read a held-back entry in full. */
export function entryFields(
  entry: SealedEntry,
): readonly { readonly field: string; readonly value: string }[] {
  let raw: unknown;
  try {
    raw = JSON.parse(entry.body);
  } catch {
    return [{ field: 'text', value: entry.body }];
  }
  return fieldsOf('', raw).filter(({ field }) => field !== 'salt');
}

function substance(entry: ReadableEntry, zone: string): string {
  switch (entry.kind) {
    case 'firing.reading': {
      const { voltage_kV, pressure_bar_g, shots, looked } = entry.body;
      return [
        plain(voltage_kV, 'kV'),
        plain(pressure_bar_g, 'bar(g)'),
        `${plain(shots, '')} ${shots === 1 ? 'shot' : 'shots'}`,
        LOOK_WORDS[looked],
      ].join(', ');
    }
    case 'firing.opened':
      return entry.body.unready === null ? entry.body.number : `${entry.body.number}, recorded as unready`;
    case 'firing.shots-counted':
      return `${plain(entry.body.shots, '')} shots`;
    case 'permit.granted':
      return `${envelopeWords(entry.body.envelope)}, to ${dayWords(entry.body.until_ms, zone)}`;
    case 'rig.declared':
      return entry.body.state === 'shorted' ? 'shorted' : 'short off';
    case 'rig.created':
      return `${entry.body.name}, revision ${entry.body.number}`;
    case 'rig.revised':
      return `revision ${entry.body.number}: ${entry.body.why}`;
    case 'incident.reported':
      return entry.body.what;
    case 'check.step-done':
      return entry.body.step.replaceAll('-', ' ');
    case 'check.step-waived':
      return `${entry.body.step.replaceAll('-', ' ')}: ${entry.body.why}`;
    case 'person.joined':
      return `${entry.body.name}, ${ROLE_WORDS[entry.body.role]}`;
    case 'person.role-set':
      return ROLE_WORDS[entry.body.role];
    case 'part.fitted':
      return partWords(entry.body);
    case 'kit.added':
    case 'kit.inspected':
    case 'kit.issued':
    case 'kit.returned':
      return kitWords(entry, zone);
    case 'alignment.measured':
    case 'alignment.adjusted':
    case 'alignment.arc-seen':
      return alignmentWords(entry);
    case 'guest.in':
      return entry.body.name;
    case 'hands.in':
      return entry.body.where;
    case 'hands.out':
      return entry.body.words ?? '';
    case 'photo.attached':
      return entry.body.caption === '' ? entry.body.name : entry.body.caption;
    case 'trace.attached':
      return entry.body.name;
    case 'noise.counted':
      return `${plain(entry.body.touches_ignored, '')} touches`;
    default:
      return wordsOf(entry.body);
  }
}

function wordsOf(body: ReadableEntry['body']): string {
  if ('words' in body && body.words !== undefined && body.words !== '') return body.words;
  if ('why' in body) return body.why;
  return '';
}

function plain(value: number, unit: string): string {
  const decimals = Math.min(6, `${value}`.split('.')[1]?.length ?? 0);
  return formatQuantity(value, unit, { digits: { decimals }, rounding: 'nearest' });
}

function fieldsOf(prefix: string, value: unknown): { field: string; value: string }[] {
  if (value === null || typeof value !== 'object') {
    return [
      {
        field: prefix,
        value: value === null ? 'none' : typeof value === 'string' ? value : JSON.stringify(value),
      },
    ];
  }
  return Object.entries(value).flatMap(([key, inner]: [string, unknown]) =>
    fieldsOf(prefix === '' ? key : `${prefix}.${key}`, inner),
  );
}
