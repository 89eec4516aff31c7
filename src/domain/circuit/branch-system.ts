import { solveLinear } from '../numerics/solve-linear';
import { STAGES } from './collocation';
import type { BranchStages, FeedNetwork } from './feed-network';
import { RADAU, sumOfFive } from './method';
import type { Scratch } from './scratch';

const S = STAGES;
/** Rows of the channel's equations: its own matrix, the coupling to the gap, the right-hand side. */
const CHANNEL_WIDTH = 2 * S + 1;
const GAP_WIDTH = S + 1;

/** Length of scratch that a system takes. */
export const SYSTEM_SCRATCH = S * CHANNEL_WIDTH + 2 * S * GAP_WIDTH + S;

/** The branches and their state at the start of a step. */
export interface SystemStep {
  readonly step: number;
  readonly gap_A: number;
  readonly channel_A: number;
  readonly gapFree_V: Float64Array;
  readonly channelFree_V: Float64Array;
  /** Null while the channel is open. */
  readonly channel_ohm: Float64Array | null;
}

/** The stage equations of both branches. */
export interface BranchSystem {
  /** Sets all of a step but the gap's resistance and takes the channel out of it; false where that is singular. */
  prepare(step: SystemStep): boolean;
  /**
   * Finds the gap's currents for a resistance at every stage; `pull`, where there is one, adds the resistance's own answer
   * to the currents about those in `branches` (Newton's step). False where it is singular.
   */
  solve(gap_ohm: Float64Array, pull: Float64Array | null, branches: BranchStages): boolean;
  /** Fills in the channel's currents for the gap's. */
  follow(branches: BranchStages): void;
}

/**
 * Elimination in blocks: the channel's resistance is known beforehand, so its five currents go first and once a step;
 * what is left are five equations for the gap, solved again at every iteration of a law that knows the current.
 */
export function createBranchSystem(
  network: FeedNetwork,
  {
    gap_H,
    channel_H,
    scratch,
  }: { readonly gap_H: number; readonly channel_H: number; readonly scratch: Scratch },
): BranchSystem {
  const { zGap, zCross, zChannel } = network;
  const { a, w, w1 } = RADAU;
  const channel = scratch(S * CHANNEL_WIDTH);
  // The gap's equations without its resistance, and with it.
  const fixed = scratch(S * GAP_WIDTH);
  const system = scratch(S * GAP_WIDTH);
  const column = scratch(S);
  let open = true;

  function takeOutChannel(start_A: number, perChannel: number, given: SystemStep): boolean {
    const { channelFree_V, channel_ohm } = given;
    for (let i = 0; i < S; i += 1) {
      const row = i * CHANNEL_WIDTH;
      for (let j = 0; j < S; j += 1) {
        const k = i * S + j;
        channel[row + j] = perChannel * (w[k] ?? 0) + (zChannel[k] ?? 0);
        channel[row + S + j] = zCross[k] ?? 0;
      }
      channel[row + i] = (channel[row + i] ?? 0) + (channel_ohm?.[i] ?? 0);
      channel[row + 2 * S] = perChannel * (w1[i] ?? 0) * start_A + (channelFree_V[i] ?? 0);
    }
    if (!solveLinear(channel, S, S + 1)) return false;
    for (let j = 0; j <= S; j += 1) {
      for (let k = 0; k < S; k += 1) column[k] = channel[k * CHANNEL_WIDTH + S + j] ?? 0;
      for (let i = 0; i < S; i += 1) {
        const at = i * GAP_WIDTH + j;
        fixed[at] = (fixed[at] ?? 0) - sumOfFive(zCross, i * S, column);
      }
    }
    return true;
  }

  return {
    prepare(given) {
      const perGap = gap_H / given.step;
      for (let i = 0; i < S; i += 1) {
        const row = i * GAP_WIDTH;
        for (let j = 0; j < S; j += 1) {
          const k = i * S + j;
          fixed[row + j] = perGap * (w[k] ?? 0) + (zGap[k] ?? 0);
        }
        fixed[row + S] = perGap * (w1[i] ?? 0) * given.gap_A + (given.gapFree_V[i] ?? 0);
      }
      open = given.channel_ohm === null;
      return open || takeOutChannel(given.channel_A, channel_H / given.step, given);
    },
    solve(gap_ohm, pull, { gap_A }) {
      system.set(fixed);
      for (let i = 0; i < S; i += 1) {
        const row = i * GAP_WIDTH;
        system[row + i] = (system[row + i] ?? 0) + (gap_ohm[i] ?? 0);
        if (pull === null) continue;
        let known = system[row + S] ?? 0;
        for (let j = 0; j < S; j += 1) {
          const guess = gap_A[j] ?? 0;
          const change = (pull[i] ?? 0) * (a[i * S + j] ?? 0) * guess;
          system[row + j] = (system[row + j] ?? 0) + change;
          known += change * guess;
        }
        system[row + S] = known;
      }
      if (!solveLinear(system, S)) return false;
      for (let i = 0; i < S; i += 1) gap_A[i] = system[i * GAP_WIDTH + S] ?? 0;
      return true;
    },
    follow({ gap_A, channel_A }) {
      for (let i = 0; i < S; i += 1) {
        const row = i * CHANNEL_WIDTH;
        channel_A[i] = open ? 0 : (channel[row + 2 * S] ?? 0) - sumOfFive(channel, row + S, gap_A);
      }
    },
  };
}
