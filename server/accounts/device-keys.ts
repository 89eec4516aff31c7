import { createPublicKey, verify } from 'node:crypto';
import { calculateJwkThumbprint } from 'jose';
import * as z from 'zod/mini';

const coordinate = z.string().check(z.regex(/^[\w-]{43}$/, 'must be 32 bytes in base64url'));

/** Public part of the key that a tablet made and cannot hand out (protocol 4.1). */
export const devicePublicKeySchema = z.object({
  kty: z.literal('EC'),
  crv: z.literal('P-256'),
  x: coordinate,
  y: coordinate,
});
export type DevicePublicKey = z.infer<typeof devicePublicKeySchema>;

/** False when the numbers are no point of the curve. */
export function isUsableKey(key: DevicePublicKey): boolean {
  try {
    createPublicKey({ key: { ...key }, format: 'jwk' });
    return true;
  } catch {
    return false;
  }
}

/** One name per key (RFC 7638). */
export function thumbprintOf(key: DevicePublicKey): Promise<string> {
  return calculateJwkThumbprint(key, 'sha256');
}

export interface SignedWords {
  readonly deed: 'refresh' | 'device';
  readonly lab: string;
  readonly device: string;
  /** Null where the tablet speaks for itself. */
  readonly person: string | null;
  readonly nonce: string;
}

/** The exact text that a tablet signs. */
export function wordsToSign({ deed, lab, device, person, nonce }: SignedWords): string {
  return `holdoff ${deed}\n${lab}\n${device}\n${person ?? '-'}\n${nonce}`;
}

/** ECDSA on P-256 with SHA-256; the signature is r and s as WebCrypto gives them, in base64url. */
export function isSignedBy(key: DevicePublicKey, words: SignedWords, signature: string): boolean {
  try {
    const publicKey = createPublicKey({ key: { ...key }, format: 'jwk' });
    return verify(
      'sha256',
      Buffer.from(wordsToSign(words), 'utf8'),
      { key: publicKey, dsaEncoding: 'ieee-p1363' },
      Buffer.from(signature, 'base64url'),
    );
  } catch {
    return false;
  }
}
