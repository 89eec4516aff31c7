import { ok, refused, type Result } from '../units/result';
import { numberAt } from './fields';
import type { Figure, Lookup, LookupAnswer, NumberField, Solvable } from './lookup';

/** A lookup of one curve, for what runs over any lookup. `null` of the curve is a refusal. */
export function toyLookup(
  curve: (x: number) => number | null,
  parts: {
    readonly x?: Partial<NumberField>;
    readonly solvable?: Partial<Solvable>;
    readonly slow?: true;
  } = {},
): Lookup {
  const x: NumberField = {
    kind: 'number',
    key: 'x',
    label: 'Input',
    unit: 'mm',
    min: 0,
    max: 10,
    step: 0.1,
    decimals: 1,
    slide: { from: 0, to: 10, scale: 'linear' },
    help: 'What goes in.',
    ...parts.x,
  };
  return {
    key: 'toy',
    title: 'Toy',
    decides: 'Nothing.',
    fields: [
      x,
      {
        kind: 'choice',
        key: 'gas',
        label: 'Gas',
        options: [{ value: 'N2', label: 'N2' }],
        help: 'Which gas.',
      },
      { kind: 'text', key: 'note', label: 'Note', help: 'Words.' },
    ],
    start: () => ({ values: { x: 1, gas: 'N2', note: '' }, known: { x: 'rig' } }),
    answer: (values): Result<LookupAnswer> => {
      const at = numberAt(values, 'x');
      const y = at === null ? null : curve(at);
      if (y === null) return refused({ type: 'no', field: 'x', words: 'Input: not there.' });
      return ok({ figures: [figure(y)], model: 'A curve', valid: 'everywhere', warnings: [], cautions: [] });
    },
    solvable: [{ field: 'x', figure: 'y', rounding: 'nearest', ...parts.solvable }],
    ...(parts.slow === undefined ? {} : { slow: parts.slow }),
  };
}

function figure(value: number): Figure {
  return {
    key: 'y',
    label: 'output',
    value,
    low: value - 1,
    high: value + 1,
    unit: 'kV',
    rounding: 'down',
    digits: 3,
    weight: 'answer',
  };
}
