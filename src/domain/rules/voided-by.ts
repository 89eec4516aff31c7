import { latestRevision, type Permit, type RigDoc } from '../book/documents/rig';
import { standingPermit } from './readiness';

/** What a revision of a rig takes away, to be said before it is written. */
export interface Voided {
  readonly permit: Permit | null;
  readonly check: boolean;
}

export function voidedByRevision(rig: RigDoc, now_ms: number): Voided {
  const { ready_check } = rig;
  return {
    permit: standingPermit(rig, now_ms),
    check:
      ready_check !== null && ready_check.voided === null && rig.heads.includes(ready_check.rig_revision),
  };
}

/** In words, one sentence each; that a rig keeps its state says the last. */
export function voidedWords(rig: RigDoc, now_ms: number): readonly string[] {
  const { permit, check } = voidedByRevision(rig, now_ms);
  const { number } = latestRevision(rig);
  return [
    permit === null
      ? 'No permit stands that could lapse.'
      : `The firing permit for revision ${number} lapses: nobody may fire until a reviewer grants one for the new revision.`,
    ...(check ? ['The before-firing check is void and has to be walked again.'] : []),
  ];
}
