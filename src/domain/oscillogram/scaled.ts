import type { Envelope } from './extremes';
import type { PulseFigures, Ring } from './measure';
import type { TraceSurvey } from './survey';

/** What somebody said of a channel. */
export interface ChannelScale {
  /** Volts, or amperes, for one of the file's figures, the probe left out. */
  readonly unit_V_or_A: number;
  readonly probe_ratio: number;
  readonly inverted: boolean;
}

/** What one of the file's figures is worth, V or A: unit, probe and sign. Every figure of a channel goes with it. */
export function channelScale({ unit_V_or_A, probe_ratio, inverted }: ChannelScale): number {
  return unit_V_or_A * probe_ratio * (inverted ? -1 : 1);
}

/**
 * By how much the file's seconds are to be stretched: where it does not say its unit, or the time between two points,
 * somebody did.
 */
export function timeScale({ unit_s }: TraceSurvey['time'], time_unit_s: number): number {
  return unit_s === null ? time_unit_s : time_unit_s / unit_s;
}

/** A negative scale turns a trace over, and its lowest becomes its highest. */
export function scaledEnvelope(of: Envelope, scale: number, stretch: number): Envelope {
  const times = (values: Float64Array) => values.map((value) => value * scale);
  const [low, high] = scale < 0 ? [times(of.high), times(of.low)] : [times(of.low), times(of.high)];
  return { from_s: of.from_s * stretch, to_s: of.to_s * stretch, low, high };
}

export function scaledPulse(of: PulseFigures, scale: number, stretch: number): PulseFigures {
  const time = (one: number | null) => (one === null ? null : one * stretch);
  return {
    rest: of.rest * scale,
    peak: of.peak * scale,
    noise: of.noise * Math.abs(scale),
    peak_s: of.peak_s * stretch,
    rise_s: time(of.rise_s),
    start_s: time(of.start_s),
    half_s: time(of.half_s),
  };
}

export function scaledRing(of: Ring, stretch: number): Ring {
  const { value, band } = of.frequency_Hz;
  return {
    ...of,
    frequency_Hz: {
      ...of.frequency_Hz,
      value: value / stretch,
      band: { low: band.low / stretch, high: band.high / stretch },
    },
  };
}
