import { AMBIENT_FIELD } from './ambient-field';
import { choice, linear, log, number } from './field-forms';
import type { Field } from './lookup';

const GAP = { unit: 'mm', min: 0.01, max: 500, step: 0.01, decimals: 2, slide: log(0.2, 20) } as const;
const PLACE = {
  unit: 'mm',
  min: -10_000,
  max: 10_000,
  step: 1,
  decimals: 0,
  slide: linear(-50, 500),
} as const;

export const ALIGNMENT_FIELDS: readonly Field[] = [
  number('gap_a_mm', 'Gap at A', {
    ...GAP,
    help: 'The thickest feeler that just passes near the A end, shorted and cold. Both gaps and their places give the line of the bars.',
  }),
  number('gap_b_mm', 'Gap at B', {
    ...GAP,
    help: 'The same near the B end, with the same drag on the feeler.',
  }),
  number('target_mm', 'Target gap', {
    ...GAP,
    help: 'The gap that both ends are to have. The rig\u2019s mean spacing, unless the gap itself is to change.',
  }),
  number('feeler_mm', 'Feeler error', {
    unit: 'mm',
    min: 0,
    max: 1,
    step: 0.005,
    decimals: 3,
    slide: linear(0, 0.1),
    help: 'How far off a reading of the feeler may be. 0.01 to 0.02 mm is common practice; it decides what the answer can tell.',
  }),
  number('allowed_percent', 'Allowed spread', {
    unit: '%',
    min: 0.01,
    max: 50,
    step: 0.5,
    decimals: 1,
    slide: linear(0.5, 10),
    help: 'How differently the two ends may break. One to two per cent is even to the eye on most channels.',
  }),
  number('channel_bar_g', 'Channel pressure', {
    unit: 'bar(g)',
    min: -1.1,
    max: 5,
    step: 0.05,
    decimals: 2,
    slide: linear(-0.5, 1),
    help: 'Pressure of the gas in the channel above the air outside: 0 for a channel open to the room.',
  }),
  AMBIENT_FIELD,
  number('length_mm', 'Active length', {
    unit: 'mm',
    min: 1,
    max: 10_000,
    step: 5,
    decimals: 0,
    slide: linear(20, 500),
    help: 'Of the discharge, from the A end to the B end. The spread is that between its two ends.',
  }),
  number('place_a_mm', 'Feeler place A', {
    ...PLACE,
    help: 'Where the feeler goes in near A, counted from the A end of the active length.',
  }),
  number('place_b_mm', 'Feeler place B', {
    ...PLACE,
    help: 'Where it goes in near B, counted from the A end too. The two places must differ.',
  }),
  ...screwFields('1', 'first'),
  ...screwFields('2', 'second'),
];

function screwFields(number_: string, which: string): readonly Field[] {
  return [
    number(`screw${number_}_place_mm`, `Screw ${number_} place`, {
      ...PLACE,
      help: `Where the ${which} screw acts on the bar, counted from the A end of the active length.`,
    }),
    number(`screw${number_}_pitch_mm`, `Screw ${number_} pitch`, {
      unit: 'mm',
      min: 0.05,
      max: 20,
      step: 0.05,
      decimals: 2,
      slide: log(0.2, 2),
      help: 'Travel of the screw in one whole turn: 0.5 mm for a common M3, 0.7 for M4, 0.8 for M5.',
    }),
    number(`screw${number_}_lever`, `Screw ${number_} lever`, {
      unit: '',
      min: 0.01,
      max: 100,
      step: 0.1,
      decimals: 2,
      slide: log(0.1, 10),
      help: 'Travel of the bar for one of the screw: 1 where the screw pushes the bar itself.',
    }),
    choice(`screw${number_}_closes`, `Screw ${number_} closes`, {
      options: [
        ['clockwise', 'clockwise'],
        ['anticlockwise', 'anticlockwise'],
      ],
      help: 'Which way of turning, seen from its head, makes the gap smaller. Try it shorted before you trust it.',
    }),
  ];
}
