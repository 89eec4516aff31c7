import { paths } from '../../config/paths';
import { WAITING_TYPES, type WaitingItem, type WaitingType } from '../../domain/report/desk-shapes';
import { kindWords } from '../../domain/report/entry-words';
import { ageWords } from '../../domain/report/time-words';

/** What stands on the two faces of a waiting pair, in its gap, and where it leads. */
export interface WaitingPair {
  readonly key: string;
  readonly title: string;
  readonly substance: string;
  readonly by: string;
  readonly age: string;
  readonly href: string;
}

const TITLES: Readonly<Record<WaitingType, string>> = {
  unready: 'Recorded as unready',
  irregular: 'Irregular readings',
  firing: 'Firing to review',
  'permit-asked': 'Permit asked',
  incident: 'Incident',
  parting: 'Parting',
  'held-back': 'Held back',
};

/** Longer words would push the faces apart; the opened thing shows them whole. */
const SUBSTANCE_LENGTH = 90;

export function waitingPair(
  item: WaitingItem,
  people: Readonly<Record<string, string>>,
  now_ms: number,
): WaitingPair {
  return {
    key: `${item.type}/${item.id}`,
    title: item.type === 'irregular' && item.kind !== null ? 'Irregular entry' : TITLES[item.type],
    substance: shorten(substance(item)),
    by: item.by === null ? 'author open' : (people[item.by] ?? 'somebody'),
    age: ageWords(Math.max(0, now_ms - item.received_ms)),
    href: hrefOf(item),
  };
}

/** Unready and irregular firings first, since somebody fired all the same; then by age, the oldest first. */
export function inOrder(waiting: readonly WaitingItem[]): readonly WaitingItem[] {
  return waiting.toSorted(
    (a, b) => WAITING_TYPES.indexOf(a.type) - WAITING_TYPES.indexOf(b.type) || a.received_ms - b.received_ms,
  );
}

function substance(item: WaitingItem): string {
  const rig = item.rig_name ?? 'A rig';
  const number = item.number === null ? '' : ` ${item.number}`;
  switch (item.type) {
    case 'unready':
      return `${rig}${number}: ${item.words}`;
    case 'irregular':
      if (item.kind !== null) return `${rig}, ${kindWords(item.kind)}: ${item.words}`;
      return `${rig}${number}, ${item.irregular} of ${counted(item.count, 'reading')}`;
    case 'firing':
      return `${rig}${number}, ${counted(item.count, 'reading')}`;
    case 'permit-asked':
      return `${rig}, revision${number}${item.words === '' ? '' : `: ${item.words}`}`;
    case 'incident':
      return `${rig}: ${item.words}`;
    case 'parting':
      return `${rig}, ${counted(item.count, 'revision')} stand, the stricter limits rule`;
    case 'held-back':
      return `${kindWords(item.kind ?? '')}: ${item.words}`;
  }
}

function hrefOf(item: WaitingItem): string {
  switch (item.type) {
    case 'irregular':
      // An irregular entry of no firing names its kind, and is read where its rig is.
      if (item.kind !== null) return item.rig === null ? paths.desk() : paths.deskRig(item.rig);
      return paths.deskFiring(item.id);
    case 'unready':
    case 'firing':
      return paths.deskFiring(item.id);
    case 'held-back':
      return paths.deskHeld();
    default:
      return item.rig === null ? paths.desk() : paths.deskRig(item.rig);
  }
}

function counted(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`;
}

function shorten(words: string): string {
  return words.length <= SUBSTANCE_LENGTH ? words : `${words.slice(0, SUBSTANCE_LENGTH - 1)}…`;
}
