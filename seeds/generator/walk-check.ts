import type { StepResult } from '../../src/domain/book/bodies/check-bodies';
import { latestRevision, type RigDoc } from '../../src/domain/book/documents/rig';
import type { RigSpec } from '../../src/domain/book/rig-spec';
import type { Step } from '../../src/domain/book/sheet-spec';
import { standingPermit } from '../../src/domain/rules/readiness';
import { rigWait } from '../../src/domain/rules/rig-figures';
import { DEMO_LAB_SETTINGS, type DemoTablet } from '../lab';
import { must } from '../must';
import type { DemoSheet } from '../sheets/demo-sheets';
import type { Bench } from './bench';
import { rounded } from './rounded';
import type { Weather } from './weather';

export interface Walk {
  readonly tablet: DemoTablet;
  readonly rig: RigDoc;
  readonly sheet: DemoSheet;
  readonly by: string;
  readonly second: string;
  readonly weather: Weather;
  readonly vessel_bar_g: number;
  readonly flow_L_min: number;
}

/** Pictures are not handed over by this seed, and none is made up. */
const NO_PHOTO = 'No camera is allowed in the Pulse Room this month; the second person looked instead.';
const EYEWEAR = ['3 and 4', '3 and 7', '5 and 6'] as const;

/** Walks every step of a sheet in order and closes the check. Answers its id. */
export function walkCheck(bench: Bench, walk: Walk): string {
  const { tablet, by: author } = walk;
  const revision = latestRevision(walk.rig);
  const subject = bench.write(tablet, 'check.opened', {
    author,
    body: { rig: walk.rig.id, rig_revision: revision.entry, sheet: walk.sheet.id },
  });
  for (const step of walk.sheet.spec.steps) {
    bench.pass(bench.dice.between(12, 38));
    if (step.type === 'photo') {
      bench.write(tablet, 'check.step-waived', { author, subject, body: { step: step.key, why: NO_PHOTO } });
      continue;
    }
    const result = resultOf(step, { bench, walk, spec: revision.spec });
    if (result.type === 'wait') bench.pass(result.waited_s);
    bench.write(tablet, 'check.step-done', {
      author,
      subject,
      ...(step.type === 'second-person' ? { witness: walk.second } : {}),
      body: {
        step: step.key,
        result,
        note: step.key === 'eyewear' ? `Eyewear ${bench.dice.pick(EYEWEAR)}` : '',
      },
    });
  }
  bench.pass(bench.dice.between(4, 9));
  bench.write(tablet, 'check.closed', { author, subject, body: {} });
  return subject;
}

interface StepFacts {
  readonly bench: Bench;
  readonly walk: Walk;
  readonly spec: RigSpec;
}

function resultOf(step: Step, facts: StepFacts): StepResult {
  switch (step.type) {
    case 'confirm':
      return { type: 'confirm' };
    case 'second-person':
      return { type: 'second-person' };
    case 'reading':
      return { type: 'reading', value: measured(step.key, facts), unit: step.unit };
    case 'wait': {
      const wait = must(rigWait(facts.spec, DEMO_LAB_SETTINGS));
      const required_s = wait.type === 'known' ? wait.wait_s : null;
      return { type: 'wait', required_s, waited_s: (required_s ?? 60) + facts.bench.dice.whole(1, 20) };
    }
    case 'computed':
      return { type: 'computed', shown: computed(step.shows, facts) };
    case 'photo':
      throw new Error('a photo is waived, not made up');
  }
}

function measured(key: string, { bench: { dice }, walk, spec }: StepFacts): number {
  const open = spec.gap.vessel === null;
  switch (key) {
    case 'vessel-pressure':
      return walk.vessel_bar_g;
    case 'shut-off-creep':
      return open ? 0 : rounded(dice.between(-0.01, 0.03), 2);
    case 'flow':
      return walk.flow_L_min;
    case 'ambient-pressure':
      return walk.weather.ambient_bar_abs;
    case 'temperature':
      return walk.weather.temperature_C;
    case 'humidity':
      return walk.weather.humidity_pct;
    case 'residual-voltage':
      return dice.whole(-4, 6);
    case 'vessel-vented':
      return 0;
    default:
      throw new Error(`the demo does not know how to measure ${key}`);
  }
}

function computed(shows: Extract<Step, { type: 'computed' }>['shows'], { bench, walk }: StepFacts): string {
  if (shows !== 'permit') throw new Error(`no demo sheet asks for ${shows}`);
  const permit = standingPermit(walk.rig, bench.now());
  const { number } = latestRevision(walk.rig);
  if (permit === null) return `Revision ${number} has no permit`;
  const { max_kV, max_bar_g, max_rate_Hz } = permit.envelope;
  const until = new Date(permit.until_ms).toISOString().slice(0, 10);
  return `Revision ${number}, until ${until}: up to ${max_kV} kV, ${max_bar_g} bar(g), ${max_rate_Hz} Hz`;
}
