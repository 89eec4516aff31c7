import type { RigSpec } from '../../../domain/book/rig-spec';
import { specFieldWords } from '../../../domain/report/spec-words';
import type { ChoiceEdit, DayEdit, NumberEdit, TextEdit } from './edit-field';

/** Labels that hang on the circuit: C1 or the dump capacitor. */
type Topology = RigSpec['topology'];

interface NumberParts {
  readonly step: number;
  readonly help: string;
  readonly min?: number;
  readonly max?: number;
  readonly minExcluded?: boolean;
  readonly whole?: boolean;
  readonly empty?: NumberEdit['empty'];
  readonly label?: string;
  readonly topology?: Topology;
  /** Path whose words it carries, for a row of a list. */
  readonly as?: string;
}

/** Above nothing at all, up to the schema's own bound, unless something narrower is said. */
export function number(key: string, parts: NumberParts): NumberEdit {
  const { label, unit } = specFieldWords(parts.as ?? key, parts.topology ?? 'lc-inversion');
  const min = parts.min ?? 0;
  return {
    kind: 'number',
    key,
    label: parts.label ?? label,
    unit,
    help: parts.help,
    step: parts.step,
    min,
    max: parts.max ?? 1e9,
    minExcluded: parts.minExcluded ?? parts.min === undefined,
    whole: parts.whole ?? false,
    empty: parts.empty ?? 'refused',
  };
}

/** A gauge pressure, within the bounds of the Book. */
export function pressure(key: string, help: string): NumberEdit {
  return number(key, { step: 0.05, help, min: -1.1, max: 20 });
}

export function voltage(key: string, parts: NumberParts): NumberEdit {
  return number(key, { max: 200, ...parts });
}

interface ChoiceParts {
  readonly help: string;
  readonly options: readonly (readonly [value: string, label: string])[];
  readonly as?: ChoiceEdit['as'];
  readonly empty?: ChoiceEdit['empty'];
  readonly label?: string;
}

export function choice(key: string, parts: ChoiceParts): ChoiceEdit {
  return {
    kind: 'choice',
    key,
    label: parts.label ?? specFieldWords(key, 'lc-inversion').label,
    help: parts.help,
    options: parts.options.map(([value, label]) => ({ value, label })),
    as: parts.as ?? 'text',
    empty: parts.empty ?? 'refused',
  };
}

export function known(key: string, what: string): ChoiceEdit {
  return choice(key, {
    help: `Whether ${what} measured on this rig.`,
    options: [
      ['measured', 'measured'],
      ['assumed', 'assumed'],
    ],
  });
}

interface TextParts {
  readonly help: string;
  readonly empty?: TextEdit['empty'];
  readonly label?: string;
}

export function text(key: string, parts: TextParts): TextEdit {
  return {
    kind: 'text',
    key,
    label: parts.label ?? specFieldWords(key, 'lc-inversion').label,
    help: parts.help,
    empty: parts.empty ?? 'refused',
    maxLength: 120,
  };
}

export function day(key: string, help: string): DayEdit {
  return { kind: 'day', key, label: specFieldWords(key, 'lc-inversion').label, help, empty: 'null' };
}
