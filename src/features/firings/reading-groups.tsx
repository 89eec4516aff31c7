import type { ReactNode } from 'react';
import { GasLetters } from './gas-letters';
import { eyeWords } from './eye-scale';
import { ChoiceRow, Quantity } from './reading-field';
import { beamWords, groupWords, READING_GROUPS, type ReadingGroup } from './reading-group';
import type { ReadingForm } from './use-reading-form';
import { FieldRow } from '../../components/field-row';
import { isCarried, sourceWords } from './reading-form';

/** Fields that a bench uses now and then: folded, each group says in its own row what it holds. */
export function ReadingGroups({ form }: { readonly form: ReadingForm }) {
  return READING_GROUPS.map((group) => (
    <Group key={group.key} group={group} form={form}>
      {group.key === 'beam' ? <BeamFields form={form} /> : null}
      {group.key === 'trigger' ? <TriggerFields form={form} /> : null}
      {group.key === 'channel' ? <ChannelFields form={form} /> : null}
    </Group>
  ));
}

interface GroupProps {
  readonly group: ReadingGroup;
  readonly form: ReadingForm;
  readonly children: ReactNode;
}

function Group({ group, form, children }: GroupProps) {
  const open = form.draft.groups.includes(group.key);
  const carried = group.fields.every((field) => isCarried(form.draft, field));
  const words = groupWords(form.values, group.key);
  return (
    <>
      <button
        type="button"
        className="field-row firing-group"
        aria-expanded={open}
        onClick={() => {
          form.fold(group.key);
        }}
      >
        <span className="field-label">
          <span>{group.label}</span>
          {open ? null : <span className="muted">{words === '' ? 'not entered' : words}</span>}
        </span>
        <span className={`firing-write${carried && words !== '' ? ' muted' : ''}`}>
          {open ? 'Fold' : 'Unfold'}
        </span>
      </button>
      {open ? children : null}
    </>
  );
}

function BeamFields({ form }: { readonly form: ReadingForm }) {
  const { values, base, draft } = form;
  const at = beamWords(values);
  return (
    <>
      <Quantity field="output_attenuators" form={form} />
      <ChoiceRow
        field="output_eye"
        label="Eye scale"
        form={form}
        value={values.output_eye === null ? null : eyeWords(values.output_eye)}
      />
      <FieldRow
        label="Beam position"
        source={sourceWords(base, draft, 'beam_x_mm')}
        value={at === '' ? null : <span className="firing-choice">{at}</span>}
        unit="mm"
        carried={isCarried(draft, 'beam_x_mm')}
        onPress={() => {
          form.open('beam');
        }}
      />
    </>
  );
}

function TriggerFields({ form }: { readonly form: ReadingForm }) {
  return (
    <>
      <Quantity field="trigger_delay_ns" form={form} />
      <Quantity field="trigger_jitter_ns" form={form} />
      <Quantity field="trigger_misses" form={form} />
    </>
  );
}

function ChannelFields({ form }: { readonly form: ReadingForm }) {
  const { channel_gas, dye_batch } = form.values;
  return (
    <>
      <ChoiceRow
        field="channel_gas"
        label="Channel gas"
        form={form}
        value={channel_gas === null ? null : <GasLetters gas={channel_gas} />}
      />
      <ChoiceRow field="dye_batch" label="Dye batch" form={form} value={dye_batch} />
    </>
  );
}
