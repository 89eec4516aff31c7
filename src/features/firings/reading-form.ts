import { CARRIABLE, type ReadingValues } from '../../domain/book/bodies/firing-bodies';
import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import { checkNumber } from '../../domain/units/check-number';
import { parseQuantity } from '../../domain/units/parse-number';
import { ok, refused, type Refusal, type Result } from '../../domain/units/result';
import { isQuantity, QUANTITY_KEYS, QUANTITY_TRAITS, type QuantityKey } from './reading-fields';

export type Carriable = (typeof CARRIABLE)[number];
export type ChoiceKey = 'how' | 'gas' | 'looked' | 'output_eye' | 'channel_gas';
export type WordsKey = 'note' | 'summary' | 'dye_batch';
/** `beam` is the grid on which both coordinates are set at once. */
export type FieldKey = QuantityKey | ChoiceKey | WordsKey | 'beam';

type Quantities = { readonly [K in QuantityKey]: number | null };
/** A reading as it stands on the form: what is not known yet is null, never a made-up figure. */
export interface FormValues extends Quantities {
  readonly how: ReadingValues['how'] | null;
  readonly gas: ReadingValues['gas'];
  readonly looked: ReadingValues['looked'] | null;
  readonly output_eye: number | null;
  readonly channel_gas: NonNullable<ReadingValues['channel_gas']> | null;
  readonly dye_batch: string | null;
}
type ValueKey = keyof FormValues;

/** Where the untouched values come from. */
export interface Base {
  readonly values: FormValues;
  readonly source: Readonly<Record<ValueKey, string>>;
}

/**
 * What a person has changed since the reading before; everything else shows through from the base. The text in the open
 * keypad is part of it, so that a kill at any key loses no key.
 */
export interface ReadingDraft {
  readonly entered: Partial<FormValues>;
  readonly note: string;
  /** Words for the closing of the firing. */
  readonly summary: string;
  readonly field: FieldKey;
  /** Text in the open keypad; null while it is closed, '' while nothing has been typed yet. */
  readonly typing: string | null;
  /** The choice or text of this field is open in the figure's place. */
  readonly open: boolean;
  /** Groups of seldom fields that stand unfolded. */
  readonly groups: readonly string[];
}

export const EMPTY_DRAFT: ReadingDraft = {
  entered: {},
  note: '',
  summary: '',
  field: 'voltage_kV',
  typing: null,
  open: false,
  groups: [],
};

/** Left out of the entry while nobody has said anything about them. */
const MAY_BE_ABSENT = [
  'output_attenuators',
  'output_eye',
  'beam_x_mm',
  'beam_y_mm',
  'trigger_delay_ns',
  'trigger_jitter_ns',
  'trigger_misses',
  'channel_gas',
  'dye_batch',
] as const satisfies readonly ValueKey[];

const NOTHING_SEEN = Object.fromEntries(MAY_BE_ABSENT.map((key) => [key, null])) as {
  readonly [K in (typeof MAY_BE_ABSENT)[number]]: null;
};
const NOT_ENTERED = Object.fromEntries(MAY_BE_ABSENT.map((key) => [key, 'not entered'])) as {
  readonly [K in (typeof MAY_BE_ABSENT)[number]]: string;
};

/**
 * The first reading of a firing stands on the rig and the lab. Voltage, how it was measured, shots and looks nobody knows
 * beforehand: a guess there would pass for something that was seen, and the calibration lives on measured self-breaks.
 */
export function firstBase(spec: RigSpec, revision: string, settings: LabSettings | undefined): Base {
  const none = 'not entered';
  const rig = `rig, rev ${revision}`;
  const lab = settings === undefined ? none : 'lab setting';
  return {
    values: {
      ...NOTHING_SEEN,
      voltage_kV: null,
      pressure_bar_g: spec.gap.lowest_bar_g,
      shots: null,
      output_uJ: null,
      flow_L_min: null,
      rate_Hz: null,
      ambient_bar_abs: settings?.ambient_bar_abs ?? null,
      temperature_C: settings?.ambient_C ?? null,
      humidity_pct: null,
      how: null,
      gas: spec.gap.gas,
      looked: null,
    },
    source: {
      ...NOT_ENTERED,
      voltage_kV: none,
      pressure_bar_g: rig,
      shots: none,
      output_uJ: none,
      flow_L_min: none,
      rate_Hz: none,
      ambient_bar_abs: lab,
      temperature_C: lab,
      humidity_pct: none,
      how: none,
      gas: rig,
      looked: none,
    },
  };
}

/** Every later reading stands on the one before. Misses belong to their own burst: none are assumed of the next. */
export function nextBase(before: ReadingValues): Base {
  const { values, source } = baseOf(before);
  return {
    values: { ...values, trigger_misses: null },
    source: { ...source, trigger_misses: 'not entered' },
  };
}

/** A reading as it was logged. */
export function baseOf(before: ReadingValues): Base {
  const { note: _note, carried_over: _carried, ...logged } = before;
  const seen = Object.fromEntries(MAY_BE_ABSENT.map((key) => [key, logged[key] ?? null])) as Pick<
    FormValues,
    (typeof MAY_BE_ABSENT)[number]
  >;
  const values: FormValues = { ...logged, ...seen };
  const keys = Object.keys(values) as ValueKey[];
  const source = Object.fromEntries(
    keys.map((key) => [key, values[key] === null ? 'not entered' : 'carried over']),
  ) as Record<ValueKey, string>;
  return { values, source };
}

export function formValues(base: Base, draft: ReadingDraft): FormValues {
  return { ...base.values, ...draft.entered };
}

export function isCarried(draft: ReadingDraft, key: ValueKey): boolean {
  return !Object.hasOwn(draft.entered, key);
}

/** How a value is known, in the words beside its label. */
export function sourceWords(base: Base, draft: ReadingDraft, key: ValueKey): string {
  if (isCarried(draft, key)) return base.source[key];
  return draft.entered[key] === null ? 'left out' : 'entered';
}

/** Takes a value as touched, also when it is the one that stood there before: somebody has looked. */
export function enter<K extends ValueKey>(draft: ReadingDraft, key: K, value: FormValues[K]): ReadingDraft {
  return { ...draft, entered: { ...draft.entered, [key]: value }, typing: null, open: false };
}

/** A typed text becomes a value, or is refused in words and stays on the keypad. An optional field may be emptied. */
export function enterText(draft: ReadingDraft, key: QuantityKey, text: string): Result<ReadingDraft> {
  const { optional, whole, rule, label } = QUANTITY_TRAITS[key];
  if (optional && text.trim() === '') return ok(enter(draft, key, null));
  const parsed = parseQuantity(text, rule);
  if (!parsed.ok) return parsed;
  if (whole && !Number.isInteger(parsed.value)) {
    const what = key === 'shots' ? 'shots' : 'numbers';
    return refused({ type: 'not-whole', field: key, words: `${label}: only whole ${what} can be counted.` });
  }
  return ok(enter(draft, key, parsed.value));
}

/** One step up or down on the grid of the field's step; refused at its bounds. */
export function stepQuantity(
  draft: ReadingDraft,
  at: { readonly key: QuantityKey; readonly value: number },
  direction: -1 | 1,
): Result<ReadingDraft> {
  const { step, rule } = QUANTITY_TRAITS[at.key];
  const steps = at.value / step;
  // Off the grid, the nearer grid line in that direction; on it, the next one.
  const onGrid = Math.abs(steps - Math.round(steps)) < 1e-6;
  const next = onGrid ? Math.round(steps) + direction : direction > 0 ? Math.ceil(steps) : Math.floor(steps);
  const checked = checkNumber(Number((next * step).toFixed(4)), rule);
  return checked.ok ? ok(enter(draft, at.key, checked.value)) : checked;
}

/** Figures on the open keypad that nobody has entered: logging past them would log something else than what is shown. */
export function typedNotEntered(draft: ReadingDraft): Refusal | null {
  const { field, typing } = draft;
  if (!isQuantity(field) || typing === null || typing === '') return null;
  const { label, unit } = QUANTITY_TRAITS[field];
  const shown = `${typing.replace('-', '\u2212')}${unit === '' ? '' : `\u2009${unit}`}`;
  return {
    type: 'not-entered',
    field,
    words: `${label}: ${shown} is typed and not entered. Enter it, or leave it as it was.`,
  };
}

/** The body of the reading, or what is still missing before it can be logged. */
export function toReading(base: Base, draft: ReadingDraft): Result<ReadingValues> {
  const typed = formValues(base, draft);
  const batch = typed.dye_batch?.trim() ?? '';
  const values: FormValues = { ...typed, dye_batch: batch === '' ? null : batch };
  if (!isComplete(values)) return refused(firstMissing(values));
  return ok({
    ...withoutAbsent(values),
    note: draft.note.trim(),
    // What nobody has ever said cannot be carried over.
    carried_over: CARRIABLE.filter((key) => values[key] !== null && isCarried(draft, key)),
  });
}

function withoutAbsent(values: FormValues & Required): Complete {
  const absent: readonly string[] = MAY_BE_ABSENT.filter((key) => values[key] === null);
  return Object.fromEntries(Object.entries(values).filter(([key]) => !absent.includes(key))) as Complete;
}

/** After a reading is durable the next one starts untouched; the field in hand and the words for closing stay. */
export function afterLogging(draft: ReadingDraft): ReadingDraft {
  return { ...EMPTY_DRAFT, summary: draft.summary, field: draft.field, groups: draft.groups };
}

/** A correction starts from the reading as it stands; what was carried over stays so until it is touched. */
export function toCorrection(before: ReadingValues, draft: ReadingDraft): Result<ReadingValues> {
  const corrected = toReading(baseOf(before), draft);
  if (!corrected.ok) return corrected;
  return ok({
    ...corrected.value,
    carried_over: before.carried_over.filter((key) => isCarried(draft, key)),
  });
}

/** The field to open for what is missing; null for those that have none. */
export function fieldOf(refusal: Refusal): FieldKey | null {
  const { field } = refusal;
  return field === 'how' || field === 'looked' || (field !== undefined && isQuantity(field)) ? field : null;
}

type Complete = Omit<ReadingValues, 'note' | 'carried_over'>;
type Required = Pick<
  ReadingValues,
  'how' | 'looked' | 'voltage_kV' | 'pressure_bar_g' | 'shots' | 'ambient_bar_abs' | 'temperature_C'
>;

function isComplete(values: FormValues): values is FormValues & Required {
  return (
    values.how !== null &&
    values.looked !== null &&
    QUANTITY_KEYS.every((key) => QUANTITY_TRAITS[key].optional || values[key] !== null)
  );
}

/** In the order in which the screen shows them. */
function firstMissing(values: FormValues): Refusal {
  const empty = (field: FieldKey, words: string): Refusal => ({ type: 'empty', field, words });
  for (const key of QUANTITY_KEYS) {
    const { optional, label } = QUANTITY_TRAITS[key];
    if (optional || values[key] !== null) continue;
    if (key === 'shots') return empty(key, 'Shots: enter how many this burst had.');
    return empty(key, `${label}: enter a number before logging.`);
  }
  return values.how === null
    ? empty('how', 'Voltage was: choose set, held or self-break.')
    : empty('looked', 'How it looked: touch the channel, or choose a word below it.');
}
