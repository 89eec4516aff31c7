import { BAR_PER_ATM, KPA_PER_BAR, psiToBar, TORR_PER_BAR } from '../units/pressure';
import { BASE_UNITS, type Dimension } from '../units/unit-table';

/** A unit of a quantity: own times `size`, less `zero`, is in the base unit. */
export interface ListedUnit {
  readonly label: string;
  readonly size: number;
  /** Base value where this unit counts 0, for degrees. */
  readonly zero?: number;
  readonly answer?: true;
  /** Of a pressure: what it is counted from. */
  readonly reference?: 'gauge' | 'absolute';
}

export interface Quantity {
  readonly key: string;
  readonly label: string;
  readonly units: readonly ListedUnit[];
  /** Reads a typed text of this kind; none where only numbers are taken. */
  readonly dimension?: Dimension;
  /** Where the scale ends, in the base unit: nothing is colder than this. */
  readonly least?: number;
}

const INCH_MM = 25.4;
const ELECTRONVOLT_J = 1.602176634e-19;

function prefixed(dimension: Dimension, prefixes: string, main: string): readonly ListedUnit[] {
  const unit = BASE_UNITS[dimension];
  return Array.from(prefixes, (prefix) => ({
    label: prefix === '1' ? unit : `${prefix}${unit}`,
    size: Number(`1e${POWERS[prefix] ?? 0}`),
    ...(main.includes(prefix) ? { answer: true as const } : {}),
  }));
}

const POWERS: Readonly<Record<string, number>> = {
  f: -15,
  p: -12,
  n: -9,
  '\u00b5': -6,
  m: -3,
  '1': 0,
  k: 3,
  M: 6,
  G: 9,
};

const gauge = { reference: 'gauge' } as const;
const absolute = { reference: 'absolute' } as const;

/** Quantities of the bench, with their units; the first one or two are the large figures. */
export const QUANTITIES: readonly Quantity[] = [
  {
    key: 'pressure',
    label: 'pressure',
    dimension: 'pressure',
    units: [
      { label: 'bar(g)', size: 1, answer: true, ...gauge },
      { label: 'bar(abs)', size: 1, answer: true, ...absolute },
      { label: 'mbar(abs)', size: 1e-3, ...absolute },
      { label: 'kPa(abs)', size: 1 / KPA_PER_BAR, ...absolute },
      { label: 'kPa(g)', size: 1 / KPA_PER_BAR, ...gauge },
      { label: 'MPa(abs)', size: 10, ...absolute },
      { label: 'psi(g)', size: psiToBar(1), ...gauge },
      { label: 'psi(abs)', size: psiToBar(1), ...absolute },
      { label: 'Torr(abs)', size: 1 / TORR_PER_BAR, ...absolute },
      { label: 'atm(abs)', size: BAR_PER_ATM, ...absolute },
      { label: 'inHg(abs)', size: INCH_MM / TORR_PER_BAR, ...absolute },
    ],
  },
  {
    key: 'length',
    label: 'length',
    dimension: 'length',
    units: [
      { label: 'mm', size: 1, answer: true },
      { label: 'in', size: INCH_MM, answer: true },
      { label: '\u00b5m', size: 1e-3 },
      { label: 'thou', size: INCH_MM / 1000 },
      { label: 'cm', size: 10 },
      { label: 'm', size: 1000 },
      { label: 'nm', size: 1e-6 },
    ],
  },
  { key: 'voltage', label: 'voltage', dimension: 'voltage', units: prefixed('voltage', 'm1kM', 'k1') },
  { key: 'current', label: 'current', dimension: 'current', units: prefixed('current', 'n\u00b5m1k', 'm1') },
  {
    key: 'capacitance',
    label: 'capacitance',
    dimension: 'capacitance',
    units: prefixed('capacitance', 'pn\u00b5m1', 'pn'),
  },
  {
    key: 'inductance',
    label: 'inductance',
    dimension: 'inductance',
    units: prefixed('inductance', 'n\u00b5m1', 'n\u00b5'),
  },
  {
    key: 'resistance',
    label: 'resistance',
    dimension: 'resistance',
    units: prefixed('resistance', 'm1kMG', '1M'),
  },
  {
    key: 'energy',
    label: 'energy',
    dimension: 'energy',
    units: [
      ...prefixed('energy', 'n\u00b5m1k', 'm1'),
      { label: 'Wh', size: 3600 },
      { label: 'eV', size: ELECTRONVOLT_J },
    ],
  },
  { key: 'power', label: 'power', dimension: 'power', units: prefixed('power', '\u00b5m1kM', '1k') },
  {
    key: 'time',
    label: 'time',
    dimension: 'time',
    units: [...prefixed('time', 'pn\u00b5m1', 'n1'), { label: 'min', size: 60 }, { label: 'h', size: 3600 }],
  },
  {
    key: 'frequency',
    label: 'frequency',
    dimension: 'frequency',
    units: prefixed('frequency', '1kMG', '1M'),
  },
  { key: 'charge', label: 'charge', dimension: 'charge', units: prefixed('charge', 'pn\u00b5m1', 'n\u00b5') },
  {
    key: 'temperature',
    label: 'temperature',
    least: 0,
    units: [
      { label: '\u00b0C', size: 1, zero: 273.15, answer: true },
      { label: 'K', size: 1, answer: true },
      { label: '\u00b0F', size: 5 / 9, zero: 273.15 - (32 * 5) / 9 },
    ],
  },
  {
    key: 'flow',
    label: 'gas flow',
    units: [
      { label: 'L/min', size: 1, answer: true },
      { label: 'L/h', size: 1 / 60, answer: true },
      { label: 'm\u00b3/h', size: 1000 / 60 },
      { label: 'cm\u00b3/s', size: 0.06 },
      { label: 'ft\u00b3/h', size: (0.3048 ** 3 * 1000) / 60 },
    ],
  },
  {
    key: 'angle',
    label: 'angle',
    units: [
      { label: 'mrad', size: 1, answer: true },
      { label: '\u00b0', size: (1000 * Math.PI) / 180, answer: true },
      { label: 'arcmin', size: (1000 * Math.PI) / 180 / 60 },
      { label: 'turns', size: 2000 * Math.PI },
    ],
  },
  {
    key: 'field',
    label: 'field',
    units: [
      { label: 'kV/mm', size: 1, answer: true },
      { label: 'kV/cm', size: 0.1, answer: true },
      { label: 'MV/m', size: 1 },
      { label: 'V/\u00b5m', size: 1 },
      { label: 'V/mil', size: 1 / INCH_MM },
    ],
  },
];
