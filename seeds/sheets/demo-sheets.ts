import type { SheetSpec } from '../../src/domain/book/sheet-spec';
import { BEFORE_FIRING } from '../../src/domain/rules/ready-sheets/before-firing';
import { DYE_HANDLING } from '../../src/domain/rules/ready-sheets/dye-handling';
import { GAS_CHANGE } from '../../src/domain/rules/ready-sheets/gas-change';
import { MAKE_SAFE_CHARGE_TRANSFER } from '../../src/domain/rules/ready-sheets/make-safe-charge-transfer';
import { MAKE_SAFE_LC_INVERSION } from '../../src/domain/rules/ready-sheets/make-safe-lc-inversion';
import { WEEKLY_CARE } from '../../src/domain/rules/ready-sheets/weekly-care';
import { namedId } from '../named-id';

export interface DemoSheet {
  readonly id: string;
  readonly spec: SheetSpec;
}

/** One sheet before firing, and one to make safe for each circuit: there from the first day. */
export const DEMO_SHEETS = {
  'before-firing': { id: namedId('sheet/before-firing'), spec: BEFORE_FIRING },
  'make-safe-charge-transfer': {
    id: namedId('sheet/make-safe-charge-transfer'),
    spec: MAKE_SAFE_CHARGE_TRANSFER,
  },
  'make-safe-lc-inversion': { id: namedId('sheet/make-safe-lc-inversion'), spec: MAKE_SAFE_LC_INVERSION },
} as const satisfies Readonly<Record<string, DemoSheet>>;

/** Published at the end of the month. */
export const LATER_SHEETS = {
  'gas-change': { id: namedId('sheet/gas-change'), spec: GAS_CHANGE },
  'dye-handling': { id: namedId('sheet/dye-handling'), spec: DYE_HANDLING },
  'weekly-care': { id: namedId('sheet/weekly-care'), spec: WEEKLY_CARE },
} as const satisfies Readonly<Record<string, DemoSheet>>;
