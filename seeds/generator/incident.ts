import { BENCH_TABLET, DESK_TABLET } from '../lab';
import { ADA, MILO } from '../people';
import type { DemoRig } from '../rigs/demo-rig';
import type { Bench } from './bench';

/** Written in the middle of a firing: by itself it stands the rig down, under its own id. */
export function reportFlashover(bench: Bench, rig: DemoRig): string {
  bench.pass(50);
  return bench.write(BENCH_TABLET, 'incident.reported', {
    author: ADA.id,
    subject: rig.id,
    body: {
      what: 'Flashover along the long edge of the C1 sheet, with a loud crack. A brown line of 30 mm on the film.',
      near: 'Nobody was within a metre; Milo stood at the door.',
      made_safe: 'Supply off at once; the make-safe sheet is being walked now.',
      stand_down: null,
    },
  });
}

export function answerIncident(bench: Bench, incident: string): void {
  bench.pull(DESK_TABLET);
  bench.write(DESK_TABLET, 'incident.answered', {
    author: MILO.id,
    subject: incident,
    body: {
      words:
        'Seen on the film. Three plies leave too little against 16 kV and the edge is short. Put in a fourth ply and 60 mm ' +
        'of bare edge; I look at both before the rig comes back.',
    },
  });
  bench.handOver(DESK_TABLET);
}

/** The rig comes back once its cause is mended; the return names what it lifts. */
export function returnRig(bench: Bench, rig: DemoRig, incident: string): void {
  bench.pull(DESK_TABLET);
  bench.write(DESK_TABLET, 'rig.returned', {
    author: MILO.id,
    subject: rig.id,
    body: { lifts: [incident], words: 'New sheets seen: four plies, edges 60 mm, no mark under the lamp.' },
  });
  bench.pass(60);
  bench.write(DESK_TABLET, 'incident.closed', {
    author: MILO.id,
    subject: incident,
    body: { words: 'Cause found and mended. The film check is part of the make-safe sheet.' },
  });
  bench.handOver(DESK_TABLET);
}
