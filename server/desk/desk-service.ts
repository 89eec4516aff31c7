import type { FiringDoc } from '../../src/domain/book/documents/firing';
import type { ReadingDoc } from '../../src/domain/book/documents/reading';
import type { JudgedEntry } from '../../src/domain/book/entry';
import type {
  FiringAnswer,
  FiringList,
  RigReportAnswer,
  WaitingAnswer,
  WaitingItem,
} from '../../src/domain/report/desk-shapes';
import { rigReport } from '../../src/domain/report/rig-report';
import { NotThere } from '../http/problems';
import type { DeskStore } from './desk-store';
import {
  waitingFiring,
  waitingHeld,
  waitingIncident,
  waitingIrregular,
  waitingOfRig,
  waitingStub,
  type WaitingDraft,
} from './waiting';

/** An inbox that is longer than this is no inbox any more; the newest of each sort stand in it. */
const mostOfASort = 200;
const mostReadings = 5000;
/** Irregular entries outside a firing have nothing that settles them: they leave the inbox by age. */
const irregularForMs = 30 * 24 * 3_600_000;

export interface FiringQuery {
  readonly rig?: string | undefined;
  readonly state?: string | undefined;
  readonly before?: number | undefined;
  readonly limit: number;
}

export type DeskService = ReturnType<typeof createDeskService>;

/** What the Desk reads. It changes nothing: reviewing is done by entries, like everything else. */
export function createDeskService(store: DeskStore, now: () => number) {
  const people = async (lab: string, ids: readonly (string | null)[]): Promise<Record<string, string>> =>
    Object.fromEntries(
      await store.namesOf(
        lab,
        'person',
        ids.filter((id) => id !== null),
      ),
    );

  async function drafts(lab: string): Promise<WaitingDraft[]> {
    const most = { lab, limit: mostOfASort };
    const [firings, incidents, rigs, held, stubs, irregular] = await Promise.all([
      store.listDocuments({ ...most, kind: 'firing', states: ['open', 'closed'] }),
      store.listDocuments({ ...most, kind: 'incident', states: ['open'] }),
      store.listDocuments({ ...most, kind: 'rig', states: ['waiting'] }),
      store.listDocuments({ ...most, kind: 'held', states: ['standing'] }),
      store.listStubs(lab, mostOfASort),
      store.listEntries({ lab, since: 0, limit: mostOfASort, verdict: 'irregular' }),
    ]);
    const loose = irregular.filter((one) => !isOfFiring(one) && one.received_ms > now() - irregularForMs);
    const rigOf = await rigsBehind(lab, [
      ...held.map(({ doc }) => doc.parent),
      ...loose.map((one) => one.subject),
    ]);
    return [
      ...firings.flatMap(({ doc, revision }) => waitingFiring(doc, revision) ?? []),
      ...incidents.map(({ doc, made }) => waitingIncident(doc, made)),
      ...rigs.flatMap(({ doc, revision }) => waitingOfRig(doc, revision)),
      ...held.map(({ doc, made }) => waitingHeld(doc, rigOf.get(doc.parent) ?? null, made)),
      ...stubs.map(waitingStub),
      ...loose.map((one) => waitingIrregular(one, rigOf.get(one.subject) ?? null)),
    ];
  }

  /** The rig behind each subject: the rig itself, or the one of a firing, check or incident. */
  async function rigsBehind(lab: string, subjects: readonly string[]): Promise<Map<string, string>> {
    const found = await store.parentsOf(lab, [...new Set(subjects)]);
    return new Map(found.map(({ id, kind, parent }) => [id, kind === 'rig' ? id : (parent ?? id)]));
  }

  return {
    async waiting(lab: string): Promise<WaitingAnswer> {
      const found = await drafts(lab);
      const rigNames = await store.namesOf(
        lab,
        'rig',
        found.flatMap((one) => one.rig ?? []),
      );
      const points = await store.pointsAt(
        lab,
        found.map((one) => one.revision),
      );
      const waiting = found.map((one): WaitingItem => ({
        ...one,
        rig_name: one.rig === null ? null : (rigNames.get(one.rig) ?? null),
        received_ms: points.get(one.revision)?.received_ms ?? 0,
      }));
      return {
        waiting: waiting.toSorted((one, other) => other.revision - one.revision),
        people: await people(
          lab,
          found.map((one) => one.by),
        ),
      };
    },

    async firings(lab: string, { rig, state, before, limit }: FiringQuery): Promise<FiringList> {
      const found = await store.listDocuments({
        lab,
        kind: 'firing',
        limit,
        ...(rig === undefined ? {} : { parent: rig }),
        ...(state === undefined ? {} : { states: [state] }),
        ...(before === undefined ? {} : { before }),
      });
      const points = await store.pointsAt(
        lab,
        found.map((one) => one.revision),
      );
      const rigNames = await store.namesOf(
        lab,
        'rig',
        found.map(({ doc }) => doc.parent),
      );
      return {
        firings: found.map(({ doc, revision }) => ({
          firing: doc,
          rig_name: rigNames.get(doc.parent) ?? '',
          revision,
          chain_hash: hashAt(points, revision),
        })),
        people: await people(
          lab,
          found.flatMap(({ doc }) => peopleOfFiring(doc)),
        ),
      };
    },

    async firing(lab: string, id: string): Promise<FiringAnswer> {
      const firing = (await store.findDocument(lab, 'firing', id))?.doc;
      const rig =
        firing === undefined ? undefined : (await store.findDocument(lab, 'rig', firing.parent))?.doc;
      const book = await store.bookPoint(lab);
      if (firing === undefined || rig === undefined || book === undefined)
        throw new NotThere('There is no such firing in this lab.');
      const check =
        firing.check === null ? undefined : (await store.findDocument(lab, 'check', firing.check))?.doc;
      const sheet =
        check === undefined ? undefined : (await store.findDocument(lab, 'sheet', check.sheet))?.doc;
      const found = await store.listDocuments({ lab, kind: 'reading', parent: id, limit: mostReadings });
      const readings = found.map((one) => one.doc).toSorted((one, other) => one.no - other.no);
      const mentioned = [
        ...peopleOfFiring(firing),
        ...readings.flatMap(peopleOfReading),
        ...Object.values(check?.steps ?? {}).flatMap((step) => [step.by, step.witness]),
        ...rig.revisions.map((one) => one.by),
        ...rig.permits.map((one) => one.by),
        ...rig.stand_downs.map((one) => one.by),
      ];
      return {
        firing,
        rig,
        check: check ?? null,
        sheet: sheet ?? null,
        readings,
        entries: await store.firingEntries(lab, id),
        book,
        people: await people(lab, mentioned),
      };
    },

    async rigReport(lab: string, id: string): Promise<RigReportAnswer> {
      const rig = (await store.findDocument(lab, 'rig', id))?.doc;
      const settings = (await store.findDocument(lab, 'lab', lab))?.doc.settings;
      const book = await store.bookPoint(lab);
      if (rig === undefined || settings === undefined || book === undefined)
        throw new NotThere('There is no such rig in this lab.');
      const report = rigReport(rig, settings);
      return { ...report, rows: report.rows.map((row) => ({ ...row, warnings: [...row.warnings] })), book };
    },

    async entries(lab: string, query: { readonly since: number; readonly limit: number }) {
      const entries = await store.listEntries({ lab, ...query });
      return {
        entries,
        people: await people(
          lab,
          entries.flatMap((one) => [one.author, one.witness]),
        ),
      };
    },

    async entry(lab: string, id: string): Promise<JudgedEntry> {
      const entry = await store.findEntry(lab, id);
      if (entry === undefined) throw new NotThere('There is no such entry in this lab.');
      return entry;
    },

    async heldBack(lab: string) {
      const found = await store.listDocuments({
        lab,
        kind: 'held',
        states: ['standing'],
        limit: mostOfASort,
      });
      const held = found.map((one) => one.doc);
      return {
        held,
        people: await people(
          lab,
          held.flatMap(({ entry }) => [entry.author, entry.witness]),
        ),
      };
    },
  };
}

function isOfFiring({ kind }: JudgedEntry): boolean {
  return kind.startsWith('firing.');
}

function hashAt(points: ReadonlyMap<number, { readonly chain_hash: string }>, revision: number): string {
  const point = points.get(revision);
  if (point === undefined) throw new Error(`revision ${revision} is missing`);
  return point.chain_hash;
}

function peopleOfFiring(firing: FiringDoc): (string | null)[] {
  return [firing.opened.by, firing.closed?.by ?? null, ...firing.reviews.map((one) => one.by)];
}

function peopleOfReading(reading: ReadingDoc): (string | null)[] {
  return [reading.logged.by, reading.struck?.by ?? null, ...reading.corrections.map((one) => one.by)];
}
