import { answer, withBand, type Answer, type Basis, type Warning } from '../units/answer';
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
  /** Where the supply gives less power than voltage times current, what it gives. */
  readonly supply_W?: number;
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
export interface SupplyReach extends Basis {
  readonly type: 'reaches' | 'may-not-fire' | 'never-fires';
  readonly reachable_kV: number;
  readonly needed_kV: number;
  readonly words: string;
  /** Where the capacitor settles while the gap stays shut. */
  readonly reachable: Answer;
  /** What has to be reached for the gap to be sure to fire; its band begins at the law. */
  readonly needed: Answer;
}

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
  const type =
    reachable_kV >= needed_kV ? 'reaches' : reachable_kV <= gap.law_kV ? 'never-fires' : 'may-not-fire';
  const needed = answer({
    value: needed_kV,
    unit: 'kV',
    relative: 0,
    model: REACH_MODEL,
    valid: REACH_VALID,
  });
  return ok({
    type,
    reachable_kV,
    needed_kV,
    words: REACH_WORDS[type],
    reachable: reachable.value,
    needed: withBand(needed, { low: gap.law_kV, high: needed_kV }),
    model: REACH_MODEL,
    valid: REACH_VALID,
    warnings: type === 'reaches' ? [] : [SITS_CHARGED],
  });
}

const REACH_MODEL = '1.05 of the high side against what ballast and bleed leave';
const REACH_VALID = 'where the gap\u2019s two sides hold; steady state, no leakage beside the bleed';
const SITS_CHARGED: Warning = {
  type: 'sits-charged',
  words: 'A gap that does not fire leaves the rig charged to what the supply reaches.',
};
const REACH_WORDS: Readonly<Record<SupplyReach['type'], string>> = {
  reaches: 'The supply reaches past the high side: the gap fires.',
  'never-fires':
    'Ballast and bleed leave less than the self-break voltage: by the law the gap never fires and the rig sits charged.',
  'may-not-fire':
    'The high side is beyond the supply: the gap may not fire. If it does not, the rig sits charged.',
};

/** What fires by itself, as its charging sees it. */
export interface ChargedGap {
  readonly capacitance_F: number;
  readonly break_kV: number;
}

/** Rate that ballast and bleed alone allow at a self-break voltage, Hz. Refused where the gap never fires. */
export function relaxedRate(charging: Charging, gap: ChargedGap): Result<Answer> {
  const bad = badCharging(charging);
  if (bad !== undefined) return refused(bad);
  return repetitionRate({
    ballast_ohm: charging.ballast_Mohm * 1e6 * share(charging),
    capacitance_F: gap.capacitance_F,
    supply_V: charging.supply_kV * 1000 * share(charging),
    break_V: gap.break_kV * 1000,
  });
}

/**
 * Highest rate the charging allows at a self-break voltage, Hz: the relaxation through ballast and bleed, and never
 * more than the supply's current and power carry. Round it down.
 */
export function highestRate(charging: Charging, gap: ChargedGap): Result<Answer> {
  const relaxed = relaxedRate(charging, gap);
  if (!relaxed.ok) return relaxed;
  const value = Math.min(relaxed.value.value, currentRate_Hz(charging, gap), powerRate_Hz(charging, gap));
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

/** Shots a second that the supply's current carries, Hz: C Vb of charge each. Not checked. */
export function currentRate_Hz({ supply_mA }: Charging, gap: ChargedGap): number {
  return (supply_mA * 1e-3) / (gap.capacitance_F * gap.break_kV * 1000);
}

/** Shots a second that the supply's power carries, Hz: C Vb Vs each. Not checked. */
export function powerRate_Hz({ supply_kV, supply_W = Infinity }: Charging, gap: ChargedGap): number {
  return supply_W / (gap.capacitance_F * gap.break_kV * 1000 * supply_kV * 1000);
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
    charging.supply_W === undefined
      ? ok(undefined)
      : checkNumber(charging.supply_W, {
          field: 'supply_W',
          name: 'Supply power',
          unit: 'W',
          min: 0,
          minExcluded: true,
          max: 1e9,
        }),
    checkNumber(charging.ballast_Mohm, { field: 'ballast_Mohm', name: 'Ballast', ...megohm }),
    charging.bleed_Mohm === null
      ? ok(undefined)
      : checkNumber(charging.bleed_Mohm, { field: 'bleed_Mohm', name: 'Bleed', ...megohm }),
  ]);
}
