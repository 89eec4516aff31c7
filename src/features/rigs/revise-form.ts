import type { RigDoc } from '../../domain/book/documents/rig';
import type { RigSpec } from '../../domain/book/rig-spec';
import { specChanges, type SpecChange } from '../../domain/rules/loosening';
import { standingPermit } from '../../domain/rules/readiness';
import { parseQuantity } from '../../domain/units/parse-number';
import { reviseFields, type ReviseField } from './revise-fields';

/** Only what was touched: the rest follows the latest revision, even when that changes while somebody types. */
export interface ReviseDraft {
  readonly texts: Readonly<Record<string, string>>;
  readonly gas: RigSpec['gap']['gas'] | null;
  readonly irradiated: boolean | null;
  readonly why: string;
}

export const EMPTY_DRAFT: ReviseDraft = { texts: {}, gas: null, irradiated: null, why: '' };

export interface Revision {
  /** What would be written; the latest spec wherever a field is refused. */
  readonly spec: RigSpec;
  readonly changes: readonly SpecChange[];
  readonly loosens: boolean;
  /** By field. */
  readonly refusals: Readonly<Record<string, string>>;
  /** Why it cannot be saved yet, in words; null when it can. */
  readonly hindrance: string | null;
}

export function revisionOf(before: RigSpec, draft: ReviseDraft): Revision {
  const fields = reviseFields(before);
  const refusals: Record<string, string> = {};
  let spec: RigSpec = {
    ...before,
    gap: {
      ...before.gap,
      gas: draft.gas ?? before.gap.gas,
      irradiated: draft.irradiated ?? before.gap.irradiated,
    },
  };
  for (const field of fields) {
    const text = draft.texts[field.key];
    if (text === undefined) continue;
    const read = readField(field, text);
    if (read.ok) spec = field.write(spec, read.value);
    else refusals[field.key] = read.words;
  }
  Object.assign(refusals, { ...contradictions(spec), ...refusals });
  const changes = specChanges(before, spec);
  return {
    spec,
    changes,
    loosens: changes.some((change) => change.loosens),
    refusals,
    hindrance: hindrance(changes, refusals, draft.why),
  };
}

type ReadField =
  { readonly ok: true; readonly value: number | null } | { readonly ok: false; readonly words: string };

export function readField(field: ReviseField, text: string): ReadField {
  if (text.trim() === '' && field.mayBeUnknown) return { ok: true, value: null };
  const number = parseQuantity(text, field.rule);
  return number.ok ? number : { ok: false, words: number.refusal.words };
}

/** One step up or down, in decimal, so that 2.6 and 0.1 give 2.7; from an empty field the step leads to the step. */
export function stepText(
  field: ReviseField,
  direction: -1 | 1,
  now: { readonly text: string | undefined; readonly spec: RigSpec },
): string {
  const value = now.text === undefined ? field.read(now.spec) : Number(now.text);
  const from = value === null || !Number.isFinite(value) ? 0 : value;
  const next = Number((from + direction * field.step).toPrecision(12));
  return String(Math.min(field.rule.max, Math.max(field.rule.min, next)));
}

/** What stands against the numbers taken together, beside the field that has to give way. */
function contradictions(spec: RigSpec): Record<string, string> {
  const found: Record<string, string> = {};
  const { gap_mm, gap_error_mm, lowest_bar_g, highest_bar_g, vessel } = spec.gap;
  if (gap_mm <= gap_error_mm)
    found['gap.gap_mm'] = `Gap: must be wider than its setting error of ${gap_error_mm}\u2009mm.`;
  if (highest_bar_g < lowest_bar_g)
    found['gap.highest_bar_g'] = `Highest working pressure: below the lowest, ${lowest_bar_g}\u2009bar(g).`;
  if (vessel === null) return found;
  const over = (value: number, name: string): string | null =>
    value > vessel.rated_bar_g
      ? `${name}: above the vessel's ${vessel.rated_bar_g}\u2009bar(g).`
      : value > vessel.relief_bar_g
        ? `${name}: above the relief valve's ${vessel.relief_bar_g}\u2009bar(g).`
        : null;
  const working = over(highest_bar_g, 'Highest working pressure');
  const limit = over(spec.envelope.max_bar_g, 'Envelope pressure');
  if (working !== null) found['gap.highest_bar_g'] = working;
  if (limit !== null) found['envelope.max_bar_g'] = limit;
  return found;
}

function hindrance(
  changes: readonly SpecChange[],
  refusals: Readonly<Record<string, string>>,
  why: string,
): string | null {
  const [refused] = Object.values(refusals);
  if (refused !== undefined) return refused;
  if (changes.length === 0) return 'Nothing has been changed yet.';
  return why.trim() === '' ? 'Say why the rig is revised.' : null;
}

export interface Voided {
  /** The permit that rules now and would lapse. */
  readonly permit: ReturnType<typeof standingPermit>;
  readonly check: boolean;
  readonly parting: boolean;
}

/** What a revision takes away from this rig, to be said before saving. */
export function voidedBy(rig: RigDoc, now_ms: number): Voided {
  const { ready_check } = rig;
  return {
    permit: standingPermit(rig, now_ms),
    check:
      ready_check !== null && ready_check.voided === null && rig.heads.includes(ready_check.rig_revision),
    parting: rig.heads.length > 1,
  };
}
