import type { RigSpec } from '../book/rig-spec';
import type { GapInput, GapSetup } from '../gap/gap-input';

/** Errors of settings that the bench reads off a dial; common practice, no source. */
export const DIAL_ERRORS = { pressure_bar: 0.02, temperature_C: 3 } as const;

/** The rig's spark gap as the physics takes it. */
export function gapSetupOf(spec: RigSpec, temperature_C: number): GapSetup {
  const { gas, electrodes, radius_mm, gap_mm, gap_error_mm, irradiated } = spec.gap;
  return {
    gas,
    electrodes: { shape: shapeOf(electrodes), radius_mm },
    gap_mm,
    u_gap_mm: gap_error_mm,
    u_pressure_bar: DIAL_ERRORS.pressure_bar,
    temperature_C,
    u_temperature_C: DIAL_ERRORS.temperature_C,
    irradiated,
  };
}

// Bars without a radius are refused in words until the gap takes their own shape.
function shapeOf(electrodes: RigSpec['gap']['electrodes']): GapSetup['electrodes']['shape'] {
  if (electrodes === 'hex-bars') return 'cylinder';
  return electrodes === 'capped-rods' ? 'domed' : electrodes;
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
