import type { EditField } from './edit-field';

import { choice, number, text } from './field-kinds';
import { rowsOf, type TextOf } from './spec-texts';

export const MOST_NODES = 12;
export const MOST_POINTS = 20;
export const MOST_SCREWS = 2;

/** Every node that stays charged by itself, with what bleeds it. */
export function nodeFields(textOf: TextOf): readonly EditField[] {
  const inversion = textOf('topology') !== 'charge-transfer';
  return rowsOf(textOf('nodes')).flatMap((row, i): readonly EditField[] => {
    const at = `nodes.${row}`;
    const name = textOf(`${at}.name`).trim();
    return [
      text(`${at}.name`, { label: `Node ${i + 1}, name`, help: 'As it is labelled on the rig.' }),
      choice(`${at}.holds`, {
        label: `Node ${i + 1} holds`,
        help: 'The capacitor that keeps it charged.',
        options: [
          ['first', inversion ? 'C1' : 'dump capacitor'],
          ['second', inversion ? 'C2' : 'peaking capacitor'],
        ],
      }),
      number(`${at}.bleed_Mohm`, {
        as: `nodes.${i}.bleed_Mohm`,
        label: `Bleed, ${name === '' ? `node ${i + 1}` : name}`,
        step: 10,
        max: 1_000_000,
        empty: 'null',
        help: 'Resistor that discharges this node alone. Empty: not known, and then there is no wait at all.',
      }),
    ];
  });
}

export function shortingFields(textOf: TextOf): readonly EditField[] {
  return rowsOf(textOf('shorting_points')).map((row, i) =>
    text(`shorting_points.${row}`, {
      label: `Shorting point ${i + 1}`,
      help: 'As it is labelled on the rig.',
    }),
  );
}
