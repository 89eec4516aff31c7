import { describe, expect, it } from 'vitest';
import { firstReach, pieceAt, pieceBound, pieceEnd, pieceSlope, pieceTop } from './piece';

// 3 theta - 3 theta^2: rises to 0.75 in the middle.
const HILL = Float64Array.from([0, 3, -3, 0, 0, 0]);
const RISING = Float64Array.from([1, 0, 1, 0, 0, 0]);
const FALLING = HILL.map((power) => -power);

describe('a piece', () => {
  it('has its value, its slope and its bound', () => {
    expect(pieceAt(HILL, 0, 0.25)).toBeCloseTo(0.5625, 14);
    expect(pieceSlope(HILL, 0, 0.25)).toBeCloseTo(1.5, 14);
    expect(pieceBound(HILL, 0)).toBeCloseTo(0.9, 14);
    expect(pieceEnd(RISING, 0)).toBe(2);
  });

  it.each([
    ['inside, from above', HILL, 0.5],
    ['inside, from below', FALLING, 0.5],
    ['at the end', RISING, 1],
    ['at the start', Float64Array.from([2, -1, 0, 0, 0, 0]), 0],
    ['anywhere where it is flat', new Float64Array(6), 0],
  ])('is largest %s', (_where, piece, theta) => {
    expect(pieceTop(piece, 0)).toBeCloseTo(theta, 9);
  });

  it.each([
    ['on the way up', HILL, 0.5625, 0.25],
    ['downwards as well', FALLING, 0.5625, 0.25],
    ['at the very top', HILL, 0.75, 0.5],
    ['at once', RISING, 1, 0],
  ])('first reaches a level %s', (_how, piece, level, theta) => {
    expect(firstReach(piece, 0, level)).toBeCloseTo(theta, 7);
  });

  it('does not reach what lies above its top, though its bound does', () => {
    expect(firstReach(HILL, 0, 0.7501)).toBeUndefined();
    expect(firstReach(HILL, 0, 7)).toBeUndefined();
  });
});
