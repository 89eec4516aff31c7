import type { Answer, Warning } from '../units/answer';
import { ok, type Result } from '../units/result';
import { CHECKED_GAP_OVER_RADIUS } from './curved-gap';
import type { CheckedElectrodes } from './electrodes';
import { FULLY_VALID_FROM_BAR_CM, type GapInput } from './gap-input';
import { buildGapModel, voltagesAt, type GapModel, type GapVoltages } from './gap-model';
import type { GasName } from './gas-table';
import { HIGH_FIELD_MV_M } from './high-field';

/** Share of the low side that may stand on a gap that must not fire (physics M). */
const STANDING_SHARE = 0.8;
const LARGE_SETTING_ERROR = 0.03;

/**
 * What a spark gap does, always with both sides. Nothing fires below `low_kV` (hold-off, early breaks); it may
 * hold up to `high_kV` (stress, supply, "will it fire"); `law_kV` is the point estimate between them. Round the
 * low side and the standing voltage down, the high side up.
 */
export interface GapAnswer {
  readonly law_kV: number;
  readonly low_kV: number;
  readonly high_kV: number;
  /** Standing voltage that must not fire it: 0.8 of the low side. With a person near, no gap is a barrier. */
  readonly stand_at_most_kV: number;
  readonly model: string;
  /** Both sides over the law, minus 1: -0.11 and 0.29. */
  readonly band: { readonly below: number; readonly above: number };
  readonly valid: string;
  readonly warnings: readonly Warning[];
  /** True above 10 MV/m at the electrode, where surfaces and not the law decide. */
  readonly highField: boolean;
  readonly meanField_MV_m: number;
  readonly x_bar_cm: number;
}

/**
 * Self-break of a gap with its two sides; physics A(c), K and M. Valid from 0.05 to 5 bar cm (0.013 to 0.05 with
 * a lower low side) and up to 5 bar(abs). Refused by field in words for anything else, never NaN.
 */
export function selfBreak(input: GapInput): Result<GapAnswer> {
  const model = buildGapModel(input);
  return model.ok ? selfBreakAt(model.value, input.pressure.bar_abs) : model;
}

/** The same for a gap whose fields are already worked out. */
export function selfBreakAt(model: GapModel, pressure_bar_abs: number): Result<GapAnswer> {
  const voltages = voltagesAt(model, pressure_bar_abs);
  if (!voltages.ok) return voltages;
  const { law_kV, low_kV, high_kV, peakField_MV_m, x_bar_cm } = voltages.value;
  return ok({
    law_kV,
    low_kV,
    high_kV,
    stand_at_most_kV: STANDING_SHARE * low_kV,
    model: modelWords(model),
    band: { below: low_kV / law_kV - 1, above: high_kV / law_kV - 1 },
    valid:
      'from 0.05 to 5\u2009bar cm and up to 5\u2009bar(abs); smooth, clean electrodes and nothing else near the gap',
    warnings: warningsFor(model, voltages.value, pressure_bar_abs),
    highField: peakField_MV_m > HIGH_FIELD_MV_M,
    meanField_MV_m: law_kV / model.setup.gap_mm,
    x_bar_cm,
  });
}

/** V_low of physics M alone, as an answer. */
export function holdOffLow(input: GapInput): Result<Answer> {
  return oneSide(input, 'low_kV');
}

/** V_high of physics M alone, as an answer. */
export function selfBreakHigh(input: GapInput): Result<Answer> {
  return oneSide(input, 'high_kV');
}

function oneSide(input: GapInput, side: 'low_kV' | 'high_kV'): Result<Answer> {
  const both = selfBreak(input);
  if (!both.ok) return both;
  const { model, valid, warnings, low_kV, high_kV } = both.value;
  return ok({
    value: both.value[side],
    unit: 'kV',
    band: { low: low_kV, high: high_kV },
    model,
    valid,
    warnings,
  });
}

const GAS_WORDS: Readonly<Partial<Record<GasName, string>>> = { N2: 'nitrogen', H2: 'hydrogen' };

function modelWords({ setup, electrodes }: GapModel): string {
  const gas = GAS_WORDS[setup.gas] ?? setup.gas;
  return electrodes.shape === 'plane'
    ? `Law: uniform field in ${gas}, plane electrodes`
    : `Law: streamer integral in ${gas}, ${shapeWords(electrodes)}`;
}

function shapeWords(electrodes: Exclude<CheckedElectrodes, { readonly shape: 'plane' }>): string {
  if (electrodes.shape === 'hex-bars') {
    const { flats_mm, corner_mm, facing } = electrodes;
    const way = facing === 'flats' ? 'flat to flat' : 'edge to edge';
    return `hexagonal bars ${way}, ${String(flats_mm)}\u2009mm across flats, corners of ${String(corner_mm)}\u2009mm radius`;
  }
  return `${ROUND_WORDS[electrodes.shape]} of ${String(electrodes.radius_mm)}\u2009mm radius`;
}

const ROUND_WORDS = {
  domed: 'domed electrodes taken as spheres',
  sphere: 'spheres',
  cylinder: 'parallel cylinders',
  'capped-rods': 'round-ended rods',
} as const;

/** Radius that the gap's width is judged by. */
function radiusOf(electrodes: CheckedElectrodes): number | undefined {
  return 'radius_mm' in electrodes ? electrodes.radius_mm : undefined;
}

function warningsFor(model: GapModel, voltages: GapVoltages, pressure_bar_abs: number): readonly Warning[] {
  const { setup, electrodes, law } = model;
  const radius_mm = radiusOf(electrodes);
  const warnings: Warning[] = [];
  const warn = (type: string, words: string) => warnings.push({ type, words });
  if (!setup.irradiated) {
    warn('no-uv', 'Without UV on the gap it may hold up to a fifth more; the high side counts that in.');
  }
  if (voltages.peakField_MV_m > HIGH_FIELD_MV_M) {
    warn(
      'high-field',
      'Above 10\u2009MV/m at the electrode it breaks below the law, by 5 to 30 %, as its surface decides.',
    );
  }
  if (voltages.lowest_x_bar_cm < FULLY_VALID_FROM_BAR_CM) {
    warn('small-pd', 'Below 0.05\u2009bar cm the cathode matters by 10 %; the low side is drawn lower.');
  }
  if (radius_mm !== undefined && setup.gap_mm > CHECKED_GAP_OVER_RADIUS * radius_mm) {
    warn('wide-gap', 'Gap wider than two radii: beyond the points the model was checked against.');
  }
  if (radius_mm !== undefined && pressure_bar_abs > 2) {
    warn(
      'by-similarity',
      'Above 2\u2009bar(abs) no measurements on spheres were found: the model rests on similarity.',
    );
  }
  if (setup.gas === 'N2') {
    warn('nitrogen', 'Sources on nitrogen disagree, from 0.9 to 1.15 of air; each side takes the worse one.');
  }
  if (setup.gas === 'CO2' || setup.gas === 'H2' || setup.gas === 'SF6') {
    warn(
      'gas-from-memory',
      `This gas is known to within ${String(Math.round(law.relative * 100))} % only; both sides count that in.`,
    );
  }
  if (electrodes.shape === 'hex-bars') {
    warn(
      'bars-by-computation',
      'Hexagonal bars rest on computed fields alone. Burrs and bar ends break lower.',
    );
  }
  if (electrodes.shape === 'hex-bars' && electrodes.facing === 'flats') {
    warn('plan-with-edges', 'Flat to flat they break at their corners: the low side takes edge to edge.');
  }
  if (settingError(model, pressure_bar_abs) > LARGE_SETTING_ERROR) {
    warn(
      'setting-error',
      'The setting errors of gap and pressure weigh more than the law: measure them better first.',
    );
  }
  return warnings;
}

function settingError({ setup }: GapModel, pressure_bar_abs: number): number {
  return Math.hypot(setup.u_gap_mm / setup.gap_mm, setup.u_pressure_bar / pressure_bar_abs);
}
