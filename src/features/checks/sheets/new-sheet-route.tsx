import { Screen } from '../../../components/frame';
import { SaysBlock } from '../../../components/says-block';
import { useSheets } from '../../../data/use-book';
import { READY_SHEETS } from '../../../domain/rules/ready-sheets/ready-sheets';
import { PURPOSE_WORDS } from '../../../domain/report/words';
import { useMay } from '../use-may';
import { draftOf } from './sheet-draft';
import { SheetEditor } from './sheet-editor';
import { useSheetEdit, type SheetEdit } from './use-sheet-edit';
import '../checks.css';
import './sheets.css';

/** A new sheet: from nothing, from a ready sheet, or from one that is published. */
export function NewSheetRoute() {
  const edit = useSheetEdit(null);
  const may = useMay();
  if (!may('sheet.published')) return <NotYours />;
  return edit.draft.begun ? <SheetEditor edit={edit} /> : <StartFrom edit={edit} />;
}

export function NotYours() {
  return (
    <Screen>
      <div className="check-figure">
        <SaysBlock lead="A reviewer or the lead writes check sheets.">Everybody can read them.</SaysBlock>
      </div>
    </Screen>
  );
}

function StartFrom({ edit }: { readonly edit: SheetEdit }) {
  const sheets = useSheets();
  return (
    <Screen>
      <div className="check-figure sheet-edit">
        <h1 className="check-title">New check sheet</h1>
        <section aria-label="Start from" className="sheet-section">
          <button type="button" className="sheet-start" onClick={() => edit.change({})}>
            <b>An empty sheet</b>
          </button>
          <h2>A ready sheet</h2>
          <SaysBlock muted>
            Written from common practice, without a source. Make it yours: local rules and the person
            responsible come first.
          </SaysBlock>
          {READY_SHEETS.map(({ key, spec }) => (
            <button
              key={key}
              type="button"
              className="sheet-start"
              onClick={() => edit.change(draftOf(spec))}
            >
              <b>Copy ready sheet: {spec.title}</b>
              <span className="muted">
                {PURPOSE_WORDS[spec.purpose]}, {spec.steps.length} steps
              </span>
            </button>
          ))}
          {sheets.length === 0 ? null : <h2>A sheet of this lab</h2>}
          {sheets.map(({ id, spec }) => (
            <button
              key={id}
              type="button"
              className="sheet-start"
              onClick={() => edit.change(draftOf({ ...spec, title: `${spec.title}, copy`.slice(0, 120) }))}
            >
              <b>Copy: {spec.title}</b>
            </button>
          ))}
        </section>
      </div>
    </Screen>
  );
}
