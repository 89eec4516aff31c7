import { writeAudit } from '../db/audit';
import type { Database } from '../db/database';
import { NotAllowed, RefreshRefused, Revoked } from '../http/problems';
import type { AccessTokens } from './access-tokens';
import type { DeviceTokenRequest, RefreshRequest } from './account-shapes';
import { isSignedBy } from './device-keys';
import type { Nonces } from './nonces';
import { roleOf } from './people-store';
import { refreshTokenSha } from './refresh-cookie';
import { deleteRefreshToken, findRefreshToken, noteRefreshTokenUse } from './refresh-tokens-store';
import { findTablet, type TabletRow } from './tablets-store';

export interface SessionParts {
  readonly database: Database;
  readonly tokens: AccessTokens;
  readonly nonces: Nonces;
  readonly now: () => number;
}

const signInAgain = 'Sign in again on this tablet.';

export function createSessions({ database, tokens, nonces, now }: SessionParts) {
  function requireFresh(nonce: string): void {
    if (!nonces.isFresh(nonce))
      throw new RefreshRefused('The nonce is not ours or older than a minute. Ask for another.');
  }

  /** Reported, and it ends nobody's session: whoever copied a cookie must not be able to sign the owner out (protocol 4.1). */
  async function reportForeignKey(request: RefreshRequest): Promise<never> {
    await writeAudit(database, {
      lab: request.lab,
      at_ms: now(),
      what: 'refresh-under-another-key',
      device: request.device,
      person: request.person,
    });
    throw new RefreshRefused(`The session belongs to another tablet. ${signInAgain}`);
  }

  return {
    async refresh(request: RefreshRequest, cookie: string | undefined) {
      const { lab, person, device, nonce, signature } = request;
      requireFresh(nonce);
      const token_sha = cookie === undefined ? undefined : refreshTokenSha(cookie);
      const token = token_sha === undefined ? undefined : await findRefreshToken(database, lab, token_sha);
      if (token === undefined || token.person !== person || token.expires_ms <= now()) {
        throw new RefreshRefused(`There is no such session. ${signInAgain}`);
      }
      const tablet = await findTablet(database, lab, token.device);
      const signed =
        tablet?.id === device && isSigned(tablet, { deed: 'refresh', lab, device, person, nonce }, signature);
      if (!signed) return reportForeignKey(request);
      if (tablet.revoked_ms !== null) throw new Revoked();
      const role = await roleOf(database, lab, person);
      if (role === null) throw new NotAllowed('You are no longer a member of this lab.');
      await noteRefreshTokenUse(database, token, now());
      return { ...(await tokens.issue({ lab, dev: device, sub: person, use: 'person' })), role };
    },

    /** The tablet's own token: good for handing over while nobody is signed in (protocol 4.2). */
    async deviceToken({ lab, device, nonce, signature }: DeviceTokenRequest) {
      requireFresh(nonce);
      const tablet = await findTablet(database, lab, device);
      const words = { deed: 'device', lab, device, person: null, nonce } as const;
      if (tablet === undefined || !isSigned(tablet, words, signature)) {
        throw new RefreshRefused('The signature is not that of a tablet of this lab.');
      }
      if (tablet.revoked_ms !== null) throw new Revoked();
      return tokens.issue({ lab, dev: device, sub: device, use: 'device' });
    },

    async signOut(whose: { lab: string; device: string; person: string }, cookie: string | undefined) {
      if (cookie !== undefined)
        await deleteRefreshToken(database, { ...whose, token_sha: refreshTokenSha(cookie) });
    },
  };
}

function isSigned(tablet: TabletRow, words: Parameters<typeof isSignedBy>[1], signature: string): boolean {
  return tablet.publicKey !== null && isSignedBy(tablet.publicKey, words, signature);
}
