import { formatFigure, type Rounding } from '../units/format-quantity';

/** Counting digits of a self-break voltage, so that every place shows the same ones: 6.37 kV as well as 18.8 kV. */
export const BREAK_DIGITS = 3;

/** A self-break voltage in kV without its unit; the low side is rounded down and the high side up by whoever asks. */
export function breakText(kV: number, rounding: Rounding): string {
  return formatFigure(kV, { digits: { significant: BREAK_DIGITS }, rounding });
}
