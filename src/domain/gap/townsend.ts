import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { ok, refused, type Refusal, type Result } from '../units/result';
import { uniformBreakdown } from './uniform-law';
import { barToTorr } from '../units/pressure';
import { TOWNSEND_CONSTANTS } from './gas-table';

/** Constants of V = B pd / ln(A pd / ln(1 + 1/gamma)), pd in Torr cm. */
export interface TownsendForm {
  readonly A_per_cm_Torr: number;
  readonly B_V_per_cm_Torr: number;
  readonly gamma: number;
}

/** A pair of constants and the published minimum they are to meet. */
export interface TownsendMinimum {
  readonly A_per_cm_Torr: number;
  readonly B_V_per_cm_Torr: number;
  readonly voltage_V: number;
}

const VALID =
  'only within the E/p range of its constants; at a spark gap\u2019s working point it reads 7 to 14 % high';

// At the pole the form runs off to any number; so close to it, the number means nothing.
const POLE_MARGIN = 1e-3;

/**
 * Townsend form, V. Refused at and left of its pole, where the form has no value: that is not a promise that
 * nothing breaks. Pass the gas to have E/p held against the range of its constants.
 */
export function townsendVoltage(form: TownsendForm, pd_Torr_cm: number, gas?: string): Result<Answer> {
  const bad = badForm(form) ?? badPositive(pd_Torr_cm, 'pd_Torr_cm', 'Pressure times gap');
  if (bad !== undefined) return refused(bad);
  const divisor = Math.log((form.A_per_cm_Torr * pd_Torr_cm) / Math.log1p(1 / form.gamma));
  if (!(divisor > POLE_MARGIN)) {
    return refused({
      type: 'no-breakdown-by-this-form',
      field: 'pd_Torr_cm',
      words:
        'Pressure times gap: this form predicts no breakdown here. That says nothing about the gap itself.',
    });
  }
  const value = (form.B_V_per_cm_Torr * pd_Torr_cm) / divisor;
  return ok(
    answer({
      value,
      unit: 'V',
      relative: 0.15,
      model: 'Townsend form',
      valid: VALID,
      warnings: outsideRange(value / pd_Torr_cm, gas),
    }),
  );
}

/** Secondary emission that makes the form's lowest voltage the published one; its pd is then off. */
export function gammaFromMinimum(minimum: TownsendMinimum): Result<Answer> {
  const bad = badMinimum(minimum);
  if (bad !== undefined) return refused(bad);
  const { A_per_cm_Torr: A, B_V_per_cm_Torr: B, voltage_V } = minimum;
  return ok(plain(1 / Math.expm1((voltage_V * A) / (Math.E * B)), '1', 'Voltage of the minimum matched'));
}

/** Where that form has its minimum, Torr cm: V_min/B, since E/p at the minimum is exactly B. */
export function pdMinFromGamma(minimum: TownsendMinimum): Result<Answer> {
  const bad = badMinimum(minimum);
  if (bad !== undefined) return refused(bad);
  return ok(plain(minimum.voltage_V / minimum.B_V_per_cm_Torr, 'Torr cm', 'Voltage of the minimum matched'));
}

/**
 * B that makes the form pass through both coordinates of the minimum, V/(cm Torr). Right at the minimum and far
 * too high from three times its pd on: for the plot near the minimum, never for a gap.
 */
export function forcedB(voltage_V: number, pd_Torr_cm: number): Result<Answer> {
  const bad =
    badPositive(voltage_V, 'voltage_V', 'Voltage') ??
    badPositive(pd_Torr_cm, 'pd_Torr_cm', 'Pressure times gap');
  if (bad !== undefined) return refused(bad);
  return ok(plain(voltage_V / pd_Torr_cm, 'V/(cm Torr)', 'Both coordinates of the minimum matched'));
}

/** How far the textbook form (15, 365, gamma 0.01) lies above the law for air at 20 C, as a share. */
export function townsendOvershoot(pressure_bar_abs: number, gap_cm: number): Result<Answer> {
  const law = uniformBreakdown('air', { pressure_bar_abs, gap_cm, temperature_C: 20 });
  if (!law.ok) return law;
  const form = { A_per_cm_Torr: 15, B_V_per_cm_Torr: 365, gamma: 0.01 };
  const textbook = townsendVoltage(form, barToTorr(pressure_bar_abs) * gap_cm);
  if (!textbook.ok) return textbook;
  return ok(
    plain(textbook.value.value / 1000 / law.value.value - 1, '1', 'Textbook form against the law for air'),
  );
}

function plain(value: number, unit: string, model: string): Answer {
  return answer({ value, unit, model, relative: 0.1, valid: VALID });
}

function outsideRange(E_over_p: number, gas: string | undefined) {
  const range = gas === undefined ? undefined : TOWNSEND_CONSTANTS[gas];
  if (range === undefined) return [];
  if (E_over_p >= range.lowest_E_over_p && E_over_p <= range.highest_E_over_p) return [];
  return [
    {
      type: 'outside-E-over-p',
      words: `E/p lies outside ${String(range.lowest_E_over_p)} to ${String(range.highest_E_over_p)}\u2009V/(cm Torr), where the constants hold.`,
    },
  ];
}

function badForm(form: TownsendForm): Refusal | undefined {
  return (
    badPositive(form.A_per_cm_Torr, 'A_per_cm_Torr', 'A') ??
    badPositive(form.B_V_per_cm_Torr, 'B_V_per_cm_Torr', 'B') ??
    badPositive(form.gamma, 'gamma', 'Gamma')
  );
}

function badMinimum(minimum: TownsendMinimum): Refusal | undefined {
  return (
    badPositive(minimum.A_per_cm_Torr, 'A_per_cm_Torr', 'A') ??
    badPositive(minimum.B_V_per_cm_Torr, 'B_V_per_cm_Torr', 'B') ??
    badPositive(minimum.voltage_V, 'voltage_V', 'Voltage')
  );
}

function badPositive(value: number, field: string, name: string): Refusal | undefined {
  const checked = checkNumber(value, { field, name, unit: '', min: 1e-9, max: 1e6 });
  return checked.ok ? undefined : checked.refusal;
}
