import type { BodyOf } from '../../domain/book/kinds';
import { latestRevision, type Permit, type RigDoc } from '../../domain/book/documents/rig';
import type { Missing } from '../../domain/rules/readiness';
import { ok, refused, type Result } from '../../domain/units/result';

export interface Opening {
  readonly permit: Permit | null;
  readonly missing: readonly Missing[];
  /** Null when the firing is ready; otherwise why it is recorded all the same. */
  readonly why: string | null;
}

/** What a firing is opened with. An unready one names what was missing, and stands on whatever stood. */
export function openingBody(
  rig: RigDoc,
  { permit, missing, why }: Opening,
): Result<Omit<BodyOf<'firing.opened'>, 'number'>> {
  const shared = { rig: rig.id, rig_revision: latestRevision(rig).entry, permit: permit?.entry ?? null };
  if (why === null) {
    const [first] = missing;
    if (first !== undefined) return refused({ type: 'not-ready', words: first.words });
    return ok({ ...shared, check: rig.ready_check?.check ?? null, unready: null });
  }
  if (why.trim() === '')
    return refused({ type: 'no-reason', words: 'Reason: say in words why it is fired unready.' });
  const checkCounts = !missing.some((one) => one.code.includes('check'));
  return ok({
    ...shared,
    check: checkCounts ? (rig.ready_check?.check ?? null) : null,
    unready: { missing: missing.map(({ code, words }) => ({ code, words })), why: why.trim() },
  });
}
