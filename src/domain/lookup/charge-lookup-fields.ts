import { choice, linear, log, number } from './field-forms';
import { textAt } from './fields';
import { GAP_FIELDS } from './gap-lookup-fields';
import type { Field, Values } from './lookup';

const fromGap = (values: Values) => textAt(values, 'break_by') === 'gap';
const entered = (values: Values) => !fromGap(values);
const isBlown = (values: Values) => textAt(values, 'blown') === 'blown';

/** The gap's own fields, but for a held voltage: here it is charged until it breaks. */
const GAP_KEYS = [
  'gas',
  'gap_mm',
  'pressure',
  'electrodes',
  'radius_mm',
  'gap_error_mm',
  'irradiated',
  'temperature_C',
  'ambient_bar_abs',
];

const OF_THE_GAP = GAP_FIELDS.filter(({ key }) => GAP_KEYS.includes(key)).map((field): Field => ({
  ...field,
  shownFor: (values) => fromGap(values) && (field.shownFor?.(values) ?? true),
}));

function kilovolt(key: string, label: string, help: string): Field {
  return number(key, label, {
    unit: 'kV',
    min: 0.01,
    max: 200,
    step: 0.5,
    decimals: 1,
    slide: linear(1, 40),
    help,
    shownFor: entered,
  });
}

export const CHARGE_FIELDS: readonly Field[] = [
  number('supply_kV', 'Supply', {
    unit: 'kV',
    min: 0.1,
    max: 200,
    step: 0.5,
    decimals: 1,
    slide: linear(1, 40),
    help: 'What the supply is set to, or its limit. Everything behind it may stand at this for as long as the gap stays shut.',
  }),
  number('supply_mA', 'Supply current', {
    unit: 'mA',
    min: 0.001,
    max: 1e5,
    step: 0.1,
    decimals: 2,
    slide: log(0.1, 100),
    help: 'What it gives at most, from its plate.',
  }),
  number('supply_W', 'Supply power', {
    unit: 'W',
    min: 0.001,
    max: 1e6,
    step: 5,
    decimals: 0,
    slide: log(1, 1000),
    optional: true,
    help: 'What it gives for longer than a moment, where its plate says less than kV times mA.',
  }),
  number('ballast_Mohm', 'Ballast', {
    unit: 'M\u2126',
    min: 0.001,
    max: 1e6,
    step: 1,
    decimals: 1,
    slide: log(0.1, 1000),
    help: 'Resistor between supply and capacitor.',
  }),
  number('bleed_Mohm', 'Bleed', {
    unit: 'M\u2126',
    min: 0.001,
    max: 1e6,
    step: 10,
    decimals: 0,
    slide: log(10, 10_000),
    optional: true,
    help: 'All bleeds that load the supply while it charges, together. It divides the voltage with the ballast.',
  }),
  number('capacitance_nF', 'Capacitance', {
    unit: 'nF',
    min: 1e-4,
    max: 1e6,
    step: 0.1,
    decimals: 2,
    slide: log(0.1, 100),
    help: 'All that is charged: the dump capacitor, or both of an LC inversion.',
  }),
  choice('break_by', 'Self-break', {
    options: [
      ['gap', 'from the gap'],
      ['entered', 'as entered'],
    ],
    help: 'Both sides from the gap\u2019s own figures, or as you know them.',
  }),
  kilovolt('low_kV', 'Nothing fires below', 'Low side of the self-break.'),
  kilovolt('break_kV', 'Self-break', 'Where it breaks by the law, or by your own readings.'),
  kilovolt(
    'high_kV',
    'May hold up to',
    'High side of the self-break. The supply has to reach past it for the gap to be sure to fire.',
  ),
  ...OF_THE_GAP,
  choice('blown', 'Gap', {
    options: [
      ['unblown', 'not blown'],
      ['blown', 'blown'],
    ],
    help: 'Whether fresh gas goes through the gap between shots. Unblown it is doubtful above 10 Hz.',
  }),
  number('volume_cm3', 'Gap volume', {
    unit: 'cm\u00b3',
    min: 1e-4,
    max: 1e5,
    step: 0.1,
    decimals: 2,
    slide: log(0.05, 100),
    help: 'Of the gas between and around the electrodes that a shot spoils.',
    shownFor: isBlown,
  }),
  number('flow_L_min', 'Purge flow', {
    unit: 'L/min',
    min: 0.001,
    max: 1e4,
    step: 0.1,
    decimals: 2,
    slide: log(0.05, 20),
    optional: true,
    help: 'Through the gap, at its own pressure. Three gap volumes a shot are wanted.',
    shownFor: isBlown,
  }),
  number('wanted_Hz', 'Rate wanted', {
    unit: 'Hz',
    min: 0.001,
    max: 1000,
    step: 0.5,
    decimals: 1,
    slide: log(0.1, 50),
    optional: true,
    help: 'Shots a second that you are after: it says whether they can be had, and what they take.',
  }),
  number('envelope_Hz', 'Rate allowed', {
    unit: 'Hz',
    min: 0.001,
    max: 1000,
    step: 0.5,
    decimals: 1,
    slide: log(0.1, 50),
    optional: true,
    help: 'Highest rate of the envelope. A limit that was set, whatever the parts could do.',
  }),
];
