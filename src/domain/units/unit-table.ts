import { BAR_PER_ATM, KPA_PER_BAR, psiToBar, TORR_PER_BAR } from './pressure';

/** What a typed quantity may be of, with the unit in which the domain keeps it. */
export const BASE_UNITS = {
  voltage: 'V',
  current: 'A',
  capacitance: 'F',
  inductance: 'H',
  resistance: '\u2126',
  energy: 'J',
  power: 'W',
  time: 's',
  frequency: 'Hz',
  charge: 'C',
  length: 'mm',
  pressure: 'bar',
} as const;
export type Dimension = keyof typeof BASE_UNITS;

/** Powers of ten by their SI sign; both letters that look like micro are read. */
export const SI_PREFIXES: Readonly<Record<string, number>> = {
  f: -15,
  p: -12,
  n: -9,
  '\u00b5': -6,
  '\u03bc': -6,
  u: -6,
  m: -3,
  '': 0,
  k: 3,
  M: 6,
  G: 9,
  T: 12,
};

/** Units that take a prefix, by sign. */
export const PREFIXED: Readonly<Record<string, Dimension>> = {
  V: 'voltage',
  A: 'current',
  F: 'capacitance',
  H: 'inductance',
  '\u2126': 'resistance',
  '\u03a9': 'resistance',
  ohm: 'resistance',
  Ohm: 'resistance',
  J: 'energy',
  W: 'power',
  s: 'time',
  Hz: 'frequency',
  C: 'charge',
};

/** Units as they stand, by sign in lower case, with their size in the base unit. */
export const PLAIN_UNITS: Readonly<Record<string, { readonly dimension: Dimension; readonly size: number }>> =
  {
    m: { dimension: 'length', size: 1000 },
    cm: { dimension: 'length', size: 10 },
    mm: { dimension: 'length', size: 1 },
    um: { dimension: 'length', size: 1e-3 },
    '\u00b5m': { dimension: 'length', size: 1e-3 },
    '\u03bcm': { dimension: 'length', size: 1e-3 },
    nm: { dimension: 'length', size: 1e-6 },
    in: { dimension: 'length', size: 25.4 },
    inch: { dimension: 'length', size: 25.4 },
    '"': { dimension: 'length', size: 25.4 },
    mil: { dimension: 'length', size: 0.0254 },
    thou: { dimension: 'length', size: 0.0254 },
    bar: { dimension: 'pressure', size: 1 },
    mbar: { dimension: 'pressure', size: 1e-3 },
    pa: { dimension: 'pressure', size: 1e-5 },
    hpa: { dimension: 'pressure', size: 1e-3 },
    kpa: { dimension: 'pressure', size: 1 / KPA_PER_BAR },
    mpa: { dimension: 'pressure', size: 10 },
    torr: { dimension: 'pressure', size: 1 / TORR_PER_BAR },
    mmhg: { dimension: 'pressure', size: 1 / TORR_PER_BAR },
    atm: { dimension: 'pressure', size: BAR_PER_ATM },
    inhg: { dimension: 'pressure', size: 25.4 / TORR_PER_BAR },
    psi: { dimension: 'pressure', size: psiToBar(1) },
    min: { dimension: 'time', size: 60 },
    h: { dimension: 'time', size: 3600 },
  };
