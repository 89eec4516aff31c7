import { uuidFromBytes } from '../src/domain/book/ids';
import { hashText } from '../src/domain/book/length-prefixed';

/** An id that is the same at every seeding, so that a demo link or a test can name it: made from a name by its hash. */
export function namedId(name: string): string {
  const digits = hashText(`thornwick/${name}`);
  return uuidFromBytes(
    Uint8Array.from({ length: 16 }, (_, at) => parseInt(digits.slice(2 * at, 2 * at + 2), 16)),
  );
}
