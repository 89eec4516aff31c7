import type { HoldOutcome } from '../../components/hold';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { useAppend } from '../../data/use-append';
import { useLookups } from '../../data/use-book';
import { keptBody, type KeptFind } from '../../domain/lookup/kept';
import { pinnedLookups } from '../../domain/lookup/pinned';
import { numberAt } from '../../domain/lookup/fields';
import { isWhatIf, wantedKey } from './lookup-form';
import type { LookupView } from './use-lookup';

/** Keeps what the screen shows, pins it to the Bench, and takes the "what if" back. */
export function LookupThumbs({ view }: { readonly view: LookupView }) {
  const { lookup, rig, form, answer, refusal, reset } = view;
  const pinned = pinnedLookups(useLookups(rig?.id ?? '')).some((doc) => doc.kept.lookup === lookup.key);
  const keep = useKeep(view);
  const ready = rig !== undefined && answer !== null && refusal === null;
  const reason = rig === undefined ? 'Take a rig in hand to keep it.' : refusal?.words;
  const common = { disabled: !ready, ...(reason === undefined ? {} : { reason }) };
  return (
    <ThumbZone
      label="Actions"
      main={
        <ThumbDome
          size="big"
          hold="half-second"
          label={'Hold\nto keep'}
          holdLabel="Hold: keep this lookup"
          onComplete={() => keep(undefined)}
          {...common}
        />
      }
      others={[
        <ThumbDome
          key="pin"
          hold="half-second"
          label={pinned && !isWhatIf(form) ? 'Unpin' : 'Pin to bench'}
          holdLabel={pinned && !isWhatIf(form) ? 'Hold: unpin from the Bench' : 'Hold: pin to the Bench'}
          onComplete={() => keep(pinned && !isWhatIf(form) ? 'unpin' : 'pin')}
          {...common}
        />,
        ...(isWhatIf(form)
          ? [
              <ThumbDome
                key="back"
                label={rig === undefined ? 'Start afresh' : 'Back to the rig'}
                onComplete={reset}
              />,
            ]
          : []),
      ]}
    />
  );
}

function useKeep(view: LookupView): (pin: 'pin' | 'unpin' | undefined) => Promise<HoldOutcome> {
  const append = useAppend();
  return async (pin) => {
    const { lookup, rig, revision, form, values, answer, refusal } = view;
    if (rig === undefined || answer === null || refusal !== null) {
      return { type: 'failed', words: refusal?.words ?? 'There is nothing to keep yet.' };
    }
    const outcome = await append({
      kind: 'lookup.kept',
      subject: rig.id,
      body: keptBody({
        lookup,
        values,
        known: form.known,
        answer,
        find: findOf(view),
        rig_revision: revision?.entry ?? null,
        ...(pin === undefined ? {} : { pin }),
      }),
    });
    return outcome.type === 'logged' ? { type: 'settled' } : { type: 'failed', words: outcome.words };
  };
}

function findOf({ lookup, form, solvable }: LookupView): KeptFind | null {
  if (solvable === null) return null;
  const { field, figure, purpose = null } = solvable;
  return { field, figure, purpose, target: numberAt(form.values, wantedKey(lookup, form.find) ?? '') };
}
