import type { SheetSpec } from '../../book/sheet-spec';
import { GAS_AND_LAST, PROVE, SUPPLY_OFF } from './make-safe-steps';

/** Common practice at benches of this kind, no source; local rules and the person responsible come first. */
export const MAKE_SAFE_CHARGE_TRANSFER: SheetSpec = {
  title: 'Make safe: charge transfer',
  purpose: 'make-safe',
  topologies: ['charge-transfer'],
  caution:
    'A charged gap that did not fire holds the whole supply. The peaking capacitor may be charged the other way round. ' +
    'Resistor tip first, then the hard short, one hand, the second person watching.',
  steps: [
    ...SUPPLY_OFF,
    {
      key: 'short-dump',
      type: 'confirm',
      guards: 'shorting',
      title: 'Dump capacitor: resistor tip, then hard short',
      detail: 'Earth clamp on first. Hold the resistor tip on for ten slow breaths before the hard tip.',
      waive: 'never',
    },
    {
      key: 'short-peaking',
      type: 'confirm',
      guards: 'shorting',
      title: 'Peaking capacitor: resistor tip, then hard short',
      detail: 'By itself: the gap parts it from the dump capacitor.',
      waive: 'never',
    },
    {
      key: 'short-gap-and-supply',
      type: 'confirm',
      guards: 'shorting',
      title: 'Gap and supply node: resistor tip, then hard short',
      detail: 'The cable and the output of the supply hold charge too.',
      waive: 'never',
    },
    ...PROVE,
    ...GAS_AND_LAST,
  ],
};
