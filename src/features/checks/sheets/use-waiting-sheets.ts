import { useOwnEntries } from '../../../data/use-book';
import { readEntry } from '../../../domain/book/read-body';

export interface WaitingSheet {
  readonly kind: 'sheet.published' | 'sheet.retired';
  readonly entry: string;
  readonly sheet: string;
  /** Of a sheet to be published. */
  readonly title: string | null;
}

/** Acts on sheets that were written here and have no effect yet, since the server has not judged them. */
export function useWaitingSheets(): readonly WaitingSheet[] {
  return useOwnEntries(60).flatMap(({ entry, verdict }): readonly WaitingSheet[] => {
    if (verdict !== 'waiting' || !entry.kind.startsWith('sheet.')) return [];
    const read = readEntry(entry);
    if (read.type !== 'readable') return [];
    const { kind, meta, body } = read.entry;
    if (kind === 'sheet.published')
      return [{ kind, entry: meta.id, sheet: meta.subject, title: body.spec.title }];
    return kind === 'sheet.retired' ? [{ kind, entry: meta.id, sheet: meta.subject, title: null }] : [];
  });
}
