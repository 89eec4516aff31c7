import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { useAppend } from '../../data/use-append';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { GapLookup } from './use-gap-lookup';

/** Keeps what the screen shows, as it shows it, and takes the "what if" back. */
export function GapThumbs({ rig, lookup }: { readonly rig: RigDoc; readonly lookup: GapLookup }) {
  const append = useAppend();
  const { form, view, reset, revision } = lookup;
  const changed = Object.values(form.known).includes('what-if') || form.find !== 'voltage';
  const keep = async () => {
    if (!view.ok) return { type: 'failed', words: view.refusal.words } as const;
    const { law_kV, low_kV, high_kV, model, valid } = view.value.answer;
    const { values, gas, irradiated, reference, find, purpose, known } = form;
    const outcome = await append({
      kind: 'lookup.kept',
      subject: rig.id,
      body: {
        lookup: 'gap',
        inputs: { ...values, gas, irradiated, reference, find, purpose, known, rig_revision: revision.entry },
        answers: { law_kV, low_kV, high_kV, model, valid, solved: view.value.solution?.value ?? null },
        pinned: false,
      },
    });
    return outcome.type === 'logged'
      ? ({ type: 'settled' } as const)
      : ({ type: 'failed', words: outcome.words } as const);
  };
  return (
    <ThumbZone
      label="Actions"
      main={
        <ThumbDome
          size="big"
          hold="half-second"
          label={'Hold\nto keep'}
          holdLabel="Hold: keep this lookup"
          onComplete={keep}
          disabled={!view.ok}
        />
      }
      others={changed ? [<ThumbDome key="back" label="Back to the rig" onComplete={reset} />] : []}
    />
  );
}
