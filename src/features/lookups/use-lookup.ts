import { useMemo } from 'react';
import { useDraft } from '../../data/use-draft';
import { useNow } from '../../data/use-now';
import { useOwnCurve } from '../../data/use-rig-calibration';
import type { LabDoc } from '../../domain/book/documents/lab';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import { ownValues } from '../../domain/lookup/gap-own';
import type { Lookup, LookupAnswer, Values } from '../../domain/lookup/lookup';
import { standingPermit } from '../../domain/rules/readiness';
import type { Refusal } from '../../domain/units/result';
import { lookupFormOf, solvableOf, type LookupForm } from './lookup-form';
import { askOf, useComputed } from './use-lookup-answer';

/** One lookup of one rig: a form kept as a draft at every key, and its answer. */
export function useLookup(lookup: Lookup, rig: RigDoc | undefined, lab: LabDoc | undefined): LookupView {
  const revision = rig === undefined ? null : latestRevision(rig);
  const { best_ms } = useNow(60_000);
  const permit = rig === undefined ? null : standingPermit(rig, best_ms);
  const envelope = permit?.envelope ?? null;
  const initial = useMemo(
    () =>
      lookupFormOf(
        lookup,
        lookup.start({
          spec: revision?.spec ?? null,
          settings: lab?.settings ?? null,
          envelope,
        }),
      ),
    [lookup, revision, lab, envelope],
  );
  // A new revision, permit or lab settings start afresh: old "what if" values would pass for the rig's.
  const started = [
    revision?.entry ?? 'no-rig',
    lab?.set.entry ?? 'no-lab',
    permit?.entry ?? 'no-permit',
  ].join('/');
  const draft = useDraft<LookupForm>(`lookup/${lookup.key}/2/${started}`, initial);
  const form = draft.value;
  const { values: set, find } = form;
  // Drawn over the law, never entered, never kept: what was measured changes under a form that stays.
  const own = useOwnCurve(lookup.key === 'gap' ? rig : undefined);
  const ask = useMemo(() => {
    const spec = revision?.spec;
    const values = own === null || spec === undefined ? set : { ...set, ...ownValues(own, spec) };
    return askOf(lookup, { values, find });
  }, [lookup, set, find, own, revision]);
  const { reply, computing } = useComputed(lookup, ask);
  const answered = reply?.ok === true && reply.value.kind === 'answer' ? reply.value : null;
  const solvable = solvableOf(lookup, form.find);
  const found = answered?.found ?? null;
  const values: Values =
    solvable === null || found === null ? form.values : { ...form.values, [solvable.field]: found.value };
  return {
    lookup,
    rig,
    revision,
    form,
    change: draft.set,
    reset: draft.clear,
    /** The values that the answer is for: with what was found in its place. */
    values,
    answer: answered?.answer ?? null,
    refusal: reply?.ok === false ? reply.refusal : null,
    solvable,
    found,
    computing,
  };
}

export interface LookupView {
  readonly lookup: Lookup;
  readonly rig: RigDoc | undefined;
  readonly revision: ReturnType<typeof latestRevision> | null;
  readonly form: LookupForm;
  readonly change: (next: (now: LookupForm) => LookupForm) => void;
  readonly reset: () => void;
  readonly values: Values;
  readonly answer: LookupAnswer | null;
  readonly refusal: Refusal | null;
  readonly solvable: ReturnType<typeof solvableOf>;
  readonly found: { readonly value: number; readonly all: readonly number[] } | null;
  readonly computing: boolean;
}
