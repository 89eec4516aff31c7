import { AMBIENT_FIELD } from './ambient-field';
import { textAt } from './fields';
import { choice, linear, number } from './field-forms';
import type { Field, UnitChoice, Values } from './lookup';

/** An effective voltage, brought to its peak. */
const RMS: UnitChoice = {
  key: 'rms',
  label: 'kV rms',
  decimals: 1,
  toOwn: (rms) => rms * Math.SQRT2,
  fromOwn: (peak) => peak / Math.SQRT2,
};

const airBy = (way: string) => (values: Values) => textAt(values, 'air_by') === way;

export const CLEARANCE_FIELDS: readonly Field[] = [
  number('voltage_kV', 'Peak voltage', {
    unit: 'kV',
    units: [RMS],
    min: 0.001,
    max: 200,
    step: 0.5,
    decimals: 1,
    slide: linear(1, 40),
    help: 'The highest that can ever stand between the two parts: the supply\u2019s limit, twice that between plates that an inversion turns over.',
  }),
  number('distance_mm', 'Distance there is', {
    unit: 'mm',
    min: 0.1,
    max: 100_000,
    step: 1,
    decimals: 0,
    slide: linear(10, 200),
    optional: true,
    help: 'Shortest way through air between the bare parts, where it is known: it is held against what is needed.',
  }),
  choice('air_by', 'Air known by', {
    options: [
      ['barometer', 'barometer'],
      ['altitude', 'altitude'],
    ],
    help: 'A barometer at the bench goes before the altitude; by altitude the air of a deep low is taken.',
  }),
  { ...AMBIENT_FIELD, shownFor: airBy('barometer') },
  number('altitude_m', 'Altitude', {
    unit: 'm',
    min: -500,
    max: 9000,
    step: 50,
    decimals: 0,
    slide: linear(0, 4000),
    help: 'Of the bench above the sea. Thin air breaks sooner: 2,000 m ask for a quarter more distance.',
    shownFor: airBy('altitude'),
  }),
  number('temperature_C', 'Temperature', {
    unit: '\u00b0C',
    min: -40,
    max: 100,
    step: 1,
    decimals: 0,
    slide: linear(0, 60),
    help: 'Of the air between the parts. Warm air is thin.',
  }),
  number('humidity_percent', 'Humidity', {
    unit: '%',
    min: 0,
    max: 100,
    step: 5,
    decimals: 0,
    slide: linear(0, 100),
    optional: true,
    help: 'Relative. Dry air breaks sooner between points; damp air earns no credit, because it wets the surfaces.',
  }),
];
