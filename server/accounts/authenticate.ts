import type { Database } from '../db/database';
import type { Authenticate } from '../http/caller';
import { NotSignedIn, Revoked } from '../http/problems';
import type { AccessTokens } from './access-tokens';
import { findStanding } from './tablets-store';

/** The token says who; whether the tablet still may, and in which role the person acts, is read now (protocol 4.4). */
export function createAuthenticate(database: Database, tokens: AccessTokens): Authenticate {
  return async (token) => {
    const claims = await tokens.read(token);
    if (claims === undefined) throw new NotSignedIn('The access token is not valid, or no longer.');
    const { lab, dev, sub, use } = claims;
    const person = use === 'person' ? sub : null;
    const standing = await findStanding(database, { lab, device: dev, person });
    if (standing === undefined) throw new NotSignedIn('The tablet of this access token is not known.');
    if (standing.revoked) throw new Revoked();
    return { lab, device: { id: dev, letter: standing.letter }, person, role: standing.role };
  };
}
