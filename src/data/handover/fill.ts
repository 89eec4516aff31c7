import type * as z from 'zod/mini';
import type { Document } from '../../domain/book/documents/document';
import { FOLD_VERSION } from '../../domain/book/fold';
import { snapshotHeaderSchema, snapshotTrailerSchema } from '../../domain/handover/wire';
import { beginFill } from '../store/mirror-fill';
import { went, type HandoverParts, type StepOutcome } from './handover-ports';
import { toSetback } from './setback';

const FILL_TIMEOUT_MS = 120_000;
const STAGE_AT = 500;

type Header = z.infer<typeof snapshotHeaderSchema>;

/** Brings in a whole Book, staged beside the mirror; nothing flips without the trailer (protocol 3.8). */
export async function fillMirror(parts: HandoverParts, signal: AbortSignal): Promise<StepOutcome> {
  const since = await parts.mirror.cursor();
  const fill = beginFill(parts.mirror.database);
  await fill.clear();
  const come: Arriving = { header: null, promised: null, held: [] };
  const outcome = await parts.tokens.lines(
    'device',
    { method: 'GET', path: '/api/handover/snapshot', signal, timeout_ms: FILL_TIMEOUT_MS },
    async (text) => {
      const line: unknown = JSON.parse(text);
      if (come.header === null) {
        come.header = snapshotHeaderSchema.parse(line);
        return;
      }
      const trailer = snapshotTrailerSchema.safeParse(line);
      if (trailer.success) come.promised = trailer.data.documents;
      else come.held.push(documentOf(line));
      if (come.held.length < STAGE_AT) return;
      await fill.stage(come.held);
      come.held = [];
    },
  );
  if (outcome.type !== 'ok') return toSetback(outcome);
  await fill.stage(come.held);
  const { header: begun, promised } = come;
  if (begun === null || promised === null)
    return { type: 'later', state: 'no-network', words: 'The Book broke off while it was arriving.' };
  if (begun.fold_version !== FOLD_VERSION)
    return {
      type: 'later',
      state: 'trouble',
      words: 'This app and the server fold the Book in different versions: update the app.',
    };
  const flipped = await fill.flip(begun, promised, since);
  if (flipped.type === 'moved') return { type: 'displaced' };
  if (flipped.type === 'incomplete')
    return {
      type: 'later',
      state: 'no-network',
      words: `The Book arrived with ${flipped.staged} of ${flipped.promised} documents.`,
    };
  await parts.store.setKey('epoch', begun.epoch);
  await parts.view.mirrorMoved(null);
  parts.bus.post({ type: 'mirror', keys: null });
  return went(null);
}

interface Arriving {
  header: Header | null;
  promised: number | null;
  held: Document[];
}

/** Documents are the server's folds by the same code; only their frame is looked at. */
function documentOf(line: unknown): Document {
  if (typeof line === 'object' && line !== null && 'doc' in line) return line.doc as Document;
  throw new Error('a line of the snapshot is no document');
}
