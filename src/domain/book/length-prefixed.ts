import { sha256 } from '@noble/hashes/sha2.js';
import { bytesToHex, utf8ToBytes } from '@noble/hashes/utils.js';

export type Hashable = string | number | boolean | null;

/**
 * SHA-256 over fields written one after the other, each as its UTF-8 length in bytes, a colon, and its text, so that no
 * two different lists of fields give the same bytes. Numbers and booleans are written as JSON writes them, null as the
 * length `-` with nothing behind it. Hex.
 */
export function hashFields(fields: readonly Hashable[]): string {
  const hash = sha256.create();
  for (const field of fields) {
    if (field === null) {
      hash.update(utf8ToBytes('-:'));
      continue;
    }
    const bytes = utf8ToBytes(typeof field === 'string' ? field : JSON.stringify(field));
    hash.update(utf8ToBytes(`${bytes.length}:`));
    hash.update(bytes);
  }
  return bytesToHex(hash.digest());
}

/** SHA-256 of a text's UTF-8 bytes, hex. */
export function hashText(text: string): string {
  return bytesToHex(sha256(utf8ToBytes(text)));
}
