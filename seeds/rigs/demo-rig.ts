import type { RigSpec } from '../../src/domain/book/rig-spec';

/** A rig of the demo lab: what it is, how it came to be, and how its gap behaves beside the law. */
export interface DemoRig {
  readonly id: string;
  readonly name: string;
  /** Key of its make-safe sheet. */
  readonly sheet: 'make-safe-lc-inversion' | 'make-safe-charge-transfer';
  /** As it stands today: the last revision. */
  readonly spec: RigSpec;
  readonly revisions: readonly { readonly spec: RigSpec; readonly why: string }[];
  /** Envelope of the permit for each revision, within the limits of that revision. */
  readonly permits: readonly RigSpec['envelope'][];
  readonly character: {
    /** Self-break over the law, and its standard deviation. */
    readonly ratio: number;
    readonly scatter_kV: number;
    readonly working_bar_g: number;
    readonly rate_Hz: readonly number[];
    /** Of the channel's gas. */
    readonly flow_L_min: number;
  };
}
