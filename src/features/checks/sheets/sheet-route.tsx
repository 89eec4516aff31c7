import { useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { Caution } from '../../../components/caution';
import { Screen } from '../../../components/frame';
import { HoldButton } from '../../../components/hold-button';
import { SaysBlock } from '../../../components/says-block';
import { paths } from '../../../config/paths';
import { useAppend } from '../../../data/use-append';
import { useDraft } from '../../../data/use-draft';
import { useLab, usePerson, useRigs, useSheet } from '../../../data/use-book';
import type { SheetDoc } from '../../../domain/book/documents/sheet';
import { circuits, rigs, stepWords } from '../../../domain/report/sheet-words';
import { dayWords } from '../../../domain/report/time-words';
import { PURPOSE_WORDS } from '../../../domain/report/words';
import { ReasonDialog } from '../reason-dialog';
import { useMay } from '../use-may';
import { useWaitingSheets } from './use-waiting-sheets';
import '../checks.css';
import './sheets.css';

/** A published sheet, read by anybody; a reviewer changes or retires it. */
export function SheetRoute() {
  const { sheet: id = '' } = useParams();
  const sheet = useSheet(id);
  return sheet === undefined ? <NoSheet /> : <Sheet key={sheet.id} sheet={sheet} />;
}

export function NoSheet() {
  return (
    <Screen>
      <div className="check-figure">
        <SaysBlock lead="This check sheet is not in the tablet’s Book.">
          The Book may still be filling.
        </SaysBlock>
      </div>
    </Screen>
  );
}

function Sheet({ sheet }: { readonly sheet: SheetDoc }) {
  const { spec, published, version, retired } = sheet;
  const may = useMay();
  const by = usePerson(published.by);
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const all = useRigs();
  const rigName = (id: string) => all.find((rig) => rig.id === id)?.name ?? 'a rig not in the Book';
  const retiring = useWaitingSheets().some((one) => one.kind === 'sheet.retired' && one.sheet === sheet.id);
  return (
    <Screen>
      <div className="check-figure sheet-edit">
        <h1 className="check-title">{spec.title}</h1>
        <p className="muted">
          {PURPOSE_WORDS[spec.purpose]}, version {version}, published{' '}
          {dayWords(published.stamp.wall_ms, zone)} by {by?.name ?? 'somebody'}. {circuits(spec)};{' '}
          {rigs(spec, rigName)}.
        </p>
        {retired === null ? null : <SaysBlock lead="Retired.">No check is opened on it any more.</SaysBlock>}
        {retiring ? (
          <SaysBlock lead="Retiring waits for the server.">Until then it is in force.</SaysBlock>
        ) : null}
        <Caution>{spec.caution}</Caution>
        <ol className="sheet-read" aria-label="Steps">
          {spec.steps.map((step, at) => (
            <li key={step.key}>
              <span className="check-list-no">{at + 1}</span>
              <span className="check-list-words">
                <b>{step.title}</b>
                {step.detail === '' ? null : <span>{step.detail}</span>}
                <span className="muted">{stepWords(step)}</span>
              </span>
            </li>
          ))}
        </ol>
        {retired === null && may('sheet.published') ? (
          <div className="sheet-row">
            <Link className="sheet-button" to={paths.changeSheet(sheet.id)}>
              Change this sheet
            </Link>
            {retiring ? null : <Retire sheet={sheet} />}
          </div>
        ) : null}
      </div>
    </Screen>
  );
}

function Retire({ sheet }: { readonly sheet: SheetDoc }) {
  const append = useAppend();
  const [asking, setAsking] = useState(false);
  const { value: why, set, clear } = useDraft<string>(`sheet-retire/${sheet.id}`, '');
  return (
    <>
      <HoldButton label="Retire" onComplete={() => setAsking(true)} />
      {asking ? (
        <ReasonDialog
          title={`Retire: ${sheet.spec.title}`}
          label="Why it is retired"
          words={why}
          onWords={set}
          act="Hold to retire"
          hold="second"
          onAct={async () => {
            if (why.trim() === '')
              return { type: 'failed', words: 'Reason: say in words why it is retired.' };
            const body = { why: why.trim() };
            const outcome = await append({ kind: 'sheet.retired', subject: sheet.id, body });
            if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
            clear();
            return { type: 'settled' };
          }}
          onClose={() => setAsking(false)}
        />
      ) : null}
    </>
  );
}
