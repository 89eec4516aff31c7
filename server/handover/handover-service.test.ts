import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { bodyText, sealEntry, type SealedEntry } from '../../src/domain/book/entry';
import { GENESIS_HASH } from '../../src/domain/book/ids';
import { testSettings } from '../../tests/support/test-lab';
import { BrokenEntry, NotYours, Reset, Revoked } from '../http/problems';
import { createFounding } from './founding';
import { createHandoverService } from './handover-service';
import { createHeadWatcher } from './head-watcher';
import { holdoffDomain, type Domain } from './judge-batch';
import { createMemoryBookStore } from './memory-book-store';

const lead = randomUUID();
const noon_ms = Date.UTC(2026, 2, 2, 12);

async function open(domain: Domain = holdoffDomain) {
  const store = createMemoryBookStore();
  const { id: lab, epoch } = await createFounding({ store, now: () => noon_ms })({
    settings: testSettings,
    lead: { id: lead, name: 'Inge' },
  });
  const device = randomUUID();
  store.addTablet({ lab, device }, [lead]);
  const watcher = createHeadWatcher({
    readHead: async (id) => (await store.labState(id))?.revision ?? 0,
    pollEveryMs: 5,
    onPollFailed: () => undefined,
  });
  const faults: string[] = [];
  const onFault = (id: string) => void faults.push(id);
  const service = createHandoverService({ store, watcher, domain, now: () => noon_ms, onFault });
  let seq = 0;
  const seal = (kind = 'noise.counted', body: object = { touches_ignored: 1, over_s: 1 }): SealedEntry => {
    seq += 1;
    const id = randomUUID();
    const stamp = {
      wall_ms: noon_ms,
      offset_min: 0,
      zone: 'Etc/UTC',
      page_life: device,
      monotonic_ms: 1,
      time_uncertain: false,
    };
    const base = { epoch, revision: 0, hash: GENESIS_HASH };
    return sealEntry(
      { lab, id, device, seq, kind, version: 1, subject: id, author: lead, witness: null, base, stamp },
      bodyText({ ...body }, 'ab'.repeat(16)),
    );
  };
  const push = (entries: readonly SealedEntry[]) => service.push({ lab, device, session: lead, entries });
  return { store, service, watcher, lab, device, seal, push, faults };
}

describe('founding a lab', () => {
  it('begins the Book with the lead’s joining and the lab’s settings, in the lead’s name', async () => {
    const { store, lab } = await open();
    const [first, second] = await store.entriesAfter(lab, 0, 10);
    expect(first).toMatchObject({
      revision: 1,
      verdict: 'applied',
      entry: { kind: 'person.joined', subject: lead, author: lead },
    });
    expect(second).toMatchObject({
      revision: 2,
      verdict: 'applied',
      entry: { kind: 'lab.set', subject: lab },
    });
  });

  it('does nothing to a lab that is there', async () => {
    const { store, lab } = await open();
    const again = createFounding({ store, now: () => noon_ms })({
      id: lab,
      settings: testSettings,
      lead: { id: randomUUID(), name: 'Eve' },
    });
    await expect(again).rejects.toThrow();
    expect(await store.labState(lab)).toMatchObject({ revision: 2 });
  });

  it('founds nothing where the rules object to what follows the first entry', async () => {
    const store = createMemoryBookStore();
    const settings = { ...testSettings, ambient_bar_abs: 9 };
    const id = randomUUID();
    const founding = createFounding({ store, now: () => noon_ms })({
      id,
      settings,
      lead: { id: lead, name: 'Inge' },
    });
    await expect(founding).rejects.toThrow(/did not apply/);
    expect(await store.labState(id)).toBeUndefined();
  });
});

describe('a rule or fold that throws', () => {
  const wrong = 'rig.stood-down';
  const throwing: Domain['judge'] = function* (entry, context) {
    if (entry.kind === wrong) throw new Error('a bug in a rule');
    return yield* holdoffDomain.judge(entry, context);
  };
  const throwingFold: Domain['fold'] = function* (entry, judgement) {
    if (entry.kind === wrong && judgement.verdict !== 'held-back') {
      yield {
        op: 'put',
        doc: {
          kind: 'claim',
          id: entry.id,
          parent: entry.id,
          claimed: { entry: entry.id, by: null, device: entry.device, stamp: entry.stamp, at: 1 },
        },
      };
      throw new Error('a bug in a fold');
    }
    return yield* holdoffDomain.fold(entry, judgement);
  };

  it.each([
    ['rule', { ...holdoffDomain, judge: throwing }],
    ['fold', { ...holdoffDomain, fold: throwingFold }],
  ])('holds that one entry back with "fault" and delays no other: %s', async (_which, domain) => {
    const { store, lab, seal, push, faults } = await open(domain);
    const before = seal();
    const bad = seal(wrong, { why: 'Ozone' });
    const answer = await push([before, bad, seal()]);
    expect(answer.results.map((one) => [one.outcome, one.reason?.cause ?? null])).toEqual([
      ['applied', null],
      ['held-back', 'fault'],
      ['applied', null],
    ]);
    expect(faults).toEqual([bad.id]);
    const documents: { kind: string; id: string }[] = [];
    await store.snapshot(lab, async ({ pages }) => {
      for await (const page of pages)
        documents.push(...page.map((text) => JSON.parse(text) as { kind: string; id: string }));
    });
    // Of a fold that threw nothing stays, and the entry is kept with its text.
    expect(documents.filter((doc) => doc.id === bad.id).map((doc) => doc.kind)).toEqual(['held']);
  });
});

describe('a store that fails in the middle', () => {
  const elsewhere = randomUUID();
  const asking: Domain['judge'] = function* (entry, context) {
    yield { op: 'get', kind: 'rig', id: elsewhere };
    return yield* holdoffDomain.judge(entry, context);
  };

  it.each([
    ['fetching ahead', lead],
    ['while a rule asks', elsewhere],
  ])('fails the whole batch, and blames no entry: %s', async (_when, failsAt) => {
    const { store, service, lab, device, seal, faults } = await open();
    const failing = createHandoverService({
      store: {
        ...store,
        write: (whose, work) =>
          store.write(whose, (writer) =>
            work({
              ...writer,
              documentsByIds: (ids) =>
                ids.includes(failsAt)
                  ? Promise.reject(new Error('connection lost'))
                  : writer.documentsByIds(ids),
            }),
          ),
      },
      watcher: createHeadWatcher({
        readHead: () => Promise.resolve(0),
        pollEveryMs: 5,
        onPollFailed: () => undefined,
      }),
      domain: { ...holdoffDomain, judge: asking },
      now: () => noon_ms,
      onFault: (id) => void faults.push(id),
    });
    const entry = seal();
    await expect(failing.push({ lab, device, session: lead, entries: [entry] })).rejects.toThrow(
      'connection lost',
    );
    expect(faults).toEqual([]);
    expect(await store.labState(lab)).toMatchObject({ revision: 2 });
    const retried = await service.push({ lab, device, session: lead, entries: [entry] });
    expect(retried.results).toMatchObject([{ outcome: 'applied', revision: 3 }]);
  });
});

describe('pushing and pulling', () => {
  it('takes the same entry twice in one batch once', async () => {
    const { seal, push } = await open();
    const entry = seal();
    const answer = await push([entry, entry]);
    expect(answer.results.map((one) => one.revision)).toEqual([3, 3]);
    expect(answer.head).toBe(3);
  });

  it('refuses what is foreign or broken before it touches the Book', async () => {
    const { push, seal, store, lab } = await open();
    const entry = seal();
    await expect(push([{ ...entry, device: randomUUID() }])).rejects.toBeInstanceOf(NotYours);
    await expect(push([{ ...entry, seq: 9 }])).rejects.toBeInstanceOf(BrokenEntry);
    expect(await store.labState(lab)).toMatchObject({ revision: 2 });
  });

  it('waits for the next entry, and gives up in time', async () => {
    const { service, lab, device, seal, push } = await open();
    const { head, entries } = await service.pull(pullOf(lab, device, 0, GENESIS_HASH));
    const hash = entries.at(-1)?.chain_hash ?? '';
    const none = await service.pull({ ...pullOf(lab, device, head, hash), wait_ms: 10 });
    expect(none).toMatchObject({ to: head, more: false, entries: [] });
    const waiting = service.pull({ ...pullOf(lab, device, head, hash), wait_ms: 10_000 });
    const entry = seal();
    await push([entry]);
    expect((await waiting).entries.map((one) => one.entry)).toEqual([entry]);
    await expect(service.pull(pullOf(lab, device, head, 'f'.repeat(64)))).rejects.toBeInstanceOf(Reset);
  });

  it('gives a tablet that is gone after the wait nothing', async () => {
    const { service, watcher, lab } = await open();
    const { head, entries } = await service.pull(pullOf(lab, randomUUID(), 0, GENESIS_HASH));
    const waiting = service.pull({
      ...pullOf(lab, randomUUID(), head, entries.at(-1)?.chain_hash ?? ''),
      wait_ms: 10_000,
    });
    watcher.close();
    await expect(waiting).rejects.toBeInstanceOf(Revoked);
  });
});

function pullOf(lab: string, device: string, since: number, hash: string) {
  return { lab, device, since, hash, limit: 100, wait_ms: 0, signal: new AbortController().signal };
}
