import { describe, expect, it } from 'vitest';
import { densityWords, eighthsWords, itemWords, turnWords } from './kit-words';

describe('words for kit', () => {
  it('gives each piece by its own figures, gauge said', () => {
    expect(densityWords({ from_nm: 190, to_nm: 375, density: 6.5 })).toBe('OD 6.5 at 190 to 375\u2009nm');
    expect(itemWords({ type: 'relief-valve', set_bar_g: 1.5 })).toBe('opens at 1.5\u2009bar(g)');
    expect(itemWords({ type: 'shorting-stick', resistor_kohm: null, rated_kV: 40 })).toBe(
      'resistor not known, to 40\u2009kV',
    );
    expect(itemWords({ type: 'spare', count: 1, minimum: 2, catalogue: null })).toBe('1 there, at least 2');
  });
});

describe('words for turns', () => {
  it.each([
    [0, '0'],
    [1, '1/8'],
    [2, '1/4'],
    [4, '1/2'],
    [6, '3/4'],
    [7, '7/8'],
    [8, '1'],
    [11, '1 3/8'],
  ])('%d eighths are %s', (eighths, words) => {
    expect(eighthsWords(eighths)).toBe(words);
  });

  it('says which way, seen from the head', () => {
    expect(turnWords({ screw: 'Screw A', eighths_clockwise: -3 })).toBe('Screw A: 3/8 anticlockwise');
    expect(turnWords({ screw: 'Screw A', eighths_clockwise: 0 })).toBe('Screw A: leave');
  });
});
