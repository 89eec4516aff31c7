/** As a display with so many digits behind the point shows it. */
export function rounded(value: number, digits: number): number {
  const shown = Number(value.toFixed(digits));
  // A meter shows no minus before zero, and JSON would lose it.
  return shown === 0 ? 0 : shown;
}
