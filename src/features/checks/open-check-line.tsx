import { Link } from 'react-router-dom';
import { paths } from '../../config/paths';
import { usePerson, useSheet } from '../../data/use-book';
import { useNow } from '../../data/use-now';
import type { CheckDoc } from '../../domain/book/documents/check';
import { revisionById, type RigDoc } from '../../domain/book/documents/rig';
import { checkProgress } from '../../domain/rules/check-progress';
import { checkAge } from './check-history';

/** The check that is open, and how far it is. */
export function OpenCheckLine({ check, rig }: { readonly check: CheckDoc; readonly rig: RigDoc }) {
  const sheet = useSheet(check.sheet);
  const by = usePerson(check.opened.by);
  const { stamp } = useNow(10_000);
  const spec = revisionById(rig, check.rig_revision)?.spec;
  if (sheet === undefined || spec === undefined) return null;
  const { steps, next } = checkProgress(sheet, check, spec);
  const at = next === null ? steps.length : steps.findIndex((one) => one.step.key === next.key) + 1;
  return (
    <Link className="check-open" to={paths.check(check.id)}>
      <b>{sheet.spec.title} is open</b>
      <span>
        {next === null ? 'every step is done: close it' : `step ${at} of ${steps.length}: ${next.title}`}
      </span>
      <span className="muted">
        opened {checkAge(check, stamp)} by {by?.name ?? 'author open'}
      </span>
    </Link>
  );
}
