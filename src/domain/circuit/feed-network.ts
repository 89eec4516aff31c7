/** What a circuit holds beside its two branch currents: volts on both capacitors, current in the charging inductor. */
export interface NetworkState {
  first_V: number;
  second_V: number;
  charging_A: number;
}

/** What is wanted of it at every stage of a step. */
export interface NetworkStages {
  readonly channel_V: Float64Array;
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
 * zChannel iL. All these matrices are functions of the method's own, its impedances at 1/(h a), so they come from
 * its modes.
 */
export interface FeedNetwork {
  readonly zGap: Float64Array;
  readonly zCross: Float64Array;
  readonly zChannel: Float64Array;
  readonly start: Readonly<NetworkState>;
  /** False where the charging current is always zero. */
  readonly hasCharging: boolean;
  /** Sets the matrices for a step length. */
  setStep(h: number): void;
  /** Voltage over both branches at the stages with no current in them. */
  free(state: Readonly<NetworkState>, gap_V: Float64Array, channel_V: Float64Array): void;
  /** The stages for the branch currents found; `out.channel_V` comes in as `free` left it. */
  respond(state: Readonly<NetworkState>, branches: BranchStages, out: NetworkStages): void;
  /** Moves the state to the end of the step. */
  advance(state: NetworkState, branches: BranchStages, stages: NetworkStages): void;
  channelVoltage(state: Readonly<NetworkState>): number;
  /** Power lost beside gap and channel: in the bleed, or in the resistance of the charging inductor. */
  loss_W(channel_V: number, charging_A: number): number;
  /** Energy in both capacitors and the charging inductor. */
  stored_J(state: Readonly<NetworkState>): number;
}
