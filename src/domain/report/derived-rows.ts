import type { DerivedFigure, DerivedKey, RigDerived } from '../rules/rig-derived';
import { formatFigure, type Rounding } from '../units/format-quantity';

/** A derived figure as a row: what it is, what it is worth, and what to read before acting on it. */
export interface DerivedRow {
  readonly key: DerivedKey;
  readonly label: string;
  readonly value: string | null;
  readonly unit: string;
  readonly refusal: string | null;
  readonly words: string;
  readonly caution: boolean;
  /** Null for what is exact, and where there is no figure. */
  readonly band: string | null;
  readonly model: string;
  readonly valid: string;
  readonly warnings: readonly string[];
}

/** Rows in the order of the domain; only those asked for, where some are. */
export function derivedRows(derived: RigDerived, keys?: readonly DerivedKey[]): readonly DerivedRow[] {
  const wanted =
    keys === undefined
      ? derived.figures
      : keys.flatMap((key) => derived.figures.filter((figure) => figure.key === key));
  return wanted.map(rowOf);
}

function rowOf({ key, label, figure, rounding, digits, words, caution }: DerivedFigure): DerivedRow {
  const common = { key, label, words, caution };
  if (!figure.ok) {
    const none = { value: null, unit: '', band: null, model: '', valid: '', warnings: [] };
    return { ...common, ...none, refusal: figure.refusal.words };
  }
  const { value, unit, band, model, valid, warnings } = figure.value;
  const scale = unit === 'A' && Math.abs(value) >= 1000 ? { size: 1000, unit: 'kA' } : { size: 1, unit };
  const shown = (one: number, towards: Rounding): string =>
    formatFigure(one / scale.size, { digits: { significant: digits }, rounding: towards });
  return {
    ...common,
    value: shown(value, rounding),
    unit: scale.unit === '1' ? '' : scale.unit,
    refusal: null,
    band: band.low === band.high ? null : `${shown(band.low, 'down')} to ${shown(band.high, 'up')}`,
    model,
    valid,
    warnings: warnings.map((warning) => warning.words),
  };
}
