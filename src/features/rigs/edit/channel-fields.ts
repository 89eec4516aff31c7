import type { EditField } from './edit-field';

import { choice, known, number, pressure, text, voltage } from './field-kinds';
import { GAS_OPTIONS } from './gap-fields';
import { FORM_KEYS, rowsOf, type TextOf } from './spec-texts';

export function channelFields(): readonly EditField[] {
  return [
    choice('channel.gas', { help: 'What flows through the channel.', options: GAS_OPTIONS }),
    text('channel.profile', {
      empty: 'absent',
      help: 'Shape of the faces, as turned or bent: half round, sharp edge over a plane.',
    }),
    number('channel.length_mm', { step: 5, help: 'Active length, end to end of the facing electrodes.' }),
    number('channel.spacing_a_mm', { step: 0.1, help: 'Distance of the electrodes at the A end.' }),
    number('channel.spacing_b_mm', { step: 0.1, help: 'Distance of the electrodes at the B end.' }),
    number('channel.across_kohm', {
      step: 1,
      empty: 'null',
      help: 'Resistor across the channel. It brings it to zero before each shot. Empty: none, or not known.',
    }),
    number('channel.edge_mm', { step: 0.5, empty: 'absent', help: 'Radius of the electrodes’ edge.' }),
    number('channel.width_mm', {
      step: 0.5,
      empty: 'absent',
      help: 'Width of the discharge, across the beam and the gap.',
    }),
    number('channel.flow_L_min', {
      step: 0.5,
      min: 0,
      minExcluded: false,
      empty: 'absent',
      help: 'Usual flow through the channel.',
    }),
  ];
}

const LARGE_MM = 10_000;

export function screwFields(textOf: TextOf): readonly EditField[] {
  const screws = rowsOf(textOf('channel.screws')).flatMap((row, i): readonly EditField[] => {
    const at = `channel.screws.${row}`;
    const as = (field: string): string => `channel.screws.${i}.${field}`;
    return [
      text(`${at}.name`, { label: `Screw ${i + 1}, name`, help: 'As it is marked on the rig.' }),
      choice(`${at}.closes`, {
        label: `Screw ${i + 1} closes the gap`,
        help: 'Which way of turning makes the gap smaller, seen from the head.',
        options: [
          ['clockwise', 'clockwise'],
          ['anticlockwise', 'anticlockwise'],
        ],
      }),
      number(`${at}.position_mm`, {
        as: as('position_mm'),
        step: 5,
        min: -LARGE_MM,
        max: LARGE_MM,
        help: 'Where it pushes, counted from the A end of the active length.',
      }),
      number(`${at}.pitch_mm`, {
        as: as('pitch_mm'),
        step: 0.05,
        help: 'Travel of one turn: 0.5 mm for M3, 0.7 mm for M4.',
      }),
      number(`${at}.lever`, {
        as: as('lever'),
        step: 0.1,
        help: 'Millimetres at the electrode for one of the screw; 1 where it pushes the bar itself.',
      }),
    ];
  });
  const feeler = (key: string, help: string): EditField =>
    number(key, { step: 5, min: -LARGE_MM, max: LARGE_MM, empty: 'absent', help });
  return [
    ...screws,
    feeler('channel.feeler_a_mm', 'Where the feeler goes in near the A end, counted from it. Empty: at it.'),
    feeler('channel.feeler_b_mm', 'Where the feeler goes in near the B end, counted from the A end.'),
    number('channel.feeler_error_mm', {
      step: 0.01,
      min: 0,
      minExcluded: false,
      empty: 'absent',
      help: 'How far a feeler reading may be off.',
    }),
  ];
}

export function beamFields(): readonly EditField[] {
  const optional = (key: string, step: number, help: string): EditField =>
    number(key, { step, empty: 'absent', help });
  return [
    text('beam.stop', { empty: 'absent', help: 'What the beam ends in. The eyewear hangs on the rest.' }),
    number('beam.pulse_energy_uJ', { step: 10, help: 'By a meter, or the most that is expected.' }),
    number('beam.wavelength_nm', { step: 0.1, help: '337.1 nm for nitrogen.' }),
    optional('beam.pulse_ns', 1, 'Length of the light pulse at half its height.'),
    optional('beam.width_mm', 0.5, 'Of the beam as it leaves the rig.'),
    optional('beam.height_mm', 0.5, 'Of the beam as it leaves the rig.'),
    optional('beam.divergence_width_mrad', 0.5, 'Whole angle along the width.'),
    optional('beam.divergence_height_mrad', 0.5, 'Whole angle along the height.'),
  ];
}

const USUAL = [
  ['usual', 'assumed by the model'],
  ['given', 'own figures'],
] as const;

export function modelFields(textOf: TextOf): readonly EditField[] {
  return [
    known('model.known', 'the inductances were'),
    number('model.gap_nH', { step: 1, help: 'Loop of the gap with its straps.' }),
    number('model.channel_nH', { step: 1, help: 'Loop of the channel with its straps.' }),
    choice(FORM_KEYS.gapLaw, {
      as: 'form',
      help: 'How the gap’s resistance falls. Without own figures the usual ones are taken and said to be assumed.',
      options: USUAL,
    }),
    ...(textOf(FORM_KEYS.gapLaw) === 'given' ? gapLawFields(textOf) : []),
    choice(FORM_KEYS.channelLaw, {
      as: 'form',
      help: 'What the channel does once it breaks down.',
      options: USUAL,
    }),
    ...(textOf(FORM_KEYS.channelLaw) === 'given' ? channelLawFields() : []),
  ];
}

function gapLawFields(textOf: TextOf): readonly EditField[] {
  const at = (key: string): string => `model.gap_law.${key}`;
  const law = textOf(at('law'));
  return [
    choice(at('law'), {
      label: 'Law of the gap',
      help: 'A fixed fall time, or the integral of the current squared.',
      options: [
        ['exponential', 'falls exponentially'],
        ['rompe-weizel', 'Rompe and Weizel'],
      ],
    }),
    number(at('start_ohm'), { step: 10, help: 'Resistance that it starts with.' }),
    number(at('end_ohm'), { step: 0.1, help: 'What is left of it in the end.' }),
    ...(law === 'exponential' ? [number(at('fall_ns'), { step: 0.1, help: 'Its fall to 1/e.' })] : []),
    ...(law === 'rompe-weizel'
      ? [
          number(at('constant_cm2_atm_V2s'), {
            step: 0.1,
            help: 'Constant of the law, near 1 in nitrogen and air.',
          }),
        ]
      : []),
    known(at('known'), 'this law was'),
  ];
}

function channelLawFields(): readonly EditField[] {
  const at = (key: string): string => `model.channel_law.${key}`;
  return [
    number(at('over_static'), {
      step: 0.05,
      help: 'Fast breakdown over the static one: 1.3 for a third more.',
    }),
    number(at('start_ohm'), { step: 10, help: 'Resistance that it starts with.' }),
    number(at('end_ohm'), { step: 0.05, help: 'What is left of it in the end.' }),
    number(at('fall_ns'), { step: 0.1, help: 'Its fall to 1/e.' }),
    known(at('known'), 'this law was'),
  ];
}

export function envelopeFields(): readonly EditField[] {
  return [
    voltage('envelope.max_kV', { step: 0.5, help: 'No firing beyond it. At most the supply’s limit.' }),
    pressure('envelope.max_bar_g', 'No firing beyond it. At most what vessel and relief allow.'),
    number('envelope.max_rate_Hz', { step: 0.5, max: 1000, help: 'No firing beyond it.' }),
  ];
}
