import { formatFigure } from '../units/format-quantity';

/** Counting digits of a stored energy, so that every place shows the same ones. */
export const ENERGY_DIGITS = 3;

/** A stored energy in J without its unit, rounded up: it can only hurt by being more. */
export function energyText(energy_J: number): string {
  return formatFigure(energy_J, { digits: { significant: ENERGY_DIGITS }, rounding: 'up' });
}
