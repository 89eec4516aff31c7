import type { RigSpec } from '../book/rig-spec';
import {
  idealPeakCurrent,
  inversionHalfPeriod,
  inversionPeak,
  seriesCapacitance_F,
  transferHalfPeriod,
  transferPeak,
} from '../circuit/ideals';
import { ok, type Result } from '../units/result';
import { capacitance_F } from './rig-figures';

/** Ceilings of a rig's pulse from the supply's limit, by the lossless ring: for distances and pick-up, never a forecast. */
export interface RigPulse {
  /** Highest voltage that may stand across the channel for nanoseconds, kV. */
  readonly peak_kV: number;
  /** Highest current in the gap's lead, A. */
  readonly current_A: number;
  /** Quarter period of that ring, ns. */
  readonly quarter_ns: number;
}

export function rigPulse(spec: RigSpec): Result<RigPulse> {
  const first = capacitance_F(spec.first);
  if (!first.ok) return first;
  const second = capacitance_F(spec.second);
  if (!second.ok) return second;
  const charge_V = spec.charging.supply_kV * 1000;
  const inductance_H = spec.model.gap_nH * 1e-9;
  const pair = { dump_F: first.value, peaking_F: second.value };
  const inverts = spec.topology === 'lc-inversion';
  const peak = inverts ? inversionPeak(charge_V) : transferPeak(pair, charge_V);
  if (!peak.ok) return peak;
  const half = inverts
    ? inversionHalfPeriod(first.value, inductance_H)
    : transferHalfPeriod(pair, inductance_H);
  if (!half.ok) return half;
  const current = idealPeakCurrent({
    charge_V,
    series_F: inverts ? first.value : seriesCapacitance_F(pair),
    inductance_H,
  });
  if (!current.ok) return current;
  return ok({
    peak_kV: peak.value.value / 1000,
    current_A: current.value.value,
    quarter_ns: (half.value.value / 2) * 1e9,
  });
}
