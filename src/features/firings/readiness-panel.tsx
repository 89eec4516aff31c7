import { Link } from 'react-router-dom';
import { Caution } from '../../components/caution';
import { paths } from '../../config/paths';
import { latestRevision, type Permit, type RigDoc } from '../../domain/book/documents/rig';
import { dayWords } from '../../domain/report/time-words';
import type { Missing } from '../../domain/rules/readiness';
import { mendedByCheck, menderWords } from './readiness-words';

interface ReadinessPanelProps {
  readonly rig: RigDoc;
  readonly missing: readonly Missing[];
}

/** Each missing thing by itself, with who can mend it, and the way there when it is you. */
export function ReadinessPanel({ rig, missing }: ReadinessPanelProps) {
  return (
    <section aria-label="Readiness">
      <h1 className="firing-title">
        {rig.name} is not ready: {missing.length} {missing.length === 1 ? 'thing' : 'things'} missing
      </h1>
      <ol className="readiness">
        {missing.map((one) => (
          <li key={`${one.code} ${one.words}`}>
            <span>
              <b>{one.words}</b>
              <span className="muted">{menderWords(one)}</span>
            </span>
            {mendedByCheck(one) ? (
              <Link className="readiness-mend" to={paths.checks(rig.id)}>
                Open check
              </Link>
            ) : null}
          </li>
        ))}
      </ol>
    </section>
  );
}

interface ReadyWordsProps {
  readonly rig: RigDoc;
  readonly permit: Permit | null;
  readonly zone: string;
}

export function ReadyWords({ rig, permit, zone }: ReadyWordsProps) {
  const { number } = latestRevision(rig);
  return (
    <section aria-label="Readiness">
      <h1 className="firing-title">Nothing is missing</h1>
      {permit === null ? null : (
        <p>
          {rig.name}, revision {number}. Permit to {dayWords(permit.until_ms, zone)}: at most{' '}
          {permit.envelope.max_kV}
          {'\u2009'}kV, {permit.envelope.max_bar_g}
          {'\u2009'}bar(g), {permit.envelope.max_rate_Hz}
          {'\u2009'}Hz.
        </p>
      )}
      <Caution>
        This says what was declared and checked, not what the rig does. From “stick off” on treat it as
        charged.
      </Caution>
    </section>
  );
}
