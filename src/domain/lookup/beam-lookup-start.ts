import { apertureDivergence } from '../beam/output';
import { BEAM, DAY_S, rigBeam } from '../rules/rig-beam';
import { storedAt_J } from '../rules/rig-figures';
import type { RigSpec } from '../book/rig-spec';
import type { Known, Start, StartFrom, Values } from './lookup';

const NO_RIG = {
  pulse_energy_uJ: 100,
  wavelength_nm: 337.1,
  pulse_ns: BEAM.pulse_ns,
  rate_Hz: 10,
  width_mm: BEAM.width_mm,
  height_mm: 3,
  divergence_width_mrad: 2,
  divergence_height_mrad: 5,
};

/** The rig's beam as hazards count it; what nobody measured stands at its harsher side and says that it is assumed. */
export function beamStart({ spec }: StartFrom): Start {
  const values: Values = {
    ...NO_RIG,
    exposure_s: DAY_S,
    second: 'none',
    dye_nm: 460,
    ...(spec === null ? {} : fromRig(spec)),
  };
  const known: Record<string, Known> = {};
  for (const key of Object.keys(values)) known[key] = 'assumed';
  return { values, known: spec === null ? known : { ...known, ...knownOf(spec, values) } };
}

function fromRig(spec: RigSpec): Values {
  const stored = storedAt_J(spec, spec.charging.supply_kV);
  const beam = rigBeam(spec, stored.ok ? stored.value : 0);
  if (!beam.ok) return {};
  const { line, planned_uJ } = beam.value;
  const whole = (width_mm: number) => apertureDivergence(width_mm, spec.channel.length_mm);
  // The low end, as with a mirror: the narrower beam reaches farther.
  const guessed = (width_mm: number, otherwise: number) => {
    const angle = whole(width_mm);
    return angle.ok ? Number(angle.value.band.low.toPrecision(3)) : otherwise;
  };
  return {
    pulse_energy_uJ: planned_uJ,
    wavelength_nm: line.wavelength_nm,
    pulse_ns: Number((line.pulse_s * 1e9).toPrecision(12)),
    rate_Hz: line.train?.rate_Hz ?? spec.envelope.max_rate_Hz,
    exposure_s: line.train?.exposure_s ?? DAY_S,
    width_mm: line.width_mm,
    height_mm: line.height_mm,
    divergence_width_mrad:
      spec.beam.divergence_width_mrad ?? guessed(line.width_mm, NO_RIG.divergence_width_mrad),
    divergence_height_mrad:
      spec.beam.divergence_height_mrad ?? guessed(line.height_mm, NO_RIG.divergence_height_mrad),
  };
}

function knownOf({ beam, channel }: RigSpec, values: Values): Record<string, Known> {
  const said = (value: unknown): Known => (value === undefined ? 'assumed' : 'rig');
  return {
    // Where it is planned with more than the rig declares, that figure is nobody's reading.
    pulse_energy_uJ: values['pulse_energy_uJ'] === beam.pulse_energy_uJ ? 'rig' : 'assumed',
    wavelength_nm: 'rig',
    rate_Hz: 'rig',
    pulse_ns: said(beam.pulse_ns),
    width_mm: said(beam.width_mm ?? channel.width_mm),
    height_mm: said(beam.height_mm),
    divergence_width_mrad: said(beam.divergence_width_mrad),
    divergence_height_mrad: said(beam.divergence_height_mrad),
  };
}
