import { useState } from 'react';
import { Choice } from '../../../components/choice';
import { FieldRow } from '../../../components/field-row';
import { Keypad } from '../../../components/keypad';
import { WordsField } from '../../../components/words-field';
import type { StepType } from '../../../domain/book/sheet-spec';
import { SHOWS_WORDS, STEP_WORDS } from '../../../domain/report/sheet-words';
import { CHECK_KEYPAD_WORDS } from '../keypad-words';
import { waiveFixed, type StepDraft } from './sheet-draft';
import type { SheetEdit } from './use-sheet-edit';

interface StepFieldsProps {
  readonly edit: SheetEdit;
  readonly step: StepDraft;
}

const KINDS = (Object.keys(STEP_WORDS) as readonly StepType[]).map((value) => ({
  value,
  label: STEP_WORDS[value],
}));
const SHOWS = (Object.keys(SHOWS_WORDS) as readonly StepDraft['shows'][]).map((value) => ({
  value,
  label: SHOWS_WORDS[value],
}));
const GUARDS = [
  { value: 'none', label: 'neither' },
  { value: 'shorting', label: 'shorting' },
  { value: 'beam-stop', label: 'beam stop' },
] as const;
const FROM_RIG = [
  { value: 'none', label: 'no' },
  { value: 'envelope.max_bar_g', label: 'its gauge pressure' },
  { value: 'envelope.max_kV', label: 'its voltage' },
] as const;

/** All that a step says. Who may waive it is fixed where nobody may. */
export function StepFields({ edit, step }: StepFieldsProps) {
  const change = (part: Partial<StepDraft>): void => edit.changeStep(step.key, part);
  const fixed = waiveFixed(step);
  return (
    <div className="sheet-fields">
      <Choice label="Kind" options={KINDS} value={step.type} onChange={(type) => change({ type })} />
      <WordsField
        label="Step title"
        rows={1}
        maxLength={120}
        value={step.title}
        onChange={(title) => change({ title })}
      />
      <WordsField
        label="What to do"
        hint="how, and what to look for"
        value={step.detail}
        onChange={(detail) => change({ detail })}
      />
      {step.type === 'reading' ? <ReadingFields step={step} change={change} /> : null}
      {step.type === 'computed' ? (
        <Choice label="Shows" options={SHOWS} value={step.shows} onChange={(shows) => change({ shows })} />
      ) : null}
      {step.type === 'second-person' ? null : (
        <div className="sheet-row">
          <span>Guards</span>
          <Choice
            label="Guards"
            options={GUARDS}
            value={step.guards}
            onChange={(guards) => change({ guards })}
          />
        </div>
      )}
      <div className="sheet-row">
        <span>
          May be waived by{' '}
          <span className="muted">
            {fixed ? 'fixed: shorting, beam stop and second person are never waived' : 'with a reason'}
          </span>
        </span>
        <Choice
          label="May be waived by"
          options={[
            { value: 'never', label: 'nobody' },
            { value: 'reviewer', label: 'a reviewer', disabled: fixed },
            { value: 'operator', label: 'the operator', disabled: fixed },
          ]}
          value={step.waive}
          onChange={(waive) => change({ waive })}
        />
      </div>
    </div>
  );
}

type LimitKey = 'lowest' | 'highest';
const LIMITS: readonly { readonly key: LimitKey; readonly label: string }[] = [
  { key: 'lowest', label: 'Lowest' },
  { key: 'highest', label: 'Highest' },
];

interface ReadingFieldsProps {
  readonly step: StepDraft;
  readonly change: (part: Partial<StepDraft>) => void;
}

function ReadingFields({ step, change }: ReadingFieldsProps) {
  const [typing, setTyping] = useState<LimitKey | null>(null);
  const typed = LIMITS.find(({ key }) => key === typing);
  return (
    <>
      <div className="sheet-row">
        <WordsField
          label="Quantity"
          rows={1}
          maxLength={120}
          value={step.quantity}
          onChange={(quantity) => change({ quantity })}
        />
        <WordsField
          label="Unit"
          rows={1}
          maxLength={120}
          value={step.unit}
          onChange={(unit) => change({ unit })}
        />
      </div>
      {typed === undefined ? (
        <div className="sheet-limits">
          {LIMITS.map(({ key, label }) => (
            <FieldRow
              key={key}
              label={label}
              source={step[key] === '' ? 'no limit' : 'inclusive'}
              value={step[key] === '' ? null : step[key].replace('-', '\u2212')}
              unit={step.unit}
              onPress={() => setTyping(key)}
            />
          ))}
        </div>
      ) : (
        <Keypad
          key={typed.key}
          label={`${typed.label} (empty: no limit)`}
          initial={step[typed.key]}
          units={[{ key: step.unit, label: step.unit }]}
          unit={step.unit}
          words={CHECK_KEYPAD_WORDS}
          allowMinus
          onText={(text) => change({ [typed.key]: text })}
          onEnter={(text) => {
            change({ [typed.key]: text });
            setTyping(null);
          }}
          onCancel={() => setTyping(null)}
        />
      )}
      <div className="sheet-row">
        <span>Not above the rig’s envelope</span>
        <Choice
          label="Not above the rig’s envelope"
          options={FROM_RIG}
          value={step.from_rig}
          onChange={(from_rig) => change({ from_rig })}
        />
      </div>
    </>
  );
}
