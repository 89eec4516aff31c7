import { Link } from 'react-router-dom';
import { Caution } from '../../../components/caution';
import { SaysBlock } from '../../../components/says-block';
import { paths } from '../../../config/paths';
import { useLab } from '../../../data/use-book';
import { useNames } from '../../../data/use-names';
import { latestRevision } from '../../../domain/book/documents/rig';
import { momentWords } from '../../../domain/report/time-words';
import { formatFigure } from '../../../domain/units/format-quantity';
import { remainingWords, shotsText, usedWords, type PartLedger } from '../../../domain/rules/part-ledger';
import { placeWords } from './part-words';
import type { RigParts } from './use-rig-parts';

/** Parts that are fitted, newest first, then those that were. A touch opens the ledger of one. */
export function PartList({ parts }: { readonly parts: RigParts }) {
  const { ledgers, part, choose, rig } = parts;
  const { topology } = latestRevision(rig).spec;
  if (ledgers.length === 0)
    return (
      <SaysBlock lead="No part of this rig is written down yet.">
        Fit one, and its shots are counted from then on: capacitors, electrodes, film, resistors.
      </SaysBlock>
    );
  const fitted = ledgers.filter((ledger) => ledger.part.retired === null);
  const retired = ledgers.filter((ledger) => ledger.part.retired !== null);
  const rowOf = (ledger: PartLedger) => (
    <li key={ledger.part.id}>
      <button
        type="button"
        className="part-row"
        aria-expanded={part?.id === ledger.part.id}
        onClick={() => choose(ledger.part.id)}
      >
        <span>
          <b>{ledger.part.fitted.what}</b>
          <br />
          <span className="muted">
            {[placeWords(ledger.part.fitted.place, topology), ledger.part.fitted.where]
              .filter((words) => words !== '')
              .join(', ')}
          </span>
        </span>
        <span className="part-figures">
          <b className="nowrap">
            {shotsText(ledger.life.all ?? ledger.life.here)}
            {'\u2009'}shots
          </b>
          <br />
          <span className="muted">
            {ledger.life.all === null
              ? 'here; before: not known'
              : (ledger.part.fitted.fitted_on ?? 'day not known')}
          </span>
        </span>
      </button>
      {part?.id === ledger.part.id ? <Ledger ledger={ledger} /> : null}
    </li>
  );
  return (
    <>
      <ul className="rig-list">{fitted.map(rowOf)}</ul>
      {retired.length === 0 ? null : (
        <section>
          <h2>Retired</h2>
          <ul className="rig-list">{retired.map(rowOf)}</ul>
        </section>
      )}
    </>
  );
}

function Ledger({ ledger }: { readonly ledger: PartLedger }) {
  const nameOf = useNames();
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const { part, life, stress_ratio, wear, words } = ledger;
  const { serial, note, fitted_on, shots_before } = part.fitted;
  return (
    <div className="part-ledger">
      <p>
        <Link to={paths.notesOf('part', part.id)}>Notes and photos</Link>
      </p>
      <dl className="part-facts">
        <dt>Fitted</dt>
        <dd>
          {fitted_on ?? 'day not known'}, written {momentWords(part.trace.stamp.wall_ms, zone)} by{' '}
          {nameOf(part.trace.by)}
        </dd>
        {serial === '' ? null : (
          <>
            <dt>Serial</dt>
            <dd>{serial}</dd>
          </>
        )}
        <dt>Shots</dt>
        <dd>
          {shotsText(life.here)} here,{' '}
          {shots_before === null ? 'not known how many' : shotsText(shots_before)} before
        </dd>
        {stress_ratio === null ? null : (
          <>
            <dt>Stress</dt>
            <dd>
              {formatFigure(stress_ratio, { digits: { significant: 2 }, rounding: 'up' })} of what it stands,
              at the envelope’s voltage
            </dd>
          </>
        )}
        {wear === null ? null : (
          <>
            <dt>Life used</dt>
            <dd>{usedWords(wear.used)}</dd>
            <dt>Left, likely</dt>
            <dd>{remainingWords(wear)}</dd>
          </>
        )}
        {part.retired === null ? null : (
          <>
            <dt>Retired</dt>
            <dd>
              {part.retired.why}, {momentWords(part.retired.stamp.wall_ms, zone)} by {nameOf(part.retired.by)}
            </dd>
          </>
        )}
        {note === '' ? null : (
          <>
            <dt>Note</dt>
            <dd>{note}</dd>
          </>
        )}
      </dl>
      {words === '' ? null : <p className="muted m-0">{words}</p>}
      {wear === null ? null : (
        <>
          <p className="muted m-0">
            {wear.remaining.model}. Valid: {wear.remaining.valid}. Each firing counts at the envelope of its
            revision, the most that it may have had.
          </p>
          {[...new Set([...wear.warnings, ...wear.remaining.warnings].map((one) => one.words))].map(
            (said) => (
              <Caution key={said}>{said}</Caution>
            ),
          )}
        </>
      )}
    </div>
  );
}
