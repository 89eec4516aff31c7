import { byRatio, capacitance, inductance, is, length } from './circuit-lookup-forms';
import { AROUND_FIELDS, CHANNEL_FIELDS, GAP_LAW_FIELDS } from './circuit-lookup-law-fields';
import { choice, linear, log, number } from './field-forms';
import type { Field } from './lookup';

const PARTS: readonly Field[] = [
  choice('topology', 'Circuit', {
    options: [
      ['charge-transfer', 'charge transfer'],
      ['lc-inversion', 'LC inversion'],
    ],
    help: 'Charge transfer switches a dump capacitor onto a peaking capacitor. An LC inversion shorts one of two charged capacitors, and the channel sees both in series.',
  }),
  number('charge_kV', 'Charged to', {
    unit: 'kV',
    min: 0.1,
    max: 200,
    step: 0.5,
    decimals: 1,
    slide: linear(1, 40),
    help: 'Voltage at which the gap closes; it starts at the self-break voltage by the law.',
  }),
  capacitance('first_nF', 'First capacitor', {
    help: 'The dump capacitor of a charge transfer, or C1 of an LC inversion, on the gap\u2019s side.',
  }),
  choice('second_by', 'Second capacitor by', {
    options: [
      ['value', 'its value'],
      ['ratio', 'the ratio'],
    ],
    help: 'By its own value, or by how many times the first capacitor is larger: the ratio can then be swept.',
  }),
  capacitance('second_nF', 'Second capacitor', {
    help: 'The peaking capacitor of a charge transfer, across the channel, or C2 of an LC inversion.',
    shownFor: (values) => !byRatio(values),
  }),
  number('ratio', 'First over second', {
    unit: '',
    min: 0.05,
    max: 100,
    step: 0.1,
    decimals: 2,
    slide: log(0.5, 10),
    help: 'Dump over peaking capacitor. 3 to 4 is common practice: more voltage, and less of the energy gets across.',
    shownFor: byRatio,
  }),
];

const LOOP: readonly Field[] = [
  choice('gap_by', 'Gap loop', {
    options: [
      ['known', 'inductance known'],
      ['loop', 'loop of wire'],
      ['straps', 'two straps in air'],
      ['strip', 'strip over a plane'],
    ],
    help: 'Inductance of the gap with its straps: known, or from the dimensions of what carries the current. Real straps are 30 % off.',
  }),
  inductance('gap_nH', 'Gap inductance', {
    slide: log(2, 200),
    help: 'The whole loop of the gap but the sheet itself. 10 to 15 nH for every centimetre of spark and lead.',
    shownFor: is('gap_by', 'known'),
  }),
  length('loop_long_mm', 'Loop, long side', {
    slide: log(5, 300),
    help: 'Between the centres of the conductors.',
    shownFor: is('gap_by', 'loop'),
  }),
  length('loop_short_mm', 'Loop, short side', {
    slide: log(5, 300),
    help: 'Between the centres of the conductors.',
    shownFor: is('gap_by', 'loop'),
  }),
  length('wire_radius_mm', 'Wire radius', {
    slide: log(0.2, 20),
    help: 'Of the round conductor; at most a quarter of the short side.',
    shownFor: is('gap_by', 'loop'),
  }),
  length('strap_length_mm', 'Strap length', {
    slide: log(5, 500),
    help: 'Along the current, one way.',
    shownFor: is('gap_by', 'straps', 'strip'),
  }),
  length('strap_width_mm', 'Strap width', {
    slide: log(5, 500),
    help: 'Across the current.',
    shownFor: is('gap_by', 'straps', 'strip'),
  }),
  length('strap_spacing_mm', 'Spacing', {
    slide: log(0.1, 100),
    help: 'Between the two straps, or from the strip down to its plane.',
    shownFor: is('gap_by', 'straps', 'strip'),
  }),
  length('return_mm', 'Spark return radius', {
    slide: log(2, 200),
    optional: true,
    help: 'How far from the spark its current returns. It adds the spark itself to the loop; leave it out where the dimensions hold it already.',
    shownFor: is('gap_by', 'loop', 'straps', 'strip'),
  }),
  choice('channel_by', 'Channel loop', {
    options: [
      ['known', 'inductance known'],
      ['loop', 'from its section'],
    ],
    help: 'Inductance of the channel with its return.',
  }),
  inductance('channel_nH', 'Channel inductance', {
    slide: log(0.5, 50),
    help: 'Of the laser channel with its return to the second capacitor.',
    shownFor: is('channel_by', 'known'),
  }),
  number('section_mm2', 'Section of its loop', {
    unit: 'mm\u00b2',
    min: 0.01,
    max: 1e6,
    step: 10,
    decimals: 0,
    slide: log(10, 2000),
    help: 'Area that the channel\u2019s current goes around, looking along the channel.',
    shownFor: is('channel_by', 'loop'),
  }),
  length('channel_length_mm', 'Channel length', {
    slide: log(10, 1000),
    help: 'Active length of the electrodes.',
    shownFor: is('channel_by', 'loop'),
  }),
];

const SHEET: readonly Field[] = [
  choice('feed', 'Switched capacitor', {
    options: [
      ['parts', 'bank of parts'],
      ['sheet', 'a sheet'],
    ],
    help: 'A sheet carries waves. Where it has more inductance than its gap no circuit of lumped parts gives the wave shape.',
  }),
  length('feed_along_mm', 'Sheet along the current', {
    slide: log(20, 1000),
    help: 'Way of the current over the sheet; its longer side unless the gap\u2019s foot says otherwise.',
    shownFor: is('feed', 'sheet'),
  }),
  length('feed_across_mm', 'Sheet across', {
    slide: log(20, 1000),
    help: 'Across the current.',
    shownFor: is('feed', 'sheet'),
  }),
  number('feed_thickness_mm', 'Between foils', {
    unit: 'mm',
    min: 0.001,
    max: 100,
    step: 0.05,
    decimals: 3,
    slide: log(0.05, 5),
    help: 'All plies between two foils together.',
    shownFor: is('feed', 'sheet'),
  }),
  number('feed_eps_r', 'Permittivity', {
    unit: '',
    min: 1,
    max: 20_000,
    step: 0.1,
    decimals: 2,
    slide: log(1, 10),
    help: 'Of the dielectric; it slows the wave.',
    shownFor: is('feed', 'sheet'),
  }),
  number('feed_pairs', 'Active plate pairs', {
    unit: '',
    min: 1,
    max: 1000,
    step: 1,
    decimals: 0,
    slide: linear(1, 20),
    whole: true,
    help: 'Pairs of facing foils side by side share the current.',
    shownFor: is('feed', 'sheet'),
  }),
  number('wanted_rise_ns', 'Wanted rise', {
    unit: 'ns',
    min: 0.01,
    max: 1e5,
    step: 0.5,
    decimals: 1,
    slide: log(0.5, 50),
    optional: true,
    help: 'A rise under twice the transit of the sheet is one of waves and is not answered.',
    shownFor: is('feed', 'sheet'),
  }),
];

export const CIRCUIT_FIELDS: readonly Field[] = [
  ...PARTS,
  ...LOOP,
  ...SHEET,
  ...GAP_LAW_FIELDS,
  ...CHANNEL_FIELDS,
  ...AROUND_FIELDS,
];
