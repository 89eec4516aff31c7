import type { RigSpec } from '../book/rig-spec';
import type { BeamLine } from '../beam/eyewear';
import { hazardOutput } from '../beam/output';
import { ok, type Result } from '../units/result';
import { narrowest_mm } from './rig-circuit';

/** What stands for a beam that nobody measured: harsher than most, since it decides eyewear. */
export const BEAM = { pulse_ns: 0.6, width_mm: 1 } as const;

/** Time base of ultraviolet exposure, s: a working day (IEC 60825-1, from memory). */
export const DAY_S = 30_000;

/** A rig's beam as hazards count it. */
export interface RigBeam {
  readonly line: BeamLine;
  /** As it stands in the rig. */
  readonly declared_uJ: number;
  /** What it is planned with: the larger of the declared energy and a thousandth of what the rig stores. */
  readonly planned_uJ: number;
  readonly assumed: readonly string[];
}

/** The rig's beam with what is not known of it filled in (physics O), at its highest rate for a working day. Both ends emit this. */
export function rigBeam(spec: RigSpec, stored_J: number): Result<RigBeam> {
  const { pulse_energy_uJ, wavelength_nm, pulse_ns, width_mm, height_mm } = spec.beam;
  const hazard = hazardOutput(stored_J);
  if (!hazard.ok) return hazard;
  const planned_uJ = Math.max(pulse_energy_uJ, hazard.value.value);
  return ok({
    line: {
      name: 'Laser',
      wavelength_nm,
      energy_J: planned_uJ * 1e-6,
      pulse_s: (pulse_ns ?? BEAM.pulse_ns) * 1e-9,
      width_mm: width_mm ?? spec.channel.width_mm ?? BEAM.width_mm,
      height_mm: height_mm ?? narrowest_mm(spec.channel),
      train: { rate_Hz: spec.envelope.max_rate_Hz, exposure_s: DAY_S },
    },
    declared_uJ: pulse_energy_uJ,
    planned_uJ,
    assumed: [
      ...(planned_uJ > pulse_energy_uJ ? ['pulse energy, a thousandth of what the rig stores'] : []),
      ...(pulse_ns === undefined ? ['pulse length'] : []),
      ...(width_mm === undefined || height_mm === undefined ? ['beam size'] : []),
    ],
  });
}
