import type { Circuit } from '../../src/domain/circuit/circuit-input';
import { solveTransient } from '../../src/domain/circuit/transient';
import type { Fineness } from './netlist';
import { spiceFigures, type SpiceFigures } from './spice-figures';

/** Relative deviations of the solver from ngspice; null where neither has the figure. */
export interface Comparison {
  readonly circuit: Circuit;
  readonly marginal: boolean;
  readonly agreeOnFiring: boolean;
  readonly peakVoltage: number;
  readonly rise: number;
  readonly peakGap: number;
  readonly peakChannel: number | null;
  readonly audit: number;
}

export function compare(circuit: Circuit, fineness: Fineness): Comparison {
  const solved = solveTransient(circuit, { samples: 0 });
  if (!solved.ok) throw new Error(`the solver refuses a circuit: ${solved.refusal.words}`);
  const ours = solved.value;
  const spice = spiceFigures(circuit, fineness);
  const off = (key: 'peakVoltage_V' | 'rise_s' | 'peakGap_A') => ours[key] / spice[key] - 1;
  return {
    circuit,
    marginal: ours.marginal,
    agreeOnFiring: (ours.fired_s === null) === (spice.fired_s === null),
    peakVoltage: off('peakVoltage_V'),
    rise: off('rise_s'),
    peakGap: off('peakGap_A'),
    peakChannel: channelDeviation(ours.peakChannel_A, spice.peakChannel_A),
    audit: ours.energy.audit,
  };
}

function channelDeviation(ours: number | null, spice: SpiceFigures['peakChannel_A']): number | null {
  if (ours === null && spice === null) return null;
  return ours === null || spice === null ? Number.NaN : ours / spice - 1;
}
