import { ROMPE_WEIZEL_RANGE } from '../spark/spark-resistance';
import type { Answer, Warning } from '../units/answer';
import { ok, type Result } from '../units/result';
import type { Circuit, GapLaw } from './circuit-input';
import { solveTransient, type Transient, type TransientOptions } from './transient';

/** A transient with what its figures are worth. */
export interface CircuitAnswer {
  readonly transient: Transient;
  readonly peakVoltage: Answer;
  readonly timeToPeak: Answer;
  readonly rise: Answer;
  readonly peakGapCurrent: Answer;
  /** Null while the channel stays dark. */
  readonly peakChannelCurrent: Answer | null;
  /** Whether the channel fires with the parts as given, and with all variants of them alike. */
  readonly fires: { readonly asGiven: boolean; readonly always: boolean };
  readonly warnings: readonly Warning[];
}

/** Stray inductances are known no better: physics L gives 10 % for loops and 30 % for real straps. */
const INDUCTANCE_SHARE = 0.2;
/** Fall time of the exponential gap law, which stands for the other law. Own estimate. */
const FALL_SHARE = 0.3;
/** A band is far wider than what this leaves, some 1e-5 of a peak, and takes half the steps. */
const VARIANT_TOLERANCE = 1e-3;
/** Fast breakdown of a channel scatters about this much. Common practice, no source. */
const BREAK_SHARE = 0.1;

/**
 * Solves a circuit together with variants of it: the gap\u2019s law and the stray inductances at both ends of what they may
 * be, and the channel\u2019s breakdown 10 % either side. Every figure carries the band that these span; a channel that fires
 * in some of them only is said to be uncertain.
 */
export function circuitAnswer(circuit: Circuit, options: TransientOptions = {}): Result<CircuitAnswer> {
  const given = solveTransient(circuit, options);
  if (!given.ok) return given;
  const transients = [given.value];
  for (const variant of variantsOf(circuit)) {
    const solved = solveTransient(variant, { tolerance: VARIANT_TOLERANCE, ...options, samples: 0 });
    if (solved.ok) transients.push(solved.value);
    else if (solved.refusal.type === 'stopped') return solved;
  }
  const fires = given.value.fired_s !== null;
  const always = transients.every((one) => (one.fired_s !== null) === fires);
  const warnings: readonly Warning[] = always ? given.value.warnings : [...given.value.warnings, UNCERTAIN];
  const figure = (value: number, read: (one: Transient) => number | null, unit: string): Answer => {
    const all = [value, ...transients.map(read).filter((one) => one !== null)];
    const band = { low: Math.min(...all), high: Math.max(...all) };
    return { value, unit, band, warnings, model: modelOf(circuit.gap), valid: VALID };
  };
  const { peakVoltage_V, peakVoltage_s, rise_s, peakGap_A, peakChannel_A } = given.value;
  return ok({
    transient: given.value,
    peakVoltage: figure(peakVoltage_V, (one) => one.peakVoltage_V, 'V'),
    timeToPeak: figure(peakVoltage_s, (one) => one.peakVoltage_s, 's'),
    rise: figure(rise_s, (one) => one.rise_s, 's'),
    peakGapCurrent: figure(peakGap_A, (one) => one.peakGap_A, 'A'),
    peakChannelCurrent:
      peakChannel_A === null ? null : figure(peakChannel_A, (one) => one.peakChannel_A, 'A'),
    fires: { asGiven: fires, always },
    warnings,
  });
}

const VALID =
  'lumped parts, one spark channel; the band spans the gap law\u2019s constants, stray inductances \u00b120\u2009% and the channel\u2019s breakdown \u00b110\u2009%';

const UNCERTAIN: Warning = {
  type: 'may-not-fire',
  words:
    'Whether the channel fires hangs on what is not known well enough: gap law, stray inductance, breakdown.',
};

function modelOf(gap: GapLaw): string {
  return gap.law === 'exponential'
    ? 'Lumped transient, gap resistance falling exponentially'
    : 'Lumped transient, gap after Rompe and Weizel from its start resistance';
}

/** A slow and a fast gap, and a late and an early channel. */
function variantsOf(circuit: Circuit): readonly Circuit[] {
  const { channel } = circuit;
  const broken = (share: number): readonly Circuit[] =>
    channel.break_V === null
      ? []
      : [{ ...circuit, channel: { ...channel, break_V: share * channel.break_V } }];
  return [
    loopOf(circuit, { gap: slowGap(circuit.gap), share: 1 + INDUCTANCE_SHARE }),
    loopOf(circuit, { gap: fastGap(circuit.gap), share: 1 - INDUCTANCE_SHARE }),
    ...broken(1 - BREAK_SHARE),
    ...broken(1 + BREAK_SHARE),
  ];
}

function loopOf(circuit: Circuit, { gap, share }: { readonly gap: GapLaw; readonly share: number }): Circuit {
  const channel = { ...circuit.channel, inductance_H: share * circuit.channel.inductance_H };
  return { ...circuit, gap, channel, gap_H: share * circuit.gap_H };
}

function slowGap(gap: GapLaw): GapLaw {
  if (gap.law === 'exponential') return { ...gap, fall_s: (1 + FALL_SHARE) * gap.fall_s };
  const constant_cm2_atm_V2s = Math.min(gap.constant_cm2_atm_V2s, ROMPE_WEIZEL_RANGE.low);
  return { ...gap, constant_cm2_atm_V2s };
}

function fastGap(gap: GapLaw): GapLaw {
  if (gap.law === 'exponential') return { ...gap, fall_s: (1 - FALL_SHARE) * gap.fall_s };
  const constant_cm2_atm_V2s = Math.max(gap.constant_cm2_atm_V2s, ROMPE_WEIZEL_RANGE.high);
  return { ...gap, constant_cm2_atm_V2s };
}
