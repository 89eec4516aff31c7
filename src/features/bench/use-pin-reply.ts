import { useEffect, useMemo, useState } from 'react';
import { answerLookup } from '../../data/lookup/answer-lookup';
import type { LookupAsk, LookupReply } from '../../data/lookup/lookup-protocol';
import { browserLookupRunner } from '../../data/ports/browser-lookup-runner';
import type { Lookup } from '../../domain/lookup/lookup';
import type { Result } from '../../domain/units/result';

/** Answered here, or in a worker where that would take longer than a frame; null while it is computed. */
export function usePinReply(lookup: Lookup, ask: LookupAsk): Result<LookupReply> | null {
  const slow = lookup.slow === true;
  const here = useMemo(() => (slow ? null : answerLookup(lookup, ask)), [slow, lookup, ask]);
  const [elsewhere, setElsewhere] = useState<Result<LookupReply> | null>(null);
  useEffect(() => {
    if (!slow) return undefined;
    const runner = browserLookupRunner();
    let wanted = true;
    void runner.ask({ lookup: lookup.key, ask }).answer.then((result) => {
      if (wanted) setElsewhere(result);
    });
    return () => {
      wanted = false;
      runner.close();
    };
  }, [slow, lookup, ask]);
  return slow ? elsewhere : here;
}
