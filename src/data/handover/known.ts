import { knownAnswerSchema, type HelloAnswer } from '../../domain/handover/wire';
import type { Receipt } from '../store/acknowledge';
import type { EntryRow } from '../store/book-database';
import { putCount } from '../store/book-keys';
import { went, type HandoverParts, type StepOutcome } from './handover-ports';
import { toSetback } from './setback';

const AT_ONCE = 5000;

/** Asks which of these the Book has; those are acknowledged, the others are given back. */
export async function askKnown(
  parts: HandoverParts,
  rows: readonly EntryRow[],
  about: { readonly epoch: string; readonly signal: AbortSignal },
): Promise<StepOutcome<readonly EntryRow[]>> {
  const unknown: EntryRow[] = [];
  for (let at = 0; at < rows.length; at += AT_ONCE) {
    const some = rows.slice(at, at + AT_ONCE);
    const asked = await knownOf(
      parts,
      some.map((row) => row.id),
      about.signal,
    );
    if (asked.type !== 'went') return asked;
    const receipts = asked.value;
    await parts.store.acknowledge(receipts, { epoch: about.epoch, now_ms: parts.clock.wallMs() });
    const known = new Set(receipts.map((receipt) => receipt.id));
    unknown.push(...some.filter((row) => !known.has(row.id)));
  }
  return went(unknown);
}

async function knownOf(
  parts: HandoverParts,
  ids: readonly string[],
  signal: AbortSignal,
): Promise<StepOutcome<readonly Receipt[]>> {
  const outcome = await parts.tokens.request('device', {
    method: 'POST',
    path: '/api/handover/known',
    body: { ids },
    schema: knownAnswerSchema,
    signal,
  });
  if (outcome.type !== 'ok') return toSetback(outcome);
  return went(
    outcome.value.known.map(({ id, revision, outcome: verdict, reason }) => ({
      id,
      revision,
      verdict,
      reason,
    })),
  );
}

/** Of the entries set aside from an old mirror only those stay that the new Book lacks (protocol 3.11). */
export async function forgetKnownSetAside(parts: HandoverParts, signal: AbortSignal): Promise<void> {
  const { set_aside } = parts.mirror.database;
  const ids = await set_aside.toCollection().primaryKeys();
  for (let at = 0; at < ids.length; at += AT_ONCE) {
    const asked = await knownOf(parts, ids.slice(at, at + AT_ONCE), signal);
    // Kept, and asked again after the next reset: nothing is lost by that.
    if (asked.type !== 'went') return;
    await set_aside.bulkDelete(asked.value.map((receipt) => receipt.id));
  }
}

/** After a restored server: what it still has is acknowledged anew, what it lost waits again (protocol 3.11). */
export async function settleReset(
  parts: HandoverParts,
  hello: HelloAnswer,
  signal: AbortSignal,
): Promise<StepOutcome> {
  const rows = await parts.store.allOwn();
  const asked = await askKnown(parts, rows, { epoch: hello.epoch, signal });
  if (asked.type !== 'went') return asked;
  await parts.store.waitAgain(asked.value.filter((row) => row.state !== 'waiting'));
  await parts.store.write(() =>
    putCount(parts.store.database, `acked_seq/${parts.device()}`, hello.last_seq),
  );
  await parts.view.ownChanged();
  parts.bus.post({ type: 'acknowledged' });
  return went(null);
}

/** A cloned or rewound tablet: what the Book has is settled, the rest waits for a sign-in as a new tablet (protocol 3.6). */
export async function settleFork(
  parts: HandoverParts,
  hello: HelloAnswer,
  signal: AbortSignal,
): Promise<StepOutcome> {
  const rows = (await parts.store.allOwn()).filter((row) => row.state === 'waiting');
  const asked = await askKnown(parts, rows, { epoch: hello.epoch, signal });
  if (asked.type !== 'went') return asked;
  const device = await parts.store.device();
  if (device !== undefined && !device.forked)
    await parts.store.setDevice({ ...device, forked: true }, hello.epoch);
  await parts.view.ownChanged();
  parts.bus.post({ type: 'acknowledged' });
  return went(null);
}
