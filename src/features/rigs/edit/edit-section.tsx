import { HoldButton } from '../../../components/hold-button';
import { CAPACITOR_WORDS } from '../../../domain/report/words';
import { EditFields } from './edit-section-fields';
import { topologyOf, type Section } from './edit-sections';
import { SectionList } from './section-list';
import { SheetDrawing } from './sheet-drawing';
import type { RigEdit } from './use-rig-edit';

/** One section of a rig: its choices, words and numbers, with what belongs to them drawn beside. */
export function EditSection({ edit, section }: { readonly edit: RigEdit; readonly section: Section }) {
  const status = edit.state.sections.find((one) => one.section === section);
  const suggested = status?.suggested ?? 0;
  return (
    <div className="edit-section">
      {section === 'first' || section === 'second' ? <Sheet edit={edit} side={section} /> : null}
      {section === 'nodes' || section === 'shorting' || section === 'screws' ? (
        <SectionList edit={edit} section={section} />
      ) : (
        <EditFields edit={edit} fields={edit.fields} />
      )}
      {(status?.open ?? 0) > 0 ? (
        <HoldButton label="Suggest what is open" onComplete={() => edit.suggest(section)} />
      ) : null}
      {suggested > 0 ? (
        <div className="edit-confirm">
          <p className="m-0">
            {suggested === 1 ? 'One value is' : `${suggested} values are`} suggested and not yours yet: change
            what is different on this rig, then say that the rest is right.
          </p>
          <HoldButton label="These are right" onComplete={() => edit.confirm(section)} />
        </div>
      ) : null}
    </div>
  );
}

function Sheet({ edit, side }: { readonly edit: RigEdit; readonly side: 'first' | 'second' }) {
  const { figures, textOf } = edit.state;
  const capacitor = figures?.spec[side];
  if (figures === null || capacitor?.kind !== 'sheet') return null;
  return (
    <SheetDrawing
      name={CAPACITOR_WORDS[topologyOf(textOf)][side]}
      sheet={capacitor}
      supply_kV={figures.spec.charging.supply_kV}
    />
  );
}
