import type { JournalCall, JournalReply, JournalRequest } from './journal-protocol';

/** The part of a file handle that exists in workers only, and is not among the types of a page. */
interface SyncAccessHandle {
  readonly write: (bytes: Uint8Array<ArrayBuffer>, options: { readonly at: number }) => number;
  readonly flush: () => void;
  readonly getSize: () => number;
  readonly truncate: (size: number) => void;
  readonly close: () => void;
}
type SyncFile = FileSystemFileHandle & { readonly createSyncAccessHandle: () => Promise<SyncAccessHandle> };

const ROOT = 'holdoff-journals';

function answerRequests(): void {
  const open = new Map<string, SyncAccessHandle>();
  addEventListener('message', (event: MessageEvent<JournalRequest>) => {
    const { no, call } = event.data;
    perform(call, open).then(
      (value) => {
        reply({ no, ok: true, value });
      },
      (error: unknown) => {
        reply({ no, ok: false, words: String(error) });
      },
    );
  });
}

function reply(message: JournalReply): void {
  postMessage(message);
}

async function perform(
  call: JournalCall,
  open: Map<string, SyncAccessHandle>,
): Promise<string | readonly string[] | null> {
  if (call.op === 'folders') return await namesIn(await root());
  if (call.op === 'append') {
    append(open.get(`${call.folder}/${call.name}`), call.text);
    return null;
  }
  const folder = await (await root()).getDirectoryHandle(call.folder, { create: true });
  switch (call.op) {
    case 'list':
      return await namesIn(folder);
    case 'read':
      return await (await (await folder.getFileHandle(call.name)).getFile()).text();
    case 'create': {
      const file = (await folder.getFileHandle(call.name, { create: true })) as SyncFile;
      open.set(`${call.folder}/${call.name}`, await file.createSyncAccessHandle());
      return null;
    }
    case 'close':
      open.get(`${call.folder}/${call.name}`)?.close();
      open.delete(`${call.folder}/${call.name}`);
      return null;
    case 'remove':
      await folder.removeEntry(call.name);
      return null;
  }
}

function append(handle: SyncAccessHandle | undefined, text: string): void {
  if (handle === undefined) throw new Error('the journal file is not open');
  const bytes = new TextEncoder().encode(text);
  const at = handle.getSize();
  if (handle.write(bytes, { at }) !== bytes.length) {
    // Half a line would swallow the next one.
    handle.truncate(at);
    throw new Error('the disk took only a part of the line');
  }
  handle.flush();
}

async function root(): Promise<FileSystemDirectoryHandle> {
  return await (await navigator.storage.getDirectory()).getDirectoryHandle(ROOT, { create: true });
}

async function namesIn(folder: FileSystemDirectoryHandle): Promise<readonly string[]> {
  const names: string[] = [];
  for await (const name of folder.keys()) names.push(name);
  return names;
}

answerRequests();
