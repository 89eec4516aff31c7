import type { Role } from '../../src/domain/book/bodies/people-bodies';

/** Who sends a request, as read from the access token and from the database now. */
export interface Caller {
  readonly lab: string;
  readonly device: { readonly id: string; readonly letter: string };
  /** Set under a person's own token, null under the tablet's. */
  readonly person: string | null;
  /** Role held now; null for a tablet, or for a person who was removed from the lab. */
  readonly role: Role | null;
}

export interface PersonCaller extends Caller {
  readonly person: string;
  readonly role: Role;
}

/**
 * Reads an access token. Throws `NotSignedIn` when it is missing, wrong or expired and `Revoked` when the tablet was
 * revoked, whatever the token says.
 */
export type Authenticate = (token: string) => Promise<Caller>;
