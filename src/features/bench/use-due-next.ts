import { useChecks, useFirings } from '../../data/use-book';
import { useReadiness } from '../../data/use-now';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { dueNext, type DueNext } from './due-next';

export function useDueNext(rig: RigDoc, view: DeclaredView): DueNext {
  const missing = useReadiness(rig.id) ?? [];
  const firings = useFirings(rig.id);
  const checks = useChecks(rig.id);
  return dueNext({
    rig,
    view,
    missing,
    openFiring: firings.find((firing) => rig.open_firings.includes(firing.id)),
    openCheck: checks.find((check) => rig.open_checks.includes(check.id)),
  });
}
