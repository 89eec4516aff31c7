import { latestRevision } from '../../src/domain/book/documents/rig';
import { BENCH_TABLET, DESK_TABLET } from '../lab';
import { ADA, MILO } from '../people';
import type { DemoRig } from '../rigs/demo-rig';
import type { Bench } from './bench';
import type { LoggedReading } from './fire-rig';
import { reviseRig, rigDoc, writeGrant } from './revisions-and-permits';

/** Hands in the shorted rig for a while, with a tag that comes off again. */
export function handsInAndOut(
  bench: Bench,
  rig: DemoRig,
  stay: { readonly where: string; readonly minutes: number },
): void {
  bench.pull(BENCH_TABLET);
  const tag = bench.write(BENCH_TABLET, 'hands.in', {
    author: ADA.id,
    subject: rig.id,
    body: { where: stay.where },
  });
  bench.pass(stay.minutes * 60);
  bench.write(BENCH_TABLET, 'hands.out', { author: ADA.id, subject: rig.id, body: { tag } });
  bench.handOver(BENCH_TABLET);
}

export function changeGas(bench: Bench, rig: DemoRig, words: string): void {
  bench.pull(BENCH_TABLET);
  bench.write(BENCH_TABLET, 'gas.changed', { author: ADA.id, subject: rig.id, body: { words } });
  bench.handOver(BENCH_TABLET);
}

export function askForPermit(bench: Bench, rig: DemoRig, words: string): void {
  bench.pull(BENCH_TABLET);
  const rig_revision = latestRevision(rigDoc(bench, rig)).entry;
  bench.write(BENCH_TABLET, 'permit.asked', {
    author: ADA.id,
    subject: rig.id,
    body: { rig_revision, words },
  });
  bench.handOver(BENCH_TABLET);
}

export function declareShorted(bench: Bench, rig: DemoRig): void {
  bench.pull(BENCH_TABLET);
  bench.write(BENCH_TABLET, 'rig.declared', { author: MILO.id, subject: rig.id, body: { state: 'shorted' } });
  bench.handOver(BENCH_TABLET);
}

/** A slip of the keypad, put right in the same firing; the first version stays readable. */
export function correctShots(
  bench: Bench,
  firing: { readonly id: string; readonly readings: readonly LoggedReading[] },
): void {
  const reading = firing.readings.at(-1);
  if (reading === undefined) throw new Error('nothing to correct');
  bench.pass(25);
  bench.write(BENCH_TABLET, 'entry.corrected', {
    author: ADA.id,
    subject: firing.id,
    body: {
      corrects: reading.id,
      kind: 'firing.reading',
      body: { ...reading.values, shots: reading.values.shots + 40, carried_over: [] },
      why: 'The counter ran on for two bursts.',
    },
  });
}

/**
 * Milo widens the permit for the revision on his screen while Ada is already handing the next one over: held back,
 * then dismissed by himself.
 */
export function grantTooLate(bench: Bench, rig: DemoRig): void {
  const revision = rigDoc(bench, rig).revisions.length - 1;
  reviseRig(bench, rig);
  bench.pass(600);
  const grant = writeGrant(bench, rig, { revision, until_ms: bench.now() + 60 * 24 * 3_600_000 });
  bench.expect(grant, {
    name: `${rig.name}: a permit for a revision that was no longer the latest`,
    verdict: 'held-back',
    code: 'superseded-revision',
  });
  bench.handOver(DESK_TABLET);
  bench.pass(300);
  bench.write(DESK_TABLET, 'entry.struck', {
    author: MILO.id,
    subject: rig.id,
    body: { strikes: grant, why: 'Overtaken by the new revision; that one gets its own permit.' },
  });
  bench.handOver(DESK_TABLET);
}
