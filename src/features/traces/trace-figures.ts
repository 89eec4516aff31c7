import type { TraceReading } from '../../domain/book/bodies/note-bodies';
import type { BodyOf } from '../../domain/book/kinds';
import { ringInductance } from '../../domain/oscillogram/measure';
import { channelScale, scaledPulse, scaledRing, timeScale } from '../../domain/oscillogram/scaled';
import type { TraceSurvey } from '../../domain/oscillogram/survey';
import type { Answer } from '../../domain/units/answer';
import type { Shows } from './trace-draft';

export type KeptFigures = BodyOf<'trace.attached'>['figures'][number];

/** What was measured on one channel, in the units that it is shown in. */
export interface Measured {
  readonly shows: Shows;
  readonly unit: 'kV' | 'A' | 'V';
  readonly peak: number;
  readonly rise_s: number | null;
  /** First passage of 10 %, from the instrument's zero. */
  readonly start_s: number | null;
  /** Of half the height after half the height of the trigger channel; after the instrument's zero where there is none. */
  readonly delay_s: number | null;
  readonly after: string;
  readonly ring_Hz: Answer | null;
  readonly inductance_H: Answer | null;
  /** Nothing on the channel stands clear of its noise: there is no pulse to measure. */
  readonly quiet: boolean;
}

/** A pulse that is no higher than this many scatters of the quiet start is noise. */
const CLEAR_OF_NOISE = 6;

export function unitOf(shows: Shows): Measured['unit'] {
  if (shows === 'current') return 'A';
  return shows === 'gap-voltage' || shows === 'channel-voltage' ? 'kV' : 'V';
}

/** Volts or amperes for one of the unit that a channel is shown in. */
export function unitSize(shows: Shows): number {
  return unitOf(shows) === 'kV' ? 1000 : 1;
}

/** Measures one channel as it was said to be read; `loop_F` is the capacitance that rings, null where none is known. */
export function measured(
  survey: TraceSurvey,
  reading: TraceReading,
  { index, loop_F }: { readonly index: number; readonly loop_F: number | null },
): Measured | null {
  const channel = reading.channels[index];
  const found = survey.channels[index];
  if (channel === undefined || found === undefined) return null;
  const stretch = timeScale(survey.time, reading.time_unit_s);
  const pulse = scaledPulse(found.pulse, channelScale(channel) / unitSize(channel.shows), stretch);
  const quiet = Math.abs(pulse.peak) <= CLEAR_OF_NOISE * pulse.noise;
  const ring = found.ring === null || quiet ? null : scaledRing(found.ring, stretch);
  const trigger = reading.channels.findIndex((one, i) => one.shows === 'trigger' && i !== index);
  const half_s = trigger === -1 ? null : (survey.channels[trigger]?.pulse.half_s ?? null);
  const after =
    half_s === null ? 'after the instrument’s zero' : `after ${reading.channels[trigger]?.name ?? ''}`;
  const delay_s =
    half_s === null ? pulse.start_s : pulse.half_s === null ? null : pulse.half_s - half_s * stretch;
  return {
    shows: channel.shows,
    unit: unitOf(channel.shows),
    peak: pulse.peak,
    rise_s: quiet ? null : pulse.rise_s,
    start_s: quiet ? null : pulse.start_s,
    delay_s: quiet ? null : delay_s,
    after,
    ring_Hz: ring?.frequency_Hz ?? null,
    inductance_H: ring === null || loop_F === null ? null : ringInductance(ring, loop_F),
    quiet,
  };
}

/** As the Book keeps them; what leaves its bounds is left out rather than bent. */
export function keptFigures(one: Measured, column: number): KeptFigures {
  const within = (value: number | null, low: number): number | null =>
    value !== null && Number.isFinite(value) && value >= low && value <= 1e9 ? value : null;
  const aboveZero = (value: number | null): number | null =>
    value !== null && value > 0 ? within(value, 0) : null;
  return {
    channel: column,
    peak: within(one.peak, -1e9),
    peak_unit: one.unit,
    rise_10_90_ns: within(one.rise_s === null ? null : one.rise_s * 1e9, 0),
    delay_ns: within(one.delay_s === null ? null : one.delay_s * 1e9, -1e9),
    ring_MHz: aboveZero(one.ring_Hz === null ? null : one.ring_Hz.value / 1e6),
    inductance_nH: aboveZero(one.inductance_H === null ? null : one.inductance_H.value * 1e9),
  };
}
