import { envelope, type Envelope } from './extremes';
import { pulseFigures, ringAfter, type PulseFigures, type Ring } from './measure';
import type { Oscillogram } from './read-oscillogram';

/** What a screen needs of a channel without its points; values as they stand in the file. */
export interface ChannelSurvey {
  readonly name: string;
  /** As the header says; empty where it says nothing. */
  readonly unit: string;
  /** Its place among the columns with figures, counted from 0. */
  readonly column: number;
  readonly pulse: PulseFigures;
  readonly ring: Ring | null;
}

/** A file of an oscilloscope without its points: small enough to be sent from where it was read. */
export interface TraceSurvey extends Pick<Oscillogram, 'points' | 'layout' | 'skipped' | 'overrange'> {
  readonly time: {
    readonly type: 'column' | 'interval' | 'none';
    readonly column: number | null;
    readonly unit_s: number | null;
    readonly words: string;
    readonly from_s: number;
    readonly to_s: number;
  };
  readonly channels: readonly ChannelSurvey[];
  /** Of the whole file, by channel. */
  readonly whole: readonly Envelope[];
}

/** Looks a file through once: figures of every channel, and its extremes over so many slices. */
export function surveyOf(read: Oscillogram, slices: number): TraceSurvey {
  const { seconds, type, column, unit_s, words } = read.time;
  const window = { from_s: seconds[0] ?? 0, to_s: seconds.at(-1) ?? 0 };
  return {
    points: read.points,
    layout: read.layout,
    skipped: read.skipped,
    overrange: read.overrange,
    time: { type, column, unit_s, words, ...window },
    channels: read.channels.map(({ name, unit, values }, i) => {
      const pulse = pulseFigures({ seconds, values });
      return {
        name,
        unit,
        column: column === null || i < column ? i : i + 1,
        pulse,
        ring: ringAfter({ seconds, values }, pulse.peak_s),
      };
    }),
    whole: envelopesOf(read, window, slices),
  };
}

/** Extremes of every channel in a window of time, in the file's own seconds. */
export function envelopesOf(
  read: Oscillogram,
  window: { readonly from_s: number; readonly to_s: number },
  slices: number,
): readonly Envelope[] {
  const { seconds } = read.time;
  return read.channels.map(({ values }) => envelope({ seconds, values }, window, slices));
}
