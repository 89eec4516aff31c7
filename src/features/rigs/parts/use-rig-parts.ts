import { useState } from 'react';
import type { HoldOutcome } from '../../../components/hold';
import { useAppend } from '../../../data/use-append';
import { useFirings, useParts } from '../../../data/use-book';
import { useDraft } from '../../../data/use-draft';
import type { RigDoc } from '../../../domain/book/documents/rig';
import { EMPTY_FIT, fitOf, type FitDraft } from './fit-form';
import { partLedger } from '../../../domain/rules/part-ledger';

const EMPTY_RETIRE: { readonly why: string } = { why: '' };

/** Parts of one rig: what is fitted, what was, and a part being fitted or retired. */
export function useRigParts(rig: RigDoc) {
  const append = useAppend();
  const parts = useParts(rig.id);
  const firings = useFirings(rig.id);
  const fit = useDraft<FitDraft>(`part-fit/${rig.id}`, EMPTY_FIT);
  const [view, setView] = useState<'list' | 'fit' | 'retire'>('list');
  const [chosen, setChosen] = useState<string | null>(null);
  const retire = useDraft(`part-retire/${chosen ?? ''}`, EMPTY_RETIRE);
  const read = fitOf(fit.value, parts);
  const part = parts.find((one) => one.id === chosen) ?? null;

  const outcomeOf = (outcome: Awaited<ReturnType<typeof append>>, clear: () => void): HoldOutcome => {
    if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
    clear();
    setView('list');
    setChosen(null);
    return { type: 'settled' };
  };

  return {
    rig,
    parts,
    ledgers: parts.map((one) => partLedger(one, rig, firings)),
    fit,
    read,
    view,
    setView,
    part,
    choose: (id: string) => setChosen(chosen === id ? null : id),
    retire,
    logFit: async (): Promise<HoldOutcome> =>
      read.ok
        ? outcomeOf(await append({ kind: 'part.fitted', subject: rig.id, body: read.body }), fit.clear)
        : { type: 'failed', words: read.words },
    logRetire: async (): Promise<HoldOutcome> => {
      const why = retire.value.why.trim();
      if (part === null) return { type: 'failed', words: 'Choose the part.' };
      if (why === '') return { type: 'failed', words: 'Say why it is retired.' };
      return outcomeOf(
        await append({ kind: 'part.retired', subject: rig.id, body: { part: part.id, why } }),
        retire.clear,
      );
    },
  };
}

export type RigParts = ReturnType<typeof useRigParts>;
