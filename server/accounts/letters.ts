const alphabet = 26;

/** The letter of a lab's nth tablet, from 1: A to Z, then AA, AB and so on. A letter is never used again. */
export function tabletLetter(count: number): string {
  if (!Number.isSafeInteger(count) || count < 1) throw new RangeError('tablets are counted from 1');
  let letters = '';
  for (let rest = count; rest > 0; rest = Math.floor((rest - 1) / alphabet)) {
    letters = String.fromCharCode(65 + ((rest - 1) % alphabet)) + letters;
  }
  return letters;
}
