import type { Database } from '../db/database';

export interface Me {
  readonly person: { readonly id: string; readonly name: string };
  readonly lab: { readonly id: string; readonly name: string; readonly epoch: string };
}

export async function readMe(database: Database, lab: string, person: string): Promise<Me | undefined> {
  const row = await database('memberships')
    .join('labs', 'labs.id', 'memberships.lab')
    .join('people', 'people.id', 'memberships.person')
    .select({ person_name: 'people.name', lab_name: 'labs.name', epoch: 'labs.epoch' })
    .where({ 'memberships.lab': lab, 'memberships.person': person })
    .first<{ person_name: string; lab_name: string; epoch: string } | undefined>();
  if (row === undefined) return undefined;
  return {
    person: { id: person, name: row.person_name },
    lab: { id: lab, name: row.lab_name, epoch: row.epoch },
  };
}
