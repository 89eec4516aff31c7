import type { Role } from '../src/domain/book/bodies/people-bodies';
import { namedId } from './named-id';

export interface DemoPerson {
  readonly id: string;
  readonly name: string;
  readonly role: Role;
  /** `.example` is kept free for documentation, so no letter ever reaches anybody. */
  readonly email: string;
  /** Of the demo lab only, and printed where a person can read it. */
  readonly password: string;
}

/** The crew of the demo lab: one person for each role. */
export const ADA = person('ada', { name: 'Ada Brook', role: 'operator', password: 'copper-heron-41' });
export const MILO = person('milo', { name: 'Milo Venn', role: 'reviewer', password: 'brass-kettle-62' });
export const INGE = person('inge', { name: 'Inge Sorrel', role: 'lead', password: 'quiet-wren-27' });
export const TARIQ = person('tariq', { name: 'Tariq Holm', role: 'reader', password: 'paper-thorn-58' });

/** The lead first: she founds the lab. */
export const DEMO_PEOPLE: readonly DemoPerson[] = [INGE, MILO, ADA, TARIQ];

function person(key: string, rest: Omit<DemoPerson, 'id' | 'email'>): DemoPerson {
  return { id: namedId(`person/${key}`), email: `${key}@thornwick.example`, ...rest };
}
