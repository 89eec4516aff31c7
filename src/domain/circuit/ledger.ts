import type { Circuit } from './circuit-input';
import type { Run } from './integrate';

/** Where the energy of a shot went by the end of the window. */
export interface EnergyLedger {
  readonly start_J: number;
  readonly gap_J: number;
  readonly channel_J: number;
  /** In the bleed, or in the resistance of the charging inductor. */
  readonly feed_J: number;
  /** Still in capacitors and inductors. */
  readonly left_J: number;
  /** What is missing or too much, as a share of the start: the error of the computation. */
  readonly audit: number;
}

/** Energy in the capacitors before the gap closes, J. */
export function startEnergy_J(circuit: Circuit): number {
  const charged_F =
    circuit.topology === 'charge-transfer' ? circuit.dump_F : circuit.first_F + circuit.second_F;
  return 0.5 * charged_F * circuit.charge_V ** 2;
}

export function ledgerOf(circuit: Circuit, { end, left_J }: Run): EnergyLedger {
  const start_J = startEnergy_J(circuit);
  const { gap_J, channel_J, loss_J: feed_J } = end;
  return {
    start_J,
    gap_J,
    channel_J,
    feed_J,
    left_J,
    audit: (left_J + gap_J + channel_J + feed_J) / start_J - 1,
  };
}
