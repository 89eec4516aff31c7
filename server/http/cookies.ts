import type { SetCookie } from './route';

export function readCookies(header: string | undefined): ReadonlyMap<string, string> {
  const pairs = (header ?? '').split(';').flatMap((part): [string, string][] => {
    const at = part.indexOf('=');
    return at < 0 ? [] : [[part.slice(0, at).trim(), part.slice(at + 1).trim()]];
  });
  return new Map(pairs);
}

/** Values are our own base64url and need no quoting. */
export function writeCookie({ name, value, maxAge_s, secure }: SetCookie): string {
  const age = value === null ? 0 : maxAge_s;
  const parts = [`${name}=${value ?? ''}`, 'Path=/', `Max-Age=${age}`, 'HttpOnly', 'SameSite=Strict'];
  return (secure ? [...parts, 'Secure'] : parts).join('; ');
}
