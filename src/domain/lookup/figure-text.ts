import { formatFigure, type Rounding } from '../units/format-quantity';
import type { Figure } from './lookup';

/** A figure as it is written: a power of ten apart where plain digits would not fit a reading. */
export interface FigureText {
  readonly figure: string;
  /** Null for plain digits. */
  readonly power: number | null;
}

const LEAST_PLAIN = 1e-4;
const MOST_PLAIN = 1e7;

/** A figure's value as screens and tables write it, rounded to its harmless side. */
export function figureText(
  figure: Pick<Figure, 'value' | 'digits' | 'decimals' | 'rounding'>,
  value: number = figure.value,
  rounding: Rounding = figure.rounding,
): FigureText {
  const size = Math.abs(value);
  if (size !== 0 && (size < LEAST_PLAIN || size >= MOST_PLAIN)) {
    const power = Math.floor(Math.log10(size));
    const mantissa = Number(value.toExponential().split('e')[0]);
    return {
      figure: formatFigure(mantissa, { digits: { significant: figure.digits }, rounding }),
      power,
    };
  }
  const digits =
    figure.decimals === undefined ? { significant: figure.digits } : { decimals: figure.decimals };
  return { figure: formatFigure(value, { digits, rounding }), power: null };
}

/** The same in one line of plain text: 1.20e-9 for what a screen sets as a power of ten. */
export function figureLine(...of: Parameters<typeof figureText>): string {
  const { figure, power } = figureText(...of);
  return power === null ? figure : `${figure}e${String(power).replace('-', '\u2212')}`;
}

/** The band in words, its low end rounded down and its high end up; null for a figure without one. */
export function bandText(figure: Figure): string | null {
  if (figure.low === undefined || figure.high === undefined) return null;
  return `${figureLine(figure, figure.low, 'down')} to ${figureLine(figure, figure.high, 'up')}`;
}
