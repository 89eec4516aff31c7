import { describe, expect, it } from 'vitest';
import { firingNumber, isUuid, revisionNumber, uuidFromBytes } from './ids';

describe('ids', () => {
  it('makes a UUIDv4 of sixteen bytes, whatever they are', () => {
    expect(uuidFromBytes(new Uint8Array(16))).toBe('00000000-0000-4000-8000-000000000000');
    expect(uuidFromBytes(new Uint8Array(16).fill(255))).toBe('ffffffff-ffff-4fff-bfff-ffffffffffff');
    expect(isUuid(uuidFromBytes(Uint8Array.from({ length: 16 }, (_, at) => at)))).toBe(true);
  });

  it('refuses another number of bytes, and leaves its argument as it was', () => {
    expect(() => uuidFromBytes(new Uint8Array(15))).toThrow(RangeError);
    const bytes = new Uint8Array(16).fill(255);
    uuidFromBytes(bytes);
    expect(bytes[6]).toBe(255);
  });

  it.each(['', 'x', 7, null, '00000000-0000-4000-8000-00000000000G', '00000000-0000-3000-8000-000000000000'])(
    'knows that %s is none',
    (value) => {
      expect(isUuid(value)).toBe(false);
    },
  );

  it('numbers firings and revisions by the tablet’s letter', () => {
    expect([firingNumber('A', 119), revisionNumber('A', 8)]).toEqual(['A-119', '8A']);
  });
});
