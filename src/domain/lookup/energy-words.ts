import { energyText } from '../capacitor/energy-text';
import { numberAt } from './fields';
import type { Values } from './lookup';

/** An energy with its supply beside it: no energy stands alone, because the supply is what usually kills. */
export function energyWords(energy_J: number, values: Values): string {
  const energy = energyText(energy_J);
  const [kV, mA] = [numberAt(values, 'supply_kV'), numberAt(values, 'supply_mA')];
  return kV === null || mA === null
    ? `${energy}\u2009J, whatever supply charges it`
    : `${energy}\u2009J, charged by a supply of ${String(kV)}\u2009kV and ${String(mA)}\u2009mA`;
}
