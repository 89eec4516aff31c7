import type { ReadingValues } from '../../src/domain/book/bodies/firing-bodies';
import { latestRevision } from '../../src/domain/book/documents/rig';
import { firingNumber } from '../../src/domain/book/ids';
import { missingToFire, standingPermit } from '../../src/domain/rules/readiness';
import { BENCH_TABLET, DEMO_LAB, type DemoTablet } from '../lab';
import { ADA, MILO } from '../people';
import type { DemoRig } from '../rigs/demo-rig';
import { DEMO_SHEETS } from '../sheets/demo-sheets';
import type { Bench } from './bench';
import { sampleReadings, type ReadingPlan } from './readings';
import { rigDoc } from './revisions-and-permits';
import { walkCheck, type Walk } from './walk-check';
import type { Weather } from './weather';

export interface FiringPlan {
  readonly rig: DemoRig;
  readonly weather: Weather;
  readonly readings: number;
  readonly summary: string;
  /** Absent: the bench tablet, Ada with Milo as the second person. */
  readonly tablet?: DemoTablet;
  readonly by?: string;
  readonly second?: string;
  readonly early?: number;
  readonly beyond?: ReadingPlan['beyond'];
  readonly flashover?: number;
  readonly arcs?: number;
  /** Set when it is recorded as unready: why it was fired all the same. */
  readonly unready?: string;
  /** Written between the last reading and the closing. */
  readonly beforeClosing?: (firing: {
    readonly id: string;
    readonly readings: readonly LoggedReading[];
  }) => void;
}

export interface LoggedReading {
  readonly id: string;
  readonly values: ReadingValues;
}

/** One firing from the before-firing check to the rig made safe, then handed over. Answers its id. */
export function fireRig(bench: Bench, plan: FiringPlan): string {
  const { rig, tablet = BENCH_TABLET, by = ADA.id, second = MILO.id } = plan;
  bench.pull(tablet);
  const doc = rigDoc(bench, rig);
  const walk: Omit<Walk, 'sheet'> = {
    tablet,
    rig: doc,
    by,
    second,
    weather: plan.weather,
    vessel_bar_g: latestRevision(doc).spec.gap.lowest_bar_g,
    flow_L_min: rig.character.flow_L_min,
  };
  const check = walkCheck(bench, { ...walk, sheet: DEMO_SHEETS['before-firing'] });
  // The checked steps must be judged before readiness can be asked; the tablet does the same over its own mirror.
  bench.handOver(tablet);
  bench.pass(bench.dice.between(30, 90));
  const firing = openFiring(bench, { ...plan, tablet, by, check });
  const readings = logReadings(bench, firing, { ...plan, tablet, by });
  plan.beforeClosing?.({ id: firing, readings });
  bench.pass(bench.dice.between(20, 60));
  bench.write(tablet, 'firing.closed', { author: by, subject: firing, body: { summary: plan.summary } });
  bench.pass(bench.dice.between(20, 60));
  walkCheck(bench, { ...walk, sheet: DEMO_SHEETS[rig.sheet] });
  bench.handOver(tablet);
  return firing;
}

interface Opening extends FiringPlan {
  readonly tablet: DemoTablet;
  readonly by: string;
}

function openFiring(bench: Bench, plan: Opening & { readonly check: string }): string {
  const { rig, tablet, by, check } = plan;
  const doc = rigDoc(bench, rig);
  return bench.write(tablet, 'firing.opened', {
    author: by,
    body: {
      number: firingNumber(tablet.letter, bench.tablet(tablet).nextFiringNumber()),
      rig: rig.id,
      rig_revision: latestRevision(doc).entry,
      check,
      permit: standingPermit(doc, bench.now())?.entry ?? null,
      unready: plan.unready === undefined ? null : unreadyNote(bench, { ...plan, why: plan.unready }),
    },
  });
}

/** What the tablet itself said was missing, and the person's reason. */
function unreadyNote(bench: Bench, { rig, tablet, by, why }: Opening & { readonly why: string }) {
  const stamp = {
    wall_ms: bench.now(),
    page_life: bench.tablet(tablet).pageLife(),
    monotonic_ms: 0,
    time_uncertain: false,
  };
  const missing = missingToFire({
    rig: rigDoc(bench, rig),
    person: bench.book.doc('person', by),
    lab: bench.book.doc('lab', DEMO_LAB.id),
    device: tablet.id,
    stamp,
    now_ms: bench.now(),
    filling: false,
  });
  return { missing: missing.map(({ code, words }) => ({ code, words })), why };
}

function logReadings(bench: Bench, firing: string, plan: Opening): readonly LoggedReading[] {
  const { rig, weather, early, beyond, flashover, arcs } = plan;
  const doc = rigDoc(bench, rig);
  const { spec } = latestRevision(doc);
  const permit = standingPermit(doc, bench.now());
  const sampled = sampleReadings(
    {
      rig,
      spec,
      weather,
      count: plan.readings,
      highest_bar_g: (permit?.envelope ?? spec.envelope).max_bar_g,
      ...(early === undefined ? {} : { early }),
      ...(beyond === undefined ? {} : { beyond }),
      ...(flashover === undefined ? {} : { flashover }),
      ...(arcs === undefined ? {} : { arcs }),
    },
    bench.dice,
  );
  return sampled.map((values, at) => {
    bench.pass(bench.dice.between(50, 110));
    const id = bench.write(plan.tablet, 'firing.reading', { author: plan.by, subject: firing, body: values });
    if (beyond?.at === at) {
      bench.expect(id, {
        name: `${rig.name}: a reading above the permit’s pressure`,
        verdict: 'irregular',
        code: 'beyond-envelope',
      });
    }
    return { id, values };
  });
}
