import type { BodyOf } from '../book/kinds';
import { refused, type Result } from '../units/result';
import type { Figure, Known, Lookup, LookupAnswer, Values } from './lookup';

export type KeptBody = BodyOf<'lookup.kept'>;

/** A figure as it was kept: enough to be shown years later without the lookup that gave it. */
export type KeptFigure = Pick<
  Figure,
  'key' | 'label' | 'value' | 'unit' | 'low' | 'high' | 'rounding' | 'digits' | 'decimals' | 'weight'
>;

/** What was solved for when it was kept. */
export interface KeptFind {
  readonly field: string;
  readonly figure: string;
  readonly purpose: string | null;
  readonly target: number | null;
}

export interface KeptParts {
  readonly lookup: Pick<Lookup, 'key'>;
  readonly values: Values;
  /** By field: where each value came from. */
  readonly known: Readonly<Record<string, Known>>;
  readonly answer: LookupAnswer;
  readonly find?: KeptFind | null;
  /** Entry of the rig's revision that the values started from; null without a rig. */
  readonly rig_revision: string | null;
  /** Pins it to the Bench, or takes the pin of the same lookup and rig away; keeping alone changes no pin. */
  readonly pin?: 'pin' | 'unpin';
}

/** The body of a `lookup.kept` entry: inputs with where they came from, answers, model and validity. */
export function keptBody(parts: KeptParts): KeptBody {
  const { lookup, values, known, answer, find = null, rig_revision, pin } = parts;
  return {
    lookup: lookup.key,
    inputs: {
      values: { ...values },
      known: { ...known },
      find: find === null ? null : { ...find },
      rig_revision,
      ...(pin === 'unpin' ? { unpins: true } : {}),
    },
    answers: {
      figures: answer.figures.map(keptFigure),
      says: answer.says ?? null,
      model: answer.model,
      valid: answer.valid,
      warnings: answer.warnings.map((warning) => warning.words),
      cautions: [...answer.cautions],
    },
    pinned: pin === 'pin',
  };
}

function keptFigure(figure: Figure) {
  const { key, label, value, unit, low, high, rounding, digits, decimals, weight } = figure;
  return {
    key,
    label,
    value,
    unit,
    rounding,
    digits,
    weight,
    ...(low === undefined ? {} : { low }),
    ...(high === undefined ? {} : { high }),
    ...(decimals === undefined ? {} : { decimals }),
  };
}

/** A kept lookup as it is read again. */
export interface Kept {
  readonly lookup: string;
  readonly values: Values;
  readonly known: Readonly<Record<string, string>>;
  readonly find: KeptFind | null;
  readonly figures: readonly KeptFigure[];
  readonly model: string;
  readonly valid: string;
  readonly rig_revision: string | null;
  readonly pinned: boolean;
}

/** Reads a kept body. Null for one that another version of the app wrote in a shape that cannot be read here. */
export function readKept(body: KeptBody): Kept | null {
  const inputs = record(body.inputs);
  const answers = record(body.answers);
  const values = record(inputs?.['values']);
  if (inputs === null || answers === null || values === null) return null;
  const figures = Array.isArray(answers['figures']) ? answers['figures'].flatMap(readFigure) : [];
  return {
    lookup: body.lookup,
    values: Object.fromEntries(Object.entries(values).filter(isValue)),
    known: Object.fromEntries(
      Object.entries(record(inputs['known']) ?? {}).filter(
        (each): each is [string, string] => typeof each[1] === 'string',
      ),
    ),
    find: readFind(inputs['find']),
    figures,
    model: words(answers['model']),
    valid: words(answers['valid']),
    rig_revision: typeof inputs['rig_revision'] === 'string' ? inputs['rig_revision'] : null,
    pinned: body.pinned,
  };
}

function readFigure(raw: unknown): KeptFigure[] {
  const figure = record(raw);
  if (figure === null) return [];
  const { key, label, value, unit, low, high, rounding, digits, decimals, weight } = figure;
  if (typeof key !== 'string' || !isNumber(value)) return [];
  return [
    {
      key,
      label: words(label),
      value,
      unit: words(unit),
      rounding: rounding === 'up' || rounding === 'down' ? rounding : 'nearest',
      digits: isNumber(digits) && digits >= 1 && digits <= 12 ? Math.floor(digits) : 3,
      weight: weight === 'answer' || weight === 'main' ? weight : 'side',
      ...(isNumber(low) ? { low } : {}),
      ...(isNumber(high) ? { high } : {}),
      ...(isNumber(decimals) && decimals >= 0 && decimals <= 12 ? { decimals: Math.floor(decimals) } : {}),
    },
  ];
}

function readFind(raw: unknown): KeptFind | null {
  const find = record(raw);
  if (find === null) return null;
  const { field, figure, purpose, target } = find;
  if (typeof field !== 'string' || typeof figure !== 'string') return null;
  return {
    field,
    figure,
    purpose: typeof purpose === 'string' ? purpose : null,
    target: isNumber(target) ? target : null,
  };
}

/**
 * The answer of today's app to the inputs that were kept. `lookup` is the one that the body names; the caller looks it up, so
 * that a screen which only shows pins does not load them all. Refused in words where the body cannot be read.
 */
export function recompute(body: KeptBody, lookup: Lookup): Result<LookupAnswer> {
  const kept = readKept(body);
  if (kept === null || kept.lookup !== lookup.key) {
    return refused({
      type: 'unreadable',
      words: 'This kept lookup was written by another version of the app.',
    });
  }
  return lookup.answer(kept.values);
}

function record(raw: unknown): Readonly<Record<string, unknown>> | null {
  return typeof raw === 'object' && raw !== null && !Array.isArray(raw)
    ? (raw as Readonly<Record<string, unknown>>)
    : null;
}

function isValue(each: [string, unknown]): each is [string, number | string | null] {
  return each[1] === null || typeof each[1] === 'string' || isNumber(each[1]);
}

function isNumber(raw: unknown): raw is number {
  return typeof raw === 'number' && Number.isFinite(raw);
}

function words(raw: unknown): string {
  return typeof raw === 'string' ? raw : '';
}
