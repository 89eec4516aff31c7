import { DYES, SOLVENT_CAUTIONS } from '../dye/dyes';
import { textAt } from './fields';
import { choice, linear, log, number } from './field-forms';
import type { Field } from './lookup';

/** The dye is not in the table: its formula is asked. */
export const OTHER = 'other';

export const DYE_FIELDS: readonly Field[] = [
  choice('dye', 'Dye', {
    options: [...DYES.map(({ name }) => [name, name] as const), [OTHER, 'another, by formula']],
    help: 'As the label names it. Salts and hydrates weigh differently: where the label states a molar mass it goes before this one.',
  }),
  {
    kind: 'text',
    key: 'formula',
    label: 'Formula',
    help: 'With counter-ion and water, as C28H31ClN2O3 or C8H10N4O2.H2O. Brackets are read, charges are left out.',
    shownFor: (values) => textAt(values, 'dye') === OTHER,
  },
  number('concentration_mM', 'Concentration', {
    unit: 'mmol/L',
    min: 1e-6,
    max: 1000,
    step: 0.5,
    decimals: 2,
    slide: log(0.05, 50),
    help: 'Of the solution in the cell. Pumped from the side by nitrogen 2 to 10 mmol/L are usual.',
  }),
  number('volume_mL', 'Volume', {
    unit: 'mL',
    min: 0.001,
    max: 100_000,
    step: 10,
    decimals: 0,
    slide: log(1, 2000),
    help: 'Of the solution that is made up. Fill up to it in the flask; it is not what is added.',
  }),
  number('purity_percent', 'Purity', {
    unit: '%',
    min: 1,
    max: 100,
    step: 1,
    decimals: 0,
    slide: linear(50, 100),
    help: 'Dye in what is weighed, from the label. More is weighed where there is less dye in it.',
  }),
  choice('solvent', 'Solvent', {
    options: [
      ...SOLVENT_CAUTIONS.map(({ solvent }) => [solvent, solvent] as const),
      ['water', 'water'],
      [OTHER, 'another'],
    ],
    help: 'What it is dissolved in. It says what to mind beside a spark gap.',
  }),
  number('stock_mM', 'Stock', {
    unit: 'mmol/L',
    min: 1e-6,
    max: 10_000,
    step: 1,
    decimals: 2,
    slide: log(0.1, 100),
    optional: true,
    help: 'Concentration of a stock solution, where one is thinned instead of weighing anew.',
  }),
  number('absorption', 'Absorption', {
    unit: 'L/(mol cm)',
    min: 1,
    max: 1e6,
    step: 1000,
    decimals: 0,
    slide: log(100, 100_000),
    optional: true,
    help: 'Decadic coefficient at the pump\u2019s own wavelength, measured in a thin cell. The one at the maximum in tables is another number.',
  }),
  number('cell_mm', 'Cell depth', {
    unit: 'mm',
    min: 0.01,
    max: 1000,
    step: 1,
    decimals: 1,
    slide: log(0.1, 50),
    help: 'Way of the pump light through the solution, from window to wall.',
  }),
  number('pump_uJ', 'Pump energy', {
    unit: '\u00b5J',
    min: 0.001,
    max: 1e7,
    step: 10,
    decimals: 0,
    slide: log(0.1, 10_000),
    help: 'Of a pulse that reaches the cell, to plan hazards with: the same as in the beam lookup.',
  }),
  number('pump_nm', 'Pump wavelength', {
    unit: 'nm',
    min: 100,
    max: 700,
    step: 0.1,
    decimals: 1,
    slide: linear(300, 550),
    help: '337.1 nm for a nitrogen laser.',
  }),
  number('pulse_ns', 'Pulse length', {
    unit: 'ns',
    min: 1e-4,
    max: 1e10,
    step: 0.1,
    decimals: 1,
    slide: log(0.1, 20),
    help: 'Of the dye light, hardly longer than the pump\u2019s. The visible limit is the same from 10 ps to 5 \u00b5s.',
  }),
  number('dye_nm', 'Dye wavelength', {
    unit: 'nm',
    min: 100,
    max: 100_000,
    step: 1,
    decimals: 0,
    slide: linear(400, 700),
    help: 'Where the dye lases in this solvent: coumarin 1 from about 437 to 485 nm. Read it off a spectrometer.',
  }),
];
