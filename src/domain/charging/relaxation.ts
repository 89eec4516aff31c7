import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { RESISTANCE_RULE } from '../capacitor/bleed';
import { CAPACITANCE_RULE, VOLTAGE_RULE } from '../capacitor/energy';
import { computed } from '../units/computed';
import { andThen, firstRefusal, ok, refused, type Result } from '../units/result';

/** A capacitor charged through a ballast from a steady voltage until its gap breaks. */
export interface Relaxation {
  readonly ballast_ohm: number;
  readonly capacitance_F: number;
  readonly supply_V: number;
  readonly break_V: number;
}

/**
 * Rate of a free-running gap, Hz: 1/(R C ln(Vs/(Vs - Vb))). Refused where the supply does not reach the break:
 * then it never fires and sits charged.
 */
export function repetitionRate({
  ballast_ohm,
  capacitance_F,
  supply_V,
  break_V,
}: Relaxation): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(ballast_ohm, { ...RESISTANCE_RULE, field: 'ballast_ohm', name: 'Ballast' }),
    checkNumber(capacitance_F, CAPACITANCE_RULE),
    checkNumber(supply_V, { ...VOLTAGE_RULE, field: 'supply_V', name: 'Supply voltage', min: 1 }),
    checkNumber(break_V, {
      ...VOLTAGE_RULE,
      field: 'break_V',
      name: 'Self-break voltage',
      min: 1,
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  if (break_V >= supply_V) {
    return refused({
      type: 'never-fires',
      field: 'break_V',
      words:
        'Self-break voltage: the supply does not reach it. The gap never fires and the capacitor sits charged.',
    });
  }
  return ok(
    answer({
      value: 1 / (ballast_ohm * capacitance_F * -Math.log1p(-break_V / supply_V)),
      unit: 'Hz',
      relative: 0.15,
      model: 'Relaxation through the ballast',
      valid: 'the gap recovers between shots; a voltage close to the supply makes the rate uncertain',
    }),
  );
}

/** Power taken from the supply, W: C Vb Vs f. The ballast turns the rest of it into heat. */
export function supplyPower(shot: {
  readonly capacitance_F: number;
  readonly break_V: number;
  readonly supply_V: number;
  readonly rate_Hz: number;
}): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(shot.capacitance_F, CAPACITANCE_RULE),
    checkNumber(shot.break_V, { ...VOLTAGE_RULE, field: 'break_V', name: 'Self-break voltage' }),
    checkNumber(shot.supply_V, { ...VOLTAGE_RULE, field: 'supply_V', name: 'Supply voltage' }),
    checkNumber(shot.rate_Hz, { field: 'rate_Hz', name: 'Rate', unit: 'Hz', min: 0, max: 1e6 }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: shot.capacitance_F * shot.break_V * shot.supply_V * shot.rate_Hz,
      unit: 'W',
      relative: 0.05,
      model: 'Charge a shot times supply voltage and rate',
      valid: 'a steady supply behind a ballast',
    }),
  );
}

/** Heat in the ballast, W: what the supply gives less what the capacitor takes, C Vb (Vs - Vb/2) f. It wants a rating for it. */
export function ballastHeat(shot: {
  readonly capacitance_F: number;
  readonly break_V: number;
  readonly supply_V: number;
  readonly rate_Hz: number;
}): Result<Answer> {
  return andThen(supplyPower(shot), ({ value }) =>
    computed(
      [
        checkNumber(shot.break_V, {
          ...VOLTAGE_RULE,
          field: 'break_V',
          name: 'Self-break voltage',
          max: shot.supply_V,
          maxReason: 'what the supply gives',
        }),
      ],
      () => ({
        value: value - 0.5 * shot.capacitance_F * shot.break_V ** 2 * shot.rate_Hz,
        unit: 'W',
        relative: 0.1,
        model: 'Supply power less what the capacitor takes',
        valid: 'a steady supply behind a ballast; while a gap sits shut the bleed heats it too',
      }),
    ),
  );
}
