import { gasName } from '../../../domain/book/bodies/fields';
import { MATERIALS } from '../../../domain/capacitor/dielectrics';
import { PART_CLASSES } from '../../../domain/capacitor/parts';
import type { EditField } from './edit-field';
import { choice, day, known, number, pressure, text, voltage } from './field-kinds';
import { FORM_KEYS, type TextOf } from './spec-texts';

export const GAS_OPTIONS = gasName.options.map((gas) => [gas, gas] as const);
/** Names in the table of dielectrics; anything else may be written as words. */
export const DIELECTRIC_NAMES: readonly string[] = MATERIALS;

export function circuitFields(): readonly EditField[] {
  return [
    choice('topology', {
      help: 'LC inversion: the gap shorts C1, and the channel sees twice the voltage. Charge transfer: the gap pours the dump capacitor into the peaking one.',
      options: [
        ['lc-inversion', 'LC inversion'],
        ['charge-transfer', 'charge transfer'],
      ],
    }),
  ];
}

const RADIUS_HELP: Readonly<Record<string, string>> = {
  domed: 'Radius of the dome, as turned or by a radius gauge.',
  cylinder: 'Half the diameter of the rods that lie across each other’s face.',
  'capped-rods': 'Half the diameter of the rod, which is the radius of its cap.',
};

export function gapFields(textOf: TextOf): readonly EditField[] {
  const shape = textOf('gap.electrodes');
  const radiusHelp = RADIUS_HELP[shape];
  const fields: EditField[] = [
    choice('gap.gas', { help: 'What fills the gap when it fires.', options: GAS_OPTIONS }),
    choice('gap.electrodes', {
      help: 'Shape of the faces that look at each other.',
      options: [
        ['domed', 'domed'],
        ['cylinder', 'cylinders'],
        ['plane', 'plane'],
        ['capped-rods', 'capped rods'],
        ['hex-bars', 'hexagonal bars'],
      ],
    }),
    number('gap.gap_mm', {
      step: 0.1,
      max: 500,
      help: 'Closest distance of the faces, by gauge blocks or pin gauges.',
    }),
    number('gap.gap_error_mm', {
      label: 'Setting error',
      step: 0.01,
      min: 0,
      minExcluded: false,
      max: 100,
      help: 'How far the gap may be off. It widens the band of every voltage.',
    }),
  ];
  if (radiusHelp !== undefined)
    fields.push(
      number('gap.radius_mm', { step: 0.5, empty: 'null', help: `${radiusHelp} Empty: not known.` }),
      known('gap.radius_known', 'the radius was'),
    );
  if (shape === 'capped-rods')
    fields.push(
      number('gap.rod_length_mm', {
        step: 1,
        empty: 'absent',
        help: 'Straight part of each rod behind its cap.',
      }),
    );
  if (shape === 'hex-bars')
    fields.push(
      number('gap.flats_mm', { step: 1, empty: 'absent', help: 'Width of the bar over two flats.' }),
      number('gap.corner_mm', { step: 0.1, empty: 'absent', help: 'Radius of the rounded edges.' }),
      choice('gap.facing', {
        empty: 'absent',
        help: 'What of the bars looks at the gap.',
        options: [
          ['flats', 'flats'],
          ['edges', 'edges'],
        ],
      }),
    );
  return [
    ...fields,
    choice('gap.irradiated', {
      as: 'boolean',
      help: 'UV from the gap’s own corona or a lamp takes the delay out of its breaks.',
      options: [
        ['yes', 'reaches it'],
        ['no', 'does not'],
      ],
    }),
    pressure('gap.lowest_bar_g', 'Least pressure that it is worked at. 0 is ambient.'),
    pressure('gap.highest_bar_g', 'Highest pressure that it is worked at. The self-break is given there.'),
  ];
}

export function vesselFields(textOf: TextOf): readonly EditField[] {
  const fitted = choice(FORM_KEYS.vessel, {
    as: 'form',
    help: 'A gap above ambient pressure stands in a vessel with a relief valve.',
    options: [
      ['fitted', 'in a vessel'],
      ['none', 'open gap'],
    ],
  });
  if (textOf(FORM_KEYS.vessel) !== 'fitted') return [fitted];
  return [
    fitted,
    text('gap.vessel.material', { help: 'Body, end plates, guard.' }),
    pressure('gap.vessel.rated_bar_g', 'What its maker or its own computation allows.'),
    pressure('gap.vessel.relief_bar_g', 'Where the relief valve opens. At or under the rating.'),
    pressure('gap.vessel.regulator_max_bar_g', 'The most that the regulator can deliver.'),
    day('gap.vessel.proof_date', 'Day of the last proof test, year month day. Empty: not known.'),
  ];
}

export function capacitorFields(side: 'first' | 'second', textOf: TextOf): readonly EditField[] {
  const topology = textOf('topology') === 'charge-transfer' ? 'charge-transfer' : 'lc-inversion';
  const at = (key: string): string => `${side}.${key}`;
  const kind = choice(at('kind'), {
    label: 'Built as',
    help: 'A sheet of film between foils, or bought parts in parallel.',
    options: [
      ['sheet', 'sheet'],
      ['bank', 'bank of parts'],
    ],
  });
  if (textOf(at('kind')) === 'bank')
    return [
      kind,
      text(at('part'), { label: 'Part', help: 'As it is printed on the parts, and how many.' }),
      choice(at('catalogue'), {
        label: 'Class of part',
        empty: 'absent',
        help: 'Some ceramics lose capacitance under voltage: the class tells how much.',
        options: PART_CLASSES.map((one) => [one, one] as const),
      }),
      number(at('capacitance_nF'), {
        topology,
        label: 'Capacitance',
        step: 0.1,
        help: 'Of the whole bank, by a meter at low voltage.',
      }),
      voltage(at('rated_kV'), {
        topology,
        label: 'Rated for',
        step: 1,
        help: 'Rated voltage of one part, or of the string where parts stand in series.',
      }),
      number(at('parts'), {
        topology,
        label: 'Parts in parallel',
        step: 1,
        min: 1,
        max: 1000,
        whole: true,
        empty: 'absent',
        help: 'How many parts stand in parallel.',
      }),
    ];
  if (textOf(at('kind')) !== 'sheet') return [kind];
  const mm = (key: string, label: string, help: string): EditField =>
    number(at(key), { topology, label, step: 5, help });
  return [
    kind,
    number(at('ply_um'), {
      topology,
      label: 'One ply',
      step: 25,
      help: 'Thickness of one layer of film, by a micrometer.',
    }),
    number(at('plies'), {
      topology,
      label: 'Plies between foils',
      step: 1,
      min: 1,
      max: 100,
      whole: true,
      help: 'Layers of film lying on each other between two foils. They add up to the thickness.',
    }),
    number(at('plate_pairs'), {
      topology,
      label: 'Plate pairs',
      step: 1,
      min: 1,
      max: 1000,
      whole: true,
      help: 'Pairs of facing foils in parallel: k foils make k less 1. They multiply the capacitance.',
    }),
    mm('length_mm', 'Overlap, length', 'Of the area where the foils face each other.'),
    mm('width_mm', 'Overlap, width', 'Of the area where the foils face each other.'),
    number(at('eps_r'), {
      topology,
      label: 'Permittivity',
      step: 0.1,
      min: 1,
      max: 100,
      help: 'Of the film: 3.2 for PET.',
    }),
    number(at('strength_kV_mm'), {
      topology,
      label: 'Strength',
      step: 5,
      help: 'Short-time strength by the film’s data sheet at this thickness.',
    }),
    text(at('dielectric'), { label: 'Dielectric', help: 'Film between the foils. Choose one, or write it.' }),
  ];
}

export function chargingFields(textOf: TextOf): readonly EditField[] {
  const inversion = textOf('topology') !== 'charge-transfer';
  const inductor: readonly EditField[] = inversion
    ? [
        number('charging.inductor_uH', {
          step: 1,
          empty: 'absent',
          help: 'Coil across the channel through which C2 charges. Empty: a resistor does it.',
        }),
        ...(textOf('charging.inductor_uH').trim() === ''
          ? []
          : [
              number('charging.inductor_ohm', {
                step: 0.1,
                empty: 'absent',
                help: 'Resistance of the coil’s wire.',
              }),
            ]),
      ]
    : [];
  return [
    voltage('charging.supply_kV', {
      step: 0.5,
      help: 'The most that the supply can give, not what it is set to.',
    }),
    number('charging.supply_mA', { step: 0.1, max: 10_000, help: 'Its current limit.' }),
    number('charging.ballast_Mohm', {
      step: 1,
      help: 'Between supply and capacitor. It sets the rate, and what is left for the gap.',
    }),
    ...inductor,
  ];
}
