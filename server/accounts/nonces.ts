import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto';

/** A nonce is signed by the tablet's key at once; a longer life would only help whoever took one. */
export const NONCE_MS = 60_000;

export interface Nonces {
  readonly make: () => { nonce: string; expires_ms: number };
  readonly isFresh: (nonce: string) => boolean;
}

const macBytes = 32;
const headBytes = 16 + 8;

/** Random bytes and a time under our own HMAC: nothing is kept, so any server of the lab can check it. */
export function createNonces(secret: string, now: () => number): Nonces {
  const macOf = (head: Buffer): Buffer =>
    createHmac('sha256', secret).update('nonce\n').update(head).digest();
  return {
    make() {
      const time = Buffer.alloc(8);
      const made_ms = now();
      time.writeBigUInt64BE(BigInt(made_ms));
      const head = Buffer.concat([randomBytes(16), time]);
      return {
        nonce: Buffer.concat([head, macOf(head)]).toString('base64url'),
        expires_ms: made_ms + NONCE_MS,
      };
    },
    isFresh(nonce) {
      const bytes = Buffer.from(nonce, 'base64url');
      if (bytes.length !== headBytes + macBytes) return false;
      const head = bytes.subarray(0, headBytes);
      if (!timingSafeEqual(macOf(head), bytes.subarray(headBytes))) return false;
      const age_ms = now() - Number(head.readBigUInt64BE(16));
      return age_ms >= 0 && age_ms <= NONCE_MS;
    },
  };
}
