import type { RigDoc } from '../../domain/book/documents/rig';

/**
 * The rig that an emergency is most likely about: one with an open firing first, then the one that was in hand, then the first.
 * The screen shows the choice at once, so that a wrong guess costs one touch.
 */
export function likelyRig(rigs: readonly RigDoc[], inHand: string | null): RigDoc | undefined {
  return rigs.find((rig) => rig.open_firings.length > 0) ?? rigs.find((rig) => rig.id === inHand) ?? rigs[0];
}
