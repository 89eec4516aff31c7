import { CARRIABLE, type ReadingValues } from '../../src/domain/book/bodies/firing-bodies';
import type { RigSpec } from '../../src/domain/book/rig-spec';
import { readingPlausibility } from '../../src/domain/rules/reading-plausibility';
import { must } from '../must';
import type { DemoRig } from '../rigs/demo-rig';
import type { Dice } from './dice';
import { rounded } from './rounded';
import { selfBreakOf } from './self-break-law';
import type { Weather } from './weather';

export interface ReadingPlan {
  readonly rig: DemoRig;
  readonly spec: RigSpec;
  readonly weather: Weather;
  readonly count: number;
  /** The range that the permit leaves. */
  readonly highest_bar_g: number;
  /** Index of a reading that breaks early, so far below the law that the bench says so at once. */
  readonly early?: number;
  /** Index of a reading taken above the permit's pressure, and that pressure. */
  readonly beyond?: { readonly at: number; readonly bar_g: number };
  /** Index of a reading at which the surface flashes over. */
  readonly flashover?: number;
  /** Share of readings with arcs at the A end. */
  readonly arcs?: number;
}

/** In sigmas of the law, which are wider than the rig's own scatter: it fits neither. */
const EARLY_SIGMA = 4;
const STEP_BAR = 0.05;
/** What never looks like a misfit: two of three beyond two standard deviations would. */
const MOST_SIGMA = 2.4;
const MOST_SIGMA_SOON_AFTER = 1.9;

/** The readings of one firing: the law at each reading's own pressure and weather, times the rig's ratio, plus scatter. */
export function sampleReadings(plan: ReadingPlan, dice: Dice): readonly ReadingValues[] {
  const scatter = calmNormal(dice);
  const readings: ReadingValues[] = [];
  for (let at = 0; at < plan.count; at += 1) {
    const values = at === 0 ? heldReading(plan, dice) : brokenReading(plan, { at, dice, scatter });
    const before = readings.at(-1);
    readings.push(before === undefined ? values : { ...values, carried_over: untouched(before, values) });
  }
  return readings;
}

/** Brought up slowly before the first break: what the gap still held. */
function heldReading(plan: ReadingPlan, dice: Dice): ReadingValues {
  const base = commonValues(plan, targetPressure(plan, 0), dice);
  const held = selfBreakOf(plan.spec, base).law_kV * dice.between(0.74, 0.8);
  return {
    ...base,
    voltage_kV: shownVoltage(plan, held),
    how: 'held',
    rate_Hz: null,
    shots: 0,
    looked: 'gap-dark',
    output_uJ: null,
  };
}

function brokenReading(
  plan: ReadingPlan,
  { at, dice, scatter }: { readonly at: number; readonly dice: Dice; readonly scatter: () => number },
): ReadingValues {
  const { ratio, scatter_kV, rate_Hz } = plan.rig.character;
  const target = plan.beyond?.at === at ? plan.beyond.bar_g : targetPressure(plan, at);
  const base = commonValues(plan, target, dice);
  const { expected_kV, sigma_kV } = must(readingPlausibility(plan.spec, base, []));
  const off_kV = plan.early === at ? -EARLY_SIGMA * sigma_kV : scatter() * scatter_kV;
  const breaks_kV = ratio * expected_kV + off_kV;
  const rate = dice.pick(rate_Hz);
  const looked = looks(plan, at, dice);
  return {
    ...base,
    voltage_kV: shownVoltage(plan, breaks_kV),
    how: 'self-break',
    rate_Hz: rate,
    shots: Math.round(rate * dice.pick([10, 15, 20, 30])),
    looked,
    output_uJ: looked === 'even' ? output_uJ(plan, breaks_kV, dice) : null,
  };
}

function commonValues(plan: ReadingPlan, pressure_bar_g: number, dice: Dice): ReadingValues {
  const { spec, rig, weather } = plan;
  const settled = spec.gap.vessel === null ? 0 : rounded(pressure_bar_g + 0.004 * dice.normal(), 2);
  return {
    voltage_kV: 0,
    how: 'self-break',
    pressure_bar_g: Math.min(settled, Math.max(pressure_bar_g, plan.highest_bar_g)),
    gas: spec.gap.gas,
    flow_L_min: rig.character.flow_L_min,
    rate_Hz: null,
    shots: 0,
    looked: 'even',
    output_uJ: null,
    ...weather,
    note: '',
    carried_over: [],
  };
}

/** Up from the lowest pressure to the highest and down again, two readings at each step. */
function targetPressure({ spec, highest_bar_g }: ReadingPlan, at: number): number {
  const { lowest_bar_g, vessel } = spec.gap;
  const steps = Math.round((highest_bar_g - lowest_bar_g) / STEP_BAR);
  if (vessel === null || steps === 0) return lowest_bar_g;
  const along = Math.floor(at / 2) % (2 * steps);
  return rounded(lowest_bar_g + STEP_BAR * (along <= steps ? along : 2 * steps - along), 2);
}

function looks(plan: ReadingPlan, at: number, dice: Dice): ReadingValues['looked'] {
  if (plan.flashover === at) return 'surface-flashover';
  if (plan.early === at) return 'early-break';
  return dice.unit() < (plan.arcs ?? 0) ? 'arc-a-end' : 'even';
}

/** Light grows with the stored energy; one shot in twenty is missed by the meter's trigger. */
function output_uJ({ rig, spec, weather }: ReadingPlan, breaks_kV: number, dice: Dice): number | null {
  if (dice.unit() < 0.05) return null;
  const usual_kV = selfBreakOf(spec, { ...weather, pressure_bar_g: rig.character.working_bar_g }).law_kV;
  const light = spec.beam.pulse_energy_uJ * (breaks_kV / usual_kV) ** 2 * (1 + 0.07 * dice.normal());
  return light < 10 ? rounded(light, 2) : Math.round(light);
}

function shownVoltage({ rig }: ReadingPlan, voltage_kV: number): number {
  return rounded(voltage_kV, rig.character.scatter_kV < 0.2 ? 2 : 1);
}

/** Gaussian without the far tails, so that only what is put in on purpose fails to fit. */
function calmNormal(dice: Dice): () => number {
  let before = [0, 0];
  return () => {
    const soonAfter = before.some((one) => Math.abs(one) > MOST_SIGMA_SOON_AFTER);
    const most = soonAfter ? MOST_SIGMA_SOON_AFTER : MOST_SIGMA;
    let sigma = dice.normal();
    while (Math.abs(sigma) > most) sigma = dice.normal();
    before = [before[1] ?? 0, sigma];
    return sigma;
  };
}

function untouched(before: ReadingValues, now: ReadingValues): ReadingValues['carried_over'] {
  return CARRIABLE.filter((field) => field !== 'voltage_kV' && before[field] === now[field]);
}
