import {
  DIELECTRICS,
  MATERIALS,
  minimumStrength,
  type Material,
} from '../../../domain/capacitor/dielectrics';
import { roundToSignificant } from '../../../domain/units/format-quantity';
import type { EditDraft } from './edit-form';

export const DIELECTRIC_OPTIONS = MATERIALS.map((name) => ({ value: name, label: name }));

export function isMaterial(name: string): name is Material {
  return (MATERIALS as readonly string[]).includes(name);
}

/**
 * A film of the table: its permittivity and its least strength at one ply's thickness come along as suggestions, since
 * films differ from the table. What had been typed for another film goes.
 */
export function withDielectric(draft: EditDraft, side: 'first' | 'second', name: string): EditDraft {
  if (!isMaterial(name)) return draft;
  const at = (key: string): string => `${side}.${key}`;
  const { [at('eps_r')]: _eps, [at('strength_kV_mm')]: _strength, ...texts } = draft.texts;
  const ply_um = Number(draft.texts[at('ply_um')] ?? draft.suggested[at('ply_um')]);
  const strength = minimumStrength(name, Number.isFinite(ply_um) && ply_um > 0 ? ply_um / 1000 : 0.175);
  return {
    ...draft,
    texts: { ...texts, [at('dielectric')]: name },
    suggested: {
      ...draft.suggested,
      [at('eps_r')]: String(DIELECTRICS[name].eps_r.value),
      ...(strength.ok
        ? { [at('strength_kV_mm')]: String(roundToSignificant(strength.value.value, 2, 'down')) }
        : {}),
    },
  };
}
