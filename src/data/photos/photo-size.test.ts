import { describe, expect, it } from 'vitest';
import { bytesWords, photoSize } from './photo-size';

describe('the size of a photo', () => {
  it('shrinks the longer side to 1600 px and keeps the shape', () => {
    expect(photoSize({ width: 4000, height: 3000 })).toEqual({ width: 1600, height: 1200 });
    expect(photoSize({ width: 3000, height: 4000 })).toEqual({ width: 1200, height: 1600 });
  });

  it('never enlarges and never vanishes', () => {
    expect(photoSize({ width: 640, height: 480 })).toEqual({ width: 640, height: 480 });
    expect(photoSize({ width: 16_000, height: 2 })).toEqual({ width: 1600, height: 1 });
  });

  it('rounds what it takes up', () => {
    expect(bytesWords(311_200)).toBe('312\u2009kB');
    expect(bytesWords(1_240_000)).toBe('1.3\u2009MB');
  });
});
