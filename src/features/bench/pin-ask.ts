import type { LookupAsk } from '../../data/lookup/lookup-protocol';
import { numberAt } from '../../domain/lookup/fields';
import type { Kept, KeptFind } from '../../domain/lookup/kept';
import type { Lookup, StartFrom, Values } from '../../domain/lookup/lookup';

/**
 * What a pinned lookup asks today: whatever it had from the rig or the lab comes from their present state, and what a
 * person set as "what if" or took as assumed stays as it was kept.
 */
export function pinAsk(lookup: Lookup, kept: Kept, from: StartFrom): LookupAsk {
  const values = pinValues(lookup, kept, from);
  const solvable = kept.find === null ? -1 : placeOf(lookup, kept.find);
  if (kept.find === null || solvable < 0) return { kind: 'answer', values };
  const target = lookup.solvable[solvable]?.target;
  return {
    kind: 'find',
    values,
    solvable,
    target: kept.find.target ?? (target === undefined ? null : numberAt(values, target)),
  };
}

function pinValues(lookup: Lookup, kept: Kept, from: StartFrom): Values {
  const start = lookup.start(from).values;
  const own = Object.entries(kept.values).filter(([key]) => !comesFromRig(key));
  return { ...start, ...Object.fromEntries(own) };

  function comesFromRig(key: string): boolean {
    const known = kept.known[key];
    // A key that no field names is what the rig says and nobody enters, such as the vessel's rating.
    const entered = lookup.fields.some((field) => field.key === key);
    return (known === 'rig' || known === 'lab' || !entered) && Object.hasOwn(start, key);
  }
}

function placeOf(lookup: Lookup, { field, figure, purpose }: KeptFind): number {
  return lookup.solvable.findIndex(
    (one) => one.field === field && one.figure === figure && (one.purpose ?? null) === purpose,
  );
}

/** Labels of what a person set otherwise than the rig has it, so that nobody takes the answer for the rig's own. */
export function whatIfs(lookup: Lookup, kept: Kept): readonly string[] {
  return lookup.fields
    .filter((field) => kept.known[field.key] === 'what-if' && field.key !== kept.find?.field)
    .map((field) => field.label);
}
