import type { FiringDoc } from '../book/documents/firing';
import type { PartDoc } from '../book/documents/part';
import { precedes } from '../book/documents/trace';

export interface PartLife {
  /** Shots endured on this rig since it was fitted, by whole firings. */
  readonly here: number;
  /** With what it had endured before; null where nobody knows that. */
  readonly all: number | null;
}

/**
 * Shots that a part has endured: those of the firings opened on its rig between its fitting and its retiring, in the
 * order of the Book. A firing that was open when the part was fitted counts to the part before it.
 */
export function partLife(part: PartDoc, firings: readonly FiringDoc[]): PartLife {
  const here = firingsEndured(part, firings).reduce((sum, firing) => sum + firing.shots, 0);
  const { shots_before } = part.fitted;
  return { here, all: shots_before === null ? null : shots_before + here };
}

/** The firings whose shots a part has endured. */
export function firingsEndured(part: PartDoc, firings: readonly FiringDoc[]): readonly FiringDoc[] {
  const { retired } = part;
  return firings.filter(
    (firing) =>
      firing.parent === part.parent &&
      precedes(part.trace, firing.opened) &&
      (retired === null || precedes(firing.opened, retired)),
  );
}
