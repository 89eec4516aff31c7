import { chargingOf } from '../rules/rig-figures';
import { gapSetupOf } from '../rules/rig-gap';
import { ownValues } from './gap-own';
import type { Start, StartFrom } from './lookup';

/** What the rig says and nobody enters here: supply, vessel, and the pressures that are allowed. */
export function gapStart({ spec, settings, envelope = null, own = null }: StartFrom): Start {
  const lab = {
    temperature_C: settings?.ambient_C ?? 20,
    ambient_bar_abs: settings?.ambient_bar_abs ?? null,
    voltage_kV: null,
    condition: 'pressurised-or-worn',
  };
  const fromLab = settings === null ? 'assumed' : 'lab';
  const known = {
    temperature_C: fromLab,
    ambient_bar_abs: fromLab,
    voltage_kV: 'assumed',
    condition: 'assumed',
  } as const;
  if (spec === null) {
    return {
      values: {
        ...lab,
        gas: 'N2',
        irradiated: 'no-uv',
        electrodes: 'domed',
        radius_mm: 12,
        rod_length_mm: null,
        facing: 'edges',
        flats_mm: 12,
        corner_mm: 1,
        gap_mm: 3,
        gap_error_mm: 0.05,
        pressure: 0,
      },
      known: { ...known, ...everyOther('assumed') },
    };
  }
  const { gap } = spec;
  const setup = gapSetupOf(spec, lab.temperature_C);
  return {
    values: {
      ...lab,
      gas: gap.gas,
      irradiated: gap.irradiated ? 'uv' : 'no-uv',
      electrodes: setup.electrodes.shape,
      radius_mm: gap.radius_mm,
      rod_length_mm: gap.rod_length_mm ?? null,
      facing: gap.facing ?? null,
      flats_mm: gap.flats_mm ?? null,
      corner_mm: gap.corner_mm ?? null,
      gap_mm: gap.gap_mm,
      gap_error_mm: gap.gap_error_mm,
      pressure: (gap.lowest_bar_g + gap.highest_bar_g) / 2,
      ...chargingOf(spec),
      vessel_bar_g: gap.vessel?.rated_bar_g ?? null,
      highest_bar_g: gap.highest_bar_g,
      window_from_bar_g: envelope === null ? null : gap.lowest_bar_g,
      window_to_bar_g: envelope?.max_bar_g ?? null,
      ...(own === null ? {} : ownValues(own, spec)),
    },
    known: {
      ...known,
      ...everyOther('rig'),
      ...(gap.radius_known === 'assumed' ? { radius_mm: 'assumed' as const } : {}),
    },
  };
}

function everyOther<K>(known: K): Record<string, K> {
  return Object.fromEntries(
    [
      'gas',
      'irradiated',
      'electrodes',
      'radius_mm',
      'rod_length_mm',
      'facing',
      'flats_mm',
      'corner_mm',
      'gap_mm',
      'gap_error_mm',
      'pressure',
    ].map((key) => [key, known]),
  );
}
