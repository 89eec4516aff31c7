import { randomUUID } from 'node:crypto';
import { writeAudit } from '../db/audit';
import type { Database, Transaction } from '../db/database';
import { inTransaction } from '../db/transaction';
import { Revoked, SignInRefused, SlowDown, Unreadable } from '../http/problems';
import type { AccessTokens } from './access-tokens';
import type { SignInAnswer, SignInRequest } from './account-shapes';
import { isUsableKey, thumbprintOf, type DevicePublicKey } from './device-keys';
import { tabletLetter } from './letters';
import type { Passwords } from './passwords';
import {
  findPersonByEmail,
  listMemberships,
  normalEmail,
  type LabMembership,
  type PersonRow,
} from './people-store';
import { makeRefreshToken, REFRESH_TOKEN_MS, refreshTokenSha } from './refresh-cookie';
import { insertRefreshToken } from './refresh-tokens-store';
import type { SignInLimits } from './sign-in-limits';
import {
  findTabletByKey,
  insertTablet,
  takeTabletNumber,
  upsertGrant,
  type TabletRow,
} from './tablets-store';

export interface SignInParts {
  readonly database: Database;
  readonly tokens: AccessTokens;
  readonly passwords: Passwords;
  readonly limits: SignInLimits;
  readonly now: () => number;
}

export interface SignedIn {
  readonly answer: SignInAnswer;
  readonly refreshToken: string;
}

/** The same words whatever was wrong, so that nobody learns who has an account here. */
const refused = 'The e-mail address and the password do not belong together, or not to this lab.';

export function createSignIn(parts: SignInParts) {
  const { database, tokens, passwords, limits, now } = parts;

  async function whoIs(request: SignInRequest, ip: string): Promise<PersonRow> {
    const email = normalEmail(request.email);
    const wait_s = await limits.count(email, ip);
    if (wait_s !== null) throw new SlowDown(wait_s);
    const person = await findPersonByEmail(database, email);
    const matches = await passwords.matches(person?.password_hash, request.password);
    if (person === undefined || !matches) throw new SignInRefused(refused);
    await limits.forgive(email, ip);
    return person;
  }

  return async function signIn(request: SignInRequest, ip: string): Promise<SignedIn> {
    if (!isUsableKey(request.public_key)) {
      throw new Unreadable('body.public_key: is no point of the curve P-256', {
        fields: { 'body.public_key': 'is no point of the curve P-256' },
      });
    }
    const person = await whoIs(request, ip);
    const labs = await listMemberships(database, person.id);
    const lab = request.lab === undefined ? labs[0] : labs.find((one) => one.id === request.lab);
    if (lab === undefined) throw new SignInRefused(refused);
    const thumbprint = await thumbprintOf(request.public_key);
    const key = { publicKey: request.public_key, thumbprint };
    const refreshToken = makeRefreshToken();
    const device = await inTransaction(database, async (transaction) => {
      const tablet = await enrol(transaction, { lab, person, key, name: request.device_name, at_ms: now() });
      const whose = { lab: lab.id, device: tablet.id, person: person.id };
      await upsertGrant(transaction, { ...whose, granted_ms: now() });
      await insertRefreshToken(transaction, {
        ...whose,
        token_sha: refreshTokenSha(refreshToken),
        issued_ms: now(),
        expires_ms: now() + REFRESH_TOKEN_MS,
      });
      return tablet;
    });
    const session = await tokens.issue({ lab: lab.id, dev: device.id, sub: person.id, use: 'person' });
    return { refreshToken, answer: asAnswer({ session, person, labs, lab, device }) };
  };
}

interface Enrolment {
  readonly lab: LabMembership;
  readonly person: PersonRow;
  readonly key: { readonly publicKey: DevicePublicKey; readonly thumbprint: string };
  readonly name: string;
  readonly at_ms: number;
}

interface Tablet {
  readonly id: string;
  readonly letter: string;
  readonly name: string;
}

/** A key that the lab knows keeps its tablet and letter; a new one gets the next letter. */
async function enrol(
  transaction: Transaction,
  { lab, person, key, name, at_ms }: Enrolment,
): Promise<Tablet> {
  const known = await findTabletByKey(transaction, lab.id, key.thumbprint);
  if (known !== undefined) return standing(known);
  const letter = tabletLetter(await takeTabletNumber(transaction, lab.id));
  // Taking the number waited for the lab's lock: the same tablet may have been enrolled by a twin of this request.
  const twin = await findTabletByKey(transaction, lab.id, key.thumbprint);
  if (twin !== undefined) return standing(twin);
  const tablet = { id: randomUUID(), letter, name };
  await insertTablet(transaction, {
    ...tablet,
    lab: lab.id,
    key,
    enrolled_ms: at_ms,
    enrolled_by: person.id,
  });
  await writeAudit(transaction, {
    lab: lab.id,
    at_ms,
    what: 'tablet-enrolled',
    device: tablet.id,
    person: person.id,
    detail: { letter },
  });
  return tablet;
}

function standing({ id, letter, name, revoked_ms }: TabletRow): Tablet {
  if (revoked_ms !== null) throw new Revoked();
  return { id, letter, name };
}

interface Facts {
  readonly session: { readonly access_token: string; readonly expires_ms: number };
  readonly person: PersonRow;
  readonly labs: readonly LabMembership[];
  readonly lab: LabMembership;
  readonly device: Tablet;
}

function asAnswer({ session, person, labs, lab, device }: Facts): SignInAnswer {
  return {
    ...session,
    person: { id: person.id, name: person.name },
    labs: labs.map(({ id, name, role }) => ({ id, name, role })),
    lab: { id: lab.id, name: lab.name, epoch: lab.epoch },
    device,
  };
}
