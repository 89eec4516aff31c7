import { Table, type Column } from '../../components/table';
import { usePeople } from '../../data/use-book';
import type { KitDoc, KitEvent } from '../../domain/book/documents/kit';
import { KIND_WORDS } from '../../domain/report/entry-words';
import { OUTCOME_WORDS } from '../../domain/report/kit-words';
import { momentWords } from '../../domain/report/time-words';
import { useHolderWords } from './holder-words';

const SHOWN = 12;

/** What happened to a piece, the newest on top. */
export function KitHistory({ kit, zone }: { readonly kit: KitDoc; readonly zone: string }) {
  const holderWords = useHolderWords();
  const names = new Map(usePeople().map((person) => [person.id, person.name]));
  const columns: readonly Column<KitEvent>[] = [
    { key: 'when', head: 'when', align: 'start', cell: (row) => momentWords(row.stamp.wall_ms, zone) },
    { key: 'what', head: 'what', align: 'start', cell: (row) => KIND_WORDS[row.kind] },
    {
      key: 'words',
      head: 'how',
      align: 'start',
      cell: (row) => <span className="kit-event">{eventWords(row, holderWords)}</span>,
    },
    { key: 'by', head: 'by', align: 'start', cell: (row) => names.get(row.by ?? '') ?? 'not said' },
  ];
  const rows = kit.history.toReversed();
  if (rows.length === 0) return <p className="muted">Nothing has happened to it since it was added.</p>;
  return (
    <Table
      caption="What happened to it"
      columns={columns}
      rows={rows.slice(0, SHOWN)}
      rowKey={(row) => row.entry}
      {...(rows.length > SHOWN ? { foot: `the newest ${SHOWN} of ${rows.length}` } : {})}
    />
  );
}

function eventWords(event: KitEvent, holderWords: ReturnType<typeof useHolderWords>): string {
  const irregular = event.irregular === null ? '' : 'irregular';
  switch (event.kind) {
    case 'kit.inspected': {
      const found =
        event.body.count === null ? OUTCOME_WORDS[event.body.outcome] : `${event.body.count} there`;
      return joined([found, event.body.words, irregular]);
    }
    case 'kit.issued': {
      const count = event.body.count === null ? '' : `${event.body.count} taken`;
      return joined([count, holderWords(event.body.to), event.body.words, irregular]);
    }
    case 'kit.returned': {
      const count = event.body.count === null ? '' : `${event.body.count} back`;
      const state = event.body.condition === 'damaged' ? 'damaged' : 'as issued';
      return joined([count, state, event.body.words, irregular]);
    }
  }
}

function joined(parts: readonly string[]): string {
  return parts.filter((part) => part !== '').join(', ');
}
