import type { SheetSpec } from '../../book/sheet-spec';
import { BEFORE_FIRING } from './before-firing';
import { DYE_HANDLING } from './dye-handling';
import { GAS_CHANGE } from './gas-change';
import { MAKE_SAFE_CHARGE_TRANSFER } from './make-safe-charge-transfer';
import { MAKE_SAFE_LC_INVERSION } from './make-safe-lc-inversion';
import { WEEKLY_CARE } from './weekly-care';

export interface ReadySheet {
  readonly key: string;
  readonly spec: SheetSpec;
}

/**
 * Sheets to start from, in order of use. Common practice, no source: a lab copies one, makes it its own and publishes it;
 * nothing of this is in force by itself.
 */
export const READY_SHEETS: readonly ReadySheet[] = [
  { key: 'before-firing', spec: BEFORE_FIRING },
  { key: 'make-safe-charge-transfer', spec: MAKE_SAFE_CHARGE_TRANSFER },
  { key: 'make-safe-lc-inversion', spec: MAKE_SAFE_LC_INVERSION },
  { key: 'gas-change', spec: GAS_CHANGE },
  { key: 'dye-handling', spec: DYE_HANDLING },
  { key: 'weekly-care', spec: WEEKLY_CARE },
];
