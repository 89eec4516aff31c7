import type { SheetSpec } from '../../book/sheet-spec';
import { GAS_AND_LAST, PROVE, SUPPLY_OFF } from './make-safe-steps';

/** Common practice at benches of this kind, no source; local rules and the person responsible come first. */
export const MAKE_SAFE_LC_INVERSION: SheetSpec = {
  title: 'Make safe: LC inversion',
  purpose: 'make-safe',
  topologies: ['lc-inversion'],
  caution:
    'Two capacitors and a middle plate that floats: each stays charged by itself. Assume that the element that joins ' +
    'them is open, so that a short on one says nothing about the other. Resistor tip first, then the hard short.',
  steps: [
    ...SUPPLY_OFF,
    {
      key: 'short-c1',
      type: 'confirm',
      guards: 'shorting',
      title: 'C1: resistor tip, then hard short',
      detail: 'Earth clamp on first. Hold the resistor tip on for ten slow breaths before the hard tip.',
      waive: 'never',
    },
    {
      key: 'short-c2',
      type: 'confirm',
      guards: 'shorting',
      title: 'C2: resistor tip, then hard short',
      detail: 'By itself, whatever C1 showed.',
      waive: 'never',
    },
    {
      key: 'short-middle',
      type: 'confirm',
      guards: 'shorting',
      title: 'Middle plate: resistor tip, then hard short',
      detail: 'It floats; it may sit at any voltage when one capacitor was emptied before the other.',
      waive: 'never',
    },
    {
      key: 'short-channel',
      type: 'confirm',
      guards: 'shorting',
      title: 'Across the channel: resistor tip, then hard short',
      detail: 'From electrode to electrode, not each to earth alone.',
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
    {
      key: 'film-edges',
      type: 'confirm',
      title: 'Film edges: no tracking',
      detail:
        'With the shorts on, all four edges of each sheet under a lamp. A brown line or a tree: stand the rig down.',
      waive: 'reviewer',
    },
    ...GAS_AND_LAST,
  ],
};
