import { bytesToHex } from '@noble/hashes/utils.js';
import { bodyText, sealEntry, type Base, type SealedEntry } from '../../src/domain/book/entry';
import { versionOf, type BodyOf, type Kind } from '../../src/domain/book/kinds';
import type { DemoTablet } from '../lab';
import type { Dice } from './dice';
import { offsetMinutes } from './working-days';

/** What a person writes; the tablet adds the rest. */
export interface Writing<K extends Kind> {
  readonly author: string;
  /** Absent: the entry is its own subject. */
  readonly subject?: string;
  readonly witness?: string;
  /** Absent: the dice make one. */
  readonly id?: string;
  readonly body: BodyOf<K>;
}

/** A tablet as it was used on one day: numbers its entries without a gap and remembers what its screen stood on. */
export interface WritingTablet {
  readonly facts: DemoTablet;
  /** The app was opened: a new page life begins. */
  readonly open: (at_ms: number) => void;
  /** The mirror was filled up to here. */
  readonly pull: (base: Base) => void;
  readonly base: () => Base;
  readonly pageLife: () => string;
  readonly write: <K extends Kind>(kind: K, at_ms: number, writing: Writing<K>) => SealedEntry;
  /** Hands over what waits, in order. */
  readonly takePending: () => readonly SealedEntry[];
  readonly nextFiringNumber: () => number;
}

interface Setting {
  readonly lab: string;
  readonly zone: string;
  readonly dice: Dice;
  readonly base: Base;
}

export function createTablet(facts: DemoTablet, setting: Setting): WritingTablet {
  const { lab, zone, dice } = setting;
  let base = setting.base;
  let pageLife = { id: dice.uuid(), since_ms: 0, last_ms: 0, offset_min: 0 };
  let seq = 0;
  let firings = 0;
  let pending: SealedEntry[] = [];
  return {
    facts,
    open: (at_ms) => {
      // No page life of the month spans the hour in which clocks change.
      pageLife = { id: dice.uuid(), since_ms: at_ms, last_ms: at_ms, offset_min: offsetMinutes(zone, at_ms) };
    },
    pull: (to) => {
      base = to;
    },
    base: () => base,
    pageLife: () => pageLife.id,
    write: (kind, at_ms, { author, subject, witness, id = dice.uuid(), body }) => {
      if (at_ms < pageLife.last_ms)
        throw new Error(`tablet ${facts.letter} would write ${kind} into the past`);
      pageLife = { ...pageLife, last_ms: at_ms };
      seq += 1;
      const entry = sealEntry(
        {
          lab,
          id,
          device: facts.id,
          seq,
          kind,
          version: versionOf(kind),
          subject: subject ?? id,
          author,
          witness: witness ?? null,
          base,
          stamp: {
            wall_ms: at_ms,
            offset_min: pageLife.offset_min,
            zone,
            page_life: pageLife.id,
            monotonic_ms: at_ms - pageLife.since_ms,
            time_uncertain: false,
          },
        },
        bodyText(body, bytesToHex(dice.bytes(16))),
      );
      pending.push(entry);
      return entry;
    },
    takePending: () => {
      const taken = pending;
      pending = [];
      return taken;
    },
    nextFiringNumber: () => {
      firings += 1;
      return firings;
    },
  };
}
