import { standingReview, type FiringDoc } from '../../src/domain/book/documents/firing';
import type { ReadingDoc } from '../../src/domain/book/documents/reading';
import { DESK_TABLET } from '../lab';
import { INGE, MILO } from '../people';
import type { Bench } from './bench';

const WORDS = [
  'Agrees with the rig’s curve.',
  'Read through, nothing to add.',
  'Scatter as usual.',
  '',
  'Good spread over the pressures.',
] as const;

/** Milo reviews what is closed and waits, Inge what Milo fired himself. `waiting` is left for the demo. */
export function reviewFirings(bench: Bench, waiting: ReadonlySet<string>): void {
  bench.pull(DESK_TABLET);
  for (const document of bench.book.documents()) {
    if (document.kind !== 'firing' || document.closed === null || waiting.has(document.id)) continue;
    if (standingReview(document) !== null) continue;
    bench.pass(bench.dice.between(90, 240));
    reviewFiring(bench, document);
  }
  bench.handOver(DESK_TABLET);
}

function reviewFiring(bench: Bench, firing: FiringDoc): void {
  const { revision, hash } = bench.tablet(DESK_TABLET).base();
  const readings = bench.book
    .documents()
    .filter((one): one is ReadingDoc => one.kind === 'reading' && one.parent === firing.id);
  const left_out = readings.filter((one) => firing.unready !== null || leavesOut(one)).map(({ id }) => id);
  bench.write(DESK_TABLET, 'firing.reviewed', {
    author: firing.opened.by === MILO.id ? INGE.id : MILO.id,
    subject: firing.id,
    body: {
      words:
        firing.unready === null ? bench.dice.pick(WORDS) : 'Spoken about at the bench. Nothing of it counts.',
      left_out,
      seen_revision: revision,
      seen_hash: hash,
    },
  });
}

function leavesOut({ irregular, original }: ReadingDoc): boolean {
  return irregular !== null || original.looked === 'surface-flashover' || original.looked === 'early-break';
}
