import { describe, expect, it } from 'vitest';
import { LOOKS } from '../../domain/book/bodies/firing-bodies';
import { arcsOf, isFailure, lookRowFor, rowOf, toggleArc } from './looks';

describe('where arcs sat', () => {
  it('puts both ends together and takes one away again', () => {
    expect(toggleArc('even', 'a')).toBe('arc-a-end');
    expect(toggleArc('arc-a-end', 'b')).toBe('arc-both-ends');
    expect(toggleArc('arc-both-ends', 'a')).toBe('arc-b-end');
    expect(toggleArc('arc-b-end', 'b')).toBe('even');
  });

  it('lets the middle stand alone, since a reading holds one look', () => {
    expect(toggleArc('arc-both-ends', 'mid')).toBe('arc-mid');
    expect(toggleArc('arc-mid', 'b')).toBe('arc-b-end');
  });

  it('replaces a failure', () => {
    expect(toggleArc('gap-dark', 'mid')).toBe('arc-mid');
  });
});

describe('the row under the channel', () => {
  it('has a place for every look: drawn in the channel, or in the row', () => {
    for (const looked of LOOKS)
      expect(arcsOf(looked).length > 0 || rowOf(looked) !== null, looked).toBe(true);
  });

  it('calls the chosen failure by its name', () => {
    expect(isFailure('gap-stays-lit')).toBe(true);
    expect(lookRowFor('gap-stays-lit').at(-1)?.label).toBe('gap stays lit');
    expect(lookRowFor('even').at(-1)?.label).toBe('no beam, dark or failed');
  });
});
