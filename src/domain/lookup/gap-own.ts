import type { RigSpec } from '../book/rig-spec';
import { gapSetupOf } from '../rules/rig-gap';
import type { OwnCurve, Values } from './lookup';

/** The own curve as values that nobody enters. It belongs to the gas and electrodes that it was read on. */
export function ownValues(own: OwnCurve, spec: RigSpec): Values {
  const { scale, offset_mm, from_bar_abs, to_bar_abs } = own;
  return {
    own_scale: scale,
    own_offset_mm: offset_mm,
    own_from_bar_abs: from_bar_abs,
    own_to_bar_abs: to_bar_abs,
    own_of: ownKey({
      gas: spec.gap.gas,
      electrodes: gapSetupOf(spec, 20).electrodes.shape,
      radius_mm: spec.gap.radius_mm,
      rod_length_mm: spec.gap.rod_length_mm ?? null,
      facing: spec.gap.facing ?? null,
      flats_mm: spec.gap.flats_mm ?? null,
      corner_mm: spec.gap.corner_mm ?? null,
    }),
  };
}

/** Gas and electrodes of a form: with others than it was read on, the own curve is not drawn. */
export function ownKey(values: Values): string {
  return ['gas', 'electrodes', 'radius_mm', 'rod_length_mm', 'facing', 'flats_mm', 'corner_mm']
    .map((key) => values[key] ?? '')
    .join(' ');
}
