import { useMemo } from 'react';
import { useDraft } from '../../data/use-draft';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { LabDoc } from '../../domain/book/documents/lab';
import { gapFormOf, type GapForm } from './gap-form';
import { gapCurves, gapView, supplyAgainst } from './gap-view';

/** The lookup of one rig: a form kept as a draft at every key, its answer, and the curve around it. */
export function useGapLookup(rig: RigDoc, lab: LabDoc | undefined) {
  const revision = latestRevision(rig);
  const initial = useMemo(() => gapFormOf(revision.spec, lab?.settings), [revision, lab]);
  // A new revision or changed lab settings start afresh: old "what if" values would pass for the rig's.
  const draft = useDraft<GapForm>(`lookup/gap/${revision.entry}/${lab?.set.entry ?? 'no-lab'}`, initial);
  const form = draft.value;
  const view = useMemo(() => gapView(form), [form]);
  const range = useMemo(
    () => drawnRange(form, revision.spec.gap.vessel?.rated_bar_g ?? revision.spec.gap.highest_bar_g),
    [form, revision],
  );
  const ambient = form.values.ambient_bar_abs;
  const curves = useMemo(
    () => (view.ok && ambient !== null ? gapCurves(view.value.input, ambient, range) : null),
    [view, ambient, range],
  );
  const supply = useMemo(
    () => (view.ok ? supplyAgainst(revision.spec, view.value.answer) : null),
    [view, revision],
  );
  return {
    revision,
    form,
    change: draft.set,
    reset: draft.clear,
    saveState: draft.save,
    view,
    curves,
    range,
    supply,
  };
}

export type GapLookup = ReturnType<typeof useGapLookup>;

const LEAST_SPAN_BAR = 0.5;

/** From open air to the vessel's limit, wide enough for the pressure asked about. */
function drawnRange(form: GapForm, vessel_bar_g: number) {
  const ambient = form.values.ambient_bar_abs ?? 1;
  const asked = form.values.pressure ?? 0;
  const asked_bar_g = form.reference === 'abs' ? asked - ambient : asked;
  const from_bar_g = Math.min(0, asked_bar_g);
  return { from_bar_g, to_bar_g: Math.max(vessel_bar_g, asked_bar_g, from_bar_g + LEAST_SPAN_BAR) };
}
