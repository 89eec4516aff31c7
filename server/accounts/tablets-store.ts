import type { Role } from '../../src/domain/book/bodies/people-bodies';
import type { Database, Transaction } from '../db/database';
import { toInt, toIntOrNull } from '../db/rows';
import { devicePublicKeySchema, type DevicePublicKey } from './device-keys';

export interface TabletRow {
  readonly id: string;
  readonly letter: string;
  readonly name: string;
  readonly publicKey: DevicePublicKey | null;
  readonly revoked_ms: number | null;
}

interface RawTablet {
  readonly id: string;
  readonly letter: string;
  readonly name: string;
  readonly public_key: string | null;
  readonly revoked_ms: string | null;
}

const columns = [
  'devices.id',
  'devices.letter',
  'devices.name',
  'devices.public_key',
  'devices.revoked_ms',
] as const;

export async function findTablet(
  database: Database,
  lab: string,
  id: string,
): Promise<TabletRow | undefined> {
  const row = await database('devices').select(columns).where({ lab, id }).first<RawTablet | undefined>();
  return row === undefined ? undefined : readTablet(row);
}

export async function findTabletByKey(
  transaction: Transaction,
  lab: string,
  key_thumbprint: string,
): Promise<TabletRow | undefined> {
  const row = await transaction('devices')
    .select(columns)
    .where({ lab, key_thumbprint })
    .first<RawTablet | undefined>();
  return row === undefined ? undefined : readTablet(row);
}

/** Takes the lab's next tablet number under the lab's lock; a number is never given twice. */
export async function takeTabletNumber(transaction: Transaction, lab: string): Promise<number> {
  const row = await transaction('labs')
    .select('labs.tablets_enrolled')
    .where({ id: lab })
    .forUpdate()
    .first<{ tablets_enrolled: number } | undefined>();
  if (row === undefined) throw new Error(`there is no lab ${lab}`);
  const count = toInt(row.tablets_enrolled) + 1;
  await transaction('labs').where({ id: lab }).update({ tablets_enrolled: count });
  return count;
}

export interface NewTablet {
  readonly lab: string;
  readonly id: string;
  readonly letter: string;
  readonly name: string;
  readonly key: { readonly publicKey: DevicePublicKey; readonly thumbprint: string } | null;
  readonly enrolled_ms: number;
  readonly enrolled_by: string | null;
}

export async function insertTablet(transaction: Transaction, tablet: NewTablet): Promise<void> {
  const { lab, id, letter, name, key, enrolled_ms, enrolled_by } = tablet;
  await transaction('devices').insert({
    lab,
    id,
    letter,
    name,
    public_key: key === null ? null : JSON.stringify(key.publicKey),
    key_thumbprint: key?.thumbprint ?? null,
    enrolled_ms,
    enrolled_by,
  });
}

export interface Grant {
  readonly lab: string;
  readonly device: string;
  readonly person: string;
  readonly granted_ms: number;
}

/** A grant says that this person signed in on this tablet once, and nothing about what they may (protocol 4.2). */
export async function upsertGrant(database: Database | Transaction, grant: Grant): Promise<void> {
  const { lab, device, person, granted_ms } = grant;
  await database('grants')
    .insert({ lab, device, person, granted_ms })
    .onConflict(['lab', 'device', 'person'])
    .ignore();
}

/** What a token's tablet and person are now. */
export async function findStanding(
  database: Database,
  { lab, device, person }: { readonly lab: string; readonly device: string; readonly person: string | null },
): Promise<{ letter: string; revoked: boolean; role: Role | null } | undefined> {
  const row = await database('devices')
    .leftJoin('memberships', (join) => {
      join.on('memberships.lab', 'devices.lab').andOnVal('memberships.person', person ?? '');
    })
    .select('devices.letter', 'devices.revoked_ms', 'memberships.role')
    .where({ 'devices.lab': lab, 'devices.id': device })
    .first<{ letter: string; revoked_ms: string | null; role: Role | null } | undefined>();
  if (row === undefined) return undefined;
  return { letter: row.letter, revoked: row.revoked_ms !== null, role: row.role };
}

function readTablet({ id, letter, name, public_key, revoked_ms }: RawTablet): TabletRow {
  const publicKey = public_key === null ? null : devicePublicKeySchema.parse(JSON.parse(public_key));
  return { id, letter, name, publicKey, revoked_ms: toIntOrNull(revoked_ms) };
}
