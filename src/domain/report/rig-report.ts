import { breakText } from '../rules/break-text';
import { latestRevision, type RigDoc } from '../book/documents/rig';
import type { LabSettings } from '../book/rig-spec';
import { rigDerived } from '../rules/rig-derived';
import { derivedRows, type DerivedRow } from './derived-rows';

/** A rig on paper: its figures with the digits of the screens, and the two sides of its gap. */
export interface RigReport {
  readonly rig: string;
  readonly name: string;
  readonly revision: { readonly number: string; readonly entry: string };
  readonly rows: readonly DerivedRow[];
  /** Self-break at the middle of the working pressures, kV; null where it has no answer, then `refusal` says why. */
  readonly gap: {
    readonly at_bar_g: number;
    readonly low: string | null;
    readonly law: string | null;
    readonly high: string | null;
    readonly refusal: string | null;
  };
}

/** The newest revision of a rig, computed where it is asked for, tablet or server alike. */
export function rigReport(rig: RigDoc, settings: LabSettings): RigReport {
  const { spec, number, entry } = latestRevision(rig);
  const derived = rigDerived(spec, settings);
  const { selfBreak, at } = derived;
  const sides = selfBreak.ok
    ? {
        low: breakText(selfBreak.value.low_kV, 'down'),
        law: breakText(selfBreak.value.law_kV, 'nearest'),
        high: breakText(selfBreak.value.high_kV, 'up'),
        refusal: null,
      }
    : { low: null, law: null, high: null, refusal: selfBreak.refusal.words };
  return {
    rig: rig.id,
    name: rig.name,
    revision: { number, entry },
    rows: derivedRows(derived),
    gap: { at_bar_g: at.pressure_bar_g, ...sides },
  };
}
