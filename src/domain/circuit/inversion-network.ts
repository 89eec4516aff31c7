import type { InversionCircuit } from './circuit-input';
import { STAGES } from './collocation';
import type { FeedNetwork } from './feed-network';
import { matrixOf, MODE_COUNT, MODE_IM, MODE_RE, RADAU, rowSumsOf, sumOfFive, WEIGHTS } from './method';
import type { Scratch } from './scratch';

const S = STAGES;

/** Length of scratch that a network takes. */
export const INVERSION_SCRATCH = 5 * S * S + 5 * S + 4 * WEIGHTS;

/**
 * LC inversion (physics D): C1 va' = -ig + iL - ic; C2 vb' = -iL + ic; Lc ic' = va - vb - Rc ic. The gap shorts va, the
 * channel sees vb - va.
 */
export function inversionNetwork(circuit: InversionCircuit, scratch: Scratch): FeedNetwork {
  const { charge_V, first_F, second_F, charging_H, charging_ohm } = circuit;
  const { a, b } = RADAU;
  const zGap = scratch(S * S);
  const zCross = scratch(S * S);
  const zChannel = scratch(S * S);
  // Charging current for a charge that has left either capacitor, and the charge of it.
  const current = scratch(S * S);
  const charge = scratch(S * S);
  // What a charging current and a voltage across it at the start give by themselves: current and charge at the stages.
  const currentOfCurrent = scratch(S);
  const currentOfVoltage = scratch(S);
  const chargeOfCurrent = scratch(S);
  const chargeOfVoltage = scratch(S);
  const flow = scratch(S);
  const decay = scratch(WEIGHTS);
  const admittance = scratch(WEIGHTS);
  const decayCharge = scratch(WEIGHTS);
  const admittanceCharge = scratch(WEIGHTS);
  let perFirst = 0;
  let perSecond = 0;
  return {
    zGap,
    zCross,
    zChannel,
    start: { first_V: charge_V, second_V: charge_V, charging_A: 0 },
    hasCharging: true,
    setStep(h) {
      perFirst = h / first_F;
      perSecond = h / second_F;
      const series = perFirst + perSecond;
      const perHenry = h / charging_H;
      const damping = perHenry * charging_ohm;
      const ring = perHenry * series;
      // At every mode x: 1/(1 + damping x + ring x^2), and the charging branch's admittance x/Lc times that.
      for (let mode = 0; mode < MODE_COUNT; mode += 1) {
        const x = MODE_RE[mode] ?? 0;
        const y = MODE_IM[mode] ?? 0;
        const re = 1 + damping * x + ring * (x * x - y * y);
        const im = damping * y + 2 * ring * x * y;
        const size = re * re + im * im;
        const even = 2 * mode;
        const odd = even + 1;
        const dRe = (decay[even] = re / size);
        const dIm = (decay[odd] = -im / size);
        const qRe = (decayCharge[even] = x * dRe - y * dIm);
        const qIm = (decayCharge[odd] = x * dIm + y * dRe);
        const aRe = (admittance[even] = perHenry * qRe);
        const aIm = (admittance[odd] = perHenry * qIm);
        admittanceCharge[even] = x * aRe - y * aIm;
        admittanceCharge[odd] = x * aIm + y * aRe;
      }
      rowSumsOf(decay, currentOfCurrent);
      rowSumsOf(admittance, currentOfVoltage);
      rowSumsOf(decayCharge, chargeOfCurrent);
      rowSumsOf(admittanceCharge, chargeOfVoltage);
      // Volts of the flow count with x once more: the charge, and the charge of that.
      matrixOf(admittanceCharge, current);
      for (let mode = 0; mode < MODE_COUNT; mode += 1) {
        const x = MODE_RE[mode] ?? 0;
        const y = MODE_IM[mode] ?? 0;
        const re = admittanceCharge[2 * mode] ?? 0;
        const im = admittanceCharge[2 * mode + 1] ?? 0;
        admittanceCharge[2 * mode] = x * re - y * im;
        admittanceCharge[2 * mode + 1] = x * im + y * re;
      }
      matrixOf(admittanceCharge, charge);
      for (let k = 0; k < S * S; k += 1) {
        const one = a[k] ?? 0;
        const two = charge[k] ?? 0;
        zGap[k] = perFirst * (one - perFirst * two);
        zCross[k] = -perFirst * (one - series * two);
        zChannel[k] = series * (one - series * two);
      }
    },
    free({ first_V, second_V, charging_A }, gap_V, channel_V) {
      const across_V = first_V - second_V;
      for (let i = 0; i < S; i += 1) {
        const flown = (chargeOfCurrent[i] ?? 0) * charging_A + (chargeOfVoltage[i] ?? 0) * across_V;
        gap_V[i] = first_V - perFirst * flown;
        channel_V[i] = (perFirst + perSecond) * flown - across_V;
      }
    },
    respond({ first_V, second_V, charging_A }, { gap_A, channel_A }, out) {
      const series = perFirst + perSecond;
      const across_V = first_V - second_V;
      for (let i = 0; i < S; i += 1) {
        out.charging_A[i] = (currentOfCurrent[i] ?? 0) * charging_A + (currentOfVoltage[i] ?? 0) * across_V;
        flow[i] = series * (channel_A[i] ?? 0) - perFirst * (gap_A[i] ?? 0);
      }
      for (let i = 0; i < S; i += 1) {
        const row = i * S;
        out.charging_A[i] = (out.charging_A[i] ?? 0) + sumOfFive(current, row, flow);
        out.channel_V[i] =
          (out.channel_V[i] ?? 0) - sumOfFive(zCross, row, gap_A) - sumOfFive(zChannel, row, channel_A);
      }
    },
    advance(state, { gap_A, channel_A }, { charging_A }) {
      const across = sumOfFive(b, 0, channel_A) - sumOfFive(b, 0, charging_A);
      state.first_V -= perFirst * (sumOfFive(b, 0, gap_A) - across);
      state.second_V -= perSecond * across;
      state.charging_A = charging_A[S - 1] ?? 0;
    },
    channelVoltage: ({ first_V, second_V }) => second_V - first_V,
    loss_W: (_channel_V, charging_A) => charging_ohm * charging_A * charging_A,
    stored_J: ({ first_V, second_V, charging_A }) =>
      0.5 *
      (first_F * first_V * first_V + second_F * second_V * second_V + charging_H * charging_A * charging_A),
  };
}
