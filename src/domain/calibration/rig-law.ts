import type { GapSetup } from '../gap/gap-input';
import { buildGapModel, voltagesAt, type GapModel } from '../gap/gap-model';
import type { Result } from '../units/result';
import { ok } from '../units/result';

/** The electrodes and gas of a rig, which stay as they are over a calibration. */
export type RigGap = Pick<GapSetup, 'gas' | 'electrodes' | 'irradiated'>;

/** A setting at which the rig was fired. */
export interface RigSetting {
  readonly gap_mm: number;
  readonly pressure_bar_abs: number;
  readonly temperature_C: number;
}

/** The law of a rig's gap at any setting, kV; keeps the fields of gaps it has worked out before. */
export function rigLaw(rig: RigGap): (setting: RigSetting) => Result<number> {
  const models = new Map<string, GapModel>();
  return ({ gap_mm, pressure_bar_abs, temperature_C }) => {
    const key = `${String(gap_mm)} ${String(temperature_C)}`;
    let model = models.get(key);
    if (model === undefined) {
      const built = buildGapModel({
        ...rig,
        gap_mm,
        u_gap_mm: 0,
        u_pressure_bar: 0,
        temperature_C,
        u_temperature_C: 0,
      });
      if (!built.ok) return built;
      model = built.value;
      models.set(key, model);
    }
    const voltages = voltagesAt(model, pressure_bar_abs);
    return voltages.ok ? ok(voltages.value.law_kV) : voltages;
  };
}
