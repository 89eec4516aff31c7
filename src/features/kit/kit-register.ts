import type { KitType } from '../../domain/book/bodies/kit-bodies';
import { kitNote, type KitDoc } from '../../domain/book/documents/kit';
import { dayWords } from '../../domain/report/time-words';
import { KIT_NOTICE_MS } from '../../domain/rules/due';
import { kitFault } from '../../domain/rules/kit-fitness';

const DAY_MS = 86_400_000;

/** How a piece of kit stands, so that it can be told by shape and by words. */
export type DueState = 'none' | 'fine' | 'soon' | 'overdue' | 'failed';

export interface Due {
  readonly state: DueState;
  readonly words: string;
  /** Part of the notice that is left, 0 to 1; the void between the two faces of the mark. */
  readonly left: number;
}

export function dueOf(kit: KitDoc, now_ms: number, zone: string): Due {
  if (kit.state === 'failed') return { state: 'failed', words: 'did not pass: not to be relied on', left: 0 };
  const { due_ms } = kit;
  if (due_ms === null) return { state: 'none', words: 'nothing due', left: 1 };
  const left_ms = due_ms - now_ms;
  const what = kit.item.type === 'meter' ? 'calibration' : 'inspection';
  if (left_ms < 0) {
    const days = Math.floor(-left_ms / DAY_MS);
    const since = days < 1 ? 'since today' : `${days}\u00a0d`;
    return { state: 'overdue', words: `${what} overdue, ${since}`, left: 0 };
  }
  if (left_ms <= KIT_NOTICE_MS) {
    const days = Math.floor(left_ms / DAY_MS);
    const words = days < 1 ? `${what} due today` : `${what} due in ${days}\u00a0d`;
    return { state: 'soon', words, left: left_ms / KIT_NOTICE_MS };
  }
  return { state: 'fine', words: `${what} due ${monthWords(due_ms, zone)}`, left: 1 };
}

/** Whether somebody may rely on it for a firing; the words of the mark say why not. */
export function isUnfit(kit: KitDoc, now_ms: number): boolean {
  return kitFault(kitNote(kit), now_ms) !== null;
}

const ORDER: readonly KitType[] = [
  'eyewear',
  'shorting-stick',
  'meter',
  'relief-valve',
  'regulator',
  'cylinder',
  'key',
  'spare',
];

export interface KitGroup {
  readonly type: KitType;
  readonly kit: readonly KitDoc[];
}

/** By kind; within a kind what is due soonest comes first, what failed before it, and what is never due last. */
export function kitGroups(kit: readonly KitDoc[]): readonly KitGroup[] {
  return ORDER.map((type) => ({
    type,
    kit: kit.filter((one) => one.item.type === type).sort((a, b) => dueRank(a) - dueRank(b)),
  })).filter((group) => group.kit.length > 0);
}

export interface Order {
  readonly kit: KitDoc;
  readonly count: number;
  readonly minimum: number;
  /** What brings it back to its minimum. */
  readonly missing: number;
}

/** Spares that have fallen below their minimum. */
export function ordersOf(kit: readonly KitDoc[]): readonly Order[] {
  return kit.flatMap((one) => {
    if (one.item.type !== 'spare' || one.item.count >= one.item.minimum) return [];
    const { count, minimum } = one.item;
    return [{ kit: one, count, minimum, missing: minimum - count }];
  });
}

/** The order as plain text, one line each, to be pasted into a letter. */
export function orderText(orders: readonly Order[]): string {
  return orders
    .map(({ kit, missing, count, minimum }) => {
      const row = kit.item.type === 'spare' ? kit.item.catalogue : null;
      const catalogue = row === null ? '' : `, ${row}`;
      return `${missing} x ${kit.name} (${kit.number}${catalogue}); ${count} there, at least ${minimum}`;
    })
    .join('\n');
}

/** What stands against the register as a whole, in one line; empty where nothing does. */
export function registerWords(kit: readonly KitDoc[], now_ms: number): string {
  const states = kit.map((one) => dueOf(one, now_ms, 'Etc/UTC').state);
  const count = (state: DueState): number => states.filter((one) => one === state).length;
  const parts = [
    [count('failed'), 'did not pass'],
    [count('overdue'), 'overdue'],
    [count('soon'), 'due within 30 d'],
    [ordersOf(kit).length, 'to order'],
  ] as const;
  return parts
    .filter(([number]) => number > 0)
    .map(([number, words]) => `${number} ${words}`)
    .join(', ');
}

function dueRank(kit: KitDoc): number {
  if (kit.state === 'failed') return -Infinity;
  return kit.due_ms ?? Infinity;
}

function monthWords(due_ms: number, zone: string): string {
  const year = new Intl.DateTimeFormat('en-GB', { year: 'numeric', timeZone: zone }).format(due_ms);
  return `${dayWords(due_ms, zone)} ${year}`;
}
