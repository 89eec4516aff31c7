import { ELECTRODE_SHAPES, type Electrodes } from '../gap/electrodes';
import { GAS_NAMES } from '../gap/gas-table';
import type { Field, UnitChoice } from './lookup';
import { numberAt, textAt } from './fields';

type Shape = Electrodes['shape'];

/** Every shape that the lookup offers: those that a radius says all about, rods and bars. */
export const SHAPES: readonly Shape[] = [...ELECTRODE_SHAPES, 'capped-rods', 'hex-bars'];

const SHAPE_LABELS: Readonly<Record<Shape, string>> = {
  domed: 'domed',
  sphere: 'spheres',
  cylinder: 'cylinders',
  plane: 'plane',
  'capped-rods': 'round-ended rods',
  'hex-bars': 'hexagonal bars',
};

/** bar(abs) beside bar(g): the same pressure, counted from vacuum; it takes the ambient. */
const ABSOLUTE: UnitChoice = {
  key: 'abs',
  label: 'bar(abs)',
  decimals: 2,
  toOwn: (bar_abs, values) => fromAmbient(values, (ambient) => bar_abs - ambient),
  fromOwn: (bar_g, values) => fromAmbient(values, (ambient) => bar_g + ambient),
};

/** The difference of two decimal figures is taken without its binary dust. */
function fromAmbient(values: Parameters<UnitChoice['toOwn']>[1], move: (ambient: number) => number) {
  const ambient = numberAt(values, 'ambient_bar_abs');
  return ambient === null ? null : Number(move(ambient).toFixed(9));
}

function hexagonal(values: Parameters<UnitChoice['toOwn']>[1]): boolean {
  return textAt(values, 'electrodes') === 'hex-bars';
}

export const GAP_FIELDS: readonly Field[] = [
  {
    kind: 'choice',
    key: 'gas',
    label: 'Gas',
    options: GAS_NAMES.filter((gas) => gas !== 'H2O').map((gas) => ({ value: gas, label: gas })),
    help: 'What fills the gap. Every gas can be asked about; one without a law that we trust is refused in words, and so is any mixture.',
  },
  {
    kind: 'number',
    key: 'gap_mm',
    label: 'Gap',
    unit: 'mm',
    min: 0.01,
    max: 500,
    step: 0.1,
    decimals: 2,
    slide: { from: 0.2, to: 20, scale: 'log' },
    help: 'Shortest distance between the electrodes. Measure it with pin gauges, cold and shorted, and enter how far off that may be below.',
  },
  {
    kind: 'number',
    key: 'pressure',
    label: 'Pressure',
    unit: 'bar(g)',
    units: [ABSOLUTE],
    min: -1.1,
    max: 20,
    step: 0.05,
    decimals: 2,
    slide: { from: 0, to: 3, scale: 'linear' },
    help: 'Pressure of the gas in the gap. A gauge on the vessel reads bar(g), above the air outside; the law takes bar(abs).',
  },
  {
    kind: 'number',
    key: 'temperature_C',
    label: 'Temperature',
    unit: '\u00b0C',
    min: -40,
    max: 150,
    step: 1,
    decimals: 0,
    slide: { from: 0, to: 60, scale: 'linear' },
    help: 'Of the gas in the gap. Only its density counts: ten degrees are three per cent of the voltage.',
  },
  {
    kind: 'number',
    key: 'ambient_bar_abs',
    label: 'Ambient',
    unit: 'bar(abs)',
    min: 0.3,
    max: 1.1,
    step: 0.005,
    decimals: 3,
    slide: { from: 0.6, to: 1.1, scale: 'linear' },
    help: 'Pressure of the air outside, as a barometer at the bench reads it, not reduced to sea level. It has no default.',
  },
  {
    kind: 'number',
    key: 'voltage_kV',
    label: 'Voltage',
    unit: 'kV',
    min: 0,
    minExcluded: true,
    max: 200,
    step: 0.1,
    decimals: 1,
    slide: { from: 1, to: 50, scale: 'linear' },
    optional: true,
    help: 'The voltage that the gap has to hold, or to break at. It gives the margin and the chance of an early break, and Find solves for it.',
  },
  {
    kind: 'choice',
    key: 'condition',
    label: 'Condition',
    options: [
      { value: 'open-clean', label: 'open and clean' },
      { value: 'pressurised-or-worn', label: 'pressurised or worn' },
    ],
    help: 'How much self-break scatters from shot to shot: 0.5 to 3 % open and clean, 2 to 6 % pressurised or worn.',
    shownFor: (values) => numberAt(values, 'voltage_kV') !== null,
  },
  {
    kind: 'choice',
    key: 'irradiated',
    label: 'UV',
    options: [
      { value: 'uv', label: 'UV on the gap' },
      { value: 'no-uv', label: 'no UV' },
    ],
    help: 'Whether ultraviolet light from a corona or a lamp reaches the electrodes. Without it a gap may hold a fifth more.',
  },
  {
    kind: 'choice',
    key: 'electrodes',
    label: 'Electrodes',
    options: SHAPES.map((value) => ({ value, label: SHAPE_LABELS[value] })),
    help: 'Shape of the faces that the gap lies between. Domed faces are taken as spheres of their radius; two rods lie on one axis, two bars side by side.',
  },
  {
    kind: 'number',
    key: 'radius_mm',
    label: 'Radius',
    unit: 'mm',
    min: 0.1,
    max: 1000,
    step: 0.5,
    decimals: 1,
    slide: { from: 2, to: 100, scale: 'log' },
    help: 'Of the face, the sphere, the cylinder or the rod. Measure it with a radius gauge; a gap wider than five radii is refused.',
    shownFor: (values) => !['plane', 'hex-bars'].includes(textAt(values, 'electrodes') ?? ''),
  },
  {
    kind: 'number',
    key: 'rod_length_mm',
    label: 'Straight part',
    unit: 'mm',
    min: 0.05,
    max: 200_000,
    step: 1,
    decimals: 1,
    slide: { from: 5, to: 500, scale: 'log' },
    optional: true,
    help: 'Length of each rod behind its round end. Without it twenty radii are taken, from where on it hardly matters.',
    shownFor: (values) => textAt(values, 'electrodes') === 'capped-rods',
  },
  {
    kind: 'choice',
    key: 'facing',
    label: 'Facing',
    options: [
      { value: 'flats', label: 'flat to flat' },
      { value: 'edges', label: 'edge to edge' },
    ],
    help: 'What of the two bars faces the gap. The low side is always taken edge to edge, since a bar may turn.',
    shownFor: hexagonal,
  },
  {
    kind: 'number',
    key: 'flats_mm',
    label: 'Across flats',
    unit: 'mm',
    min: 0.5,
    max: 500,
    step: 0.5,
    decimals: 1,
    slide: { from: 3, to: 50, scale: 'log' },
    help: 'Width of a bar from flat to flat: the size of the spanner that fits it.',
    shownFor: hexagonal,
  },
  {
    kind: 'number',
    key: 'corner_mm',
    label: 'Corner radius',
    unit: 'mm',
    min: 0.001,
    max: 250,
    step: 0.1,
    decimals: 2,
    slide: { from: 0.05, to: 5, scale: 'log' },
    help: 'Of the broken edges. Look at it from the end of the bar beside a radius gauge; a sharp edge has no answer.',
    shownFor: hexagonal,
  },
  {
    kind: 'number',
    key: 'gap_error_mm',
    label: 'Gap error',
    unit: 'mm',
    min: 0,
    max: 50,
    step: 0.01,
    decimals: 2,
    slide: { from: 0, to: 0.5, scale: 'linear' },
    help: 'How far off the gap may be set. The low side is taken at the narrowest gap that it allows.',
  },
];
