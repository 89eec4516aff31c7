import { describe, expect, it } from 'vitest';
import { answer } from './answer';
import { andThen, firstRefusal, mapResult, ok, refused } from './result';
import { celsiusToKelvin, kelvinToCelsius } from './temperature';

const NO = refused({ type: 'no', words: 'No.' });

describe('Result', () => {
  it('goes on with a value and carries a refusal on', () => {
    expect(andThen(ok(2), (x) => ok(x + 1))).toEqual(ok(3));
    expect(andThen(ok(2), () => NO)).toEqual(NO);
    expect(andThen(NO, () => ok(1))).toEqual(NO);
    expect(mapResult(ok(2), (x) => x * 2)).toEqual(ok(4));
    expect(mapResult(NO, () => 1)).toEqual(NO);
  });

  it('finds the first refusal in the order of the fields', () => {
    const later = refused({ type: 'later', words: 'Later.' });
    expect(firstRefusal([ok(1), NO, later])).toEqual({ type: 'no', words: 'No.' });
    expect(firstRefusal([ok(1), ok(2)])).toBeUndefined();
    expect(firstRefusal([])).toBeUndefined();
  });
});

describe('answer', () => {
  const parts = { unit: 'kV', model: 'm', valid: 'v' };

  it('makes its band from one relative figure or from two', () => {
    expect(answer({ ...parts, value: 10, relative: 0.03 }).band).toEqual({ low: 9.7, high: 10.3 });
    expect(answer({ ...parts, value: 10, relative: { below: 0.1, above: 0.2 } }).band).toEqual({
      low: 9,
      high: 12,
    });
  });

  it('keeps the band the right way round for a negative value', () => {
    expect(answer({ ...parts, value: -10, relative: 0.1 }).band).toEqual({ low: -11, high: -9 });
  });
});

describe('temperature', () => {
  it('shifts by 273.15 (SI definition)', () => {
    expect(celsiusToKelvin(20)).toBeCloseTo(293.15, 12);
    expect(kelvinToCelsius(0)).toBeCloseTo(-273.15, 12);
  });
});
