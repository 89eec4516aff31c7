import type { Envelope } from '../../domain/oscillogram/extremes';
import type { TraceSurvey } from '../../domain/oscillogram/survey';
import type { Numbered } from '../worker/latest-runner';

/** What may be asked of a file: what is in it, or its extremes in a window of its own seconds. */
export type TraceAsk =
  | { readonly kind: 'survey'; readonly slices: number }
  | { readonly kind: 'window'; readonly from_s: number; readonly to_s: number; readonly slices: number };

/** The file goes with every question, by reference: a worker that was ended meanwhile reads it again. */
export interface TraceRequest extends Numbered {
  /** Tells one file from another. */
  readonly key: string;
  readonly file: Blob;
  readonly ask: TraceAsk;
}

export type TraceReply =
  | { readonly kind: 'survey'; readonly survey: TraceSurvey }
  | { readonly kind: 'window'; readonly envelopes: readonly Envelope[] };
