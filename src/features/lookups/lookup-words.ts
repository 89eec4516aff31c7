import { shownValue, unitDecimals } from '../../domain/lookup/fields';
import { figureLine } from '../../domain/lookup/figure-text';
import type { Figure, Known, Lookup, NumberField } from '../../domain/lookup/lookup';
import { formatFigure } from '../../domain/units/format-quantity';
import type { LookupView } from './use-lookup';

/** Where a value comes from, as it stands beside its label. */
export function sourceWords(known: Known | undefined, { revision }: Pick<LookupView, 'revision'>): string {
  switch (known) {
    case 'rig':
      return revision === null ? 'rig' : `rev ${revision.number}`;
    case 'lab':
      return 'lab';
    case 'what-if':
      return 'what if';
    case 'assumed':
    case undefined:
      return 'assumed';
  }
}

/** The found setting in the unit that is shown, rounded so that the target is still met. */
export function foundText({ solvable, found, form, values }: LookupView, field: NumberField): string | null {
  if (solvable === null || found === null) return null;
  const unit = form.units[field.key] ?? null;
  const shown = shownValue(field, values, unit);
  if (shown === null) return null;
  const size = Math.abs(shown);
  const significant = size === 0 ? 0 : 2 - Math.floor(Math.log10(size));
  const decimals = field.whole === true ? 0 : Math.max(unitDecimals(field, unit), Math.min(6, significant));
  return formatFigure(shown, { digits: { decimals }, rounding: solvable.rounding });
}

/** Figure and unit in one line, for sentences. */
export function figureSentence(figure: Figure): string {
  if (figure.words !== undefined) return figure.words;
  return `${figureLine(figure)}${figure.unit === '' ? '' : `\u2009${figure.unit}`}`;
}

/** What may be sought, one line a field, in the lookup's order. */
export function soughtFields(lookup: Lookup): readonly NumberField[] {
  const keys = [...new Set(lookup.solvable.map((pair) => pair.field))];
  return keys.flatMap((key) => {
    const field = lookup.fields.find((each) => each.key === key);
    return field?.kind === 'number' ? [field] : [];
  });
}

export function aboutWords({ rig, revision }: Pick<LookupView, 'rig' | 'revision'>): string {
  if (rig === undefined || revision === null) return 'without a rig';
  return `${rig.name}, revision ${revision.number}`;
}
