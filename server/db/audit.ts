import { randomUUID } from 'node:crypto';
import type { Database, Transaction } from './database';

export type AuditedDeed =
  'tablet-enrolled' | 'tablet-revoked' | 'tablet-forked' | 'refresh-under-another-key' | 'lab-founded';

export interface AuditLine {
  readonly lab: string;
  readonly at_ms: number;
  readonly what: AuditedDeed;
  readonly device: string | null;
  readonly person: string | null;
  readonly detail?: Readonly<Record<string, string | number | null>>;
}

export async function writeAudit(database: Database | Transaction, line: AuditLine): Promise<void> {
  const { lab, at_ms, what, device, person, detail = {} } = line;
  await database('audit').insert({
    lab,
    id: randomUUID(),
    at_ms,
    what,
    device,
    person,
    detail: JSON.stringify(detail),
  });
}
