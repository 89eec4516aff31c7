import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { hashFields, hashText } from './length-prefixed';

const sha256 = (text: string) => createHash('sha256').update(text, 'utf8').digest('hex');

describe('hashing of fields', () => {
  it('writes length in bytes, a colon and the text; null as a dash', () => {
    expect(hashFields(['a', 12, true, null, 'µΩ', ''])).toBe(sha256('1:a2:124:true-:4:µΩ0:'));
    expect(hashFields([])).toBe(sha256(''));
  });

  it('tells lists apart that would read alike without the lengths', () => {
    const lists = [
      ['ab', 'c'],
      ['a', 'bc'],
      ['abc'],
      ['abc', ''],
      ['', 'abc'],
      [null, 'abc'],
      ['-', 'abc'],
      ['1:a'],
    ];
    expect(new Set(lists.map(hashFields)).size).toBe(lists.length);
  });

  it('knows the published hashes of SHA-256 (FIPS 180-2, B.1, and of the empty text)', () => {
    expect(hashText('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
    expect(hashText('')).toBe('e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855');
  });
});
