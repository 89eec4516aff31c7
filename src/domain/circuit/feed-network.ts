/** What a circuit holds beside its two branch currents: volts on both capacitors, current in the charging inductor. */
export interface NetworkState {
  readonly first_V: number;
  readonly second_V: number;
  readonly charging_A: number;
}

/** The same at every stage of a step. */
export interface NetworkStages {
  readonly first_V: Float64Array;
  readonly second_V: Float64Array;
  readonly charging_A: Float64Array;
}

export interface BranchStages {
  readonly gap_A: Float64Array;
  readonly channel_A: Float64Array;
}

/**
 * All of a circuit but its two branches whose resistance changes. It is linear and constant, so over a step of given
 * length its answer to the branch currents at the stages is a fixed matrix, and those currents are the only unknowns of
 * a step. Voltage over the gap branch: free part - zGap ig - zCross iL; over the channel: free part - zCross ig -
 * zChannel iL.
 */
export interface FeedNetwork {
  readonly zGap: Float64Array;
  readonly zCross: Float64Array;
  readonly zChannel: Float64Array;
  readonly start: NetworkState;
  /** False where the charging current is always zero. */
  readonly hasCharging: boolean;
  /** Sets the matrices for a step length; false where they cannot be had. */
  setStep(h: number): boolean;
  /** Voltage over both branches at the stages with no current in them. */
  free(state: NetworkState, gap_V: Float64Array, channel_V: Float64Array): void;
  /** State at the stages, for the branch currents found; call after `free`. */
  respond(state: NetworkState, branches: BranchStages, out: NetworkStages): void;
  channelVoltage(first_V: number, second_V: number): number;
  /** Power lost beside gap and channel: in the bleed, or in the resistance of the charging inductor. */
  loss_W(second_V: number, charging_A: number): number;
  /** Energy in both capacitors and the charging inductor. */
  stored_J(state: NetworkState): number;
}
