import type { TransferCircuit } from './circuit-input';
import { STAGES, type Collocation } from './collocation';
import { invertInto, multiplyInto } from './dense-solve';
import type { FeedNetwork } from './feed-network';

const S = STAGES;

/** Charge transfer (physics D): CD vD' = -ig; CP vP' = ig - iL - vP/R. The gap stands between them. */
export function transferNetwork(circuit: TransferCircuit, { a }: Collocation): FeedNetwork {
  const { charge_V, dump_F, peaking_F, bleed_ohm } = circuit;
  const bleed_S = bleed_ohm === null ? 0 : 1 / bleed_ohm;
  const scratch = new Float64Array(S * S);
  const decay = new Float64Array(S * S);
  // How a voltage left on the peaking capacitor falls by itself, at the stages.
  const kept = new Float64Array(S);
  const zGap = new Float64Array(S * S);
  const zCross = new Float64Array(S * S);
  const zChannel = new Float64Array(S * S);
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
      for (let k = 0; k < S * S; k += 1) scratch[k] = leak * (a[k] ?? 0);
      for (let i = 0; i < S; i += 1) scratch[i * (S + 1)] = (scratch[i * (S + 1)] ?? 0) + 1;
      if (!invertInto(scratch, decay, S)) return false;
      multiplyInto(zChannel, decay, { other: a, factor: perPeaking, n: S });
      for (let k = 0; k < S * S; k += 1) {
        const z = zChannel[k] ?? 0;
        zCross[k] = -z;
        zGap[k] = perDump * (a[k] ?? 0) + z;
      }
      for (let i = 0; i < S; i += 1) {
        let sum = 0;
        for (let j = 0; j < S; j += 1) sum += decay[i * S + j] ?? 0;
        kept[i] = sum;
      }
      return true;
    },
    free({ first_V, second_V }, gap_V, channel_V) {
      for (let i = 0; i < S; i += 1) {
        const peaking_V = (kept[i] ?? 0) * second_V;
        channel_V[i] = peaking_V;
        gap_V[i] = first_V - peaking_V;
      }
    },
    respond({ first_V, second_V }, { gap_A, channel_A }, out) {
      for (let i = 0; i < S; i += 1) {
        let dump_V = first_V;
        let peaking_V = (kept[i] ?? 0) * second_V;
        for (let j = 0; j < S; j += 1) {
          const ig = gap_A[j] ?? 0;
          dump_V -= perDump * (a[i * S + j] ?? 0) * ig;
          peaking_V += (zChannel[i * S + j] ?? 0) * (ig - (channel_A[j] ?? 0));
        }
        out.first_V[i] = dump_V;
        out.second_V[i] = peaking_V;
        out.charging_A[i] = 0;
      }
    },
    channelVoltage: (_first_V, second_V) => second_V,
    loss_W: (second_V) => bleed_S * second_V * second_V,
    stored_J: ({ first_V, second_V }) => 0.5 * (dump_F * first_V * first_V + peaking_F * second_V * second_V),
  };
}
