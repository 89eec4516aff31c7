import { useState } from 'react';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import type { HoldOutcome } from '../../components/hold';
import { HoldButton } from '../../components/hold-button';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useAppend } from '../../data/use-append';
import { useChecks, useRig, useSheets } from '../../data/use-book';
import { useSession } from '../../data/use-session';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { SheetDoc } from '../../domain/book/documents/sheet';
import { PURPOSES } from '../../domain/book/sheet-spec';
import { PURPOSE_WORDS, TOPOLOGY_WORDS } from '../../domain/report/words';
import { sheetFits } from '../../domain/rules/sheet-fits';
import { CheckHistory } from './check-history-table';
import { OpenCheckLine } from './open-check-line';
import { useMay } from './use-may';
import './checks.css';

/** The sheets for this rig's circuit, the check that is open, and what earlier ones are worth now. */
export function ChecksRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  return rig === undefined ? (
    <Screen>
      <div className="check-figure">
        <SaysBlock lead="This rig is not in the tablet’s Book.">The Book may still be filling.</SaysBlock>
      </div>
    </Screen>
  ) : (
    <Checks rig={rig} />
  );
}

function Checks({ rig }: { readonly rig: RigDoc }) {
  const revision = latestRevision(rig);
  const sheets = useSheets().filter((sheet) => sheetFits(sheet.spec, rig));
  const checks = useChecks(rig.id);
  const open = checks.filter((check) => check.ended === null);
  const [first] = open;
  const navigate = useNavigate();
  const session = useSession();
  const may = useMay();
  return (
    <Screen
      thumbs={
        first === undefined ? undefined : (
          <ThumbZone
            label="Actions"
            main={
              <ThumbDome
                size="big"
                label={'Go on\nwith check'}
                onComplete={() => void navigate(paths.check(first.id))}
              />
            }
          />
        )
      }
    >
      <div className="check-figure">
        {open.map((check) => (
          <OpenCheckLine key={check.id} check={check} rig={rig} />
        ))}
        <section aria-label="Check sheets">
          <h1 className="check-title">Check sheets for {rig.name}</h1>
          {sheets.length === 0 ? (
            <SaysBlock>
              No sheet is published for the circuit {TOPOLOGY_WORDS[revision.spec.topology]}: a reviewer can
              publish one.
            </SaysBlock>
          ) : (
            byUse(sheets).map((sheet) => <SheetLine key={sheet.id} rig={rig} sheet={sheet} />)
          )}
        </section>
        {session.state === 'open' ? (
          <Link className="check-more check-more-link" to={paths.sheets()}>
            Read all check sheets{may('sheet.published') ? ', write or retire one' : ''}
          </Link>
        ) : null}
        <CheckHistory rig={rig} checks={checks.filter((check) => check.ended !== null)} />
      </div>
    </Screen>
  );
}

/** In order of use: before firing and making safe come before what is done once a week. */
function byUse(sheets: readonly SheetDoc[]): readonly SheetDoc[] {
  return sheets.toSorted((a, b) => PURPOSES.indexOf(a.spec.purpose) - PURPOSES.indexOf(b.spec.purpose));
}

function SheetLine({ rig, sheet }: { readonly rig: RigDoc; readonly sheet: SheetDoc }) {
  const append = useAppend();
  const navigate = useNavigate();
  const session = useSession();
  const [refusal, setRefusal] = useState<string | null>(null);
  const { title, purpose, steps, caution } = sheet.spec;
  // Before a PIN the author stays open, and only making safe may be walked (protocol 4.2).
  const locked = session.state !== 'open' && purpose !== 'make-safe';
  const open = async (): Promise<HoldOutcome> => {
    const body = { rig: rig.id, rig_revision: latestRevision(rig).entry, sheet: sheet.id };
    const outcome = await append({ kind: 'check.opened', body });
    if (outcome.type !== 'logged') {
      setRefusal(outcome.words);
      return { type: 'failed', words: outcome.words };
    }
    void navigate(paths.check(outcome.entry.id));
    return { type: 'settled' };
  };
  return (
    <article className="check-sheet" aria-label={title}>
      <div>
        <p>
          <b>{title}</b>
          <span className="muted">
            {' '}
            {title === PURPOSE_WORDS[purpose] ? '' : `${PURPOSE_WORDS[purpose].toLowerCase()}, `}
            {steps.length} steps
          </span>
        </p>
        <p className="muted check-sheet-caution">{caution}</p>
        {locked ? <p>Unlock the tablet first.</p> : null}
        {refusal === null ? null : (
          <p className="field-refusal" role="alert">
            {refusal}
          </p>
        )}
      </div>
      <HoldButton
        label={`Open check: ${title}`}
        disabled={locked}

        onComplete={open}
      />
    </article>
  );
}
