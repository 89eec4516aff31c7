import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';

/** A gap as it breaks. */
export interface BreakingGap {
  /** Impedance of what drives one gap. */
  readonly drive_ohm: number;
  /** Mean field at breakdown, MV/m (that is in units of 10 kV/cm). */
  readonly field_MV_m: number;
  /** Density of the gas over that of air at 0 C or 20 C and 1 atm. */
  readonly densityRatio: number;
  /** Spark channels side by side; each sees that many times the impedance. Default 1. */
  readonly channels?: number;
}

/**
 * Resistive phase of a spark, ns, the e-folding time of its current: 88 Z^(-1/3) E^(-4/3) (rho/rho0)^(1/2). J. C. Martin,
 * AWRE notes (J. C. Martin on Pulsed Power, Plenum 1996), from memory. Field in kV/cm by mistake reads 21.5 times too
 * fast. Another gas counts by its density.
 */
export function resistivePhase(gap: BreakingGap): Result<Answer> {
  const bad = badGap(gap);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: resistivePhase_ns(gap),
      unit: 'ns',
      relative: 0.3,
      model: 'Martin\u2019s resistive phase',
      valid: 'gases near one to some atmospheres, 1 to 100\u2009\u2126; band an own estimate',
    }),
  );
}

/** 10 to 90 % rise of the current through a gap, ns: 2.2 times resistive phase plus L/Z. Common practice. */
export function sparkRiseTime(gap: BreakingGap & { readonly inductance_nH: number }): Result<Answer> {
  const bad =
    badGap(gap) ??
    firstRefusal([
      checkNumber(gap.inductance_nH, {
        field: 'inductance_nH',
        name: 'Inductance of the gap',
        unit: 'nH',
        min: 0,
        max: 1e6,
      }),
    ]);
  if (bad !== undefined) return refused(bad);
  const inductive_ns = gap.inductance_nH / gap.drive_ohm;
  return ok(
    answer({
      value: 2.2 * (resistivePhase_ns(gap) + inductive_ns),
      unit: 'ns',
      relative: 0.35,
      model: 'Resistive and inductive phase added up',
      valid: 'common practice; in a ringing circuit the ring itself may be slower',
    }),
  );
}

function resistivePhase_ns({ drive_ohm, field_MV_m, densityRatio, channels = 1 }: BreakingGap): number {
  return 88 * Math.sqrt(densityRatio) * Math.cbrt(1 / (channels * drive_ohm)) * field_MV_m ** (-4 / 3);
}

function badGap({ drive_ohm, field_MV_m, densityRatio, channels = 1 }: BreakingGap) {
  return firstRefusal([
    checkNumber(drive_ohm, {
      field: 'drive_ohm',
      name: 'Driving impedance',
      unit: '\u2126',
      min: 1e-4,
      max: 1e5,
    }),
    checkNumber(field_MV_m, {
      field: 'field_MV_m',
      name: 'Field at breakdown',
      unit: 'MV/m',
      min: 0.1,
      max: 100,
      maxReason: 'enter MV/m, not kV/cm',
    }),
    checkNumber(densityRatio, {
      field: 'densityRatio',
      name: 'Density over that of air',
      unit: '',
      min: 1e-3,
      max: 1000,
    }),
    checkNumber(channels, { field: 'channels', name: 'Spark channels', unit: '', min: 1, max: 1000 }),
  ]);
}
