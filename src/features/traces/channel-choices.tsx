import type { ReactNode } from 'react';
import { Choice } from '../../components/choice';
import type { TraceSurvey } from '../../domain/oscillogram/survey';
import {
  choiceOf,
  TIME_UNITS,
  UNITS,
  type ChannelChoice as ChannelSaid,
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

/** Which channel is looked at; nothing where there is one only. */
export function ChannelChoice({ survey, change, index }: Omit<Props, 'draft'>) {
  const { channels } = survey;
  if (channels.length < 2) return null;
  return (
    <Choice
      label="Channel"
      options={channels.map(({ name }, i) => ({ value: String(i), label: name }))}
      value={String(index)}
      onChange={(value) => change({ channel: Number(value) })}
    />
  );
}

/** What the channel shows: the file knows columns, not what was clipped to the rig. */
export function ChannelSays({ survey, draft, change, index }: Props) {
  const { channels, time } = survey;
  const column = String(channels[index]?.column ?? 0);
  const choice = choiceOf(survey, index, draft);
  const set = (part: Partial<ChannelSaid>) =>
    change({ choices: { ...draft.choices, [column]: { ...draft.choices[column], ...part } } });
  return (
    <>
      <Headed head={`${channels[index]?.name ?? 'It'} shows`}>
        <Choice label="It shows" options={SHOWS} value={choice.shows} onChange={(shows) => set({ shows })} />
      </Headed>
      <Headed head="Unit in the file">
        <Choice<UnitKey>
          label="Unit in the file"
          options={optionsOf(UNITS)}
          value={choice.unit}
          onChange={(unit) => set({ unit })}
        />
      </Headed>
      <Headed head="Sign">
        <Choice
          label="Sign"
          options={SIGNS}
          value={choice.inverted ? 'inverted' : 'as-is'}
          onChange={(value) => set({ inverted: value === 'inverted' })}
        />
      </Headed>
      {time.type === 'column' && time.unit_s === null ? (
        <Headed head="Unit of time">
          <Choice<TimeUnit>
            label="Unit of time"
            options={optionsOf(TIME_UNITS)}
            value={draft.time_unit}
            onChange={(time_unit) => change({ time_unit })}
          />
        </Headed>
      ) : null}
    </>
  );
}

const SIGNS = [
  { value: 'as-is', label: 'as it is' },
  { value: 'inverted', label: 'turned over' },
] as const;

function Headed({ head, children }: { readonly head: string; readonly children: ReactNode }) {
  return (
    <div className="trace-choice">
      <h3>{head}</h3>
      {children}
    </div>
  );
}

function optionsOf<K extends string>(units: Readonly<Record<K, number>>) {
  return (Object.keys(units) as K[]).map((value) => ({ value, label: value }));
}
