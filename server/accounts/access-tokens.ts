import { jwtVerify, SignJWT } from 'jose';
import * as z from 'zod/mini';
import { uuid } from '../../src/domain/book/ids';
import type { SigningKeys } from './signing-keys';

/** Held in memory by the browser: whoever steals one has it for this long (protocol 4.1). */
export const ACCESS_TOKEN_MS = 10 * 60_000;

const issuer = 'holdoff';
const audience = 'holdoff-api';
const typ = 'at+jwt';

const claimsSchema = z.object({ lab: uuid, dev: uuid, sub: uuid, use: z.enum(['person', 'device']) });
export type AccessClaims = z.infer<typeof claimsSchema>;

export interface AccessTokens {
  readonly issue: (claims: AccessClaims) => Promise<{ access_token: string; expires_ms: number }>;
  /** The claims of a token that is ours and not over; undefined for any other text. */
  readonly read: (token: string) => Promise<AccessClaims | undefined>;
}

export function createAccessTokens(keys: SigningKeys, now: () => number): AccessTokens {
  return {
    async issue({ lab, dev, sub, use }) {
      const key = keys.newest();
      const issuedAt_s = Math.floor(now() / 1000);
      const expires_s = issuedAt_s + ACCESS_TOKEN_MS / 1000;
      const access_token = await new SignJWT({ lab, dev, use })
        .setProtectedHeader({ alg: 'ES256', kid: key.kid, typ })
        .setIssuer(issuer)
        .setAudience(audience)
        .setSubject(sub)
        .setIssuedAt(issuedAt_s)
        .setExpirationTime(expires_s)
        .sign(key.privateKey);
      return { access_token, expires_ms: expires_s * 1000 };
    },
    async read(token) {
      try {
        const { payload } = await jwtVerify(token, ({ kid }) => publicKeyOf(keys, kid), {
          algorithms: ['ES256'],
          issuer,
          audience,
          typ,
          requiredClaims: ['exp', 'iat'],
          currentDate: new Date(now()),
        });
        return claimsSchema.parse(payload);
      } catch {
        // Why a stranger's text is no token of ours is nobody's business.
        return undefined;
      }
    },
  };
}

function publicKeyOf(keys: SigningKeys, kid: string | undefined) {
  const key = kid === undefined ? undefined : keys.byId(kid);
  if (key === undefined) throw new Error('unknown key');
  return key.publicKey;
}
