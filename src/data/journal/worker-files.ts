import type { JournalFiles } from '../ports/ports';
import type { JournalCall, JournalReply, JournalRequest } from './journal-protocol';

interface Waiting {
  readonly resolve: (value: string | readonly string[] | null) => void;
  readonly reject: (error: Error) => void;
}

/** Journal files behind a dedicated worker: only there may a file be written synchronously and flushed. */
export function workerJournalFiles(startWorker: () => Worker): JournalFiles {
  const waiting = new Map<number, Waiting>();
  let worker: Worker | null = null;
  let last = 0;
  const ask = (call: JournalCall) =>
    new Promise<string | readonly string[] | null>((resolve, reject) => {
      worker ??= started(startWorker, waiting);
      last += 1;
      waiting.set(last, { resolve, reject });
      worker.postMessage({ no: last, call } satisfies JournalRequest);
    });
  return {
    folders: async () => asNames(await ask({ op: 'folders' })),
    list: async (folder) => asNames(await ask({ op: 'list', folder })),
    read: async (folder, name) => String((await ask({ op: 'read', folder, name })) ?? ''),
    create: async (folder, name) => {
      await ask({ op: 'create', folder, name });
      return {
        append: async (text) => {
          await ask({ op: 'append', folder, name, text });
        },
        close: async () => {
          await ask({ op: 'close', folder, name });
        },
      };
    },
    remove: async (folder, name) => {
      await ask({ op: 'remove', folder, name });
    },
  };
}

function started(startWorker: () => Worker, waiting: Map<number, Waiting>): Worker {
  const worker = startWorker();
  worker.addEventListener('message', (event: MessageEvent<JournalReply>) => {
    const reply = event.data;
    const asked = waiting.get(reply.no);
    waiting.delete(reply.no);
    if (reply.ok) asked?.resolve(reply.value);
    else asked?.reject(new Error(reply.words));
  });
  worker.addEventListener('error', () => {
    for (const asked of waiting.values()) asked.reject(new Error('the journal’s worker failed'));
    waiting.clear();
  });
  return worker;
}

function asNames(value: string | readonly string[] | null): readonly string[] {
  return typeof value === 'string' || value === null ? [] : value;
}
