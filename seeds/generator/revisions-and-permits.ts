import { latestRevision, type RigDoc } from '../../src/domain/book/documents/rig';
import { revisionNumber } from '../../src/domain/book/ids';
import { BENCH_TABLET, DESK_TABLET } from '../lab';
import { ADA, MILO } from '../people';
import type { DemoRig } from '../rigs/demo-rig';
import type { Bench } from './bench';
import type { WorkingDay } from './working-days';

const DAY_MINUTES = 24 * 60;
/** Permits that a later revision overtook ran longer than the month, so that none of them is void by date. */
const EARLIER_PERMIT_DAYS = 60;
/** The permits that stand end eighteen days after the day of seeding, in the evening. */
const STANDING_PERMIT_MINUTES = 19 * DAY_MINUTES + 18 * 60;

export function rigDoc(bench: Bench, rig: DemoRig): RigDoc {
  const doc = bench.book.doc('rig', rig.id);
  if (doc === undefined) throw new Error(`${rig.name} is not in the Book`);
  return doc;
}

/** Ada revises the rig to its next spec, which voids its permit. */
export function reviseRig(bench: Bench, rig: DemoRig): void {
  bench.pull(BENCH_TABLET);
  const doc = rigDoc(bench, rig);
  const next = rig.revisions[doc.revisions.length];
  if (next === undefined) throw new Error(`${rig.name} has no further revision`);
  bench.write(BENCH_TABLET, 'rig.revised', {
    author: ADA.id,
    subject: rig.id,
    body: {
      number: revisionNumber(BENCH_TABLET.letter, doc.revisions.length + 1),
      based_on: latestRevision(doc).entry,
      ...next,
    },
  });
  bench.handOver(BENCH_TABLET);
}

/** Milo grants a permit for the revision that he sees on his tablet. */
export function grantPermit(bench: Bench, rig: DemoRig, lastDay: WorkingDay): void {
  bench.pull(DESK_TABLET);
  const { revisions } = rigDoc(bench, rig);
  const last = revisions.length === rig.revisions.length;
  writeGrant(bench, rig, {
    revision: revisions.length - 1,
    until_ms: last
      ? lastDay.at(STANDING_PERMIT_MINUTES)
      : bench.now() + EARLIER_PERMIT_DAYS * DAY_MINUTES * 60_000,
  });
  bench.handOver(DESK_TABLET);
}

/** Writes a grant for the revision of this index, without handing it over. Answers its id. */
export function writeGrant(
  bench: Bench,
  rig: DemoRig,
  grant: { readonly revision: number; readonly until_ms: number },
): string {
  const revision = rigDoc(bench, rig).revisions[grant.revision];
  const envelope = rig.permits[grant.revision];
  if (revision === undefined || envelope === undefined) throw new Error(`${rig.name} has no such revision`);
  return bench.write(DESK_TABLET, 'permit.granted', {
    author: MILO.id,
    subject: rig.id,
    body: {
      rig_revision: revision.entry,
      envelope,
      until_ms: grant.until_ms,
      words: `Revision ${revision.number} looked over at the bench.`,
    },
  });
}
