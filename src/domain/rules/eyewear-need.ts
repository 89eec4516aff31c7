import type { DensityLine } from '../book/bodies/kit-bodies';
import type { RigSpec } from '../book/rig-spec';
import { eyewearFor, type EyewearLine } from '../beam/eyewear';
import { rigBeam } from './rig-beam';
import { storedAt_J } from './rig-figures';

/** As much of a line as a pair is held against. */
export type NeededLine = Pick<EyewearLine, 'name' | 'wavelength_nm' | 'density'>;

export type EyewearNeed =
  | {
      readonly type: 'known';
      readonly lines: readonly NeededLine[];
      /** What of the beam nobody measured; said beside the density. */
      readonly assumed: readonly string[];
    }
  /** There is no limit to reckon with: never a guess. */
  | { readonly type: 'not-known'; readonly words: string };

/**
 * Optical density that a rig's own beam asks for, the same figure as on the rig's screen: the larger of the declared and
 * the possible energy, for a working day at its highest rate. Dye light or harmonics that the rig's numbers do not name
 * come on top.
 */
export function eyewearNeed(spec: RigSpec): EyewearNeed {
  const stored = storedAt_J(spec, spec.charging.supply_kV);
  if (!stored.ok) return { type: 'not-known', words: `Not known: ${stored.refusal.words}` };
  const beam = rigBeam(spec, stored.value);
  if (!beam.ok) return { type: 'not-known', words: `Not known: ${beam.refusal.words}` };
  const need = eyewearFor([beam.value.line]);
  return need.ok
    ? { type: 'known', lines: need.value.lines, assumed: beam.value.assumed }
    : { type: 'not-known', words: `Not known: ${need.refusal.words}` };
}

/** Density that a pair states at a wavelength: the highest of its lines that reach there; null where it states none. */
export function statedDensity(densities: readonly DensityLine[], wavelength_nm: number): number | null {
  const there = densities.filter((line) => line.from_nm <= wavelength_nm && wavelength_nm <= line.to_nm);
  return there.length === 0 ? null : Math.max(...there.map((line) => line.density));
}

/** The first line that a pair does not meet; null where it meets every one. */
export function unmetLine(
  densities: readonly DensityLine[],
  lines: readonly NeededLine[],
): NeededLine | null {
  return (
    lines.find((line) => {
      const stated = statedDensity(densities, line.wavelength_nm);
      return stated === null || stated < line.density;
    }) ?? null
  );
}
