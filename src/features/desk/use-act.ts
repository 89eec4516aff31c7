import { useEffect, useRef, useState } from 'react';
import type { HoldOutcome } from '../../components/hold';
import { useAppend, useJudge } from '../../data/use-append';
import { useSession } from '../../data/use-session';
import type { Reason } from '../../domain/book/entry';

type Draft = Parameters<ReturnType<typeof useAppend>>[0];

export interface Act {
  /** Logs it; "logged" is said only then, and what the server makes of it is shown as it comes. */
  readonly log: (draft: Draft) => Promise<HoldOutcome>;
  /** The entry that was logged last from here. */
  readonly logged: string | null;
}

export function useAct(onLogged?: () => void): Act {
  const append = useAppend();
  const [logged, setLogged] = useState<string | null>(null);
  return {
    logged,
    log: async (draft) => {
      const outcome = await append(draft);
      if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
      setLogged(outcome.entry.id);
      onLogged?.();
      return { type: 'settled' };
    },
  };
}

export interface Forecast {
  /** What stands against it as far as this tablet knows; null when nothing does. */
  readonly against: Reason | null;
  /** It would wait for its author to sign in online. */
  readonly waits_for_sign_in: boolean;
}

/** What the judge would say of an act now, without writing it. `key` names what the draft says, so that it is asked anew when that changes. */
export function useForecast(draft: Draft | null, key: string): Forecast {
  const judge = useJudge();
  const session = useSession();
  const [said, setSaid] = useState<{ readonly key: string; readonly reason: Reason | null } | null>(null);
  const latest = useRef(draft);
  // Before the one that asks, so that it always reads the draft of this render.
  useEffect(() => {
    latest.current = draft;
  });
  const asks = draft !== null;
  useEffect(() => {
    let stale = false;
    const asked = latest.current;
    if (!asks || asked === null) return undefined;
    void judge(asked).then((judged) => {
      if (!stale) setSaid({ key, reason: judged.verdict === 'applied' ? null : judged.reason });
    });
    return () => {
      stale = true;
    };
  }, [judge, key, asks]);
  const reason = draft !== null && said?.key === key ? said.reason : null;
  return {
    against: reason?.cause === 'confirm' ? null : reason,
    waits_for_sign_in: session.state === 'open' && session.online !== 'signed-in',
  };
}
