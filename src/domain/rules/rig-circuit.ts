import type { CapacitorSpec, RigSpec } from '../book/rig-spec';
import { plyThickness_m } from '../capacitor/capacitance';
import { gainWindow, type GainVerdict } from '../channel/gain-window';
import { circuitAnswer, type CircuitAnswer } from '../circuit/circuit-answer';
import type { Circuit } from '../circuit/circuit-input';
import { circuitFrom, windowFor, type BenchGapLaw, type CircuitParts } from '../circuit/circuit-parts';
import { currentRise_s } from '../circuit/current-rise';
import { uniformBreakdown } from '../gap/uniform-law';
import type { Feed } from '../line/lumped-verdict';
import { sheetFeed } from '../line/sheet-feed';
import type { Answer } from '../units/answer';
import { mapResult, ok, refused, type Result } from '../units/result';
import { capacitance_F } from './rig-figures';

/** Where a rig is fired: voltage and pressure of its gap, and the air that its channel stands in. */
export interface RigPoint {
  readonly charge_kV: number;
  /** Of the spark gap. */
  readonly pressure_bar_abs: number;
  /** Of the channel, which is open to the air. */
  readonly ambient_bar_abs: number;
  readonly temperature_C: number;
}

/** A rig as the solver takes it, and what had to be assumed for it. */
export interface RigCircuit {
  readonly parts: CircuitParts;
  readonly circuit: Circuit;
  /** The sheet that is switched; null where the switched capacitor is a bank. */
  readonly feed: Feed | null;
  /** Of the laser channel at its narrower end, kV. */
  readonly staticBreak: Answer;
  /** What is assumed, each as words for a list: "gap law". Empty where everything was measured. */
  readonly assumed: readonly string[];
}

/**
 * What rigs of this kind have where nobody measured it. Rompe and Weizel's constant lies in the middle of what has been
 * published (physics B); the channel breaks at 1.25 to 1.35 of its static voltage and then falls within nanoseconds, which
 * is practice without a source.
 */
export const GAP_LAW = {
  law: 'rompe-weizel',
  end_ohm: 0.1,
  start_ohm: 1000,
  constant_cm2_atm_V2s: 1,
  fall_ns: 1,
} as const;
export const CHANNEL_LAW = { over_static: 1.3, end_ohm: 0.5, start_ohm: 1000, fall_ns: 2 } as const;
/** Of a resistor across the channel with its leads, some ten centimetres. Practice, no source. */
export const LEADS_UH = 0.1;
/** Of a charging inductor whose resistance is not said. */
export const INDUCTOR_OHM = 1;

/**
 * The rig's circuit at a point (physics D). A sheet that is switched becomes a feed, with the current along its longer
 * side, so that the solver refuses a wave shape where waves travel. Refused for a channel gas without a law, an LC
 * inversion with nothing across its channel, and numbers out of range.
 */
export function circuitOf(spec: RigSpec, at: RigPoint): Result<RigCircuit> {
  const first = capacitance_F(spec.first);
  if (!first.ok) return first;
  const second = capacitance_F(spec.second);
  if (!second.ok) return second;
  const feed = feedOf(spec.first);
  if (!feed.ok) return feed;
  const staticBreak = channelStatic(spec, at);
  if (!staticBreak.ok) return staticBreak;
  const loop = {
    topology: spec.topology,
    first_nF: first.value * 1e9,
    second_nF: second.value * 1e9,
    gap_nH: spec.model.gap_nH,
    feed: feed.value,
  };
  const half_ns = windowFor(loop) / 4;
  const charging = chargingElement(spec, half_ns);
  if (!charging.ok) return charging;
  const law = spec.model.channel_law ?? CHANNEL_LAW;
  const parts: CircuitParts = {
    ...loop,
    ...charging.value.parts,
    charge_kV: at.charge_kV,
    gap: gapLaw(spec, at.pressure_bar_abs),
    channel_nH: spec.model.channel_nH,
    channel: {
      break_kV: law.over_static * staticBreak.value.value,
      end_ohm: law.end_ohm,
      start_ohm: law.start_ohm,
      fall_ns: law.fall_ns,
    },
    window_ns: windowFor(loop),
  };
  return ok({
    parts,
    circuit: circuitFrom(parts),
    feed: feed.value,
    staticBreak: staticBreak.value,
    assumed: [...assumedLaws(spec), ...charging.value.assumed, ...assumedSheet(spec)],
  });
}

/** Static break of the laser channel at its narrower end, kV, by the uniform law at ambient pressure. */
export function channelStatic(
  { channel }: Pick<RigSpec, 'channel'>,
  { ambient_bar_abs, temperature_C }: Pick<RigPoint, 'ambient_bar_abs' | 'temperature_C'>,
): Result<Answer> {
  const broken = uniformBreakdown(channel.gas, {
    pressure_bar_abs: ambient_bar_abs,
    gap_cm: narrowest_mm(channel) / 10,
    temperature_C,
  });
  if (broken.ok) return broken;
  const { type, words } = broken.refusal;
  return refused({ type, field: 'channel', words: `Channel: ${words}` });
}

/** The sheet that the switched capacitor is made of, as its loop sees it; null for a bank of parts. */
export function feedOf(capacitor: CapacitorSpec): Result<Feed | null> {
  if (capacitor.kind === 'bank') return ok(null);
  const { length_mm, width_mm, plies, ply_um, eps_r, plate_pairs } = capacitor;
  const thickness = plyThickness_m(plies, ply_um);
  if (!thickness.ok) return thickness;
  return sheetFeed({
    along_m: Math.max(length_mm, width_mm) / 1000,
    across_m: Math.min(length_mm, width_mm) / 1000,
    thickness_m: thickness.value,
    eps_r,
    pairs: plate_pairs,
  });
}

/** A rig's transient with what it is worth, and the gain window of its channel. */
export interface RigTransient extends RigCircuit {
  readonly answer: CircuitAnswer;
  /** 10 to 90 % of the channel's current, s; null while the channel stays dark. */
  readonly currentRise_s: number | null;
  /** Null while the channel stays dark, and for a gas that is neither nitrogen nor air. */
  readonly gain: GainVerdict | null;
}

/** Points of a rig's wave shape. The rise of the current is read from them, so every screen draws as many. */
export const WAVE_POINTS = 400;

/** Share of oxygen in bottled nitrogen that flows through an open channel; assumed. */
export const BOTTLED_OXYGEN = 0.001;
export const AIR_OXYGEN = 0.21;

/** The wave shape of a rig fired at a point, with its bands: five solves of about a millisecond each. */
export function rigTransient(
  spec: RigSpec,
  at: RigPoint,
  options: { readonly shouldStop?: () => boolean } = {},
): Result<RigTransient> {
  const rig = circuitOf(spec, at);
  if (!rig.ok) return rig;
  return mapResult(circuitAnswer(rig.value.circuit, { samples: WAVE_POINTS, ...options }), (answer) => ({
    ...rig.value,
    answer,
    currentRise_s: currentRise_s(answer.transient.waveform),
    gain: channelGain(answer, {
      gas: spec.channel.gas,
      spacing_mm: narrowest_mm(spec.channel),
      staticBreak_kV: rig.value.staticBreak.value,
      ambient_bar_abs: at.ambient_bar_abs,
      temperature_C: at.temperature_C,
      oxygen_share: null,
    }),
  }));
}

export interface GainChannel {
  readonly gas: string;
  readonly spacing_mm: number;
  readonly staticBreak_kV: number;
  readonly ambient_bar_abs: number;
  readonly temperature_C: number;
  /** Null for what bottled nitrogen, or air, has. */
  readonly oxygen_share: number | null;
}

/** How far a solved circuit meets the conditions for gain in nitrogen; null where it says nothing. */
export function channelGain({ transient }: CircuitAnswer, channel: GainChannel): GainVerdict | null {
  const rise_s = currentRise_s(transient.waveform);
  if (rise_s === null || (channel.gas !== 'N2' && channel.gas !== 'air')) return null;
  const gain = gainWindow({
    currentRise_ns: rise_s * 1e9,
    peak_kV: transient.peakVoltage_V / 1000,
    staticBreak_kV: channel.staticBreak_kV,
    gap_cm: channel.spacing_mm / 10,
    pressure_bar_abs: channel.ambient_bar_abs,
    temperature_C: channel.temperature_C,
    oxygen_share: channel.oxygen_share ?? (channel.gas === 'air' ? AIR_OXYGEN : BOTTLED_OXYGEN),
  });
  return gain.ok ? gain.value : null;
}

export function narrowest_mm({ spacing_a_mm, spacing_b_mm }: RigSpec['channel']): number {
  return Math.min(spacing_a_mm, spacing_b_mm);
}

function gapLaw({ gap, model }: RigSpec, pressure_bar_abs: number): BenchGapLaw {
  const { law, end_ohm, start_ohm, ...rest } = model.gap_law ?? GAP_LAW;
  return law === 'exponential'
    ? { law, end_ohm, start_ohm, fall_ns: rest.fall_ns ?? GAP_LAW.fall_ns }
    : {
        law,
        end_ohm,
        start_ohm,
        gap_mm: gap.gap_mm,
        pressure_bar_abs,
        constant_cm2_atm_V2s: rest.constant_cm2_atm_V2s ?? GAP_LAW.constant_cm2_atm_V2s,
      };
}

function assumedLaws({ model, gap }: RigSpec): readonly string[] {
  const { gap_law: own, channel_law: channel, known } = model;
  const gasless =
    (own?.law ?? GAP_LAW.law) === 'rompe-weizel' && gap.gas !== 'N2' && gap.gas !== 'air'
      ? ', with a constant of air and nitrogen'
      : '';
  const incomplete = own?.law === 'exponential' ? own.fall_ns === null : own?.constant_cm2_atm_V2s === null;
  return [
    ...(known === 'assumed' ? ['gap and channel inductance'] : []),
    ...(own === undefined || own.known === 'assumed' || incomplete || gasless !== ''
      ? [`gap law${gasless}`]
      : []),
    ...(channel === undefined || channel.known === 'assumed' ? ['channel law and its breakdown'] : []),
  ];
}

function assumedSheet({ first }: RigSpec): readonly string[] {
  return first.kind === 'sheet' ? ['current along the longer side of the sheet'] : [];
}

interface Across {
  readonly parts: Pick<CircuitParts, 'across_kohm' | 'charging_uH' | 'charging_ohm'>;
  readonly assumed: readonly string[];
}

function chargingElement(spec: RigSpec, half_ns: number): Result<Across> {
  const { topology, channel, charging, nodes } = spec;
  const { inductor_uH, inductor_ohm } = charging;
  if (topology === 'charge-transfer') {
    const bleed = nodes.find((node) => node.holds === 'second')?.bleed_Mohm ?? null;
    const across_kohm = channel.across_kohm ?? (bleed === null ? null : bleed * 1000);
    return ok({ parts: { across_kohm, charging_uH: LEADS_UH, charging_ohm: 0 }, assumed: [] });
  }
  const resistor_ohm = channel.across_kohm === null ? null : channel.across_kohm * 1000;
  if (inductor_uH === undefined && resistor_ohm === null) {
    return refused({
      type: 'nothing-across-channel',
      field: 'channel.across_kohm',
      words: 'Across the channel: an LC inversion charges C2 through something across its channel.',
    });
  }
  // The solver takes one element: the one that carries more while the swing lasts.
  const reactance_ohm = inductor_uH === undefined ? Infinity : (Math.PI * inductor_uH * 1000) / half_ns;
  if (inductor_uH !== undefined && reactance_ohm <= (resistor_ohm ?? Infinity)) {
    return ok({
      parts: { across_kohm: null, charging_uH: inductor_uH, charging_ohm: inductor_ohm ?? INDUCTOR_OHM },
      assumed: [
        ...(inductor_ohm === undefined ? ['resistance of the charging inductor'] : []),
        ...(resistor_ohm === null ? [] : ['no current through the resistor beside the inductor']),
      ],
    });
  }
  return ok({
    parts: { across_kohm: null, charging_uH: LEADS_UH, charging_ohm: resistor_ohm ?? 0 },
    assumed: [
      'leads of the resistor across the channel',
      ...(inductor_uH === undefined ? [] : ['no current through the inductor beside the resistor']),
    ],
  });
}
