import { generateKeyPairSync } from 'node:crypto';
import { mkdtempSync, readdirSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { SignJWT } from 'jose';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { createAccessTokens } from './access-tokens';
import { isSignedBy, wordsToSign } from './device-keys';
import { createNonces } from './nonces';
import { createPasswords } from './passwords';
import { refreshCookie } from './refresh-cookie';
import { readOrMakeSecret } from './secret-files';
import { createSigningKeys, makeSigningKeyFile } from './signing-keys';

const lab = '11111111-1111-4111-8111-111111111111';
const person = '22222222-2222-4222-8222-222222222222';
const device = '33333333-3333-4333-8333-333333333333';
const claims = { lab, dev: device, sub: person, use: 'person' } as const;

describe('keys and tokens', () => {
  let folder: string;
  let now_ms = 1_772_438_400_000;
  beforeEach(() => {
    folder = mkdtempSync(path.join(tmpdir(), 'holdoff-secrets-'));
  });
  afterEach(() => rmSync(folder, { recursive: true, force: true }));
  const now = () => now_ms;

  it('makes a secret once, readable by this account only', () => {
    const inner = path.join(folder, 'secrets');
    expect(readOrMakeSecret(inner, 'nonce.key', () => 'first')).toBe('first');
    expect(readOrMakeSecret(inner, 'nonce.key', () => 'second')).toBe('first');
    expect(statSync(path.join(inner, 'nonce.key')).mode & 0o077).toBe(0);
    expect(readdirSync(inner)).toEqual(['nonce.key']);
  });

  it('signs by the newest key and still knows the one before, also one that is laid beside while it runs', async () => {
    const keys = createSigningKeys(folder, now);
    const tokens = createAccessTokens(keys, now);
    const old = await tokens.issue(claims);
    now_ms += 60_000;
    writeFileSync(path.join(folder, 'second.signing.json'), makeSigningKeyFile(now_ms));
    const fresh = await tokens.issue(claims);
    const kidOf = (token: string) =>
      (JSON.parse(Buffer.from(token.split('.')[0] ?? '', 'base64url').toString()) as { kid: string }).kid;
    expect(kidOf(fresh.access_token)).not.toBe(kidOf(old.access_token));
    expect(await tokens.read(old.access_token)).toEqual(claims);
    expect(await tokens.read(fresh.access_token)).toEqual(claims);
    expect(fresh.expires_ms).toBe(now_ms + 600_000);
  });

  it('reads no token of another key, type, audience, maker or shape, and none that is over', async () => {
    const keys = createSigningKeys(folder, now);
    const tokens = createAccessTokens(keys, now);
    const { kid, privateKey } = keys.newest();
    const sign = (change: {
      typ?: string;
      aud?: string;
      iss?: string;
      key?: typeof privateKey;
      lab?: string;
      exp?: number;
      kid?: string;
    }) =>
      new SignJWT({ lab: change.lab ?? lab, dev: device, use: 'person' })
        .setProtectedHeader({ alg: 'ES256', kid: change.kid ?? kid, typ: change.typ ?? 'at+jwt' })
        .setIssuer(change.iss ?? 'holdoff')
        .setAudience(change.aud ?? 'holdoff-api')
        .setSubject(person)
        .setIssuedAt(Math.floor(now_ms / 1000))
        .setExpirationTime(change.exp ?? Math.floor(now_ms / 1000) + 60)
        .sign(change.key ?? privateKey);
    expect(await tokens.read(await sign({}))).toEqual(claims);
    const { privateKey: other } = generateKeyPairSync('ec', { namedCurve: 'P-256' });
    for (const wrong of [
      { typ: 'JWT' },
      { aud: 'else' },
      { iss: 'else' },
      { key: other },
      { lab: 'no' },
      { kid: 'none' },
      { exp: Math.floor(now_ms / 1000) - 1 },
    ]) {
      expect([Object.keys(wrong), await tokens.read(await sign(wrong))]).toEqual([
        Object.keys(wrong),
        undefined,
      ]);
    }
  });

  it('knows its own nonce for a minute', () => {
    const nonces = createNonces('secret', now);
    const { nonce, expires_ms } = nonces.make();
    expect([nonces.isFresh(nonce), expires_ms - now_ms]).toEqual([true, 60_000]);
    expect(createNonces('other', now).isFresh(nonce)).toBe(false);
    const other = nonce.startsWith('A') ? 'B' : 'A';
    expect(nonces.isFresh(`${other}${nonce.slice(1)}`)).toBe(false);
    expect(nonces.isFresh('')).toBe(false);
    now_ms += 60_001;
    expect(nonces.isFresh(nonce)).toBe(false);
    now_ms -= 120_000;
    expect(nonces.isFresh(nonce)).toBe(false);
  });

  it('keeps passwords by argon2id, and answers for nobody as slowly as for somebody', async () => {
    const passwords = createPasswords();
    const stored = await passwords.hash('copper');
    expect(stored).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(await passwords.matches(stored, 'copper')).toBe(true);
    expect(await passwords.matches(stored, 'brass')).toBe(false);
    expect(await passwords.matches(undefined, 'nobody has this password')).toBe(false);
  });

  it('names what a tablet signs word by word', () => {
    const words = { deed: 'device', lab, device, person: null, nonce: 'n' } as const;
    expect(wordsToSign(words)).toBe(`holdoff device\n${lab}\n${device}\n-\nn`);
    const key = { kty: 'EC', crv: 'P-256', x: 'A'.repeat(43), y: 'A'.repeat(43) } as const;
    expect(isSignedBy(key, words, 'no signature')).toBe(false);
  });

  it('names the cookie for https by the prefix that binds it to this host, and marks it secure', () => {
    const cookie = refreshCookie({ origin: 'https://holdoff.lab.example', lab, person }, 'value');
    expect(cookie).toMatchObject({ name: '__Host-holdoff-11111111-22222222', secure: true });
    const plain = refreshCookie({ origin: 'http://127.0.0.1:8320', lab, person }, null);
    expect(plain).toMatchObject({ name: 'holdoff-8320-11111111-22222222', secure: false, value: null });
  });
});
