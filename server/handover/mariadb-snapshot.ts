import type { Database } from '../db/database';
import { toInt } from '../db/rows';
import type { Snapshot } from './book-store';

const documentsAtOnce = 400;

interface RawHead {
  readonly epoch: string;
  readonly revision: string;
  readonly chain_hash: string;
  readonly backup_revision: string;
  readonly fold_version: number;
}

/**
 * Runs `work` over the lab as it stands at this moment: head and documents come from one consistent snapshot, however
 * long the reading takes (protocol 3.8). It holds no lock, so pushing goes on.
 */
export async function withSnapshot(
  database: Database,
  lab: string,
  work: (snapshot: Snapshot) => Promise<void>,
): Promise<void> {
  const client = database.client as SnapshotClient;
  const connection = await client.acquireConnection();
  const select = async <Row>(sql: string, values: readonly (string | number)[]): Promise<Row[]> => {
    const [rows] = (await database.raw(sql, [...values]).connection(connection)) as [Row[], unknown];
    return rows;
  };
  try {
    await select('SET TRANSACTION ISOLATION LEVEL REPEATABLE READ', []);
    await select('START TRANSACTION WITH CONSISTENT SNAPSHOT, READ ONLY', []);
    const [head] = await select<RawHead>(
      `SELECT labs.epoch, labs.revision, labs.chain_hash, labs.backup_revision, labs.fold_version
       FROM labs WHERE labs.id = ?`,
      [lab],
    );
    if (head === undefined) throw new Error(`there is no lab ${lab}`);
    await work({
      lab: {
        epoch: head.epoch,
        revision: toInt(head.revision),
        hash: head.chain_hash,
        backup_revision: toInt(head.backup_revision),
      },
      fold_version: head.fold_version,
      pages: pagesOf(lab, select),
    });
  } finally {
    await select('ROLLBACK', []).catch(() => undefined);
    await client.releaseConnection(connection);
  }
}

/** What knex has and does not type: one connection for several statements, without a transaction of its own making. */
interface SnapshotClient {
  readonly acquireConnection: () => Promise<object>;
  readonly releaseConnection: (connection: object) => Promise<void>;
}

type Select = <Row>(sql: string, values: readonly (string | number)[]) => Promise<Row[]>;

async function* pagesOf(lab: string, select: Select): AsyncGenerator<readonly string[]> {
  let after = { id: '', kind: '' };
  for (;;) {
    const rows = await select<{ id: string; kind: string; doc: string }>(
      `SELECT documents.id, documents.kind, documents.doc FROM documents
       WHERE documents.lab = ? AND (documents.id > ? OR (documents.id = ? AND documents.kind > ?))
       ORDER BY documents.id, documents.kind LIMIT ?`,
      [lab, after.id, after.id, after.kind, documentsAtOnce],
    );
    const last = rows.at(-1);
    if (last === undefined) return;
    yield rows.map((row) => row.doc);
    after = { id: last.id, kind: last.kind };
  }
}
