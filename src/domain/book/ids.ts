import * as z from 'zod/mini';

const UUID_V4 = /^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/;
const SHA256_HEX = /^[0-9a-f]{64}$/;

/** Every reference in the Book is the id of an entry, person, lab or tablet: a lower-case UUIDv4 (protocol 1.5). */
export const uuid = z.string().check(z.regex(UUID_V4, 'must be a lower-case UUIDv4'));

/** SHA-256 as 64 lower-case hexadecimal digits. */
export const sha256Hex = z.string().check(z.regex(SHA256_HEX, 'must be 64 hexadecimal digits'));

/** Chain hash of an empty Book. */
export const GENESIS_HASH = '0'.repeat(64);

export function isUuid(value: unknown): value is string {
  return typeof value === 'string' && UUID_V4.test(value);
}

/**
 * Formats 16 random bytes as a UUIDv4. The bytes are an argument because the domain has no chance of its own.
 * @throws RangeError when not given exactly 16 bytes.
 */
export function uuidFromBytes(random: Uint8Array): string {
  if (random.length !== 16) throw new RangeError('a UUID needs 16 bytes');
  const bytes = Uint8Array.from(random);
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x40;
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80;
  const hex = Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}

/** Firings are numbered by the tablet's letter and its own count, so that the number is final when written: "A-119". */
export function firingNumber(letter: string, count: number): string {
  return `${letter}-${count}`;
}

/** Rig revisions are numbered by count and letter: "8A". */
export function revisionNumber(letter: string, count: number): string {
  return `${count}${letter}`;
}
