import { createHash, randomBytes } from 'node:crypto';
import type { SetCookie } from '../http/route';

export const REFRESH_TOKEN_MS = 180 * 24 * 3_600_000;

export function makeRefreshToken(): string {
  return randomBytes(32).toString('base64url');
}

/** At rest there is only this: the token has 256 random bits, so a plain hash keeps it. */
export function refreshTokenSha(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

interface Whose {
  readonly origin: string;
  readonly lab: string;
  readonly person: string;
}

/**
 * One cookie per lab and person, so that B's sign-in on a shared tablet does not end A's. On loopback http, where no
 * browser takes a `__Host-` cookie, the name carries the port: cookies of one host are shared between its ports.
 */
export function refreshCookieName({ origin, lab, person }: Whose): string {
  const whose = `${lab.slice(0, 8)}-${person.slice(0, 8)}`;
  const url = new URL(origin);
  return isSecure(origin)
    ? `__Host-holdoff-${whose}`
    : `holdoff-${url.port === '' ? '80' : url.port}-${whose}`;
}

export function refreshCookie(whose: Whose, token: string | null): SetCookie {
  return {
    name: refreshCookieName(whose),
    value: token,
    maxAge_s: REFRESH_TOKEN_MS / 1000,
    secure: isSecure(whose.origin),
  };
}

function isSecure(origin: string): boolean {
  return origin.startsWith('https:');
}
