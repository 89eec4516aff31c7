import type { FiringDoc } from '../../src/domain/book/documents/firing';
import type { HeldDoc } from '../../src/domain/book/documents/held';
import type { IncidentDoc } from '../../src/domain/book/documents/incident';
import {
  headRevisions,
  latestRevision,
  revisionById,
  type RigDoc,
} from '../../src/domain/book/documents/rig';
import type { JudgedEntry } from '../../src/domain/book/entry';
import type { WaitingItem } from '../../src/domain/report/desk-shapes';
import type { StubFact } from './desk-store';

/** An item whose rig is not named yet, and whose arrival has still to be looked up by its revision. */
export type WaitingDraft = Omit<WaitingItem, 'rig_name' | 'received_ms'>;

const nothing = { number: null, words: '', count: 0, irregular: 0, kind: null } as const;

/** A firing waits once: as unready, else as irregular, else, once closed, to be reviewed. */
export function waitingFiring(firing: FiringDoc, revision: number): WaitingDraft | null {
  const type = waitingType(firing);
  if (type === null) return null;
  return {
    ...nothing,
    type,
    id: firing.id,
    rig: firing.parent,
    number: firing.number,
    words: firing.unready?.why ?? '',
    count: firing.readings,
    irregular: firing.irregular_readings,
    by: firing.opened.by,
    revision,
  };
}

function waitingType(firing: FiringDoc): 'unready' | 'irregular' | 'firing' | null {
  if (firing.unready !== null) return 'unready';
  if (firing.irregular_readings > 0 || firing.opened_irregular !== null) return 'irregular';
  return firing.closed === null ? null : 'firing';
}

export function waitingIncident(incident: IncidentDoc, revision: number): WaitingDraft {
  const { id, parent, what, reported } = incident;
  return { ...nothing, type: 'incident', id, rig: parent, words: what, by: reported.by, revision };
}

/** Permits asked for a revision that still stands, and the parting if there is one. */
export function waitingOfRig(rig: RigDoc, revision: number): WaitingDraft[] {
  const asked = rig.permits_asked.filter((one) => !one.answered && rig.heads.includes(one.rig_revision));
  const permits = asked.map((one): WaitingDraft => ({
    ...nothing,
    type: 'permit-asked',
    id: one.entry,
    rig: rig.id,
    number: revisionById(rig, one.rig_revision)?.number ?? null,
    words: one.words,
    by: one.by,
    revision: one.at ?? revision,
  }));
  if (rig.heads.length < 2) return permits;
  const latest = latestRevision(rig);
  const parting: WaitingDraft = {
    ...nothing,
    type: 'parting',
    id: rig.id,
    rig: rig.id,
    number: latest.number,
    words: latest.why,
    count: headRevisions(rig).length,
    by: latest.by,
    revision: latest.at ?? revision,
  };
  return [...permits, parting];
}

/** `rig` is the rig that the held entry is about, where that can be told. */
export function waitingHeld(held: HeldDoc, rig: string | null, revision: number): WaitingDraft {
  const { id, entry, reason } = held;
  const { kind, author } = entry;
  return { ...nothing, type: 'held-back', id, rig, words: reason.words, kind, by: author, revision };
}

export function waitingStub({ id, revision, why }: StubFact): WaitingDraft {
  return { ...nothing, type: 'held-back', id, rig: null, words: why, by: null, revision };
}

/** An irregular entry that belongs to no firing, so that no review of a firing would ever show it. */
export function waitingIrregular(entry: JudgedEntry, rig: string | null): WaitingDraft {
  const { id, reason, kind, author, revision } = entry;
  return {
    ...nothing,
    type: 'irregular',
    id,
    rig,
    words: reason?.words ?? '',
    kind,
    by: author,
    revision,
    irregular: 1,
  };
}
