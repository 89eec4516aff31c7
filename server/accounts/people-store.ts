import type { Role } from '../../src/domain/book/bodies/people-bodies';
import type { Database, Transaction } from '../db/database';

export interface PersonRow {
  readonly id: string;
  readonly email: string;
  readonly name: string;
  readonly password_hash: string;
}

export interface LabMembership {
  readonly id: string;
  readonly name: string;
  readonly epoch: string;
  readonly role: Role;
}

/** E-mail addresses are compared without regard to case or surrounding blanks. */
export function normalEmail(email: string): string {
  return email.trim().toLowerCase();
}

export async function insertPerson(
  database: Database | Transaction,
  person: PersonRow & { readonly created_ms: number },
): Promise<void> {
  const { id, name, password_hash, created_ms } = person;
  await database('people').insert({ id, email: normalEmail(person.email), name, password_hash, created_ms });
}

export function findPersonByEmail(database: Database, email: string): Promise<PersonRow | undefined> {
  return database('people')
    .select('people.id', 'people.email', 'people.name', 'people.password_hash')
    .where('people.email', normalEmail(email))
    .first<PersonRow | undefined>();
}

/** The person's labs in the order of their names; the role is the one that the Book gives now. */
export async function listMemberships(database: Database, person: string): Promise<LabMembership[]> {
  return database('memberships')
    .join('labs', 'labs.id', 'memberships.lab')
    .select('labs.id', 'labs.name', 'labs.epoch', 'memberships.role')
    .where('memberships.person', person)
    .orderBy(['labs.name', 'labs.id']);
}

export async function roleOf(database: Database, lab: string, person: string): Promise<Role | null> {
  const row = await database('memberships')
    .select('memberships.role')
    .where({ lab, person })
    .first<{ role: Role } | undefined>();
  return row?.role ?? null;
}

/** For a person whose account is made after the Book already names them. */
export async function mirrorMemberships(database: Database | Transaction, person: string): Promise<void> {
  await database.raw(
    `INSERT INTO memberships (lab, person, role)
     SELECT documents.lab, documents.id, JSON_VALUE(documents.doc, '$.role') FROM documents
     WHERE documents.kind = 'person' AND documents.id = ? AND JSON_VALUE(documents.doc, '$.role') IS NOT NULL
     ON DUPLICATE KEY UPDATE role = VALUES(role)`,
    [person],
  );
}
