import type { FigureSpec, FigureTexts } from '../../components/figure-form';
import type { TraceReading } from '../../domain/book/bodies/note-bodies';
import type { ChannelSurvey, TraceSurvey } from '../../domain/oscillogram/survey';

export type Shows = TraceReading['channels'][number]['shows'];
export type Loop = 'first' | 'second' | 'series';

export const UNITS = { V: 1, mV: 1e-3, kV: 1e3, A: 1, mA: 1e-3, kA: 1e3 } as const;
export type UnitKey = keyof typeof UNITS;
export const TIME_UNITS = { s: 1, ms: 1e-3, '\u00b5s': 1e-6, ns: 1e-9 } as const;
export type TimeUnit = keyof typeof TIME_UNITS;

/** What somebody says of a channel, where it differs from what the file says. */
export interface ChannelChoice {
  readonly shows: Shows;
  readonly unit: UnitKey;
  readonly inverted: boolean;
}

/** Kept at every key. The file itself is not: it is chosen again after a kill, and reads as was said of it. */
export interface TraceDraft {
  readonly channel: number;
  readonly choices: Readonly<Record<string, Partial<ChannelChoice>>>;
  readonly time_unit: TimeUnit;
  readonly loop: Loop;
  readonly texts: FigureTexts;
  readonly note: string;
}

export const EMPTY_TRACE: TraceDraft = {
  channel: 0,
  choices: {},
  time_unit: 's',
  loop: 'series',
  texts: {},
  note: '',
};

/** What a channel is taken for until somebody says otherwise: a current by its unit, else the first voltage is the channel's. */
export function choiceOf(survey: TraceSurvey, index: number, draft: TraceDraft): ChannelChoice {
  const channel = survey.channels[index];
  const unit = unitKey(channel);
  const first = survey.channels.findIndex((one) => !unitKey(one).endsWith('A'));
  const shows: Shows = unit.endsWith('A') ? 'current' : index === first ? 'channel-voltage' : 'other';
  return { shows, unit, inverted: false, ...draft.choices[String(channel?.column ?? 0)] };
}

function unitKey(channel: ChannelSurvey | undefined): UnitKey {
  const unit = channel?.unit ?? '';
  return Object.hasOwn(UNITS, unit) ? (unit as UnitKey) : 'V';
}

export interface ReadingsKnown {
  readonly last: number;
}

/** The figures of the screen: of the channel that is looked at, of the shift, of the reading, and of time where it has none. */
export function traceSpecs(
  survey: TraceSurvey,
  draft: TraceDraft,
  { last }: ReadingsKnown,
): readonly FigureSpec[] {
  const channel = survey.channels[draft.channel];
  const probe: FigureSpec = {
    key: probeKey(channel?.column ?? 0),
    label: `Probe ratio, ${channel?.name ?? ''}`,
    short: 'Probe ratio',
    unit: '',
    step: 1,
    initial: '1',
    source: 'as the file says',
    rule: { field: 'probe', name: 'Probe ratio', unit: '', min: 0, minExcluded: true, max: 1e6 },
  };
  const interval: FigureSpec = {
    key: 'interval',
    label: 'Time between points',
    short: 'Between points',
    unit: 'ns',
    step: 1,
    initial: '1',
    source: 'assumed',
    rule: { field: 'interval', name: 'Time between points', unit: 'ns', min: 0, minExcluded: true, max: 1e9 },
  };
  const reading: FigureSpec = {
    key: 'reading',
    label: 'Reading No.',
    unit: '',
    step: 1,
    initial: last > 0 ? String(last) : '',
    source: 'the last one',
    whenEmpty: 'the firing as a whole',
    rule: { field: 'reading', name: 'Reading', unit: '', min: 1, max: Math.max(1, last) },
  };
  const shift: FigureSpec = {
    key: 'shift',
    label: 'Simulated later by',
    short: 'Shift',
    unit: 'ns',
    step: 1,
    initial: '0',
    source: 'aligned at the rise',
    rule: { field: 'shift', name: 'Shift', unit: 'ns', min: -1e6, max: 1e6 },
  };
  return [probe, ...(survey.time.type === 'none' ? [interval] : []), reading, shift];
}

export function probeKey(column: number): string {
  return `probe/${String(column)}`;
}

/** How the file is read, from what it says and what somebody said; a figure that is refused counts as untouched. */
export function readingAs(survey: TraceSurvey, draft: TraceDraft): TraceReading {
  const { time, channels } = survey;
  return {
    // Where no column is time, the points are counted, in a column after the last one.
    time_column: time.column ?? channels.length,
    time_unit_s:
      time.type === 'none'
        ? positive(draft.texts['interval'], 1) * 1e-9
        : (time.unit_s ?? TIME_UNITS[draft.time_unit]),
    channels: channels.slice(0, MOST_CHANNELS).map(({ column, name }, i) => {
      const { shows, unit, inverted } = choiceOf(survey, i, draft);
      return {
        column,
        name: name.slice(0, 120) || `Column ${String(column + 1)}`,
        shows,
        unit_V_or_A: UNITS[unit],
        probe_ratio: positive(draft.texts[probeKey(column)], 1),
        inverted,
      };
    }),
  };
}

const MOST_CHANNELS = 16;

function positive(text: string | undefined, otherwise: number): number {
  const value = Number(text ?? Number.NaN);
  return value > 0 && value <= 1e9 ? value : otherwise;
}

/** Nanoseconds by which the simulated wave shape was shifted by hand. */
export function shift_ns(draft: TraceDraft): number {
  const value = Number(draft.texts['shift'] ?? 0);
  return Number.isFinite(value) ? value : 0;
}
