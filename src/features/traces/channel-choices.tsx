import { Choice } from '../../components/choice';
import type { TraceSurvey } from '../../domain/oscillogram/survey';
import {
  choiceOf,
  TIME_UNITS,
  UNITS,
  type ChannelChoice,
  type Shows,
  type TimeUnit,
  type TraceDraft,
  type UnitKey,
} from './trace-draft';

interface Props {
  readonly survey: TraceSurvey;
  readonly draft: TraceDraft;
  readonly change: (part: Partial<TraceDraft>) => void;
  readonly index: number;
}

const SHOWS: readonly { readonly value: Shows; readonly label: string }[] = [
  { value: 'channel-voltage', label: 'channel voltage' },
  { value: 'gap-voltage', label: 'gap voltage' },
  { value: 'current', label: 'current' },
  { value: 'light', label: 'light' },
  { value: 'trigger', label: 'trigger' },
  { value: 'other', label: 'something else' },
];

/** Which channel is looked at, and what it shows: the file knows columns, not what was clipped to the rig. */
export function ChannelChoices({ survey, draft, change, index }: Props) {
  const { channels, time } = survey;
  const column = String(channels[index]?.column ?? 0);
  const choice = choiceOf(survey, index, draft);
  const set = (part: Partial<ChannelChoice>) =>
    change({ choices: { ...draft.choices, [column]: { ...draft.choices[column], ...part } } });
  return (
    <div className="trace-choices">
      {channels.length < 2 ? null : (
        <Choice
          label="Channel"
          options={channels.map(({ name }, i) => ({ value: String(i), label: name }))}
          value={String(index)}
          onChange={(value) => change({ channel: Number(value) })}
        />
      )}
      <Choice label="It shows" options={SHOWS} value={choice.shows} onChange={(shows) => set({ shows })} />
      <Choice<UnitKey>
        label="Unit in the file"
        options={optionsOf(UNITS)}
        value={choice.unit}
        onChange={(unit) => set({ unit })}
      />
      <Choice
        label="Sign"
        options={[
          { value: 'as-is', label: 'as it is' },
          { value: 'inverted', label: 'turned over' },
        ]}
        value={choice.inverted ? 'inverted' : 'as-is'}
        onChange={(value) => set({ inverted: value === 'inverted' })}
      />
      {time.type === 'column' && time.unit_s === null ? (
        <Choice<TimeUnit>
          label="Unit of time"
          options={optionsOf(TIME_UNITS)}
          value={draft.time_unit}
          onChange={(time_unit) => change({ time_unit })}
        />
      ) : null}
    </div>
  );
}

function optionsOf<K extends string>(units: Readonly<Record<K, number>>) {
  return (Object.keys(units) as K[]).map((value) => ({ value, label: value }));
}
