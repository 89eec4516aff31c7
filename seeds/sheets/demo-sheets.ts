import type { SheetSpec } from '../../src/domain/book/sheet-spec';
import { namedId } from '../named-id';
import { BEFORE_FIRING } from './before-firing';
import { MAKE_SAFE_CHARGE_TRANSFER } from './make-safe-charge-transfer';
import { MAKE_SAFE_LC_INVERSION } from './make-safe-lc-inversion';

export interface DemoSheet {
  readonly id: string;
  readonly spec: SheetSpec;
}

/** One sheet before firing, and one to make safe for each circuit. */
export const DEMO_SHEETS = {
  'before-firing': { id: namedId('sheet/before-firing'), spec: BEFORE_FIRING },
  'make-safe-charge-transfer': {
    id: namedId('sheet/make-safe-charge-transfer'),
    spec: MAKE_SAFE_CHARGE_TRANSFER,
  },
  'make-safe-lc-inversion': { id: namedId('sheet/make-safe-lc-inversion'), spec: MAKE_SAFE_LC_INVERSION },
} as const satisfies Readonly<Record<string, DemoSheet>>;
