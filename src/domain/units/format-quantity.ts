/** Which way a figure may move: a limit is rounded down, a wait or a distance up, a plain reading to the nearest. */
export type Rounding = 'nearest' | 'down' | 'up';

/** How many digits to show: all counting digits, or digits after the point. */
export type Digits = { readonly significant: number } | { readonly decimals: number };

export interface FigureFormat {
  readonly digits: Digits;
  readonly rounding: Rounding;
}

const MINUS = '\u2212';
const THIN_SPACE = '\u2009';
const NO_FIGURE = '\u2013';

// Arithmetic leaves dust in the 16th digit; without this, 1.1 rounded up to one decimal would read 1.2.
const DUST_DIGITS = 13;

// No quantity here is smaller, and the engine refuses to write more than 100.
const MOST_DECIMALS = 20;

/**
 * A figure and its unit as the screens write them: true minus, comma in thousands, thin space before the unit.
 * What is not finite gives a dash instead of a figure.
 */
export function formatQuantity(value: number, unit: string, format: FigureFormat): string {
  const figure = formatFigure(value, format);
  return unit === '' ? figure : `${figure}${THIN_SPACE}${unit}`;
}

/** The figure alone, for places that set the unit smaller. */
export function formatFigure(value: number, { digits, rounding }: FigureFormat): string {
  if (!Number.isFinite(value)) return NO_FIGURE;
  const decimals = decimalsOf(value, digits);
  const rounded = roundToDecimals(value, decimals, rounding);
  // Rounding 9.96 up gives 10.0: one counting digit more, so the count is taken again.
  const shown = 'significant' in digits ? decimalsOf(rounded, digits) : decimals;
  if (!Number.isFinite(rounded)) return NO_FIGURE;
  const text = digitsOf(Math.abs(rounded), Math.max(0, shown));
  const [whole = '0', fraction] = text.split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+$)/g, ',');
  const sign = rounded < 0 ? MINUS : '';
  return `${sign}${grouped}${fraction === undefined ? '' : `.${fraction}`}`;
}

/**
 * Rounds at a decimal place (negative places round tens and hundreds), in decimal and not in binary.
 * "down" is towards minus infinity and "up" towards plus infinity.
 */
export function roundToDecimals(value: number, decimals: number, rounding: Rounding): number {
  const scaled = shiftPoint(Number(value.toPrecision(DUST_DIGITS)), decimals);
  const steps =
    rounding === 'down'
      ? Math.floor(scaled)
      : rounding === 'up'
        ? Math.ceil(scaled)
        : halfAwayFromZero(scaled);
  return shiftPoint(steps, -decimals);
}

/** As `roundToDecimals`, counted in significant digits. */
export function roundToSignificant(value: number, significant: number, rounding: Rounding): number {
  return roundToDecimals(value, decimalsOf(value, { significant }), rounding);
}

/** From here on the engine writes an exponent of its own accord. */
const EXPONENT_FROM = 1e21;

function digitsOf(size: number, decimals: number): string {
  return size < EXPONENT_FROM ? size.toFixed(decimals) : BigInt(size).toString();
}

function decimalsOf(value: number, digits: Digits): number {
  if ('decimals' in digits) return digits.decimals;
  if (value === 0) return digits.significant - 1;
  const exponent = Number(value.toExponential(DUST_DIGITS - 1).split('e')[1]);
  return Math.min(MOST_DECIMALS, digits.significant - 1 - exponent);
}

function halfAwayFromZero(value: number): number {
  return Math.sign(value) * Math.round(Math.abs(value));
}

function shiftPoint(value: number, places: number): number {
  const [mantissa = '0', exponent = '0'] = value.toExponential().split('e');
  return Number(`${mantissa}e${String(Number(exponent) + places)}`);
}
