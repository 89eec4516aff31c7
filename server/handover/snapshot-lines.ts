import { Readable, type Writable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { createGzip } from 'node:zlib';
import type { BookStore, Snapshot } from './book-store';

/** Writes a lab's snapshot as gzipped JSON lines: header, documents, trailer. A broken one has no trailer. */
export async function writeSnapshot(
  store: Pick<BookStore, 'snapshot'>,
  lab: string,
  to: Writable,
): Promise<void> {
  try {
    await store.snapshot(lab, (snapshot) =>
      pipeline(Readable.from(linesOf(snapshot)), createGzip({ level: 4 }), to),
    );
  } catch (error) {
    // A reader that hung up wants no answer any more.
    if (!isHungUp(error)) throw error;
  }
}

async function* linesOf({ lab, fold_version, pages }: Snapshot): AsyncGenerator<string> {
  const { epoch, revision, hash } = lab;
  yield `${JSON.stringify({ snapshot: 1, epoch, revision, hash, fold_version })}\n`;
  let documents = 0;
  for await (const page of pages) {
    documents += page.length;
    yield page.map((doc) => `{"doc":${doc}}\n`).join('');
  }
  yield `${JSON.stringify({ end: true, documents })}\n`;
}

function isHungUp(error: unknown): boolean {
  return error instanceof Error && 'code' in error && error.code === 'ERR_STREAM_PREMATURE_CLOSE';
}
