import type { CheckDoc } from '../../domain/book/documents/check';
import type { FiringDoc } from '../../domain/book/documents/firing';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { SheetSpec } from '../../domain/book/sheet-spec';
import { PURPOSE_WORDS } from '../../domain/report/words';
import type { DeclaredView } from '../../domain/rules/declared-view';
import type { Missing } from '../../domain/rules/readiness';

/** What the person at the bench most likely does next, and why. */
export type DueNext =
  | { readonly type: 'go-on-firing'; readonly firing: string; readonly title: string; readonly why: string }
  | { readonly type: 'go-on-check'; readonly check: string; readonly title: string; readonly why: string }
  | { readonly type: 'open-firing'; readonly title: string; readonly why: string }
  | {
      readonly type: 'open-check';
      readonly purpose: SheetSpec['purpose'];
      readonly title: string;
      readonly why: string;
    };

interface Facts {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
  readonly missing: readonly Missing[];
  readonly openFiring: FiringDoc | undefined;
  readonly openCheck: CheckDoc | undefined;
}

/**
 * An open firing or check comes first; a rig that is not known to be shorted is made safe before anything else, unless
 * its before-firing check still counts.
 */
export function dueNext({ rig, view, missing, openFiring, openCheck }: Facts): DueNext {
  if (openFiring !== undefined)
    return {
      type: 'go-on-firing',
      firing: openFiring.id,
      title: `Firing ${openFiring.number}`,
      why: 'is open',
    };
  if (openCheck !== undefined) {
    const title =
      openCheck.purpose === 'before-firing' ? 'Before-firing check' : PURPOSE_WORDS[openCheck.purpose];
    return { type: 'go-on-check', check: openCheck.id, title, why: 'is open' };
  }
  if (missing.length === 0) return { type: 'open-firing', title: 'Firing', why: 'check and permit stand' };
  const checkOnly = missing.find((one) => one.code.startsWith('check-') || one.code === 'no-check');
  if (view.state === 'short-off' && checkOnly === undefined)
    return { type: 'open-firing', title: 'Firing', why: missing[0]?.words ?? '' };
  if (view.state === 'shorted') {
    return {
      type: 'open-check',
      purpose: 'before-firing',
      title: 'Before-firing check',
      why: lapseWords(rig, checkOnly),
    };
  }
  return {
    type: 'open-check',
    purpose: 'make-safe',
    title: 'Make safe',
    why: view.why ?? checkOnly?.words ?? 'the short is off',
  };
}

function lapseWords(rig: RigDoc, lapse: Missing | undefined): string {
  if (rig.ready_check === null) return 'none has been closed yet';
  return lapse?.words ?? '';
}
