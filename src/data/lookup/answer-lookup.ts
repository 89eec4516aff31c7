import type { Lookup } from '../../domain/lookup/lookup';
import { solveFor } from '../../domain/lookup/solve';
import { sweepAt } from '../../domain/lookup/sweep';
import { mapResult, ok, refused, type Result } from '../../domain/units/result';
import type { LookupAsk, LookupReply } from './lookup-protocol';

/** What a lookup says to a question: the same on the page and in the worker. */
export function answerLookup(lookup: Lookup, ask: LookupAsk): Result<LookupReply> {
  switch (ask.kind) {
    case 'answer':
      return mapResult(lookup.answer(ask.values), (answer): LookupReply => ({
        kind: 'answer',
        answer,
        found: null,
      }));
    case 'find': {
      const solvable = lookup.solvable[ask.solvable];
      if (solvable === undefined)
        return refused({ type: 'not-solvable', words: 'This cannot be solved for.' });
      return mapResult(
        solveFor(lookup, ask.values, { solvable, target: ask.target }),
        ({ answer, value, all }): LookupReply => ({ kind: 'answer', answer, found: { value, all } }),
      );
    }
    case 'sweep':
      return ok({ kind: 'sweep', rows: sweepAt(lookup, ask.values, ask) });
  }
}
