import type { SheetSpec } from '../../book/sheet-spec';

/** Common practice at benches of this kind, no source; local rules and the person responsible come first. */
export const WEEKLY_CARE: SheetSpec = {
  title: 'Weekly care',
  purpose: 'weekly-care',
  topologies: ['lc-inversion', 'charge-transfer'],
  caution:
    'Hands are in the rig: it stays shorted from the first step to the last, with the key in your pocket and the tag on. ' +
    'Film and ceramic give charge back, so a short that slips off is put on with the resistor tip. Whatever looks wrong ' +
    'stands the rig down first and is talked about afterwards.',
  steps: [
    {
      key: 'shorted',
      type: 'confirm',
      guards: 'shorting',
      title: 'Rig made safe, shorts on, key in your pocket',
      detail: 'The make-safe check is closed. Look at every short. Hang the hands-in tag.',
      waive: 'never',
    },
    {
      key: 'second-person',
      type: 'second-person',
      title: 'Second person in the room',
      detail: 'Knows the isolator and stays until the tag is off.',
      waive: 'never',
    },
    {
      key: 'stick',
      type: 'confirm',
      title: 'Shorting stick: continuity, lead, resistor',
      detail: 'Meter from the clamp to each tip while the lead is bent along its length. A doubt: a new one.',
      waive: 'never',
    },
    {
      key: 'earths',
      type: 'reading',
      title: 'Worst earth joint',
      detail: 'From the isolator’s earth to the rig’s plate, the supply, the vessel and the bench.',
      quantity: 'Resistance',
      unit: 'Ω',
      lowest: 0,
      highest: 0.5,
      highest_from_rig: null,
      waive: 'reviewer',
    },
    {
      key: 'bleeds',
      type: 'confirm',
      title: 'Bleed resistors measured, each one',
      detail:
        'With the shorts on and one end free. Within a tenth of what the rig’s revision says; else the wait is wrong and the rig stands down.',
      waive: 'reviewer',
    },
    {
      key: 'dielectric',
      type: 'confirm',
      title: 'Film, edges and insulators under a lamp',
      detail:
        'Brown lines, trees, blisters, dust. Wiped with a dry lint-free cloth. Tracking: stand the rig down.',
      waive: 'never',
    },
    {
      key: 'electrodes',
      type: 'confirm',
      title: 'Gap and channel electrodes',
      detail: 'Pitting, burrs, colour. Feelers only with the vessel vented.',
      waive: 'reviewer',
    },
    {
      key: 'gap-length',
      type: 'reading',
      title: 'Spark gap by feeler',
      detail: 'A change against the rig’s revision is a revision of its own.',
      quantity: 'Gap',
      unit: 'mm',
      lowest: 0.1,
      highest: 50,
      highest_from_rig: null,
      waive: 'operator',
    },
    {
      key: 'relief',
      type: 'confirm',
      title: 'Vessel, relief valve, hoses',
      detail:
        'Seal and date of the valve, proof date of the vessel, crazing of any plastic. Open gap: hoses alone.',
      waive: 'reviewer',
    },
    {
      key: 'cables',
      type: 'confirm',
      title: 'High-voltage cables and connectors',
      detail: 'No nick, no kink, no dust on the terminations, clear of edges.',
      waive: 'reviewer',
    },
    {
      key: 'interlock-and-sign',
      type: 'confirm',
      title: 'Isolator, door sign, lamp tried',
      detail: 'The isolator is thrown once and the supply seen dead. Holdoff is no part of it.',
      waive: 'reviewer',
    },
    {
      key: 'beam-stops',
      type: 'confirm',
      guards: 'beam-stop',
      title: 'Beam stops: both ends, no burn-through',
      detail: 'And no shiny thing in the plane of the beam.',
      waive: 'never',
    },
    {
      key: 'eyewear',
      type: 'confirm',
      title: 'Eyewear: scratches, density marks, number of pairs',
      detail: 'One pair more than people who come in. A scratched pair is withdrawn in Kit.',
      waive: 'reviewer',
    },
    {
      key: 'photo',
      type: 'photo',
      title: 'Photo of the HV area',
      detail: 'From the same place as last week.',
      waive: 'operator',
    },
    {
      key: 'tools-out',
      type: 'confirm',
      title: 'Tools counted out, tag off, shorts stay on',
      detail: 'The shorts come off in the next before-firing check and nowhere else.',
      guards: 'shorting',
      waive: 'never',
    },
  ],
};
