import type { RigSpec } from '../book/rig-spec';
import type { Electrodes } from '../gap/electrodes';
import type { GapInput, GapSetup } from '../gap/gap-input';

/** Errors of settings that the bench reads off a dial; common practice, no source. */
export const DIAL_ERRORS = { pressure_bar: 0.02, temperature_C: 3 } as const;

/** The rig's spark gap as the physics takes it. */
export function gapSetupOf(spec: RigSpec, temperature_C: number): GapSetup {
  const { gas, gap_mm, gap_error_mm, irradiated } = spec.gap;
  return {
    gas,
    electrodes: electrodesOf(spec.gap),
    gap_mm,
    u_gap_mm: gap_error_mm,
    u_pressure_bar: DIAL_ERRORS.pressure_bar,
    temperature_C,
    u_temperature_C: DIAL_ERRORS.temperature_C,
    irradiated,
  };
}

/** What is not known of a shape is refused beside its own field, not filled in here. */
function electrodesOf(gap: RigSpec['gap']): Electrodes {
  const { electrodes: shape, radius_mm, rod_length_mm, flats_mm, corner_mm, facing } = gap;
  if (shape === 'hex-bars') return { shape, flats_mm, corner_mm, facing };
  return shape === 'capped-rods' ? { shape, radius_mm, rod_length_mm } : { shape, radius_mm };
}

/** The gap at a gauge pressure and an ambient; there is no default for the ambient. */
export function gapInputOf(
  spec: RigSpec,
  at: { readonly pressure_bar_g: number; readonly ambient_bar_abs: number; readonly temperature_C: number },
): GapInput {
  return {
    ...gapSetupOf(spec, at.temperature_C),
    pressure: { bar_abs: at.pressure_bar_g + at.ambient_bar_abs },
  };
}
