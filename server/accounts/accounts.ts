import { randomBytes, randomUUID } from 'node:crypto';
import path from 'node:path';
import type { Database } from '../db/database';
import { inTransaction } from '../db/transaction';
import type { Authenticate } from '../http/caller';
import type { Route } from '../http/route';
import { createAccessTokens } from './access-tokens';
import { accountRoutes } from './account-routes';
import { createAuthenticate } from './authenticate';
import { tabletLetter } from './letters';
import { createNonces } from './nonces';
import { createPasswords } from './passwords';
import { insertPerson, mirrorMemberships } from './people-store';
import { readOrMakeSecret } from './secret-files';
import { createSessions } from './session-service';
import { createSignIn } from './sign-in-service';
import { createSignInLimits } from './sign-in-limits';
import { createSigningKeys } from './signing-keys';
import { insertTablet, takeTabletNumber, upsertGrant } from './tablets-store';

export interface AccountsParts {
  readonly database: Database;
  readonly secretsFolder: string;
  readonly now: () => number;
}

export interface NewPerson {
  /** Made up here when it is not given. */
  readonly id?: string;
  readonly email: string;
  readonly name: string;
  readonly password: string;
}

export interface Accounts {
  readonly routes: readonly Route[];
  readonly authenticate: Authenticate;
  /** For seeding and tests; no route reaches these three. Answers the person's id. */
  readonly addPerson: (person: NewPerson) => Promise<string>;
  /** A tablet without a key, so that nobody can sign in as it. It takes the lab's next letter. */
  readonly addTablet: (tablet: {
    lab: string;
    id?: string;
    name: string;
  }) => Promise<{ id: string; letter: string }>;
  readonly addGrant: (grant: { lab: string; device: string; person: string }) => Promise<void>;
}

export function createAccounts({ database, secretsFolder, now }: AccountsParts): Accounts {
  const tokens = createAccessTokens(createSigningKeys(path.join(secretsFolder, 'signing-keys'), now), now);
  const nonceSecret = readOrMakeSecret(secretsFolder, 'nonce.key', () => randomBytes(32).toString('hex'));
  const passwords = createPasswords();
  const limits = createSignInLimits(database, now);
  const signIn = createSignIn({ database, tokens, passwords, limits, now });
  const nonces = createNonces(nonceSecret, now);
  const sessions = createSessions({ database, tokens, nonces, now });
  return {
    routes: accountRoutes({ database, signIn, sessions, nonces }),
    authenticate: createAuthenticate(database, tokens),
    async addPerson({ id = randomUUID(), email, name, password }) {
      await insertPerson(database, {
        id,
        email,
        name,
        password_hash: await passwords.hash(password),
        created_ms: now(),
      });
      await mirrorMemberships(database, id);
      return id;
    },
    addTablet: ({ lab, id = randomUUID(), name }) =>
      inTransaction(database, async (transaction) => {
        const letter = tabletLetter(await takeTabletNumber(transaction, lab));
        await insertTablet(transaction, {
          lab,
          id,
          letter,
          name,
          key: null,
          enrolled_ms: now(),
          enrolled_by: null,
        });
        return { id, letter };
      }),
    addGrant: (grant) => upsertGrant(database, { ...grant, granted_ms: now() }),
  };
}
