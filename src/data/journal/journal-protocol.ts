/** What the page asks of the worker that owns the sync access handles. */
export type JournalCall =
  | { readonly op: 'folders' }
  | { readonly op: 'list'; readonly folder: string }
  | { readonly op: 'read'; readonly folder: string; readonly name: string }
  | { readonly op: 'create'; readonly folder: string; readonly name: string }
  | { readonly op: 'append'; readonly folder: string; readonly name: string; readonly text: string }
  | { readonly op: 'close'; readonly folder: string; readonly name: string }
  | { readonly op: 'remove'; readonly folder: string; readonly name: string };

export interface JournalRequest {
  readonly no: number;
  readonly call: JournalCall;
}

export type JournalReply =
  | { readonly no: number; readonly ok: true; readonly value: string | readonly string[] | null }
  | { readonly no: number; readonly ok: false; readonly words: string };
