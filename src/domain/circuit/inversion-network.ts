import type { InversionCircuit } from './circuit-input';
import { STAGES, type Collocation } from './collocation';
import { invertInto, multiplyInto } from './dense-solve';
import type { FeedNetwork } from './feed-network';

const S = STAGES;

/**
 * LC inversion (physics D): C1 va' = -ig + iL - ic; C2 vb' = -iL + ic; Lc ic' = va - vb - Rc ic. The gap shorts va, the
 * channel sees vb - va.
 */
export function inversionNetwork(circuit: InversionCircuit, { a, w, w1 }: Collocation): FeedNetwork {
  const { charge_V, first_F, second_F, charging_H, charging_ohm } = circuit;
  const scratch = new Float64Array(S * S);
  const admittance = new Float64Array(S * S);
  // Admittance times `a`, and `a` times that.
  const once = new Float64Array(S * S);
  const twice = new Float64Array(S * S);
  const chargingFree = new Float64Array(S);
  const zGap = new Float64Array(S * S);
  const zCross = new Float64Array(S * S);
  const zChannel = new Float64Array(S * S);
  let perFirst = 0;
  let perSecond = 0;
  let perStep = 0;
  return {
    zGap,
    zCross,
    zChannel,
    start: { first_V: charge_V, second_V: charge_V, charging_A: 0 },
    hasCharging: true,
    setStep(h) {
      perFirst = h / first_F;
      perSecond = h / second_F;
      perStep = charging_H / h;
      const series = perFirst + perSecond;
      for (let k = 0; k < S * S; k += 1) scratch[k] = perStep * (w[k] ?? 0) + series * (a[k] ?? 0);
      for (let i = 0; i < S; i += 1) scratch[i * (S + 1)] = (scratch[i * (S + 1)] ?? 0) + charging_ohm;
      if (!invertInto(scratch, admittance, S)) return false;
      multiplyInto(once, admittance, { other: a, factor: 1, n: S });
      multiplyInto(twice, a, { other: once, factor: 1, n: S });
      for (let k = 0; k < S * S; k += 1) {
        const one = a[k] ?? 0;
        const two = twice[k] ?? 0;
        zGap[k] = perFirst * (one - perFirst * two);
        zCross[k] = -perFirst * (one - series * two);
        zChannel[k] = series * (one - series * two);
      }
      return true;
    },
    free({ first_V, second_V, charging_A }, gap_V, channel_V) {
      for (let i = 0; i < S; i += 1) {
        let sum = 0;
        for (let j = 0; j < S; j += 1) {
          sum += (admittance[i * S + j] ?? 0) * (perStep * (w1[j] ?? 0) * charging_A + first_V - second_V);
        }
        chargingFree[i] = sum;
      }
      for (let i = 0; i < S; i += 1) {
        let charge = 0;
        for (let j = 0; j < S; j += 1) charge += (a[i * S + j] ?? 0) * (chargingFree[j] ?? 0);
        gap_V[i] = first_V - perFirst * charge;
        channel_V[i] = second_V - first_V + (perFirst + perSecond) * charge;
      }
    },
    respond({ first_V, second_V }, { gap_A, channel_A }, out) {
      const series = perFirst + perSecond;
      for (let i = 0; i < S; i += 1) {
        let current = chargingFree[i] ?? 0;
        for (let j = 0; j < S; j += 1) {
          const flow = series * (channel_A[j] ?? 0) - perFirst * (gap_A[j] ?? 0);
          current += (once[i * S + j] ?? 0) * flow;
        }
        out.charging_A[i] = current;
      }
      for (let i = 0; i < S; i += 1) {
        let fromFirst = 0;
        let fromSecond = 0;
        for (let j = 0; j < S; j += 1) {
          const share = a[i * S + j] ?? 0;
          const across = (channel_A[j] ?? 0) - (out.charging_A[j] ?? 0);
          fromFirst += share * ((gap_A[j] ?? 0) - across);
          fromSecond += share * across;
        }
        out.first_V[i] = first_V - perFirst * fromFirst;
        out.second_V[i] = second_V - perSecond * fromSecond;
      }
    },
    channelVoltage: (first_V, second_V) => second_V - first_V,
    loss_W: (_second_V, charging_A) => charging_ohm * charging_A * charging_A,
    stored_J: ({ first_V, second_V, charging_A }) =>
      0.5 *
      (first_F * first_V * first_V + second_F * second_V * second_V + charging_H * charging_A * charging_A),
  };
}
