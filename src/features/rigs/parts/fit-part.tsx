import { useState } from 'react';
import { Caution } from '../../../components/caution';
import { Choice } from '../../../components/choice';
import { FieldRow } from '../../../components/field-row';
import { Keypad } from '../../../components/keypad';
import { WordsField } from '../../../components/words-field';
import { latestRevision } from '../../../domain/book/documents/rig';
import { readField } from '../edit/edit-field';
import { KEYPAD_WORDS } from '../edit/edit-keypad';
import { FITTED_ON, SHOTS_BEFORE, type FitDraft } from './fit-form';
import { PLACE_ORDER, placeWords } from './part-words';
import type { RigParts } from './use-rig-parts';

/** A part about to be fitted: what it is, where it works, and what it has behind it. */
export function FitPart({ parts }: { readonly parts: RigParts }) {
  const { fit, rig } = parts;
  const draft = fit.value;
  const [typing, setTyping] = useState<'fitted_on' | 'shots_before' | null>(null);
  const { topology } = latestRevision(rig).spec;
  const put = (change: Partial<FitDraft>): void => fit.set((now) => ({ ...now, ...change }));
  if (typing !== null) return <FitKeypad parts={parts} field={typing} onDone={() => setTyping(null)} />;
  const same = parts.parts.filter((one) => one.retired === null && one.fitted.place === draft.place);
  return (
    <div className="edit-section">
      <Caution>A part that is fitted voids the before-firing check: it has to be walked again.</Caution>
      <WordsField
        label="What it is"
        hint="as it is printed on it"
        rows={1}
        maxLength={120}
        value={draft.what}
        onChange={(what) => put({ what: what.replaceAll('\n', ' ') })}
      />
      <div className="edit-choice">
        <p className="m-0">Works in</p>
        <Choice
          label="Works in"
          options={PLACE_ORDER.map((place) => ({ value: place, label: placeWords(place, topology) }))}
          value={draft.place}
          onChange={(place) => put({ place, replaces: '' })}
        />
      </div>
      {same.length === 0 ? null : (
        <div className="edit-choice">
          <p className="m-0">Takes the place of</p>
          <Choice
            label="Takes the place of"
            options={[
              { value: '', label: 'none' },
              ...same.map((one) => ({ value: one.id, label: one.fitted.what })),
            ]}
            value={draft.replaces}
            onChange={(replaces) => put({ replaces })}
          />
        </div>
      )}
      <div className="edit-numbers">
        <FieldRow
          label={FITTED_ON.label}
          source={draft.fitted_on === '' ? 'not known' : 'year, month, day'}
          value={draft.fitted_on === '' ? null : draft.fitted_on}
          onPress={() => setTyping('fitted_on')}
        />
        <FieldRow
          label={SHOTS_BEFORE.label}
          source={draft.shots_before === '' ? 'not known' : 'before it came here'}
          value={draft.shots_before === '' ? null : draft.shots_before}
          onPress={() => setTyping('shots_before')}
        />
      </div>
      <WordsField
        label="Where"
        hint="on the rig, if it needs saying"
        rows={1}
        maxLength={200}
        value={draft.where}
        onChange={(where) => put({ where })}
      />
      <WordsField
        label="Serial"
        hint="number or batch"
        rows={1}
        maxLength={120}
        value={draft.serial}
        onChange={(serial) => put({ serial })}
      />
      <WordsField label="Note" rows={2} value={draft.note} onChange={(note) => put({ note })} />
    </div>
  );
}

function FitKeypad({
  parts,
  field: key,
  onDone,
}: {
  readonly parts: RigParts;
  readonly field: 'fitted_on' | 'shots_before';
  readonly onDone: () => void;
}) {
  const field = key === 'fitted_on' ? FITTED_ON : SHOTS_BEFORE;
  const { value, set } = parts.fit;
  const [before] = useState(value[key]);
  const text = value[key];
  const read = readField(field, text, null);
  const unit = field.kind === 'number' ? field.unit : '';
  const put = (next: string): void => set((now) => ({ ...now, [key]: next }));
  return (
    <Keypad
      key={key}
      label={`${field.label}. ${field.help}`}
      initial={text.replaceAll('-', '')}
      units={[{ key: unit, label: unit }]}
      unit={unit}
      words={KEYPAD_WORDS}
      onText={put}
      onEnter={(next) => {
        const entered = readField(field, next, null);
        put(entered.ok && typeof entered.value === 'string' ? entered.value : next);
        if (entered.ok) onDone();
      }}
      onCancel={() => {
        put(before);
        onDone();
      }}
      {...(read.ok ? {} : { refusal: read.refusal.words })}
    />
  );
}
