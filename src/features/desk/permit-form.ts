import type { RigSpec } from '../../domain/book/rig-spec';
import { parseQuantity } from '../../domain/units/parse-number';
import { formatFigure } from '../../domain/units/format-quantity';

export const PERMIT_FIELDS = ['max_kV', 'max_bar_g', 'max_rate_Hz', 'days'] as const;
export type PermitField = (typeof PERMIT_FIELDS)[number];

export interface PermitDraft {
  /** Only what was touched; the rest is the rig's own envelope and the usual fortnight. */
  readonly texts: Partial<Readonly<Record<PermitField, string>>>;
  readonly words: string;
}

export const EMPTY_PERMIT: PermitDraft = { texts: {}, words: '' };

/** Two weeks unless somebody says otherwise; a year at most, so that no permit outlives its reasons. */
const USUAL_DAYS = 14;
const MOST_DAYS = 366;
const DAY_MS = 86_400_000;

export const FIELD_WORDS: Readonly<
  Record<PermitField, { readonly label: string; readonly unit: string; readonly step: number }>
> = {
  max_kV: { label: 'Highest voltage', unit: 'kV', step: 0.5 },
  max_bar_g: { label: 'Highest pressure', unit: 'bar(g)', step: 0.05 },
  max_rate_Hz: { label: 'Highest rate', unit: 'Hz', step: 0.5 },
  days: { label: 'For', unit: 'days', step: 1 },
};

export function permitText(draft: PermitDraft, field: PermitField, envelope: RigSpec['envelope']): string {
  return draft.texts[field] ?? String(field === 'days' ? USUAL_DAYS : envelope[field]);
}

export function stepPermit(
  draft: PermitDraft,
  step: { readonly field: PermitField; readonly direction: -1 | 1 },
  envelope: RigSpec['envelope'],
): PermitDraft {
  const { field, direction } = step;
  const now = Number(permitText(draft, field, envelope));
  const { min, max } = ruleOf(field, envelope);
  const from = Number.isFinite(now) ? now : max;
  const next = Number((from + direction * FIELD_WORDS[field].step).toPrecision(12));
  return { ...draft, texts: { ...draft.texts, [field]: String(Math.min(max, Math.max(min, next))) } };
}

export interface PermitReading {
  readonly envelope: RigSpec['envelope'];
  readonly until_ms: number;
  readonly refusals: Partial<Readonly<Record<PermitField, string>>>;
}

/** What would be granted; wherever a field is refused the rig's own limit stands in, and nothing is granted. */
export function readPermit(draft: PermitDraft, rig: RigSpec['envelope'], now_ms: number): PermitReading {
  const refusals: Partial<Record<PermitField, string>> = {};
  const value = (field: PermitField, otherwise: number): number => {
    const text = permitText(draft, field, rig);
    const read = parseQuantity(text, {
      field,
      name: FIELD_WORDS[field].label,
      unit: FIELD_WORDS[field].unit,
      ...ruleOf(field, rig),
    });
    if (read.ok && field === 'days' && !Number.isInteger(read.value)) refusals.days = 'For: whole days.';
    if (read.ok) return read.value;
    refusals[field] = read.refusal.words;
    return otherwise;
  };
  const envelope = {
    max_kV: value('max_kV', rig.max_kV),
    max_bar_g: value('max_bar_g', rig.max_bar_g),
    max_rate_Hz: value('max_rate_Hz', rig.max_rate_Hz),
  };
  return { envelope, until_ms: now_ms + Math.trunc(value('days', USUAL_DAYS)) * DAY_MS, refusals };
}

/** A permit may be narrower than the rig's envelope and never wider. */
function ruleOf(field: PermitField, rig: RigSpec['envelope']) {
  if (field === 'days') return { min: 1, max: MOST_DAYS };
  const maxReason = 'the limit of this revision';
  if (field === 'max_bar_g') return { min: -1.1, max: rig.max_bar_g, maxReason };
  return { min: 0.1, max: rig[field], maxReason };
}

/** The text as it is shown, with the true minus; empty while nothing stands. */
export function shownPermitText(text: string): string | null {
  if (text === '') return null;
  const value = Number(text);
  return Number.isFinite(value)
    ? formatFigure(value, { digits: { decimals: text.split('.')[1]?.length ?? 0 }, rounding: 'nearest' })
    : text;
}
