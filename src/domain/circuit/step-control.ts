import { legendreLeading, STAGES } from './collocation';
import { pieceEnd } from './piece';
import { CHANNEL_CURRENT, CHANNEL_VOLTAGE, CHARGING_CURRENT, GAP_CURRENT, type Stepper } from './stepper';

export interface StepLimits {
  /** Largest share of a step's highest term in its curve. */
  readonly tolerance: number;
  readonly scale_V: number;
  /** Currents that are small against it may be coarse. */
  readonly least_A: number;
}

export interface GoodStep {
  readonly length: number;
  /** What to try after it. */
  readonly next: number;
}

export interface StepControl {
  /**
   * Attempts steps from `wanted` downwards until one is good enough, and says how long it is and what to try next;
   * undefined when the run is too long to follow.
   */
  readonly goodStep: (wanted: number) => GoodStep | undefined;
  readonly steps: () => number;
}

const MOST_STEPS = 20_000;
const LARGEST_GROWTH = 5;
const SMALLEST_SHRINK = 0.15;
const CAREFUL = 0.9;
/** A step that may grow by less keeps its length, and with it the matrices of the network. */
const WORTH_GROWING = 1.25;
const LEGENDRE_SHARE = 1 / legendreLeading(STAGES);

/** Chooses step lengths by the highest Legendre term of the curves over a step. */
export function createStepControl(
  stepper: Stepper,
  { tolerance, scale_V, least_A }: StepLimits,
): StepControl {
  const { curves } = stepper;
  let steps = 0;
  let largest_A = least_A;

  function coarseness(): number {
    const here_A = Math.max(
      Math.abs(pieceEnd(curves, GAP_CURRENT)),
      Math.abs(pieceEnd(curves, CHANNEL_CURRENT)),
    );
    const worst_A = Math.max(highest(GAP_CURRENT), highest(CHANNEL_CURRENT), highest(CHARGING_CURRENT));
    const coarse =
      Math.max(worst_A / Math.max(largest_A, here_A), highest(CHANNEL_VOLTAGE) / scale_V) / tolerance;
    if (coarse <= 1) largest_A = Math.max(largest_A, here_A);
    return coarse;
  }

  /** Size of a curve's highest Legendre term. */
  function highest(offset: number): number {
    return Math.abs(curves[offset + STAGES] ?? 0) * LEGENDRE_SHARE;
  }

  return {
    steps: () => steps,
    goodStep(wanted) {
      let length = wanted;
      const { time_s } = stepper.state;
      while (steps < MOST_STEPS && time_s + length > time_s) {
        steps += 1;
        const coarse = stepper.attempt(length) ? coarseness() : Infinity;
        const factor = CAREFUL * Math.max(coarse, 1e-9) ** (-1 / STAGES);
        if (coarse <= 1) {
          const keep = factor > 1 && factor < WORTH_GROWING;
          return { length, next: keep ? length : length * Math.min(factor, LARGEST_GROWTH) };
        }
        length *= Math.max(factor, SMALLEST_SHRINK);
      }
      return undefined;
    },
  };
}
