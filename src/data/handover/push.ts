import { uuidFromBytes } from '../../domain/book/ids';
import {
  PUSH_MAX_ENTRIES,
  pushAnswerSchema,
  type PushAnswer,
  type PushResult,
} from '../../domain/handover/wire';
import type { Bearer, LabOutcome } from '../session/tokens';
import type { Receipt } from '../store/acknowledge';
import { nextBatch, type Batch } from './batch';
import { went, type HandoverParts, type StepOutcome } from './handover-ports';
import { toSetback } from './setback';

export type PushNews =
  | { readonly type: 'taken'; readonly head: number }
  | { readonly type: 'again' }
  | { readonly type: 'reset' }
  | { readonly type: 'forked' };

/** Sends the head of the queue. `most` shrinks when something on the way refuses large requests. */
export function createPush(parts: HandoverParts) {
  let most = PUSH_MAX_ENTRIES;

  return async (epoch: string, signal: AbortSignal): Promise<StepOutcome<PushNews>> => {
    const rows = await parts.store.nextWaiting(parts.device(), most);
    const batch = nextBatch(rows, most);
    if (batch.rows.length === 0) return went({ type: 'taken', head: 0 });
    const outcome = await send(batch, signal);
    if (outcome.type === 'ok') {
      most = Math.min(PUSH_MAX_ENTRIES, most * 2);
      return went(await settle(batch, outcome.value, epoch));
    }
    if (outcome.type === 'no-network' && outcome.foreign_status === 413)
      return halve(batch) ?? toSetback(outcome);
    if (outcome.type !== 'problem') return toSetback(outcome);
    const { code, problem } = outcome;
    if (code === 'reset') return went({ type: 'reset' });
    if (code === 'too-large' || code === 'broken-entry' || code === 'unreadable') {
      // Only a problem of our own kind may mark an entry, and then its place goes on as a stub (protocol 3.7).
      const named = namedEntry(batch, [problem.detail, ...Object.entries(problem.fields ?? {}).flat()]);
      if (named === null) {
        const smaller = halve(batch);
        if (smaller !== null) return smaller;
      }
      const broken = batch.rows.find((row) => row.id === named) ?? batch.rows[0];
      if (broken === undefined || broken.stub !== null) return toSetback(outcome);
      await parts.store.markStub(broken.id, problem.detail.slice(0, 500));
      return went({ type: 'again' });
    }
    return toSetback(outcome);
  };

  function halve(batch: Batch): StepOutcome<PushNews> | null {
    if (batch.rows.length <= 1) return null;
    most = Math.max(1, Math.floor(batch.rows.length / 2));
    return went({ type: 'again' });
  }

  async function send(batch: Batch, signal: AbortSignal): Promise<LabOutcome<PushAnswer>> {
    const ask = (bearer: Bearer) =>
      parts.tokens.request(bearer, {
        method: 'POST',
        path: '/api/handover/push',
        body: { entries: batch.items },
        schema: pushAnswerSchema,
        signal,
      });
    const outcome = await ask(batch.bearer);
    // Their session is over: the tablet's own token brings the act in, held back until its author confirms it.
    return outcome.type === 'sign-in-needed' && batch.bearer !== 'device' ? await ask('device') : outcome;
  }

  async function settle(batch: Batch, answer: PushAnswer, epoch: string): Promise<PushNews> {
    const receipts = answer.results.flatMap((result) => toReceipt(result));
    await parts.store.acknowledge(receipts, { epoch, now_ms: parts.clock.wallMs() });
    const altered = answer.results.filter((result) => result.outcome === 'altered');
    for (const { id } of altered) {
      const again = await parts.store.continueAltered(id, uuidFromBytes(parts.random(16)));
      if (again !== null) await parts.journal()?.append(again.entry);
    }
    // What follows an altered one in the batch meets a hole that the next batch fills.
    if (altered.length > 0) return { type: 'again' };
    if (answer.results.some((result) => result.outcome === 'fork-device')) return { type: 'forked' };
    if (answer.results.some((result) => result.outcome === 'hole')) return await fillHole(answer.last_seq);
    const answered = new Set(answer.results.map((result) => result.id));
    const all = batch.rows.every((row) => answered.has(row.id));
    return all ? { type: 'taken', head: answer.head } : { type: 'again' };
  }

  /** The server lacks what this tablet believes acknowledged: everything above its last seq is sent again. */
  async function fillHole(last_seq: number): Promise<PushNews> {
    await parts.store.waitAgainAbove(parts.device(), last_seq);
    const [next] = await parts.store.nextWaiting(parts.device(), 1);
    // The missing entry is not here any more either, so this sequence can never go on: it starts anew as another tablet.
    return next === undefined || next.seq === last_seq + 1 ? { type: 'again' } : { type: 'forked' };
  }
}

function toReceipt({ id, outcome, revision, reason }: PushResult): Receipt[] {
  if (revision === null) return [];
  return outcome === 'applied' || outcome === 'irregular' || outcome === 'held-back'
    ? [{ id, verdict: outcome, revision, reason }]
    : [];
}

/** The problem names the entry by its id, or by its place in the batch as `entries.3`. */
function namedEntry(batch: Batch, texts: readonly string[]): string | null {
  for (const text of texts) {
    const byId = batch.rows.find((row) => text.includes(row.id));
    if (byId !== undefined) return byId.id;
    const index = /entries[.[](\d+)/.exec(text)?.[1];
    const byIndex = index === undefined ? undefined : batch.rows[Number(index)];
    if (byIndex !== undefined) return byIndex.id;
  }
  return null;
}
