import { useState } from 'react';
import { Dialog } from '../../components/dialog';
import { FieldColumn } from '../../components/field-column';
import { FieldRow } from '../../components/field-row';
import { HoldButton } from '../../components/hold-button';
import { Keypad, type KeypadWords } from '../../components/keypad';
import { QuantityField } from '../../components/quantity-field';
import { WordsField } from '../../components/words-field';
import type { RigDoc } from '../../domain/book/documents/rig';
import { momentWords } from '../../domain/report/time-words';
import { ActOutcome, ForecastWords } from './act-outcome';
import { FIELD_WORDS, PERMIT_FIELDS, type PermitField } from './permit-form';
import { usePermit, type PermitEditor } from './use-permit';

const KEYPAD_WORDS: KeypadWords = {
  erase: 'Erase',
  clear: 'Clear',
  enter: 'Enter',
  cancel: 'Leave as it was',
  minus: 'Minus',
  point: 'Point',
  unit: 'Unit',
};

/** A new permit for the latest revision, never wider than the rig's own envelope. */
export function PermitGrant({ rig, zone }: { readonly rig: RigDoc; readonly zone: string }) {
  const permit = usePermit(rig);
  const [active, setActive] = useState<PermitField>('max_kV');
  const [typing, setTyping] = useState(false);
  const { latest, hindrance, forecast } = permit;
  return (
    <div className="desk-form" role="group" aria-label="Grant a permit">
      <p>
        <b>Grant for revision {latest.number}</b>{' '}
        <span className="muted">to {momentWords(permit.reading.until_ms, zone)}</span>
      </p>
      <FieldColumn label="Limits of the permit">
        {PERMIT_FIELDS.map((field) => (
          <Field
            key={field}
            field={field}
            permit={permit}
            active={field === active}
            onChoose={() => setActive(field)}
            onOpen={() => setTyping(true)}
          />
        ))}
      </FieldColumn>
      <WordsField label="Words" hint="may stay empty" value={permit.words} onChange={permit.setWords} />
      <ForecastWords forecast={forecast} />
      <div className="desk-buttons">
        <HoldButton
          main
          label="Grant permit"
          hold="second"
          holdLabel={`Hold: grant a permit to ${rig.name}`}
          disabled={hindrance !== null}
          {...(hindrance === null ? {} : { reason: hindrance })}
          onComplete={permit.grant}
        />
      </div>
      {permit.logged === null ? null : <ActOutcome entry={permit.logged} />}
      {typing ? <PermitKeypad field={active} permit={permit} onClose={() => setTyping(false)} /> : null}
    </div>
  );
}

interface FieldProps {
  readonly field: PermitField;
  readonly permit: PermitEditor;
  readonly active: boolean;
  readonly onChoose: () => void;
  readonly onOpen: () => void;
}

function Field({ field, permit, active, onChoose, onOpen }: FieldProps) {
  const { label, unit, step } = FIELD_WORDS[field];
  const refusal = permit.reading.refusals[field];
  const common = {
    label,
    source: field === 'days' ? 'from now' : `rig ${permit.latest.spec.envelope[field]}\u2009${unit}`,
    value: permit.shown(field),
    unit,
    carried: !permit.touched(field),
    ...(refusal === undefined ? {} : { refusal }),
  };
  if (!active) return <FieldRow {...common} onPress={onChoose} />;
  return (
    <QuantityField
      {...common}
      stepWords={`by ${step}`}
      onStep={(direction) => permit.step(field, direction)}
      onOpen={onOpen}
      lessLabel={`${label} less by ${step} ${unit}`}
      moreLabel={`${label} more by ${step} ${unit}`}
    />
  );
}

interface KeypadProps {
  readonly field: PermitField;
  readonly permit: PermitEditor;
  readonly onClose: () => void;
}

function PermitKeypad({ field, permit, onClose }: KeypadProps) {
  const { label, unit } = FIELD_WORDS[field];
  const refusal = permit.reading.refusals[field];
  const leave = (): void => {
    permit.revert(field);
    onClose();
  };
  return (
    <Dialog title={label} closeLabel="Leave as it was" onClose={leave}>
      <Keypad
        label={label}
        initial={permit.text(field)}
        units={[{ key: unit, label: unit }]}
        unit={unit}
        words={KEYPAD_WORDS}
        allowMinus={field === 'max_bar_g'}
        onText={(text) => permit.type(field, text)}
        onEnter={(text) => {
          if (permit.enter(field, text)) onClose();
        }}
        onCancel={leave}
        {...(refusal === undefined ? {} : { refusal })}
      />
    </Dialog>
  );
}
