import { answer, type Answer, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { repetitionRate } from './relaxation';

/** A supply behind its ballast, loaded by whatever bleeds the capacitor it charges. */
export interface Charging {
  readonly supply_kV: number;
  readonly supply_mA: number;
  readonly ballast_Mohm: number;
  /** Null where nothing bleeds it, or where the bleed is not known. */
  readonly bleed_Mohm: number | null;
}

/** The supply must stand this far above the high side before the gap is sure to fire (physics M). */
const REACH_SHARE = 1.05;

/** Above it an unblown gap of millimetres may not recover: common practice, from memory. */
const DOUBTFUL_RATE_HZ = 10;

/**
 * Voltage the capacitor settles at when the gap stays shut, kV: ballast and bleed divide the supply's. Round it
 * down to ask whether the gap fires; for stress take the supply's full limit, since a bleed may be open.
 */
export function reachableVoltage(charging: Charging): Result<Answer> {
  const bad = badCharging(charging);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: charging.supply_kV * share(charging),
      unit: 'kV',
      relative: 0.02,
      model: 'Ballast and bleed divide the supply',
      valid: 'steady state, no corona or leakage beside the bleed',
    }),
  );
}

/** Whether the supply makes the gap fire, by the two-sided rule; a rig\u2019s own calibration may overrule it. */
export type SupplyReach =
  | {
      readonly type: 'reaches';
      readonly reachable_kV: number;
      readonly needed_kV: number;
      readonly words: string;
    }
  | {
      readonly type: 'may-not-fire';
      readonly reachable_kV: number;
      readonly needed_kV: number;
      readonly words: string;
    }
  | {
      readonly type: 'never-fires';
      readonly reachable_kV: number;
      readonly needed_kV: number;
      readonly words: string;
    };

/**
 * Holds the reachable voltage against a gap: above 1.05 of the high side it fires, below the law it never does,
 * between them it may not and then sits charged.
 */
export function supplyReach(
  charging: Charging,
  gap: { readonly law_kV: number; readonly high_kV: number },
): Result<SupplyReach> {
  const bad = firstRefusal([
    checkNumber(gap.law_kV, {
      field: 'law_kV',
      name: 'Self-break voltage',
      unit: 'kV',
      min: 0,
      minExcluded: true,
      max: 1000,
    }),
    checkNumber(gap.high_kV, {
      field: 'high_kV',
      name: 'High side',
      unit: 'kV',
      min: 0,
      minExcluded: true,
      max: 1000,
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  const reachable = reachableVoltage(charging);
  if (!reachable.ok) return reachable;
  const reachable_kV = reachable.value.value;
  const needed_kV = REACH_SHARE * gap.high_kV;
  if (reachable_kV >= needed_kV) {
    return ok({
      type: 'reaches',
      reachable_kV,
      needed_kV,
      words: 'The supply reaches past the high side: the gap fires.',
    });
  }
  if (reachable_kV <= gap.law_kV) {
    const words =
      'Ballast and bleed leave less than the self-break voltage: by the law the gap never fires and the rig sits charged.';
    return ok({ type: 'never-fires', reachable_kV, needed_kV, words });
  }
  const words =
    'The high side is beyond the supply: the gap may not fire. If it does not, the rig sits charged.';
  return ok({ type: 'may-not-fire', reachable_kV, needed_kV, words });
}

/**
 * Highest rate the charging allows at a self-break voltage, Hz: the relaxation through ballast and bleed, and never
 * more than the supply's current carries. Round it down.
 */
export function highestRate(
  charging: Charging,
  gap: { readonly capacitance_F: number; readonly break_kV: number },
): Result<Answer> {
  const bad = badCharging(charging);
  if (bad !== undefined) return refused(bad);
  const relaxed = repetitionRate({
    ballast_ohm: charging.ballast_Mohm * 1e6 * share(charging),
    capacitance_F: gap.capacitance_F,
    supply_V: charging.supply_kV * 1000 * share(charging),
    break_V: gap.break_kV * 1000,
  });
  if (!relaxed.ok) return relaxed;
  const byCurrent = (charging.supply_mA * 1e-3) / (gap.capacitance_F * gap.break_kV * 1000);
  const value = Math.min(relaxed.value.value, byCurrent);
  const warnings: Warning[] = [];
  if (value > DOUBTFUL_RATE_HZ) {
    warnings.push({
      type: 'gap-recovery',
      words:
        'Above 10\u2009Hz an unblown gap may not recover and breaks early: blow it, or stay at 10\u2009Hz.',
    });
  }
  return ok({ ...relaxed.value, value, band: { low: 0.85 * value, high: 1.15 * value }, warnings });
}

function share({ ballast_Mohm, bleed_Mohm }: Charging): number {
  return bleed_Mohm === null ? 1 : bleed_Mohm / (bleed_Mohm + ballast_Mohm);
}

function badCharging(charging: Charging) {
  const megohm = { unit: 'M\u2126', min: 1e-6, max: 1e9 };
  return firstRefusal([
    checkNumber(charging.supply_kV, {
      field: 'supply_kV',
      name: 'Supply voltage',
      unit: 'kV',
      min: 0,
      minExcluded: true,
      max: 1000,
    }),
    checkNumber(charging.supply_mA, {
      field: 'supply_mA',
      name: 'Supply current',
      unit: 'mA',
      min: 0,
      minExcluded: true,
      max: 1e6,
    }),
    checkNumber(charging.ballast_Mohm, { field: 'ballast_Mohm', name: 'Ballast', ...megohm }),
    charging.bleed_Mohm === null
      ? ok(undefined)
      : checkNumber(charging.bleed_Mohm, { field: 'bleed_Mohm', name: 'Bleed', ...megohm }),
  ]);
}
