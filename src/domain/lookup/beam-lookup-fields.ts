import { choice, linear, log, number } from './field-forms';
import { textAt } from './fields';
import type { Field } from './lookup';

const SIZE = { unit: 'mm', min: 0.01, max: 1000, step: 0.1, decimals: 2, slide: log(0.2, 20) } as const;
const ANGLE = { unit: 'mrad', min: 0.001, max: 1000, step: 0.5, decimals: 1, slide: log(0.2, 50) } as const;

export const BEAM_FIELDS: readonly Field[] = [
  number('pulse_energy_uJ', 'Pulse energy', {
    unit: '\u00b5J',
    min: 1e-3,
    max: 1e7,
    step: 10,
    decimals: 0,
    slide: log(0.1, 10_000),
    help: 'From one end, to plan hazards with: the larger of what a meter read and a thousandth of what the rig stores.',
  }),
  number('wavelength_nm', 'Wavelength', {
    unit: 'nm',
    min: 100,
    max: 100_000,
    step: 0.1,
    decimals: 1,
    slide: linear(315, 700),
    help: 'Of the line itself: 337.1 nm for nitrogen. Limits are kept here from 315 to 700 nm; elsewhere it is refused.',
  }),
  number('pulse_ns', 'Pulse length', {
    unit: 'ns',
    min: 1e-4,
    max: 1e10,
    step: 0.1,
    decimals: 1,
    slide: log(0.1, 20),
    help: 'At half height. Under 1 ns the limit falls with it: where nobody measured it 0.6 ns is taken.',
  }),
  number('rate_Hz', 'Rate', {
    unit: 'Hz',
    min: 0.001,
    max: 100_000,
    step: 1,
    decimals: 1,
    slide: log(0.1, 100),
    help: 'Pulses a second, the highest that the rig may run at.',
  }),
  number('exposure_s', 'Time in the beam', {
    unit: 's',
    units: [
      {
        key: 'min',
        label: 'min',
        decimals: 1,
        toOwn: (minutes) => minutes * 60,
        fromOwn: (seconds) => seconds / 60,
      },
      {
        key: 'h',
        label: 'h',
        decimals: 2,
        toOwn: (hours) => hours * 3600,
        fromOwn: (seconds) => seconds / 3600,
      },
    ],
    min: 0.01,
    max: 100_000,
    step: 10,
    decimals: 0,
    slide: log(0.1, 30_000),
    help: 'How long eye or skin may be in it in a day, all times together. Ultraviolet is counted over a day of 30,000 s unless it is known.',
  }),
  number('width_mm', 'Beam width', {
    ...SIZE,
    help: 'At the aperture: as wide as the discharge, about a millimetre. A narrower beam is the more dangerous one.',
  }),
  number('height_mm', 'Beam height', {
    ...SIZE,
    help: 'At the aperture: the spacing of the electrodes, unless a burn mark says otherwise.',
  }),
  number('divergence_width_mrad', 'Divergence, width', {
    ...ANGLE,
    help: 'Whole angle along the width. Measure the spot at two distances; width over channel length is a first guess, half of it with a mirror.',
  }),
  number('divergence_height_mrad', 'Divergence, height', {
    ...ANGLE,
    help: 'Whole angle along the height, from two spots as well.',
  }),
  choice('second', 'Dye laser', {
    options: [
      ['none', 'none pumped'],
      ['dye', 'pumped by it'],
    ],
    help: 'Whether the beam pumps a dye: its visible light is then present as well, and UV glasses do not stop it.',
  }),
  number('dye_nm', 'Dye wavelength', {
    unit: 'nm',
    min: 100,
    max: 100_000,
    step: 1,
    decimals: 0,
    slide: linear(400, 700),
    help: 'Where the dye lases: coumarin 1 from about 437 to 485 nm.',
    shownFor: (values) => textAt(values, 'second') === 'dye',
  }),
];
