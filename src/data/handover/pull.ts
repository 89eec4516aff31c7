import { docKey } from '../../domain/book/documents/document';
import { pullAnswerSchema, type PullAnswer } from '../../domain/handover/wire';
import { DEFAULT_TIMEOUT_MS } from '../session/api-client';
import type { Receipt } from '../store/acknowledge';
import { went, type HandoverParts, type StepOutcome } from './handover-ports';
import { toSetback } from './setback';

const PAGE = 500;

export type PullNews =
  { readonly type: 'page'; readonly head: number; readonly came: number } | { readonly type: 'reset' };

/** Asks for what came after the cursor; with `wait_s` the server holds the question until something comes. */
export async function pullPage(
  parts: HandoverParts,
  wait_s: number,
  signal: AbortSignal,
): Promise<StepOutcome<PullNews>> {
  const { revision, hash } = await parts.mirror.cursor();
  const query = new URLSearchParams({
    since: String(revision),
    hash,
    limit: String(PAGE),
    wait: String(wait_s),
  });
  const outcome = await parts.tokens.request('device', {
    method: 'GET',
    path: `/api/handover/pull?${query.toString()}`,
    schema: pullAnswerSchema,
    signal,
    timeout_ms: wait_s * 1000 + DEFAULT_TIMEOUT_MS,
  });
  if (outcome.type === 'problem' && outcome.code === 'reset') return went({ type: 'reset' });
  if (outcome.type !== 'ok') return toSetback(outcome);
  const page = outcome.value;
  if (page.entries.length === 0) return went({ type: 'page', head: page.head, came: 0 });
  return await take(parts, page);
}

async function take(parts: HandoverParts, page: PullAnswer): Promise<StepOutcome<PullNews>> {
  // Before the page is folded: an own entry must never be in the mirror and still count as waiting here.
  await parts.store.acknowledge(ownReceipts(page), { epoch: page.epoch, now_ms: parts.clock.wallMs() });
  const applied = await parts.mirror.applyPage(page);
  if (applied.type === 'moved') return { type: 'displaced' };
  if (applied.type === 'broken') return went({ type: 'reset' });
  const keys = applied.changed.map(docKey);
  await parts.view.mirrorMoved(keys);
  parts.bus.post({ type: 'mirror', keys });
  return went({ type: 'page', head: page.head, came: page.entries.length });
}

function ownReceipts(page: PullAnswer): Receipt[] {
  return page.entries.map(({ entry, verdict, revision, reason }) => ({
    id: entry.id,
    verdict,
    revision,
    reason,
  }));
}
