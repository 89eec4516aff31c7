import { memo, useEffect, useRef, type RefObject } from 'react';
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
  const latest = useRef(view);
  useEffect(() => {
    latest.current = view;
  });
  return (
    <Thumbs
      latest={latest}
      lookup={lookup.key}
      rig={rig?.id ?? null}
      whatIf={isWhatIf(form)}
      refused={refusal?.words ?? null}
      answered={answer !== null}
      reset={reset}
    />
  );
}

interface ThumbsProps {
  /** What is kept is what the screen shows when the hold ends. */
  readonly latest: RefObject<LookupView>;
  readonly lookup: string;
  readonly rig: string | null;
  readonly whatIf: boolean;
  readonly refused: string | null;
  readonly answered: boolean;
  readonly reset: () => void;
}

/** Nothing of it changes while a thumb slides, so it is not drawn anew. */
const Thumbs = memo(function Thumbs({ latest, lookup, rig, whatIf, refused, answered, reset }: ThumbsProps) {
  const pinned = pinnedLookups(useLookups(rig ?? '')).some((doc) => doc.kept.lookup === lookup);
  const keep = useKeep(latest);
  const ready = rig !== null && answered && refused === null;
  const reason = rig === null ? 'Take a rig in hand to keep it.' : (refused ?? undefined);
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
          label={pinned && !whatIf ? 'Unpin' : 'Pin to bench'}
          holdLabel={pinned && !whatIf ? 'Hold: unpin from the Bench' : 'Hold: pin to the Bench'}
          onComplete={() => keep(pinned && !whatIf ? 'unpin' : 'pin')}
          {...common}
        />,
        ...(whatIf
          ? [
              <ThumbDome
                key="back"
                label={rig === null ? 'Start afresh' : 'Back to the rig'}
                onComplete={reset}
              />,
            ]
          : []),
      ]}
    />
  );
});

function useKeep(latest: RefObject<LookupView>): (pin: 'pin' | 'unpin' | undefined) => Promise<HoldOutcome> {
  const append = useAppend();
  return async (pin) => {
    const view = latest.current;
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
