/**
 * Text of the head of a file. UTF-8 where it is, and bytes that are not as the older one-byte letters, so that a lone
 * micro sign is read. Only the header's words go through this; figures are read from the bytes.
 */
export function textOf(bytes: Uint8Array): string {
  const parts: string[] = [];
  for (let at = 0; at < bytes.length;) {
    const first = bytes[at] ?? 0;
    const follow = first >= 0xe0 && first < 0xf0 ? 2 : first >= 0xc2 && first < 0xe0 ? 1 : 0;
    const rest = bytes.subarray(at + 1, at + 1 + follow);
    const whole = follow > 0 && rest.length === follow && rest.every((byte) => byte >> 6 === 2);
    parts.push(String.fromCharCode(whole ? joined(first, rest) : first));
    at += whole ? follow + 1 : 1;
  }
  return parts.join('');
}

function joined(first: number, rest: Uint8Array): number {
  return rest.reduce((code, byte) => (code << 6) | (byte & 0x3f), first & (rest.length === 1 ? 0x1f : 0x0f));
}

/** UTF-16, as some instruments write it, becomes UTF-8; a mark at the start goes; lone returns end lines. */
export function plainBytes(file: Uint8Array): Uint8Array {
  if (file[0] === 0xff && file[1] === 0xfe) return fromWide(file, 0);
  if (file[0] === 0xfe && file[1] === 0xff) return fromWide(file, 1);
  const marked = file[0] === 0xef && file[1] === 0xbb && file[2] === 0xbf;
  const bytes = marked ? file.subarray(3) : file;
  if (bytes.includes(10) || !bytes.includes(13)) return bytes;
  return bytes.map((byte) => (byte === 13 ? 10 : byte));
}

/** `low` is the place of the low byte in a pair. Letters beyond Latin play no part here and become a question mark. */
function fromWide(file: Uint8Array, low: 0 | 1): Uint8Array {
  const out = new Uint8Array(file.length);
  let length = 0;
  for (let at = 2; at + 1 < file.length; at += 2) {
    const code = (file[at + low] ?? 0) | ((file[at + 1 - low] ?? 0) << 8);
    if (code < 0x80) out[length++] = code;
    else if (code < 0x800) {
      out[length++] = 0xc0 | (code >> 6);
      out[length++] = 0x80 | (code & 0x3f);
    } else out[length++] = 63;
  }
  return out.subarray(0, length);
}
