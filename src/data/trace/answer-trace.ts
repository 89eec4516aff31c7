import { readOscillogram, type Oscillogram } from '../../domain/oscillogram/read-oscillogram';
import { envelopesOf, surveyOf } from '../../domain/oscillogram/survey';
import { mapResult, refused, type Result } from '../../domain/units/result';
import type { TraceReply, TraceRequest } from './trace-protocol';

const UNREADABLE = {
  type: 'file-gone',
  field: 'file',
  words: 'The tablet can no longer read this file: it was moved or changed. Choose it again.',
} as const;

/** Answers about one file after the other; the last one stays read, so that a look further in costs no reading. */
export function traceReader(): (
  request: Pick<TraceRequest, 'key' | 'file' | 'ask'>,
) => Promise<Result<TraceReply>> {
  let held: { readonly key: string; readonly read: Result<Oscillogram> } | null = null;
  return async ({ key, file, ask }) => {
    if (held?.key !== key) {
      held = null;
      const bytes = await file.arrayBuffer().catch(() => null);
      if (bytes === null) return refused(UNREADABLE);
      held = { key, read: readOscillogram(new Uint8Array(bytes)) };
    }
    return mapResult(held.read, (read): TraceReply =>
      ask.kind === 'survey'
        ? { kind: 'survey', survey: surveyOf(read, ask.slices) }
        : { kind: 'window', envelopes: envelopesOf(read, ask, ask.slices) },
    );
  };
}
