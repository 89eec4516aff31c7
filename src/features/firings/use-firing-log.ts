import { useRef, useState } from 'react';
import { useAppend, type AppendOutcome } from '../../data/use-append';
import type { HoldOutcome } from '../../components/hold';
import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import { toReading, typedNotEntered } from './reading-form';
import type { FiringFacts } from './use-firing-facts';
import type { ReadingForm } from './use-reading-form';

/** What the screen says of the last thing that was done here. */
export interface Said {
  readonly lead: string;
  readonly words: string;
}

export interface FiringLog {
  readonly said: Said | null;
  readonly say: (said: Said) => void;
  /** Both the dome and the foot key come through here. */
  readonly log: () => Promise<HoldOutcome>;
  readonly close: () => Promise<HoldOutcome>;
  readonly standDown: () => Promise<void>;
}

interface FiringLogOptions {
  readonly facts: FiringFacts;
  readonly form: ReadingForm;
  readonly onLogged: (id: string, values: ReadingValues) => void;
}

const SETTLED: HoldOutcome = { type: 'settled' };

export function useFiringLog({ facts, form, onLogged }: FiringLogOptions): FiringLog {
  const { firing, rig } = facts;
  const append = useAppend();
  const [said, setSaid] = useState<Said | null>(null);
  // A foot and a thumb at once are one reading, not two.
  const writing = useRef(false);

  const failed = (words: string): HoldOutcome => {
    setSaid({ lead: 'Not logged.', words });
    return { type: 'failed', words };
  };

  const writeReading = async (): Promise<HoldOutcome> => {
    const typed = typedNotEntered(form.draft);
    if (typed !== null) return failed(typed.words);
    const reading = toReading(form.base, form.draft);
    if (!reading.ok) {
      form.refuse(reading.refusal);
      return failed(reading.refusal.words);
    }
    const outcome = await append({ kind: 'firing.reading', subject: firing.id, body: reading.value });
    if (outcome.type !== 'logged') return failed(outcome.words);
    form.startNext();
    onLogged(outcome.entry.id, reading.value);
    setSaid(loggedWords(`Reading ${firing.readings + 1}`, outcome));
    return SETTLED;
  };

  return {
    said,
    say: setSaid,
    log: async () => {
      if (facts.loading) return failed('The readings of this firing are still being read.');
      if (writing.current) return failed('The reading before is still being written.');
      writing.current = true;
      try {
        return await writeReading();
      } finally {
        writing.current = false;
      }
    },
    close: async () => {
      const body = { summary: form.draft.summary.trim() };
      const outcome = await append({ kind: 'firing.closed', subject: firing.id, body });
      return outcome.type === 'logged' ? SETTLED : failed(outcome.words);
    },
    standDown: async () => {
      const why = `Foot key held for a second during firing ${firing.number}.`;
      const outcome = await append({ kind: 'rig.stood-down', subject: rig.id, body: { why } });
      setSaid(
        outcome.type === 'logged'
          ? { lead: `${rig.name} is stood down.`, words: 'By the foot key; logged.' }
          : { lead: 'Not stood down in the Book.', words: outcome.words },
      );
    },
  };
}

/** Said only of what is durable, with the forecast of an irregular entry at once. */
export function loggedWords(what: string, outcome: Extract<AppendOutcome, { type: 'logged' }>): Said {
  const { forecast, words } = outcome;
  if (forecast?.verdict === 'irregular')
    return {
      lead: `${what} ${words} as irregular:`,
      words: forecast.reason?.words ?? 'the reviewer will see why.',
    };
  return { lead: `${what} ${words}.`, words: '' };
}
