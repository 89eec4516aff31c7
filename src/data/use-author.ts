import type { RigDoc } from '../domain/book/documents/rig';
import type { Trace } from '../domain/book/documents/trace';
import { useChecks } from './use-book';
import { useClaims } from './use-claims';
import { useNames } from './use-names';

/**
 * Who did something at a rig: the author, or whoever said afterwards that an entry with an open author was theirs
 * (protocol 4.2). Empty where nothing was done.
 */
export function useAuthor(rig: RigDoc, trace: Trace | null): string {
  const nameOf = useNames();
  const checks = useChecks(rig.id);
  const open = trace !== null && trace.by === null;
  const check = open ? checks.find((one) => one.ended?.entry === trace.entry) : undefined;
  const claims = useClaims(open ? (check?.id ?? rig.id) : '');
  if (trace === null) return '';
  const claim = claims.find((one) => one.id === trace.entry);
  return claim === undefined ? nameOf(trace.by) : `${nameOf(claim.claimed.by)}, said afterwards`;
}
