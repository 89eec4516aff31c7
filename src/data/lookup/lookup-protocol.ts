import type { LookupAnswer, Values } from '../../domain/lookup/lookup';
import type { SweepRow } from '../../domain/lookup/sweep';
import type { Numbered } from '../worker/latest-runner';

/** What may be asked of a lookup elsewhere than on the page. Lookups are named by key: functions cannot be sent. */
export type LookupAsk =
  | { readonly kind: 'answer'; readonly values: Values }
  | {
      readonly kind: 'find';
      readonly values: Values;
      /** Place of the pair in the lookup's list. */
      readonly solvable: number;
      readonly target: number | null;
    }
  | {
      readonly kind: 'sweep';
      readonly values: Values;
      readonly field: string;
      readonly figures: readonly string[];
      readonly xs: readonly number[];
    };

export interface LookupRequest extends Numbered {
  readonly lookup: string;
  readonly ask: LookupAsk;
}

/** What comes back: an answer, with the value that was found where one was sought, or the rows of a sweep. */
export type LookupReply =
  | {
      readonly kind: 'answer';
      readonly answer: LookupAnswer;
      readonly found: { readonly value: number; readonly all: readonly number[] } | null;
    }
  | { readonly kind: 'sweep'; readonly rows: readonly SweepRow[] };
