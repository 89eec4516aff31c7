import { channelResistance, gapResistance } from './branch-laws';
import type { Circuit } from './circuit-input';
import { radauCollocation, STAGES } from './collocation';
import { solveInPlace } from './dense-solve';
import type { NetworkState } from './feed-network';
import { inversionNetwork } from './inversion-network';
import { PIECE, pieceAt } from './piece';
import { transferNetwork } from './transfer-network';

const S = STAGES;
const RADAU = radauCollocation(S);

/** The iteration converges quadratically: what is left after a move this small is its square. */
const ITERATION_TOLERANCE = 1e-4;
/** A curve may be followed this many step lengths beyond its end for a guess. */
const FARTHEST_GUESS = 2;
const MOST_ITERATIONS = 8;

/** Offsets of the four curves in a step's buffer. */
export const CHANNEL_VOLTAGE = 0;
export const GAP_CURRENT = PIECE;
export const CHANNEL_CURRENT = 2 * PIECE;
export const CHARGING_CURRENT = 3 * PIECE;
export const CURVES = 4 * PIECE;

export interface StepperState extends NetworkState {
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

/**
 * Follows a circuit by implicit collocation. The capacitors and the charging inductor are eliminated (see
 * `FeedNetwork`), so a step solves for the branch currents at its stages alone: five unknowns before breakdown, ten
 * after it. The exponential law makes that linear; Rompe and Weizel's takes a few Newton steps.
 */
export function createStepper(circuit: Circuit): Stepper {
  const network =
    circuit.topology === 'charge-transfer'
      ? transferNetwork(circuit, RADAU)
      : inversionNetwork(circuit, RADAU);
  const { zGap, zCross, zChannel } = network;
  const { nodes, a, w, w1, b, powers } = RADAU;
  const gapLaw = gapResistance(circuit.gap);
  const gap_H = circuit.gap_H;
  const channel_H = circuit.channel.inductance_H;
  let channelLaw: ((time_s: number) => number) | null = null;
  // One object for the whole run: a new one every step would be most of the garbage.
  const state: { -readonly [Key in keyof StepperState]: StepperState[Key] } = {
    ...network.start,
    time_s: 0,
    gap_A: 0,
    channel_A: 0,
    action_A2s: 0,
    gap_J: 0,
    channel_J: 0,
    loss_J: 0,
    fired_s: null,
  };

  const matrix = new Float64Array(4 * S * S);
  const right = new Float64Array(2 * S);
  const gapFree_V = new Float64Array(S);
  const channelFree_V = new Float64Array(S);
  const gap_ohm = new Float64Array(S);
  const channel_ohm = new Float64Array(S);
  const branches = { gap_A: new Float64Array(S), channel_A: new Float64Array(S) };
  const stages = {
    first_V: new Float64Array(S),
    second_V: new Float64Array(S),
    charging_A: new Float64Array(S),
  };
  const curves = new Float64Array(CURVES);
  const action = new Float64Array(S);
  const square = new Float64Array(S);
  const voltage = new Float64Array(S);
  // Gap current over the step before, to guess the next by.
  const before = new Float64Array(PIECE);
  let beforeStep = 0;
  let readyFor = 0;
  let step = 0;

  function attempt(h: number): boolean {
    if (h !== readyFor) {
      if (!network.setStep(h)) return false;
      readyFor = h;
    }
    step = h;
    network.free(state, gapFree_V, channelFree_V);
    if (channelLaw !== null) {
      for (let i = 0; i < S; i += 1) channel_ohm[i] = channelLaw(state.time_s + h * (nodes[i] ?? 0));
    }
    if (!(gapLaw.by === 'time' ? solveByTime(gapLaw.at) : solveByAction(gapLaw))) return false;
    network.respond(state, branches, stages);
    drawCurves();
    return true;
  }

  function solveByTime(at: (time_s: number) => number): boolean {
    for (let i = 0; i < S; i += 1) gap_ohm[i] = at(state.time_s + step * (nodes[i] ?? 0));
    const width = buildSystem();
    if (!solveInPlace(matrix, right, width)) return false;
    takeSolution();
    return true;
  }

  function solveByAction(law: Extract<typeof gapLaw, { by: 'action' }>): boolean {
    guessGapCurrent();
    let scale = Math.abs(state.gap_A);
    for (let iteration = 0; iteration < MOST_ITERATIONS; iteration += 1) {
      resistByAction(law);
      const width = buildSystem();
      for (let i = 0; i < S; i += 1) {
        const pull = 2 * step * (branches.gap_A[i] ?? 0) * law.slope(action[i] ?? 0, gap_ohm[i] ?? 0);
        for (let j = 0; j < S; j += 1) {
          const entry = i * width + j;
          const guess = branches.gap_A[j] ?? 0;
          const change = pull * (a[i * S + j] ?? 0) * guess;
          matrix[entry] = (matrix[entry] ?? 0) + change;
          right[i] = (right[i] ?? 0) + change * guess;
        }
      }
      if (!solveInPlace(matrix, right, width)) return false;
      let moved = 0;
      for (let i = 0; i < S; i += 1) {
        const found = right[i] ?? 0;
        moved = Math.max(moved, Math.abs(found - (branches.gap_A[i] ?? 0)));
        scale = Math.max(scale, Math.abs(found));
      }
      takeSolution();
      if (moved <= ITERATION_TOLERANCE * scale) {
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
      let sum = 0;
      for (let j = 0; j < S; j += 1) sum += (a[i * S + j] ?? 0) * (square[j] ?? 0);
      // A coarse guess may run below what was there: the action never falls.
      const here = state.action_A2s + Math.max(0, step * sum);
      action[i] = here;
      gap_ohm[i] = law.at(here);
    }
  }

  /** Stage equations of the branches; with the channel open only the gap's. */
  function buildSystem(): number {
    const width = channelLaw === null ? S : 2 * S;
    const perGap = gap_H / step;
    const perChannel = channel_H / step;
    for (let i = 0; i < S; i += 1) {
      const row = i * width;
      for (let j = 0; j < S; j += 1) {
        const k = i * S + j;
        matrix[row + j] = perGap * (w[k] ?? 0) + (zGap[k] ?? 0);
      }
      matrix[row + i] = (matrix[row + i] ?? 0) + (gap_ohm[i] ?? 0);
      right[i] = perGap * (w1[i] ?? 0) * state.gap_A + (gapFree_V[i] ?? 0);
      if (channelLaw === null) continue;
      const low = (i + S) * width;
      for (let j = 0; j < S; j += 1) {
        const k = i * S + j;
        matrix[row + S + j] = zCross[k] ?? 0;
        matrix[low + j] = zCross[k] ?? 0;
        matrix[low + S + j] = perChannel * (w[k] ?? 0) + (zChannel[k] ?? 0);
      }
      matrix[low + S + i] = (matrix[low + S + i] ?? 0) + (channel_ohm[i] ?? 0);
      right[i + S] = perChannel * (w1[i] ?? 0) * state.channel_A + (channelFree_V[i] ?? 0);
    }
    return width;
  }

  function takeSolution(): void {
    for (let i = 0; i < S; i += 1) {
      branches.gap_A[i] = right[i] ?? 0;
      branches.channel_A[i] = channelLaw === null ? 0 : (right[i + S] ?? 0);
    }
  }

  function drawCurves(): void {
    const { first_V, second_V, charging_A } = stages;
    for (let i = 0; i < S; i += 1) voltage[i] = network.channelVoltage(first_V[i] ?? 0, second_V[i] ?? 0);
    draw(CHANNEL_VOLTAGE, network.channelVoltage(state.first_V, state.second_V), voltage);
    draw(GAP_CURRENT, state.gap_A, branches.gap_A);
    if (channelLaw !== null) draw(CHANNEL_CURRENT, state.channel_A, branches.channel_A);
    if (network.hasCharging) draw(CHARGING_CURRENT, state.charging_A, charging_A);
  }

  function draw(curve: number, start: number, values: Float64Array): void {
    for (let k = 0; k < PIECE; k += 1) {
      const row = k * PIECE;
      let sum = (powers[row] ?? 0) * start;
      for (let i = 0; i < S; i += 1) sum += (powers[row + 1 + i] ?? 0) * (values[i] ?? 0);
      curves[curve + k] = sum;
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
      loss_W += weight * network.loss_W(stages.second_V[i] ?? 0, stages.charging_A[i] ?? 0);
    }
    const last = S - 1;
    state.time_s += step;
    state.first_V = stages.first_V[last] ?? 0;
    state.second_V = stages.second_V[last] ?? 0;
    state.charging_A = stages.charging_A[last] ?? 0;
    state.gap_A = branches.gap_A[last] ?? 0;
    state.channel_A = branches.channel_A[last] ?? 0;
    state.action_A2s += step * action_A2;
    state.gap_J += step * gap_W;
    state.channel_J += step * channel_W;
    state.loss_J += step * loss_W;
    before.set(curves.subarray(GAP_CURRENT, GAP_CURRENT + PIECE));
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
