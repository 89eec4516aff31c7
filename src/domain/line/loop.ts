import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { LENGTH_RULE, MU0_H_M, SPACING_RULE } from './rules';

/**
 * Inductance of a rectangular loop of round conductor, nH; sides between conductor centres, current on the surface.
 * Grover, Inductance Calculations (1946), without internal inductance; a sum of partial inductances agrees to 1 %.
 */
export function rectangularLoopInductance(loop: {
  readonly long_m: number;
  readonly short_m: number;
  readonly conductorRadius_m: number;
}): Result<Answer> {
  const { long_m: w, short_m: h, conductorRadius_m: a } = loop;
  const bad = firstRefusal([
    checkNumber(w, { ...LENGTH_RULE, field: 'long_m', name: 'Length of the loop' }),
    checkNumber(h, { ...LENGTH_RULE, field: 'short_m', name: 'Height of the loop' }),
    checkNumber(a, {
      ...LENGTH_RULE,
      field: 'conductorRadius_m',
      name: 'Conductor radius',
      max: 0.25 * Math.min(w, h),
      maxReason: 'a quarter of the short side; a thicker conductor is no loop of wire',
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  const d = Math.hypot(w, h);
  const ends = 2 * d - 2 * (w + h);
  const far = h * Math.log((h + d) / w) + w * Math.log((w + d) / h);
  const near = h * Math.log((2 * h) / a) + w * Math.log((2 * w) / a);
  return ok(
    answer({
      value: (MU0_H_M / Math.PI) * (ends - far + near) * 1e9,
      unit: 'nH',
      relative: 0.1,
      model: 'Rectangular loop of round conductor',
      valid: 'conductor thin against the loop; \u00b130\u2009% for real straps',
    }),
  );
}

/** Inductance of long electrodes with their return, nH: mu0 S/l, S the cross-section that the current goes around. */
export function channelLoopInductance(section_m2: number, length_m: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(section_m2, {
      field: 'section_m2',
      name: 'Cross-section of the loop',
      unit: 'm\u00b2',
      min: 1e-12,
      max: 100,
    }),
    checkNumber(length_m, LENGTH_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: ((MU0_H_M * section_m2) / length_m) * 1e9,
      unit: 'nH',
      relative: { below: 0.3, above: 0.05 },
      model: 'Long loop, field uniform inside',
      valid: 'length far above the loop\u2019s width; ends make it lower',
    }),
  );
}

/** Inductance of the current spreading from a foot into a pair of sheets, nH: mu0 h ln(r2/r1)/(2 pi). */
export function spreadInductance(spread: {
  readonly spacing_m: number;
  readonly foot_m: number;
  readonly edge_m: number;
}): Result<Answer> {
  const { spacing_m, foot_m, edge_m } = spread;
  const bad = firstRefusal([
    checkNumber(spacing_m, SPACING_RULE),
    checkNumber(foot_m, { ...LENGTH_RULE, field: 'foot_m', name: 'Radius of the foot' }),
    checkNumber(edge_m, {
      ...LENGTH_RULE,
      field: 'edge_m',
      name: 'Radius of the sheet',
      min: foot_m,
      minExcluded: true,
      minReason: 'the radius of the foot',
    }),
  ]);
  if (bad !== undefined) return refused(bad);
  return ok(
    answer({
      value: ((MU0_H_M * spacing_m * Math.log(edge_m / foot_m)) / (2 * Math.PI)) * 1e9,
      unit: 'nH',
      relative: 0.2,
      model: 'Radial line between two sheets',
      valid: 'spreading on all sides; half as many sides, twice as much',
    }),
  );
}
