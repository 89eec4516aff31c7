import type { Holder } from '../../src/domain/book/bodies/kit-bodies';
import { latestRevision } from '../../src/domain/book/documents/rig';
import { BENCH_TABLET } from '../lab';
import { demoRegister } from '../kit/demo-register';
import { ADA, MILO } from '../people';
import { HERON } from '../rigs/heron';
import { KETTLE } from '../rigs/kettle';
import type { Bench } from './bench';
import { rigDoc } from './revisions-and-permits';
import type { WorkingDay } from './working-days';

const HOLDERS: Readonly<Record<string, Holder>> = {
  ada: { type: 'person', id: ADA.id },
  milo: { type: 'person', id: MILO.id },
  heron: { type: 'rig', id: HERON.id },
  kettle: { type: 'rig', id: KETTLE.id },
};

/** Milo copies the register from the list on the cupboard's door. What is overdue there is in nobody's hands. */
export function copyRegister(bench: Bench, lastDay: WorkingDay): void {
  bench.pull(BENCH_TABLET);
  for (const { holder, due_days, ...piece } of demoRegister) {
    bench.pass(20);
    const due_ms = due_days === null ? null : lastDay.at(due_days * 24 * 60);
    const kit = bench.write(BENCH_TABLET, 'kit.added', { author: MILO.id, body: { ...piece, due_ms } });
    if (holder === null) continue;
    const to = HOLDERS[holder];
    if (to === undefined) throw new Error(`nobody called ${holder}`);
    bench.pass(10);
    bench.write(BENCH_TABLET, 'kit.issued', {
      author: MILO.id,
      subject: kit,
      body: { to, count: null, words: '' },
    });
  }
  bench.handOver(BENCH_TABLET);
}

/** Two rounds with the feeler, and the screw between them: the second is within what the feeler tells. */
export function alignHeron(bench: Bench): void {
  bench.pull(BENCH_TABLET);
  const rig_revision = latestRevision(rigDoc(bench, HERON)).entry;
  const about = { author: ADA.id, subject: HERON.id };
  const places = { rig_revision, place_a_mm: 10, place_b_mm: 230, feeler_error_mm: 0.015, note: '' };
  const first = bench.write(BENCH_TABLET, 'alignment.measured', {
    ...about,
    body: { ...places, gap_a_mm: 2.51, gap_b_mm: 2.38 },
  });
  bench.pass(180);
  bench.write(BENCH_TABLET, 'alignment.adjusted', {
    ...about,
    body: {
      rig_revision,
      based_on: first,
      target_mm: 2.5,
      turns: [
        { screw: 'Screw A', eighths_clockwise: 0 },
        { screw: 'Screw B', eighths_clockwise: -2 },
      ],
      predicted: { gap_a_mm: 2.522, gap_b_mm: 2.493 },
      note: '',
    },
  });
  bench.pass(240);
  bench.write(BENCH_TABLET, 'alignment.measured', {
    ...about,
    body: { ...places, gap_a_mm: 2.52, gap_b_mm: 2.49 },
  });
  bench.handOver(BENCH_TABLET);
}
