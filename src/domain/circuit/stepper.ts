import { channelResistance, gapResistance } from './branch-laws';
import { createBranchSystem, SYSTEM_SCRATCH } from './branch-system';
import type { Circuit } from './circuit-input';
import { STAGES } from './collocation';
import type { NetworkState } from './feed-network';
import { INVERSION_SCRATCH, inversionNetwork } from './inversion-network';
import { RADAU, sumOfFive } from './method';
import { PIECE, pieceAt } from './piece';
import type { Scratch } from './scratch';
import { TRANSFER_SCRATCH, transferNetwork } from './transfer-network';

const S = STAGES;

/** A curve may be followed this many step lengths beyond its end for a guess. */
const FARTHEST_GUESS = 2;
const MOST_ITERATIONS = 8;

/** Offsets of the four curves in a step's buffer. */
export const CHANNEL_VOLTAGE = 0;
export const GAP_CURRENT = PIECE;
export const CHANNEL_CURRENT = 2 * PIECE;
export const CHARGING_CURRENT = 3 * PIECE;
export const CURVES = 4 * PIECE;

/** Length of scratch that a stepper takes. */
export const STEPPER_SCRATCH =
  Math.max(TRANSFER_SCRATCH, INVERSION_SCRATCH) + SYSTEM_SCRATCH + CURVES + PIECE + 10 * S;

export interface StepperState extends Readonly<NetworkState> {
  readonly time_s: number;
  readonly gap_A: number;
  readonly channel_A: number;
  readonly action_A2s: number;
  readonly gap_J: number;
  readonly channel_J: number;
  readonly loss_J: number;
  /** When the channel broke down; null while it is open. It never opens again. */
  readonly fired_s: number | null;
}

export interface Stepper {
  /** The present state, which goes on with the run: copy what has to stay. */
  readonly state: StepperState;
  readonly restore: (kept: StepperState) => void;
  /** Solves a step from the present state without taking it; false where the iteration fails. */
  readonly attempt: (h: number) => boolean;
  /** Curves over the attempted step as powers of theta. */
  readonly curves: Float64Array;
  /** Takes the attempted step. */
  readonly accept: () => void;
  /** Breaks the channel down at the present time. */
  readonly fire: () => void;
  readonly stored_J: () => number;
}

export interface StepperOptions {
  readonly scratch: Scratch;
  /** The iteration ends with a move this small, as a share; it converges quadratically, so its square is left. */
  readonly iterationTolerance: number;
}

/**
 * Follows a circuit by implicit collocation. The capacitors and the charging inductor are eliminated (see
 * `FeedNetwork`) and then the channel (see `BranchSystem`), so a step solves for the gap's currents at its stages alone.
 * The exponential law makes that linear; Rompe and Weizel's takes a few Newton steps.
 */
export function createStepper(circuit: Circuit, { scratch, iterationTolerance }: StepperOptions): Stepper {
  const network =
    circuit.topology === 'charge-transfer'
      ? transferNetwork(circuit, scratch)
      : inversionNetwork(circuit, scratch);
  const { nodes, a, b, powers } = RADAU;
  const gapLaw = gapResistance(circuit.gap);
  const gap_H = circuit.gap_H;
  const channel_H = circuit.channel.inductance_H;
  const branchSystem = createBranchSystem(network, { gap_H, channel_H, scratch });
  let channelLaw: ((time_s: number) => number) | null = null;
  // One object for the whole run: a new one every step would be most of the garbage.
  const state: { -readonly [Key in keyof StepperState]: StepperState[Key] } = {
    first_V: network.start.first_V,
    second_V: network.start.second_V,
    charging_A: network.start.charging_A,
    time_s: 0,
    gap_A: 0,
    channel_A: 0,
    action_A2s: 0,
    gap_J: 0,
    channel_J: 0,
    loss_J: 0,
    fired_s: null,
  };

  const gapFree_V = scratch(S);
  const gap_ohm = scratch(S);
  const channel_ohm = scratch(S);
  const branches = { gap_A: scratch(S), channel_A: scratch(S) };
  const stages = { channel_V: scratch(S), charging_A: scratch(S) };
  const action = scratch(S);
  const square = scratch(S);
  const pull = scratch(S);
  const curves = scratch(CURVES);
  // Gap current over the step before, to guess the next by.
  const before = scratch(PIECE);
  let beforeStep = 0;
  let readyFor = 0;
  let step = 0;

  function attempt(h: number): boolean {
    if (h !== readyFor) {
      network.setStep(h);
      readyFor = h;
    }
    step = h;
    network.free(state, gapFree_V, stages.channel_V);
    if (channelLaw !== null) {
      for (let i = 0; i < S; i += 1) channel_ohm[i] = channelLaw(state.time_s + h * (nodes[i] ?? 0));
    }
    const { gap_A, channel_A } = state;
    const prepared = branchSystem.prepare({
      step: h,
      gap_A,
      channel_A,
      gapFree_V,
      channelFree_V: stages.channel_V,
      channel_ohm: channelLaw === null ? null : channel_ohm,
    });
    if (!prepared) return false;
    if (!(gapLaw.by === 'time' ? solveByTime(gapLaw.at) : solveByAction(gapLaw))) return false;
    branchSystem.follow(branches);
    network.respond(state, branches, stages);
    drawCurves();
    return true;
  }

  function solveByTime(at: (time_s: number) => number): boolean {
    for (let i = 0; i < S; i += 1) gap_ohm[i] = at(state.time_s + step * (nodes[i] ?? 0));
    return branchSystem.solve(gap_ohm, null, branches);
  }

  function solveByAction(law: Extract<typeof gapLaw, { by: 'action' }>): boolean {
    const { gap_A } = branches;
    guessGapCurrent();
    let scale = Math.abs(state.gap_A);
    for (let iteration = 0; iteration < MOST_ITERATIONS; iteration += 1) {
      resistByAction(law);
      // Not needed any more once the action is known: the squares make room for the guess.
      square.set(gap_A);
      for (let i = 0; i < S; i += 1) {
        pull[i] = 2 * step * (gap_A[i] ?? 0) * law.slope(action[i] ?? 0, gap_ohm[i] ?? 0);
      }
      if (!branchSystem.solve(gap_ohm, pull, branches)) return false;
      let moved = 0;
      for (let i = 0; i < S; i += 1) {
        const found = gap_A[i] ?? 0;
        moved = Math.max(moved, Math.abs(found - (square[i] ?? 0)));
        scale = Math.max(scale, Math.abs(found));
      }
      if (moved <= iterationTolerance * scale) {
        // The ledger wants the resistance of the currents found, not of the last guess.
        resistByAction(law);
        return true;
      }
    }
    return false;
  }

  /** Goes on with the curve of the step before, where that is not too far. */
  function guessGapCurrent(): void {
    const stretch = step / beforeStep;
    for (let i = 0; i < S; i += 1) {
      branches.gap_A[i] =
        stretch <= FARTHEST_GUESS ? pieceAt(before, 0, 1 + stretch * (nodes[i] ?? 0)) : state.gap_A;
    }
  }

  function resistByAction(law: Extract<typeof gapLaw, { by: 'action' }>): void {
    for (let j = 0; j < S; j += 1) square[j] = (branches.gap_A[j] ?? 0) ** 2;
    for (let i = 0; i < S; i += 1) {
      // A coarse guess may run below what was there: the action never falls.
      const here = state.action_A2s + Math.max(0, step * sumOfFive(a, i * S, square));
      action[i] = here;
      gap_ohm[i] = law.at(here);
    }
  }

  function drawCurves(): void {
    draw(CHANNEL_VOLTAGE, network.channelVoltage(state), stages.channel_V);
    draw(GAP_CURRENT, state.gap_A, branches.gap_A);
    if (channelLaw !== null) draw(CHANNEL_CURRENT, state.channel_A, branches.channel_A);
    if (network.hasCharging) draw(CHARGING_CURRENT, state.charging_A, stages.charging_A);
  }

  function draw(curve: number, start: number, values: Float64Array): void {
    for (let k = 0; k < PIECE; k += 1) {
      const row = k * PIECE;
      curves[curve + k] = (powers[row] ?? 0) * start + sumOfFive(powers, row + 1, values);
    }
  }

  function accept(): void {
    let action_A2 = 0;
    let gap_W = 0;
    let channel_W = 0;
    let loss_W = 0;
    for (let i = 0; i < S; i += 1) {
      const weight = b[i] ?? 0;
      const ig2 = (branches.gap_A[i] ?? 0) ** 2;
      action_A2 += weight * ig2;
      gap_W += weight * (gap_ohm[i] ?? 0) * ig2;
      if (channelLaw !== null) {
        channel_W += weight * (channel_ohm[i] ?? 0) * (branches.channel_A[i] ?? 0) ** 2;
      }
      loss_W += weight * network.loss_W(stages.channel_V[i] ?? 0, stages.charging_A[i] ?? 0);
    }
    network.advance(state, branches, stages);
    state.time_s += step;
    state.gap_A = branches.gap_A[S - 1] ?? 0;
    state.channel_A = branches.channel_A[S - 1] ?? 0;
    state.action_A2s += step * action_A2;
    state.gap_J += step * gap_W;
    state.channel_J += step * channel_W;
    state.loss_J += step * loss_W;
    for (let k = 0; k < PIECE; k += 1) before[k] = curves[GAP_CURRENT + k] ?? 0;
    beforeStep = step;
  }

  function restore(kept: StepperState): void {
    Object.assign(state, kept);
    beforeStep = 0;
    channelLaw = kept.fired_s === null ? null : channelResistance(circuit.channel, kept.fired_s);
  }

  return {
    state,
    restore,
    attempt,
    curves,
    accept,
    fire: () => {
      restore({ ...state, fired_s: state.time_s });
    },
    stored_J: () =>
      network.stored_J(state) +
      0.5 * (gap_H * state.gap_A * state.gap_A + channel_H * state.channel_A * state.channel_A),
  };
}
