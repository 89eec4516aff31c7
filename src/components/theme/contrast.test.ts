import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

type Rgb = readonly [number, number, number];

/** Transmission of common eyewear in R, G, B: computed from Gaussian primaries, CIE V and logistic edges (the design page). */
const FILTERS: Readonly<Record<string, Rgb>> = {
  none: [1, 1, 1],
  yellow: [0.92, 0.91, 0],
  amber: [0.9, 0.53, 0],
  orange: [0.9, 0.27, 0],
  'deep orange': [0.9, 0.04, 0],
  'red-blocking': [0.08, 0.6, 0.6],
  teal: [0, 0.49, 0.49],
  'green notch': [0.75, 0.3, 0.75],
  grey: [0.25, 0.25, 0.25],
};

const TEXT = 7;
const MUTED = 4.5;
const MARK = 3;

/** Every pair that a style sheet here sets upon another, with the floor of its kind. */
const PAIRS: readonly (readonly [string, string, number])[] = [
  ['text', 'ground', TEXT],
  ['text', 'plate', TEXT],
  ['text', 'raised', TEXT],
  ['text', 'metal', TEXT],
  ['ink', 'solid', TEXT],
  ['ink-muted', 'solid', MUTED],
  ['ground', 'text', TEXT],
  ['muted', 'ground', MUTED],
  ['muted', 'plate', MUTED],
  ['muted', 'raised', MUTED],
  ['muted', 'metal', MUTED],
  ['edge', 'ground', MARK],
  ['brass', 'ground', MARK],
  ['brass', 'raised', MARK],
  ['brass', 'metal', MARK],
];

const sheet = readFileSync(new URL('./tokens.css', import.meta.url), 'utf8');

function tokensOf(...selectors: readonly string[]): ReadonlyMap<string, Rgb> {
  const found = new Map<string, Rgb>();
  for (const selector of selectors) {
    const start = sheet.indexOf(`\n${selector} {`);
    if (start < 0) throw new Error(`no rule ${selector}`);
    const body = sheet.slice(start, sheet.indexOf('\n}', start));
    for (const [, name = '', hex = ''] of body.matchAll(/--([a-z-]+):\s*#([0-9a-f]{6});/g)) {
      found.set(name, [0, 2, 4].map((i) => Number.parseInt(hex.slice(i, i + 2), 16)) as unknown as Rgb);
    }
  }
  return found;
}

function linear(channel: number): number {
  const c = channel / 255;
  return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
}

/** Luminance behind the filter, as a part of what white has there: the eye adapts to the filter. */
function seen(colour: Rgb, filter: Rgb): number {
  const weights: Rgb = [0.2126, 0.7152, 0.0722];
  const sum = (rgb: (i: number) => number): number =>
    [0, 1, 2].reduce((total, i) => total + (weights[i] ?? 0) * (filter[i] ?? 0) * rgb(i), 0);
  return sum((i) => linear(colour[i] ?? 0)) / sum(() => 1);
}

function contrast(a: Rgb, b: Rgb, filter: Rgb): number {
  const [high = 0, low = 0] = [seen(a, filter), seen(b, filter)].sort((x, y) => y - x);
  return (high + 0.05) / (low + 0.05);
}

const MODES = {
  dark: [':root'],
  daylight: [':root', ":root[data-theme='daylight']"],
  'dark with eyewear': [':root', ":root[data-eyewear='on']"],
  'daylight with eyewear': [
    ':root',
    ":root[data-theme='daylight']",
    ":root[data-eyewear='on'][data-theme='daylight']",
  ],
} as const;

describe.each(Object.entries(MODES))('contrast through eyewear, %s', (_mode, selectors) => {
  const tokens = tokensOf(...selectors);
  const colour = (name: string): Rgb => {
    const found = tokens.get(name);
    if (found === undefined) throw new Error(`no token ${name}`);
    return found;
  };

  it.each(PAIRS)('%s on %s keeps its floor of %d', (front, back, floor) => {
    const worst = Object.entries(FILTERS).map(
      ([name, filter]) => [contrast(colour(front), colour(back), filter), name] as const,
    );
    for (const [ratio, name] of worst) expect(ratio, `through ${name}`).toBeGreaterThanOrEqual(floor);
  });
});

describe('the measure itself', () => {
  // WCAG 2.2, "relative luminance" and "contrast ratio": black on white is 21, and #767676 on white is 4.54.
  it('agrees with the published ratios without a filter', () => {
    expect(contrast([0, 0, 0], [255, 255, 255], [1, 1, 1])).toBeCloseTo(21, 5);
    expect(contrast([0x76, 0x76, 0x76], [255, 255, 255], [1, 1, 1])).toBeCloseTo(4.54, 2);
  });

  it('sees a red text vanish behind red-blocking eyewear', () => {
    const red: Rgb = [255, 0, 0];
    expect(contrast(red, [11, 11, 12], FILTERS['red-blocking'] ?? [1, 1, 1])).toBeLessThan(MARK);
  });

  it('makes muted words stand out more with the eyewear setting', () => {
    const ratio = (mode: readonly string[]): number => {
      const tokens = tokensOf(...mode);
      return contrast(tokens.get('muted') ?? [0, 0, 0], tokens.get('ground') ?? [0, 0, 0], [1, 1, 1]);
    };
    expect(ratio(MODES['dark with eyewear'])).toBeGreaterThan(ratio(MODES.dark));
    expect(ratio(MODES['daylight with eyewear'])).toBeGreaterThan(ratio(MODES.daylight));
  });
});
