import { once } from 'node:events';
import { finished } from 'node:stream/promises';
import type { Writable } from 'node:stream';
import { createGzip } from 'node:zlib';
import type { BookStore } from './book-store';

/** Writes a lab's snapshot as gzipped JSON lines: header, documents, trailer. A broken one has no trailer. */
export async function writeSnapshot(
  store: Pick<BookStore, 'snapshot'>,
  lab: string,
  to: Writable,
): Promise<void> {
  const gzip = createGzip({ level: 4 });
  // A reader that hangs up must not keep the snapshot's transaction open.
  to.once('close', () => gzip.destroy());
  gzip.pipe(to);
  const write = async (lines: string): Promise<void> => {
    if (gzip.destroyed) throw new ReaderGone();
    if (!gzip.write(lines)) await Promise.race([once(gzip, 'drain'), once(gzip, 'close')]);
  };
  try {
    await store.snapshot(lab, async ({ lab: state, fold_version, pages }) => {
      const { epoch, revision, hash } = state;
      await write(`${JSON.stringify({ snapshot: 1, epoch, revision, hash, fold_version })}\n`);
      let documents = 0;
      for await (const page of pages) {
        documents += page.length;
        await write(page.map((doc) => `{"doc":${doc}}\n`).join(''));
      }
      await write(`${JSON.stringify({ end: true, documents })}\n`);
    });
    gzip.end();
    await finished(to);
  } catch (error) {
    if (error instanceof ReaderGone || gzip.destroyed) return;
    gzip.destroy();
    to.destroy();
    throw error;
  }
}

class ReaderGone extends Error {}
