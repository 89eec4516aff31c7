import { psiToBar } from '../../../domain/units/pressure';

/** A unit that the keypad offers for a field; what is written down is always the field's own. */
export interface EditUnit {
  readonly key: string;
  readonly label: string;
  /** Own units in one of these. */
  readonly size: number;
  /** Added after scaling, for a pressure counted from vacuum. */
  readonly shift: number;
}

const plain = (label: string, size: number): EditUnit => ({ key: label, label, size, shift: 0 });

const OTHERS: Readonly<Record<string, readonly EditUnit[]>> = {
  mm: [plain('in', 25.4), plain('µm', 1e-3), plain('cm', 10)],
  µm: [plain('mm', 1e3), plain('mil', 25.4)],
  nF: [plain('pF', 1e-3), plain('µF', 1e3)],
  kV: [plain('V', 1e-3)],
  mA: [plain('µA', 1e-3)],
  MΩ: [plain('kΩ', 1e-3), plain('GΩ', 1e3)],
  kΩ: [plain('Ω', 1e-3), plain('MΩ', 1e3)],
  nH: [plain('µH', 1e3)],
  µH: [plain('nH', 1e-3), plain('mH', 1e3)],
  µJ: [plain('mJ', 1e3)],
};

/** The field's own unit first. A pressure counted from vacuum is offered only where the ambient is known. */
export function unitsOf(unit: string, ambient_bar_abs: number | null): readonly EditUnit[] {
  if (unit !== 'bar(g)') return [plain(unit, 1), ...(OTHERS[unit] ?? [])];
  return [
    plain(unit, 1),
    plain('psi(g)', psiToBar(1)),
    ...(ambient_bar_abs === null
      ? []
      : [{ key: 'bar(abs)', label: 'bar(abs)', size: 1, shift: -ambient_bar_abs }]),
  ];
}

/** A typed number with the unit it was typed in; without one it is the field's own. */
export interface TypedNumber {
  readonly number: string;
  readonly unit: string | null;
}

/** As a draft keeps it: "0.125 in", or "3.2" in the field's own unit. */
export function typedText({ number, unit }: TypedNumber): string {
  return unit === null ? number : `${number} ${unit}`;
}

export function readTyped(text: string): TypedNumber {
  const at = text.indexOf(' ');
  return at < 0 ? { number: text, unit: null } : { number: text.slice(0, at), unit: text.slice(at + 1) };
}

// Decimal figures stay decimal: 0.1 in are 2.54 mm and not 2.5399999999999996.
const DIGITS = 12;

export function toOwn(value: number, unit: EditUnit): number {
  return Number((value * unit.size + unit.shift).toPrecision(DIGITS));
}

export function fromOwn(value: number, unit: EditUnit): number {
  return Number(((value - unit.shift) / unit.size).toPrecision(DIGITS));
}
