import type { RigRevision } from '../../domain/book/documents/rig';
import { formatFigure } from '../../domain/units/format-quantity';
import type { Known } from './gap-form';
import type { GapLookup } from './use-gap-lookup';

export function revisionSource(known: Known, revision: RigRevision): string {
  if (known === 'rig') return `rev ${revision.number}`;
  return known === 'lab' ? 'lab' : 'what if';
}

export function fieldText(value: number | null, decimals: number): string | null {
  return value === null ? null : formatFigure(value, { digits: { decimals }, rounding: 'nearest' });
}

/** The low side rounds down, the high side up, so that neither ever promises more than it holds. */
export function lowText(kV: number): string {
  return formatFigure(kV, { digits: { decimals: 1 }, rounding: 'down' });
}

export function highText(kV: number): string {
  return formatFigure(kV, { digits: { decimals: 1 }, rounding: 'up' });
}

export function lawText(kV: number): string {
  return formatFigure(kV, { digits: { decimals: 1 }, rounding: 'nearest' });
}

/** The solved setting in the reference that the form shows, rounded so that the target is still met. */
export function solvedText({ form, view }: GapLookup): string | null {
  if (!view.ok || view.value.solution === null) return null;
  const { value, rounding } = view.value.solution;
  const ambient = form.values.ambient_bar_abs ?? 0;
  const shown = form.find === 'pressure' && form.reference === 'g' ? value - ambient : value;
  return formatFigure(shown, { digits: { decimals: 2 }, rounding });
}

export function percentText(share: number): string {
  const sign = share < 0 ? '\u2212' : '+';
  return `${sign}${formatFigure(Math.abs(share) * 100, { digits: { decimals: 0 }, rounding: 'up' })}`;
}
