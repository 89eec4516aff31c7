import type { RandomBytes } from '../ports/ports';
import type { PinRecord } from '../store/book-database';

/** PBKDF2 with SHA-256 at this count takes a tablet some tenths of a second per guess (protocol 4.3). */
export const PIN_ITERATIONS = 600_000;
export const PIN_TRIES = 10;
const PIN_SHAPE = /^[0-9]{6,12}$/;
const SALT_BYTES = 16;

export function pinObjection(pin: string): string | null {
  if (!PIN_SHAPE.test(pin)) return 'A PIN has 6 to 12 digits.';
  if (new Set(pin).size === 1) return 'A PIN of one repeated digit is guessed at once.';
  return '0123456789'.includes(pin) || '9876543210'.includes(pin)
    ? 'A PIN that only counts up or down is guessed at once.'
    : null;
}

/** Wait before the next try after so many wrong ones in a row, ms: 1 s, doubling. */
export function pinDelayMs(failures: number): number {
  return failures === 0 ? 0 : 1000 * 2 ** (failures - 1);
}

export async function hashPin(
  subtle: SubtleCrypto,
  pin: string,
  kdf: { readonly random: RandomBytes; readonly iterations: number },
): Promise<PinRecord> {
  const salt = kdf.random(SALT_BYTES);
  return {
    salt,
    hash: await derive(subtle, pin, { salt, iterations: kdf.iterations }),
    iterations: kdf.iterations,
  };
}

export async function isRightPin(subtle: SubtleCrypto, pin: string, record: PinRecord): Promise<boolean> {
  const hash = await derive(subtle, pin, record);
  let difference = hash.length ^ record.hash.length;
  for (const [index, byte] of hash.entries()) difference |= byte ^ (record.hash[index] ?? 0);
  return difference === 0;
}

async function derive(
  subtle: SubtleCrypto,
  pin: string,
  { salt, iterations }: Pick<PinRecord, 'salt' | 'iterations'>,
): Promise<Uint8Array<ArrayBuffer>> {
  const key = await subtle.importKey('raw', new TextEncoder().encode(pin), 'PBKDF2', false, ['deriveBits']);
  return new Uint8Array(
    await subtle.deriveBits({ name: 'PBKDF2', hash: 'SHA-256', salt, iterations }, key, 256),
  );
}
