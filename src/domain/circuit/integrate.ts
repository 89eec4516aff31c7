import type { Circuit } from './circuit-input';
import { seriesCapacitance_F } from './ideals';
import { firstReach, pieceEnd, pieceSlope } from './piece';
import { createStepControl, type GoodStep } from './step-control';
import { createScratch } from './scratch';
import { CHANNEL_VOLTAGE, createStepper, STEPPER_SCRATCH, type StepperState } from './stepper';
import { createWatch, topOf, WATCH_SCRATCH, type Watch } from './watch';

/** What a run leaves behind. */
export interface Run {
  readonly watch: Watch;
  readonly end: StepperState;
  /** Energy in capacitors and inductors at the end. */
  readonly left_J: number;
  /** How high the swing that fired the channel would have gone without, followed until it is clearly past the break. */
  readonly firingSwing_V: number | null;
  readonly steps: number;
}

export interface IntegrateOptions {
  /** Asked every few steps; true ends the run. */
  readonly shouldStop?: () => boolean;
  /** Largest share of a step's highest term in its curve. */
  readonly tolerance?: number;
}

export type RunEnd =
  { readonly type: 'done'; readonly run: Run } | { readonly type: 'stopped' } | { readonly type: 'too-long' };

/** Results this close to the break are bistable (physics D). */
export const MARGIN = 0.02;

const DEFAULT_TOLERANCE = 2e-5;
const STEPS_BETWEEN_QUESTIONS = 16;
/** Of the break, as a share of the tolerance. */
const BREAK_PRECISION = 1e-5;
/** Of Newton's last move; its square is left. */
const ITERATION_SHARE = 0.1;
const MOST_LANDINGS = 5;
/** Of the ring's current: what stays under it is over before anything of note happens. */
const LEAST_CURRENT = 0.03;
// A window's last bit of rounding is not a step.
const SLIVER = 1e-12;

/** Follows a circuit from the closing of its gap to the end of its window. */
export function integrate(circuit: Circuit, options: IntegrateOptions = {}): RunEnd {
  const { window_s, charge_V } = circuit;
  const break_V = circuit.channel.break_V ?? Infinity;
  const tolerance = options.tolerance ?? DEFAULT_TOLERANCE;
  const scratch = createScratch(STEPPER_SCRATCH + WATCH_SCRATCH);
  const stepper = createStepper(circuit, {
    scratch,
    iterationTolerance: ITERATION_SHARE * Math.sqrt(tolerance),
  });
  const { curves } = stepper;
  const watch = createWatch(scratch);
  const control = createStepControl(stepper, {
    tolerance,
    scale_V: charge_V,
    least_A: LEAST_CURRENT * ringCurrent_A(circuit),
  });
  let firingSwing_V: number | null = null;
  let rounds = 0;
  let h = firstStep(circuit.gap_H, circuit.gap);

  while (window_s - stepper.state.time_s > SLIVER * window_s) {
    if (rounds % STEPS_BETWEEN_QUESTIONS === 0 && options.shouldStop?.() === true) return { type: 'stopped' };
    rounds += 1;
    const good = control.goodStep(Math.min(h, window_s - stepper.state.time_s));
    if (good === undefined) return { type: 'too-long' };
    const reach = stepper.state.fired_s === null ? firstReach(curves, CHANNEL_VOLTAGE, break_V) : undefined;
    if (reach === undefined) {
      take(good.length);
      h = good.next;
      continue;
    }
    firingSwing_V = followOpen(good);
    const length = landOnBreak(reach * good.length, good.length);
    if (length > 0) take(length);
    stepper.fire();
    h = firstStep(circuit.channel.inductance_H, circuit.channel);
  }
  return {
    type: 'done',
    run: {
      watch,
      end: { ...stepper.state },
      left_J: stepper.stored_J(),
      firingSwing_V,
      steps: control.steps(),
    },
  };

  function firstStep(inductance_H: number, law: { readonly start_ohm: number; readonly end_ohm: number }) {
    const settles_s = inductance_H / (law.start_ohm + law.end_ohm);
    return Math.min(window_s / 50, Math.max(settles_s, 1e-9 * window_s));
  }

  function take(length_s: number): void {
    watch.add(stepper.state.time_s, length_s, curves);
    stepper.accept();
  }

  /**
   * Repeats the step with the length that ends on the break: the end of a step is far more exact than its inside.
   * Zero where the break is reached at once.
   */
  function landOnBreak(guess: number, longest: number): number {
    let length = guess;
    if (!(length > SLIVER * window_s)) return 0;
    for (let landing = 0; landing < MOST_LANDINGS; landing += 1) {
      if (!stepper.attempt(length)) return 0;
      const voltage = pieceEnd(curves, CHANNEL_VOLTAGE);
      const slope = (Math.sign(voltage) * pieceSlope(curves, CHANNEL_VOLTAGE, 1)) / length;
      const missing = break_V - Math.abs(voltage);
      if (Math.abs(missing) <= BREAK_PRECISION * tolerance * break_V || slope <= 0) break;
      const better = Math.min(longest, Math.max(0.5 * length, length + missing / slope));
      if (landing === MOST_LANDINGS - 1 || better === length) break;
      length = better;
    }
    return length;
  }

  /**
   * How high the swing goes with the channel open, from the step just attempted to its top or until it is clear of the
   * break; then comes back.
   */
  function followOpen(crossing: GoodStep): number {
    const kept = { ...stepper.state };
    let step: GoodStep | undefined = crossing;
    let top = break_V;
    while (step !== undefined) {
      top = Math.max(top, topOf(curves, CHANNEL_VOLTAGE, { start_s: 0, length_s: step.length }).size);
      const over = pieceEnd(curves, CHANNEL_VOLTAGE) * pieceSlope(curves, CHANNEL_VOLTAGE, 1) <= 0;
      if (over || top >= (1 + MARGIN) * break_V) break;
      stepper.accept();
      step = control.goodStep(step.next);
    }
    if (step !== crossing) stepper.restore(kept);
    return top;
  }
}

function ringCurrent_A(circuit: Circuit): number {
  const ring_F = circuit.topology === 'charge-transfer' ? seriesCapacitance_F(circuit) : circuit.first_F;
  return circuit.charge_V * Math.sqrt(ring_F / circuit.gap_H);
}
