import { Link } from 'react-router-dom';
import { Screen } from '../../../components/frame';
import { SaysBlock } from '../../../components/says-block';
import { paths } from '../../../config/paths';
import { useRigs, useSheets } from '../../../data/use-book';
import { PURPOSES } from '../../../domain/book/sheet-spec';
import { circuits, rigs } from '../../../domain/report/sheet-words';
import { PURPOSE_WORDS } from '../../../domain/report/words';
import { useMay } from '../use-may';
import { useWaitingSheets } from './use-waiting-sheets';
import '../checks.css';
import './sheets.css';

/** The sheets in force, by what they are for. */
export function SheetsRoute() {
  const sheets = useSheets();
  const all = useRigs();
  const may = useMay();
  const waiting = useWaitingSheets().filter((one) => one.kind === 'sheet.published');
  const rigName = (id: string) => all.find((rig) => rig.id === id)?.name ?? 'a rig not in the Book';
  return (
    <Screen>
      <div className="check-figure sheet-edit">
        <h1 className="check-title">Check sheets</h1>
        {waiting.map((one) => (
          <SaysBlock key={one.entry} lead={`${one.title} waits for the server.`}>
            It is in force once the server has taken it.
          </SaysBlock>
        ))}
        {PURPOSES.map((purpose) => {
          const of = sheets.filter((sheet) => sheet.spec.purpose === purpose);
          return (
            <section key={purpose} aria-label={PURPOSE_WORDS[purpose]} className="sheet-section">
              <h2>{PURPOSE_WORDS[purpose]}</h2>
              {of.length === 0 ? <p className="muted">none published</p> : null}
              {of.map(({ id, spec, version }) => (
                <Link key={id} className="sheet-start" to={paths.sheet(id)}>
                  <b>{spec.title}</b>
                  <span className="muted">
                    version {version}, {spec.steps.length} steps, {circuits(spec)}, {rigs(spec, rigName)}
                  </span>
                </Link>
              ))}
            </section>
          );
        })}
        {may('sheet.published') ? (
          <div className="sheet-row">
            <Link className="sheet-button" to={paths.newSheet()}>
              New sheet, or copy a ready one
            </Link>
          </div>
        ) : null}
      </div>
    </Screen>
  );
}
