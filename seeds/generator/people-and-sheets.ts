import type { WorkingDay } from './working-days';
import { BENCH_TABLET, DESK_TABLET } from '../lab';
import { ADA, DEMO_PEOPLE, INGE, MILO } from '../people';
import type { DemoRig } from '../rigs/demo-rig';
import { DEMO_SHEETS, LATER_SHEETS } from '../sheets/demo-sheets';
import type { Bench } from './bench';

/** Inge, who founded the lab, brings the others in, and Milo publishes the check sheets. */
export function bringInCrew(bench: Bench): void {
  for (const { id, name, role } of DEMO_PEOPLE.filter((one) => one !== INGE)) {
    bench.pass(40);
    bench.write(DESK_TABLET, 'person.joined', { author: INGE.id, subject: id, body: { name, role } });
  }
  for (const { id, spec } of Object.values(DEMO_SHEETS)) {
    bench.pass(120);
    bench.write(DESK_TABLET, 'sheet.published', { author: MILO.id, id, body: { spec, replaces: null } });
  }
  bench.handOver(DESK_TABLET);
  bench.pull(BENCH_TABLET);
}

/** Gas, dye and weekly care get sheets of their own, from the desk. */
export function publishLaterSheets(bench: Bench): void {
  for (const { id, spec } of Object.values(LATER_SHEETS)) {
    bench.pass(120);
    bench.write(DESK_TABLET, 'sheet.published', { author: MILO.id, id, body: { spec, replaces: null } });
  }
  bench.handOver(DESK_TABLET);
}

/** Ada builds the rig; Inge authorises her and Milo to fire it, well beyond the demo. */
export function createRig(bench: Bench, rig: DemoRig, lastDay: WorkingDay): void {
  const [first] = rig.revisions;
  if (first === undefined) throw new Error(`${rig.name} has no revision`);
  bench.pull(BENCH_TABLET);
  const { name } = rig;
  const { letter } = BENCH_TABLET;
  bench.write(BENCH_TABLET, 'rig.created', {
    author: ADA.id,
    id: rig.id,
    body: { name, number: `1${letter}`, spec: first.spec },
  });
  bench.handOver(BENCH_TABLET);
  bench.pull(DESK_TABLET);
  for (const person of [ADA, MILO]) {
    bench.pass(60);
    bench.write(DESK_TABLET, 'person.authorised', {
      author: INGE.id,
      subject: person.id,
      body: {
        rig: rig.id,
        task: 'fire',
        until_ms: lastDay.at(200 * 24 * 60),
        words: 'Trained on this rig, watched for three firings.',
      },
    });
  }
  bench.handOver(DESK_TABLET);
}
