import type { DensityLine } from '../book/bodies/kit-bodies';
import type { RigSpec } from '../book/rig-spec';
import { eyewearFor, type EyewearLine } from '../beam/eyewear';

export type EyewearNeed =
  | { readonly type: 'known'; readonly lines: readonly EyewearLine[] }
  /** A figure of the beam is missing, or there is no limit to reckon with: never a guess. */
  | { readonly type: 'not-known'; readonly words: string };

/** Optical density that a rig's own beam asks for. Dye light or harmonics that the rig's numbers do not name come on top. */
export function eyewearNeed(spec: RigSpec): EyewearNeed {
  const { pulse_energy_uJ, wavelength_nm, pulse_ns, width_mm, height_mm } = spec.beam;
  if (pulse_ns === undefined || width_mm === undefined || height_mm === undefined) {
    const gone = [
      ...(pulse_ns === undefined ? ['pulse length'] : []),
      ...(width_mm === undefined ? ['beam width'] : []),
      ...(height_mm === undefined ? ['beam height'] : []),
    ];
    return { type: 'not-known', words: `Not known: the rig’s numbers lack ${gone.join(', ')}.` };
  }
  const beam = {
    name: `${wavelength_nm} nm`,
    wavelength_nm,
    energy_J: pulse_energy_uJ * 1e-6,
    pulse_s: pulse_ns * 1e-9,
    width_mm,
    height_mm,
  };
  const need = eyewearFor([beam]);
  return need.ok
    ? { type: 'known', lines: need.value.lines }
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
  lines: readonly EyewearLine[],
): EyewearLine | null {
  return (
    lines.find((line) => {
      const stated = statedDensity(densities, line.wavelength_nm);
      return stated === null || stated < line.density;
    }) ?? null
  );
}
