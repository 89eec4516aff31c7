import type { Known, NumberField, StartFrom } from './lookup';

/** Pressure of the air at the bench. It starts empty where the lab has not said it. */
export const AMBIENT_FIELD: NumberField = {
  kind: 'number',
  key: 'ambient_bar_abs',
  label: 'Ambient',
  unit: 'bar(abs)',
  min: 0.3,
  max: 1.1,
  step: 0.005,
  decimals: 3,
  slide: { from: 0.6, to: 1.1, scale: 'linear' },
  help: 'Pressure of the air outside, as a barometer at the bench reads it, not reduced to sea level. It has no default.',
};

/** What the lab says of the air; there is no default for its pressure. */
export function labAir({ settings }: StartFrom): {
  readonly values: { readonly ambient_bar_abs: number | null; readonly temperature_C: number };
  readonly known: { readonly ambient_bar_abs: Known; readonly temperature_C: Known };
} {
  const known = settings === null ? 'assumed' : 'lab';
  return {
    values: {
      ambient_bar_abs: settings?.ambient_bar_abs ?? null,
      temperature_C: settings?.ambient_C ?? 20,
    },
    known: { ambient_bar_abs: known, temperature_C: known },
  };
}
