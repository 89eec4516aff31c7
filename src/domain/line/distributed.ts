import { brent } from '../numerics/brent';
import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, mapResult, refused, ok, type Result } from '../units/result';
import { INDUCTANCE_RULE } from './rules';

const CAPACITANCE_RULE = {
  field: 'capacitance_F',
  name: 'Capacitance',
  unit: 'F',
  min: 1e-15,
  max: 1,
} as const;
const IMPEDANCE = { unit: '\u2126', min: 1e-6, max: 1e9 } as const;

/** A charged sheet that is shorted through a gap. */
export interface ShortedSheet {
  readonly gap_H: number;
  /** Of the sheet itself, from its shorted to its open end. */
  readonly sheet_H: number;
  readonly capacitance_F: number;
}

/**
 * Half period of the lowest ring of a charged sheet shorted through a gap, s: pi sqrt(L_sheet C)/x with
 * x tan x = L_sheet/L_gap. Exact for a line; a circuit with L_gap + L_sheet/3 comes within 0.7 % while the sheet has no
 * more inductance than the gap.
 */
export function distributedHalfPeriod({ gap_H, sheet_H, capacitance_F }: ShortedSheet): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(gap_H, { ...INDUCTANCE_RULE, field: 'gap_H', name: 'Inductance of the gap' }),
    checkNumber(sheet_H, { ...INDUCTANCE_RULE, field: 'sheet_H', name: 'Inductance of the sheet' }),
    checkNumber(capacitance_F, CAPACITANCE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const ratio = sheet_H / gap_H;
  // x sin x = ratio cos x has no pole to step over.
  const root = brent((x) => x * Math.sin(x) - ratio * Math.cos(x), { low: 0, high: Math.PI / 2 });
  return mapResult(root, (x) =>
    answer({
      value: (Math.PI * Math.sqrt(sheet_H * capacitance_F)) / x,
      unit: 's',
      relative: 0.1,
      model: 'Lowest ring of a line shorted through an inductance',
      valid: 'current along one direction of the sheet; gap resistance left out',
    }),
  );
}

/**
 * Voltage that a Blumlein of two equal lines puts on its load, V: 2 V0 R/(R + 2 Z0), flat for twice the transit. An
 * ideal switch is meant: a gap of millimetres is slower than the transit of a sheet.
 */
export function blumleinLoadVoltage(blumlein: {
  readonly charge_V: number;
  readonly load_ohm: number;
  readonly line_ohm: number;
}): Result<Answer> {
  const { charge_V, load_ohm, line_ohm } = blumlein;
  const bad = firstRefusal([
    checkNumber(charge_V, { field: 'charge_V', name: 'Charging voltage', unit: 'V', min: 0, max: 1e7 }),
    checkNumber(load_ohm, { field: 'load_ohm', name: 'Load', ...IMPEDANCE }),
    checkNumber(line_ohm, { field: 'line_ohm', name: 'Impedance of one line', ...IMPEDANCE }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: (2 * charge_V * load_ohm) / (load_ohm + 2 * line_ohm),
      unit: 'V',
      relative: { below: 0.5, above: 0 },
      model: 'Two equal lines, ideal switch',
      valid: 'a switch far faster than twice the transit, which a single gap of millimetres is not',
      warnings: [
        { type: 'ideal-switch', words: 'A ceiling: the gap\u2019s own rise lowers it and rounds the pulse.' },
      ],
    }),
  );
}
