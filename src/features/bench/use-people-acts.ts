import type { HoldOutcome } from '../../components/hold';
import { useAppend, type AppendOutcome } from '../../data/use-append';
import { useDraft } from '../../data/use-draft';
import type { RigDoc } from '../../domain/book/documents/rig';

export interface GuestDraft {
  readonly who: 'outside' | 'member' | null;
  readonly person: string | null;
  readonly name: string;
  readonly knows_isolator: 'yes' | 'no' | null;
  readonly eyewear: string | null;
  readonly words: string;
}

const NO_GUEST: GuestDraft = {
  who: null,
  person: null,
  name: '',
  knows_isolator: null,
  eyewear: null,
  words: '',
};

/** Hanging and taking out tags, checking guests in and out; what is typed is kept until it is logged. */
export function usePeopleActs(rig: RigDoc) {
  const append = useAppend();
  const where = useDraft(`hands/${rig.id}`, '');
  const guest = useDraft<GuestDraft>(`guest/${rig.id}`, NO_GUEST);

  return {
    where,
    guest,
    handsIn: async (): Promise<HoldOutcome> => {
      const body = { where: where.value.trim() };
      const outcome = settle(await append({ kind: 'hands.in', subject: rig.id, body }));
      if (outcome.type === 'settled') where.clear();
      return outcome;
    },
    /** `words` for somebody else's tag. */
    handsOut: async (tag: string, words?: string): Promise<HoldOutcome> =>
      settle(
        await append({
          kind: 'hands.out',
          subject: rig.id,
          body: words === undefined ? { tag } : { tag, words: words.trim() },
        }),
      ),
    guestIn: async (): Promise<HoldOutcome> => {
      const body = guestBody(guest.value);
      if (typeof body === 'string') return { type: 'failed', words: body };
      const outcome = settle(await append({ kind: 'guest.in', subject: rig.id, body }));
      if (outcome.type === 'settled') guest.clear();
      return outcome;
    },
    guestOut: async (entry: string): Promise<HoldOutcome> =>
      settle(await append({ kind: 'guest.out', subject: rig.id, body: { guest: entry } })),
  };
}

export type PeopleActs = ReturnType<typeof usePeopleActs>;

/** The body of a `guest.in`, or what is missing of it in words. */
export function guestBody(draft: GuestDraft) {
  const { who, person, knows_isolator, eyewear } = draft;
  const name = draft.name.trim();
  if (who === null) return 'Say who it is.';
  if (who === 'member' && person === null) return 'Choose who of the lab it is.';
  if (who === 'outside' && name === '') return 'Write the name down.';
  if (knows_isolator === null) return 'Say whether the isolator was shown.';
  return {
    person: who === 'member' ? person : null,
    name: who === 'member' ? '' : name,
    knows_isolator: knows_isolator === 'yes',
    eyewear,
    words: draft.words.trim(),
  };
}

function settle(outcome: AppendOutcome): HoldOutcome {
  if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
  return { type: 'settled' };
}
