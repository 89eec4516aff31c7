import { useEffect, useMemo, useRef, useState } from 'react';
import { answerLookup } from '../../data/lookup/answer-lookup';
import type { LookupAsk, LookupReply } from '../../data/lookup/lookup-protocol';
import { browserLookupRunner, type LookupRunner } from '../../data/ports/browser-lookup-runner';
import { numberAt } from '../../domain/lookup/fields';
import type { Lookup } from '../../domain/lookup/lookup';
import type { Result } from '../../domain/units/result';
import { wantedKey, type LookupForm } from './lookup-form';

export interface Computed {
  /** Null until the first answer is there. */
  readonly reply: Result<LookupReply> | null;
  /** True once an answer has kept somebody waiting. */
  readonly computing: boolean;
}

/** A shorter wait is not worth a word. */
const PATIENCE_MS = 300;

/** Answers on the page, or in a worker where that would take longer than a frame. The last answer stays until the next is there. */
export function useComputed(lookup: Lookup, ask: LookupAsk | null): Computed {
  const slow = lookup.slow === true;
  const here = useMemo(() => (slow || ask === null ? null : answerLookup(lookup, ask)), [slow, lookup, ask]);
  const elsewhere = useWorkerAnswer(lookup.key, slow ? ask : null);
  return slow ? elsewhere : { reply: here, computing: false };
}

function useWorkerAnswer(key: string, ask: LookupAsk | null): Computed {
  const [reply, setReply] = useState<Result<LookupReply> | null>(null);
  const [computing, setComputing] = useState(false);
  const runner = useRef<LookupRunner | null>(null);
  useEffect(
    () => () => {
      runner.current?.close();
      runner.current = null;
    },
    [],
  );
  useEffect(() => {
    if (ask === null) return undefined;
    let wanted = true;
    runner.current ??= browserLookupRunner();
    const timer = setTimeout(() => setComputing(true), PATIENCE_MS);
    void runner.current.ask({ lookup: key, ask }).answer.then((result) => {
      if (!wanted) return;
      clearTimeout(timer);
      setReply(result);
      setComputing(false);
    });
    // A newer question overtakes this one; the worker goes on with it.
    return () => {
      wanted = false;
      clearTimeout(timer);
    };
  }, [key, ask]);
  return { reply, computing };
}

/** What the form asks: the answer at its values, or the input that meets the wanted figure. */
export function askOf(lookup: Lookup, form: Pick<LookupForm, 'values' | 'find'>): LookupAsk {
  const key = wantedKey(lookup, form.find);
  if (form.find === null || key === null) return { kind: 'answer', values: form.values };
  return {
    kind: 'find',
    values: form.values,
    solvable: form.find.solvable,
    target: numberAt(form.values, key),
  };
}
