/** Brightness of the spot on white card by eye, dimmest first; own scale. The place in the list is what is logged. */
export const EYE_SCALE = [
  '0, nothing',
  '1, in the dark only',
  '2, faint in dim light',
  '3, clear in dim light',
  '4, faint in room light',
  '5, clear in room light',
] as const;

/** "3, clear in dim light". */
export function eyeWords(level: number): string {
  return EYE_SCALE[level] ?? String(level);
}
