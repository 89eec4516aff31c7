import type { ChoiceField, NumberField } from './lookup';

type NumberParts = Omit<NumberField, 'kind' | 'key' | 'label'>;

/** A number field, written short. */
export function number(key: string, label: string, parts: NumberParts): NumberField {
  return { kind: 'number', key, label, ...parts };
}

/** A choice field from pairs of value and label. */
export function choice(
  key: string,
  label: string,
  {
    options,
    ...parts
  }: { readonly options: readonly (readonly [value: string, label: string])[] } & Pick<
    ChoiceField,
    'help' | 'shownFor'
  >,
): ChoiceField {
  return {
    kind: 'choice',
    key,
    label,
    options: options.map(([value, text]) => ({ value, label: text })),
    ...parts,
  };
}

/** What a slider offers, by equal steps. */
export function linear(from: number, to: number): NumberField['slide'] {
  return { from, to, scale: 'linear' };
}

/** What a slider offers, by equal ratios. */
export function log(from: number, to: number): NumberField['slide'] {
  return { from, to, scale: 'log' };
}
