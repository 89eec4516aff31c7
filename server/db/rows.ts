/** 64-bit columns arrive as digits: a whole number of them, which the schema keeps below 2^53. */
export function toInt(value: unknown): number {
  const number = typeof value === 'number' ? value : Number(value);
  if (value === null || !Number.isSafeInteger(number))
    throw new RangeError(`not a whole number: ${String(value)}`);
  return number;
}

export function toIntOrNull(value: unknown): number | null {
  return value === null || value === undefined ? null : toInt(value);
}
