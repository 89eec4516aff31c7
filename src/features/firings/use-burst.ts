import { useEffect, useRef } from 'react';
import type { HoldOutcome } from '../../components/hold';
import { useClient } from '../../data/client-context';
import { useAppend } from '../../data/use-append';
import { useDraft } from '../../data/use-draft';
import { useNow } from '../../data/use-now';
import type { FiringDoc } from '../../domain/book/documents/firing';
import { burstView, startBurst, stillRunning, type Burst, type BurstView } from './burst';
import { loggedWords, type Said } from './use-firing-log';
import type { ReadingForm } from './use-reading-form';

export interface BurstCounter {
  readonly view: BurstView;
  /** Starts a burst, or ends the one that runs and logs its shots. */
  readonly toggle: () => Promise<HoldOutcome>;
}

interface BurstOptions {
  readonly firing: FiringDoc;
  readonly form: ReadingForm;
  readonly onSaid: (said: Said) => void;
}

const NO_BURST: Burst | null = null;
const RUNNING_MS = 500;
const IDLE_MS = 60_000;
const SETTLED: HoldOutcome = { type: 'settled' };

/** Counts a burst by rate times time; its start outlives a kill as a draft, its end is an entry. */
export function useBurst({ firing, form, onSaid }: BurstOptions): BurstCounter {
  const { value: burst, set, clear } = useDraft<Burst | null>(`burst/${firing.id}`, NO_BURST);
  const client = useClient();
  // A screen of a thousand readings shall not be drawn twice a second for nothing.
  const { stamp } = useNow(burst === null ? IDLE_MS : RUNNING_MS);
  const append = useAppend();
  const writing = useRef(false);
  useEffect(() => {
    if (burst === null) return;
    const seen = stillRunning(burst, stamp);
    // Drafts are written at every change; once a second is often enough for a count of shots.
    if (seen.seen_ms - burst.seen_ms >= 1000) set(seen);
  }, [burst, stamp, set]);

  const failed = (words: string): HoldOutcome => {
    onSaid({ lead: 'Not counted.', words });
    return { type: 'failed', words };
  };
  const start = (): HoldOutcome => {
    const { rate_Hz } = form.values;
    if (rate_Hz === null) {
      const words = 'Rate: enter it before a burst is counted.';
      form.refuse({ type: 'empty', field: 'rate_Hz', words });
      return failed(words);
    }
    set(startBurst(rate_Hz, client.here().stamp()));
    onSaid({ lead: 'Burst runs.', words: 'Stopping it logs its shots.' });
    return SETTLED;
  };
  const stop = async (running: Burst): Promise<HoldOutcome> => {
    const counted = burstView(running, client.here().stamp());
    if (counted.type === 'none') return SETTLED;
    const { shots, rate_Hz } = counted;
    const outcome = await append({
      kind: 'firing.shots-counted',
      subject: firing.id,
      body: { shots, rate_Hz },
    });
    if (outcome.type !== 'logged') return failed(outcome.words);
    clear();
    // The burst is in the firing's count already: the reading that follows must not count it again.
    form.countedElsewhere();
    const said = loggedWords(`${shots} ${shots === 1 ? 'shot' : 'shots'} at ${rate_Hz}\u2009Hz`, outcome);
    onSaid({ ...said, words: `${said.words} The next reading counts none of its own.`.trim() });
    return SETTLED;
  };

  return {
    view: burstView(burst, stamp),
    toggle: async () => {
      if (writing.current) return failed('The burst before is still being written.');
      if (burst === null) return start();
      writing.current = true;
      try {
        return await stop(burst);
      } finally {
        writing.current = false;
      }
    },
  };
}
