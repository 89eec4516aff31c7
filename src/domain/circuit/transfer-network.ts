import type { TransferCircuit } from './circuit-input';
import { STAGES } from './collocation';
import type { FeedNetwork } from './feed-network';
import { matrixOf, MODE_COUNT, MODE_IM, MODE_RE, RADAU, rowSumsOf, sumOfFive, WEIGHTS } from './method';
import type { Scratch } from './scratch';

const S = STAGES;

/** Length of scratch that a network takes. */
export const TRANSFER_SCRATCH = 3 * S * S + S + WEIGHTS;

/** Charge transfer (physics D): CD vD' = -ig; CP vP' = ig - iL - vP/R. The gap stands between them. */
export function transferNetwork(circuit: TransferCircuit, scratch: Scratch): FeedNetwork {
  const { charge_V, dump_F, peaking_F, bleed_ohm } = circuit;
  const { a, b } = RADAU;
  const bleed_S = bleed_ohm === null ? 0 : 1 / bleed_ohm;
  const zGap = scratch(S * S);
  const zCross = scratch(S * S);
  const zChannel = scratch(S * S);
  // How a voltage left on the peaking capacitor falls by itself, at the stages.
  const kept = scratch(S);
  const weights = scratch(WEIGHTS);
  let perDump = 0;
  return {
    zGap,
    zCross,
    zChannel,
    start: { first_V: charge_V, second_V: 0, charging_A: 0 },
    hasCharging: false,
    setStep(h) {
      perDump = h / dump_F;
      const perPeaking = h / peaking_F;
      const leak = perPeaking * bleed_S;
      // 1/(1 + leak x) at every mode x, then x times it.
      for (let mode = 0; mode < MODE_COUNT; mode += 1) {
        const re = 1 + leak * (MODE_RE[mode] ?? 0);
        const im = leak * (MODE_IM[mode] ?? 0);
        const size = re * re + im * im;
        weights[2 * mode] = re / size;
        weights[2 * mode + 1] = -im / size;
      }
      rowSumsOf(weights, kept);
      for (let mode = 0; mode < MODE_COUNT; mode += 1) {
        const x = MODE_RE[mode] ?? 0;
        const y = MODE_IM[mode] ?? 0;
        const re = weights[2 * mode] ?? 0;
        const im = weights[2 * mode + 1] ?? 0;
        weights[2 * mode] = perPeaking * (x * re - y * im);
        weights[2 * mode + 1] = perPeaking * (x * im + y * re);
      }
      matrixOf(weights, zChannel);
      for (let k = 0; k < S * S; k += 1) {
        const z = zChannel[k] ?? 0;
        zCross[k] = -z;
        zGap[k] = perDump * (a[k] ?? 0) + z;
      }
    },
    free({ first_V, second_V }, gap_V, channel_V) {
      for (let i = 0; i < S; i += 1) {
        const peaking_V = (kept[i] ?? 0) * second_V;
        channel_V[i] = peaking_V;
        gap_V[i] = first_V - peaking_V;
      }
    },
    respond(_state, { gap_A, channel_A }, { channel_V }) {
      for (let i = 0; i < S; i += 1) {
        channel_V[i] =
          (channel_V[i] ?? 0) + sumOfFive(zChannel, i * S, gap_A) - sumOfFive(zChannel, i * S, channel_A);
      }
    },
    advance(state, { gap_A }, { channel_V }) {
      state.first_V -= perDump * sumOfFive(b, 0, gap_A);
      state.second_V = channel_V[S - 1] ?? 0;
    },
    channelVoltage: ({ second_V }) => second_V,
    loss_W: (channel_V) => bleed_S * channel_V * channel_V,
    stored_J: ({ first_V, second_V }) => 0.5 * (dump_F * first_V * first_V + peaking_F * second_V * second_V),
  };
}
