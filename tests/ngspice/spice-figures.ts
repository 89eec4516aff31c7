import type { Circuit } from '../../src/domain/circuit/circuit-input';
import { netlist, type Fineness } from './netlist';
import { runNgspice, type SpiceCurves } from './ngspice-run';

/** What ngspice says about a circuit. */
export interface SpiceFigures {
  readonly peakVoltage_V: number;
  readonly rise_s: number;
  readonly peakGap_A: number;
  readonly peakChannel_A: number | null;
  readonly fired_s: number | null;
  /** ngspice's analysis of the circuit itself; the run that looked for the breakdown is left out. */
  readonly analysis_s: number;
}

/** Solves a circuit with ngspice: once with the channel open, and once more from there if it breaks down. */
export function spiceFigures(circuit: Circuit, fineness: Fineness): SpiceFigures {
  const { break_V } = circuit.channel;
  const open = runNgspice(netlist(circuit, { fineness, fired_s: null }));
  const fired_s = break_V === null ? undefined : firstCrossing(open, break_V);
  return fired_s === undefined ? figuresOf(open, null) : spiceFiguresFired(circuit, fineness, { fired_s });
}

/** The same where the time of the breakdown is known already, null for a channel that stays dark. */
export function spiceFiguresFired(
  circuit: Circuit,
  fineness: Fineness,
  { fired_s, runs = 1 }: { readonly fired_s: number | null; readonly runs?: number },
): SpiceFigures {
  return figuresOf(runNgspice(netlist(circuit, { fineness, fired_s }), runs), fired_s);
}

function figuresOf(curves: SpiceCurves, fired_s: number | null): SpiceFigures {
  const { time_s, channel_V, gap_A, channel_A, analysis_s } = curves;
  const peakVoltage_V = peakOf(time_s, channel_V);
  const low_s = firstCrossing(curves, 0.1 * peakVoltage_V) ?? Number.NaN;
  const high_s = firstCrossing(curves, 0.9 * peakVoltage_V) ?? Number.NaN;
  return {
    peakVoltage_V,
    rise_s: high_s - low_s,
    peakGap_A: peakOf(time_s, gap_A),
    peakChannel_A: fired_s === null ? null : peakOf(time_s, channel_A),
    fired_s,
    analysis_s,
  };
}

/** First time at which the size of the channel voltage reaches a level, on straight lines between the points. */
function firstCrossing({ time_s, channel_V }: SpiceCurves, level: number): number | undefined {
  const index = channel_V.findIndex((volts) => Math.abs(volts) >= level);
  if (index < 0) return undefined;
  if (index === 0) return time_s[0];
  const [t0 = 0, t1 = 0] = time_s.subarray(index - 1, index + 1);
  const [v0 = 0, v1 = 0] = channel_V.subarray(index - 1, index + 1).map(Math.abs);
  return t0 + ((t1 - t0) * (level - v0)) / (v1 - v0);
}

/** Largest size of a curve, on the parabola through the highest point and its neighbours. */
function peakOf(time_s: Float64Array, curve: Float64Array): number {
  let top = 0;
  for (let index = 1; index < curve.length; index += 1) {
    if (Math.abs(curve[index] ?? 0) > Math.abs(curve[top] ?? 0)) top = index;
  }
  if (top === 0 || top === curve.length - 1) return Math.abs(curve[top] ?? 0);
  const [t0 = 0, t1 = 0, t2 = 0] = time_s.subarray(top - 1, top + 2);
  const [v0 = 0, v1 = 0, v2 = 0] = curve.subarray(top - 1, top + 2).map(Math.abs);
  const left = (v1 - v0) / (t1 - t0);
  const right = (v2 - v1) / (t2 - t1);
  const bend = (right - left) / (t2 - t0);
  const slope = (left * (t2 - t1) + right * (t1 - t0)) / (t2 - t0);
  return bend < 0 ? v1 - (slope * slope) / (4 * bend) : v1;
}
