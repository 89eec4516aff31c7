import { formatFigure } from '../../domain/units/format-quantity';

/** Energies round up: two decimals, three below a tenth of a joule. */
export function energyFigure(value_J: number): string {
  return formatFigure(value_J, { digits: { decimals: value_J < 0.1 ? 3 : 2 }, rounding: 'up' });
}
