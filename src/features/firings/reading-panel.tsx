import type { ReactNode } from 'react';
import { Choice } from '../../components/choice';
import { HoldButton } from '../../components/hold-button';
import { Keypad, type KeypadWords } from '../../components/keypad';
import { CHANNEL_GASES, HOW_MEASURED, type ReadingValues } from '../../domain/book/bodies/firing-bodies';
import { GAS_WORDS, HOW_WORDS, LOOK_WORDS } from '../../domain/report/words';
import { BeamGrid } from './beam-grid';
import { EYE_SCALE } from './eye-scale';
import { FAILURES } from './looks';
import { isQuantity, QUANTITY_TRAITS, shownQuantity } from './reading-fields';
import type { WordsKey } from './reading-form';
import type { ReadingForm } from './use-reading-form';

const KEYPAD_WORDS: KeypadWords = {
  erase: 'Erase',
  clear: 'Clear',
  enter: 'Enter',
  cancel: 'Leave as it was',
  minus: 'minus',
  point: 'point',
  unit: 'Unit',
};

const GASES = Object.keys(GAS_WORDS) as ReadingValues['gas'][];

/** What a field opens in the figure's place: keys, a choice, or room for words. Null while nothing is open. */
export function ReadingPanel({ form }: { readonly form: ReadingForm }): ReactNode {
  const { draft } = form;
  if (isQuantity(draft.field)) return draft.typing === null ? null : <QuantityKeys form={form} />;
  return draft.open ? <OpenField form={form} /> : null;
}

export function isPanelOpen({ draft }: ReadingForm): boolean {
  return draft.typing !== null || draft.open;
}

function QuantityKeys({ form }: { readonly form: ReadingForm }) {
  const { draft, values, refusal } = form;
  const { field, typing } = draft;
  if (!isQuantity(field)) return null;
  const { label, unit, rule } = QUANTITY_TRAITS[field];
  return (
    <Keypad
      key={field}
      label={field === 'shots' ? 'Shots in burst' : label}
      initial={(shownQuantity(values[field], field) ?? '').replace('\u2212', '-').replace(/,/g, '')}
      {...(typing === null || typing === '' ? {} : { typed: typing })}
      units={[{ key: field, label: unit }]}
      unit={field}
      allowMinus={rule.min < 0}
      words={KEYPAD_WORDS}
      {...(refusal?.field === field ? { refusal: refusal.words } : {})}
      onText={form.type}
      onEnter={form.enterTyped}
      onCancel={form.close}
    />
  );
}

function OpenField({ form }: { readonly form: ReadingForm }) {
  const { values, draft } = form;
  switch (draft.field) {
    case 'how':
      return (
        <Panel title="How the voltage was measured" form={form}>
          <Choice
            label="How the voltage was measured"
            options={HOW_MEASURED.map((value) => ({ value, label: HOW_WORDS[value] }))}
            value={values.how}
            onChange={(how) => {
              form.pick('how', how);
            }}
          />
        </Panel>
      );
    case 'gas':
      return (
        <Panel title="Gas in the spark gap" form={form}>
          <Choice
            label="Gas in the spark gap"
            options={GASES.map((value) => ({ value, label: GAS_WORDS[value] }))}
            value={values.gas}
            onChange={(gas) => {
              form.pick('gas', gas);
            }}
          />
        </Panel>
      );
    case 'looked':
      return (
        <Panel title="No beam, dark or failed" form={form}>
          <Choice
            label="How it failed"
            options={FAILURES.map((value) => ({ value, label: LOOK_WORDS[value] }))}
            value={FAILURES.find((failure) => failure === values.looked) ?? null}
            onChange={(looked) => {
              form.pick('looked', looked);
            }}
          />
        </Panel>
      );
    case 'output_eye':
      return (
        <Panel title="How bright on white card, by eye" form={form}>
          <Choice
            label="How bright on white card, by eye"
            options={EYE_SCALE.map((label, level) => ({ value: String(level), label }))}
            value={values.output_eye === null ? null : String(values.output_eye)}
            onChange={(level) => {
              form.pick('output_eye', Number(level));
            }}
          />
          <p className="muted">On the card, never into the beam. It is never turned into an energy.</p>
        </Panel>
      );
    case 'channel_gas':
      return (
        <Panel title="Gas in the laser channel" form={form}>
          <Choice
            label="Gas in the laser channel"
            options={CHANNEL_GASES.map((value) => ({ value, label: GAS_WORDS[value] }))}
            value={values.channel_gas}
            onChange={(gas) => {
              form.pick('channel_gas', gas);
            }}
          />
        </Panel>
      );
    case 'beam':
      return (
        <Panel title="Where the beam sits" form={form} done="Done">
          <BeamGrid x_mm={values.beam_x_mm} y_mm={values.beam_y_mm} onPlace={form.place} />
        </Panel>
      );
    case 'dye_batch':
    case 'note':
    case 'summary':
      return <WordsPanel field={draft.field} form={form} />;
    default:
      return null;
  }
}

interface WordsPanelProps {
  readonly field: WordsKey;
  readonly form: ReadingForm;
}

const WORDS_TITLES: Readonly<Record<WordsKey, string>> = {
  note: 'Note to this reading',
  summary: 'Words for closing the firing',
  dye_batch: 'Batch of the dye',
};

function WordsPanel({ field, form }: WordsPanelProps) {
  const title = WORDS_TITLES[field];
  const isBatch = field === 'dye_batch';
  return (
    <Panel title={title} form={form} done="Done">
      <textarea
        className="firing-words"
        aria-label={title}
        rows={isBatch ? 1 : 5}
        maxLength={isBatch ? 120 : 2000}
        autoFocus
        value={isBatch ? (form.values.dye_batch ?? '') : form.draft[field]}
        onChange={(event) => {
          form.write(field, event.target.value);
        }}
      />
    </Panel>
  );
}

interface PanelProps {
  readonly title: string;
  readonly form: ReadingForm;
  readonly done?: string;
  readonly children: ReactNode;
}

function Panel({ title, form, done = 'Leave as it was', children }: PanelProps) {
  return (
    <section className="firing-panel" aria-label={title}>
      <p className="muted">{title}</p>
      {children}
      <div>
        <HoldButton label={done} onComplete={form.close} />
      </div>
    </section>
  );
}
