import { Choice } from '../../../components/choice';
import { Screen } from '../../../components/frame';
import { SaysBlock } from '../../../components/says-block';
import { ThumbDome } from '../../../components/thumb-dome';
import { ThumbZone } from '../../../components/thumb-zone';
import { latestRevision } from '../../../domain/book/documents/rig';
import { DerivedBlock, Hazard, Wave } from '../derived-block';
import { DerivedRows } from '../derived-rows';
import { derivedRows } from '../../../domain/report/derived-rows';
import type { DerivedKey } from '../../../domain/rules/rig-derived';
import { RigCircuit } from '../rig-circuit';
import { useRigDerived, type RigDerivedView } from '../use-rig-derived';
import { EditFieldsColumn } from './edit-fields-column';
import { EditKeypad } from './edit-keypad';
import { EditOverview } from './edit-overview';
import { EditReview } from './edit-review';
import { EditSection } from './edit-section';
import { SECTIONS, sectionOf, sectionTitle } from './edit-sections';
import { useFromTop } from './use-from-top';
import type { RigEdit } from './use-rig-edit';

/** A rig being written: one section at a time, with everything that its numbers give beside it, live. */
export function EditScreen({ edit }: { readonly edit: RigEdit }) {
  const { figures } = edit.state;
  const view = useRigDerived(figures?.spec ?? null, edit.settings);
  const fields = (
    <EditFieldsColumn edit={edit}>
      {view === null || figures === null ? null : (
        <DerivedRows
          label="What comes out"
          spec={figures.spec}
          rows={derivedRows(view.derived, KEY_FIGURES[edit.view] ?? USUAL_FIGURES)}
        />
      )}
    </EditFieldsColumn>
  );
  const top = useFromTop(edit.typing ? `keypad ${edit.field?.key ?? ''}` : edit.view);
  // On a phone the keypad needs the thumb zone's place.
  return (
    <Screen fields={fields} {...(edit.typing ? {} : { thumbs: <EditThumbs key={edit.view} edit={edit} /> })}>
      <div ref={top} className="edit-top">
        {edit.typing ? <EditKeypad edit={edit} /> : <EditFigure edit={edit} view={view} />}
      </div>
    </Screen>
  );
}

const USUAL_FIGURES: readonly DerivedKey[] = ['stored', 'self_break', 'channel_peak', 'rate'];

/** What the numbers of a section move most. */
const KEY_FIGURES: Readonly<Partial<Record<RigEdit['view'], readonly DerivedKey[]>>> = {
  gap: ['self_break', 'reach', 'channel_peak', 'rate'],
  first: ['stress_first', 'margin_first', 'stored', 'channel_peak'],
  second: ['stress_second', 'margin_second', 'stored', 'channel_peak'],
  channel: ['channel_static', 'channel_peak', 'rise', 'current_rise'],
  charging: ['stored', 'reach', 'rate', 'self_break'],
  model: ['channel_peak', 'rise', 'current_rise', 'gap_current'],
  beam: ['eyewear', 'stored', 'channel_peak'],
};

function EditFigure({ edit, view }: { readonly edit: RigEdit; readonly view: RigDerivedView | null }) {
  const { rig, underneath, save } = edit;
  return (
    <div className="rig-page">
      <div className="rig-head">
        <h1>{rig === null ? 'New rig' : `Revise ${rig.name}`}</h1>
        <span className="muted">
          {headWords(edit)}
          {save === 'not-saved' ? ', draft not saved on this tablet' : ''}
        </span>
      </div>
      {edit.view === 'overview' ? (
        <EditOverview edit={edit} />
      ) : edit.view === 'review' ? (
        <EditReview edit={edit} />
      ) : (
        <>
          <h2 className="edit-title">
            {sectionTitle(edit.view, edit.state.textOf)}{' '}
            <span className="muted">
              {SECTIONS.indexOf(edit.view) + 1} of {SECTIONS.length}
            </span>
          </h2>
          {edit.view === 'circuit' && rig === null ? <StartFrom edit={edit} /> : null}
          <EditSection edit={edit} section={edit.view} />
        </>
      )}
      {underneath === null && edit.state.figures === null ? <Awaited edit={edit} /> : null}
      <Derived edit={edit} view={view} />
    </div>
  );
}

function headWords({ rig, underneath }: RigEdit): string {
  if (rig !== null && underneath !== null) return `on revision ${underneath.number}`;
  return underneath === null
    ? 'kept as a draft at every key'
    : `from a copy of revision ${underneath.number}`;
}

/** What a new rig is begun from. A touch on another start leaves everything that was entered so far. */
function StartFrom({ edit }: { readonly edit: RigEdit }) {
  if (edit.rigs.length === 0) return null;
  const empty = { value: '', label: 'nothing' };
  const copies = edit.rigs.map((rig) => {
    const { entry, number } = latestRevision(rig);
    return { value: entry, label: `copy of ${rig.name} ${number}` };
  });
  return (
    <div className="edit-choice">
      <p className="m-0">Start from</p>
      <Choice
        label="Start from"
        options={[empty, ...copies]}
        value={edit.draft.copied_from ?? ''}
        onChange={(value) => edit.copyFrom(value === '' ? null : value)}
      />
    </div>
  );
}

/** The figures wait for these: said, so that nobody looks for them. */
function Awaited({ edit }: { readonly edit: RigEdit }) {
  const { figures_wait, textOf } = edit.state;
  return (
    <SaysBlock muted lead="Drawing, figures and waveform come by themselves">
      once these are filled: {figures_wait.map((section) => sectionTitle(section, textOf)).join(', ')}. The
      rest is assumed until then, and said to be.
    </SaysBlock>
  );
}

function Derived({ edit, view }: { readonly edit: RigEdit; readonly view: RigDerivedView | null }) {
  const { figures, textOf } = edit.state;
  if (figures === null || edit.settings === null || view === null) return null;
  const taken = [...new Set(figures.taken.map((key) => sectionOf(key)))].flatMap((section) =>
    section === null ? [] : [sectionTitle(section, textOf)],
  );
  return (
    <>
      {taken.length === 0 ? null : (
        <SaysBlock muted lead="For drawing and figures below">
          {edit.rig === null
            ? `what is open is assumed: ${taken.join(', ')}.`
            : `what is refused is taken from revision ${edit.underneath?.number ?? ''}: ${taken.join(', ')}.`}
        </SaysBlock>
      )}
      <RigCircuit
        name={edit.rig?.name ?? (edit.draft.name.trim() === '' ? 'the new rig' : edit.draft.name)}
        spec={figures.spec}
        derived={view.derived}
      />
      <Hazard view={view} />
      <Wave view={view} />
      <DerivedBlock spec={figures.spec} settings={edit.settings} view={view} />
    </>
  );
}

// Keyed by the view where it is used: a thumb that lets go must not press the dome that has come under it.
function EditThumbs({ edit }: { readonly edit: RigEdit }) {
  const { view, hindrance, rig, next, draft } = edit;
  const all =
    view === 'overview' ? null : (
      <ThumbDome key="all" label="All sections" onComplete={() => edit.go('overview')} />
    );
  if (view === 'review') {
    const name = draft.name.trim();
    return (
      <ThumbZone
        label="Actions"
        main={
          <ThumbDome
            size="big"
            hold="second"
            critical
            label={rig === null ? 'Hold\nto create' : 'Hold\nto revise'}
            holdLabel={rig === null ? `Hold: create ${name}` : `Hold: revise ${rig.name}`}
            disabled={hindrance !== null}
            {...(hindrance === null ? {} : { reason: hindrance })}
            onComplete={edit.log}
          />
        }
        others={all === null ? [] : [all]}
      />
    );
  }
  const nextLabel =
    rig !== null || next === 'review' || next === 'overview'
      ? 'Review'
      : `Next:\n${sectionTitle(next, edit.state.textOf)}`;
  return (
    <ThumbZone
      label="Actions"
      main={
        <ThumbDome size="big" label={nextLabel} onComplete={() => edit.go(rig === null ? next : 'review')} />
      }
      others={[
        ...(all === null
          ? [
              <ThumbDome
                key="back"
                label={rig === null ? 'Back to the rigs' : 'Back to the rig'}
                onComplete={edit.leave}
              />,
              ...(edit.touched
                ? [
                    <ThumbDome
                      key="discard"
                      hold="second"
                      label="Discard draft"
                      holdLabel="Hold: discard the draft"
                      onComplete={edit.discard}
                    />,
                  ]
                : []),
            ]
          : [all]),
      ]}
    />
  );
}
