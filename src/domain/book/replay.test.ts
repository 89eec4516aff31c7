import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { PureBench } from '../../../tests/support/pure-bench';
import {
  ADA,
  idOf,
  MILO,
  MORNING_MS,
  TABLET_A,
  TABLET_B,
  type Written,
} from '../../../tests/support/pure-book';
import { testReading, testSpec } from '../../../tests/support/test-lab';
import { docKey, type Document } from './documents/document';
import { mapStore, runEffect, runEffectAsync } from './documents/effect';
import { foldEntry } from './fold';

/** One thing that somebody does; `pick` chooses which of the ids so far it names, right or wrong. */
interface Deed {
  readonly what: (typeof WHATS)[number];
  readonly by: string;
  readonly device: string;
  readonly pick: number;
  readonly own: boolean;
}

const WHATS = [
  'read',
  'open',
  'close',
  'down',
  'retract',
  'return',
  'hands-in',
  'hands-out',
  'revise',
  'grant',
  'withdraw',
  'settle',
  'correct',
  'strike',
  'adopt',
  'incident',
  'shorted',
  'walk',
  'review',
  'claim',
] as const;

const deed: fc.Arbitrary<Deed> = fc.record({
  what: fc.constantFrom(...WHATS),
  by: fc.constantFrom(ADA, MILO),
  device: fc.constantFrom(TABLET_A, TABLET_B),
  pick: fc.nat(1000),
  own: fc.boolean(),
});

describe('replaying a Book', () => {
  it('gives the same documents from the same entries, at once, or in batches of any size over a slow store', async () => {
    await fc.assert(
      fc.asyncProperty(
        fc.array(deed, { maxLength: 60 }),
        fc.integer({ min: 1, max: 17 }),
        async (deeds, size) => {
          const bench = new PureBench().ready();
          bench.open();
          bench.read();
          deeds.forEach((one, at) => act(bench, one, at));
          const { written, documents } = bench.book;
          const replayed = new Map<string, Document>();
          for (const { entry, ...judgement } of written)
            runEffect(foldEntry(entry, judgement), mapStore(replayed));
          expect(replayed).toEqual(documents);

          const stored = new Map<string, Document>();
          for (let from = 0; from < written.length; from += size) {
            const changed = new Map<string, Document>();
            const get = (key: Parameters<typeof docKey>[0]) => Promise.resolve(stored.get(docKey(key)));
            for (const { entry, ...judgement } of written.slice(from, from + size)) {
              await runEffectAsync(foldEntry(entry, judgement), { get }, changed);
            }
            // As a store keeps them: as text.
            for (const [key, doc] of changed) stored.set(key, JSON.parse(JSON.stringify(doc)) as Document);
          }
          expect(stored).toEqual(documents);
        },
      ),
      { numRuns: 60 },
    );
  });

  it('refuses no observation, and leaves a rig down while any stand-down is unnamed, whatever came in which order', () => {
    fc.assert(
      fc.property(fc.array(deed, { maxLength: 60 }), (deeds) => {
        const bench = new PureBench().ready();
        bench.open();
        deeds.forEach((one, at) => act(bench, one, at));
        const observations = bench.book.written.filter(({ entry }) =>
          /^(firing\.(reading|opened)|rig\.stood-down|incident\.reported)$/.test(entry.kind),
        );
        expect(observations.filter((one) => one.verdict === 'held-back')).toEqual([]);
        const downs = bench.book.written.filter(
          ({ entry }) => entry.kind === 'rig.stood-down' || entry.kind === 'incident.reported',
        );
        const named = bench.book.written
          .filter(
            (one) => hasEffect(bench, one) && /^rig\.(returned|stand-down-retracted)$/.test(one.entry.kind),
          )
          .map((one) => one.entry.body)
          .join();
        for (const down of bench.book.doc('rig', bench.rig).stand_downs) {
          if (down.lifted !== null) expect(named).toContain(down.entry);
        }
        expect(bench.book.doc('rig', bench.rig).stand_downs).toHaveLength(downs.length);
      }),
      { numRuns: 60 },
    );
  });
});

function act(bench: PureBench, { what, by, device, pick, own }: Deed, at: number): void {
  const { book, rig, firing } = bench;
  const options = { by, device, session: own ? by : null, at_min: at / 10 };
  const ids = book.written.map((one) => one.entry.id);
  const some = ids[pick % ids.length] ?? idOf(1);
  const heads = book.doc('rig', rig).heads;
  const spec = { ...testSpec, envelope: { ...testSpec.envelope, max_kV: 15 + (pick % 8) } };
  const limits = { max_kV: 14, max_bar_g: 1, max_rate_Hz: 1 };
  switch (what) {
    case 'read':
      return void book.write(
        'firing.reading',
        pick % 5 === 0 ? some : firing,
        { ...testReading, voltage_kV: 10 + (pick % 15) },
        options,
      );
    case 'open':
      return void book.write(
        'firing.opened',
        null,
        {
          number: `A-${at}`,
          rig,
          rig_revision: rig,
          check: bench.check,
          permit: bench.permit,
          unready: null,
        },
        options,
      );
    case 'close':
      return void book.write('firing.closed', firing, { summary: '' }, options);
    case 'down':
      return void book.write('rig.stood-down', rig, { why: 'Ozone' }, options);
    case 'retract':
      return void book.write(
        'rig.stand-down-retracted',
        rig,
        { stand_down: lastOf(bench, 'rig.stood-down') ?? some, incident: null },
        options,
      );
    case 'return':
      return void book.write(
        'rig.returned',
        rig,
        { lifts: [lastOf(bench, 'rig.stood-down') ?? some], words: 'Mended' },
        options,
      );
    case 'hands-in':
      return void book.write('hands.in', rig, { where: '' }, options);
    case 'hands-out':
      return void book.write('hands.out', rig, { tag: lastOf(bench, 'hands.in') ?? some }, options);
    case 'revise':
      return void book.write(
        'rig.revised',
        rig,
        { number: `${at}A`, based_on: pick % 2 === 0 ? rig : (heads.at(-1) ?? rig), spec, why: 'Tuned' },
        options,
      );
    case 'grant':
      return void book.write(
        'permit.granted',
        rig,
        { rig_revision: heads.at(-1) ?? rig, envelope: limits, until_ms: MORNING_MS + 1e9, words: '' },
        options,
      );
    case 'withdraw':
      return void book.write(
        'permit.withdrawn',
        rig,
        { permit: lastOf(bench, 'permit.granted') ?? some, why: 'Valve' },
        options,
      );
    case 'settle':
      return void book.write(
        'parting.settled',
        rig,
        { settles: [...heads, rig].slice(0, 10), keeps: heads[0] ?? rig, words: 'So' },
        options,
      );
    case 'correct':
      return void book.write(
        'entry.corrected',
        firing,
        {
          corrects: lastOf(bench, pick % 2 === 0 ? 'firing.reading' : 'entry.corrected') ?? some,
          kind: 'firing.reading',
          body: { ...testReading, shots: pick },
          why: '',
        },
        options,
      );
    case 'strike':
      return void book.write('entry.struck', firing, { strikes: some, why: 'Slip' }, options);
    case 'adopt':
      return void book.write('entry.adopted', rig, { adopts: [lastHeld(bench) ?? some] }, options);
    case 'incident':
      return void book.write(
        'incident.reported',
        rig,
        { what: 'Arc', near: '', made_safe: '', stand_down: null },
        options,
      );
    case 'shorted':
      return void book.write('rig.declared', rig, { state: 'shorted' }, options);
    case 'walk':
      return void book.write(
        'check.opened',
        null,
        { rig, rig_revision: heads.at(-1) ?? rig, sheet: bench.sheet },
        options,
      );
    case 'review':
      return void book.write(
        'firing.reviewed',
        firing,
        { words: '', left_out: [], seen_revision: at, seen_hash: '' },
        options,
      );
    case 'claim':
      return void book.write('entry.claimed', rig, { claims: some }, options);
  }
}

function hasEffect({ book }: PureBench, { verdict, entry }: Written): boolean {
  return verdict === 'applied' || (verdict === 'held-back' && book.doc('held', entry.id).adopted !== null);
}

function lastOf(bench: PureBench, kind: string): string | undefined {
  return bench.book.written.findLast((one) => one.entry.kind === kind)?.entry.id;
}

function lastHeld(bench: PureBench): string | undefined {
  return bench.book.written.findLast((one) => one.verdict === 'held-back')?.entry.id;
}
