import type { SheetSpec } from '../../book/sheet-spec';

/** Common practice at benches of this kind, no source; local rules and the person responsible come first. */
export const DYE_HANDLING: SheetSpec = {
  title: 'Dye handling',
  purpose: 'dye-handling',
  topologies: ['lc-inversion', 'charge-transfer'],
  caution:
    'Many laser dyes are toxic, of some nobody knows, and the solvents carry them through skin and burn. Read the safety ' +
    'sheet of this dye and this solvent first. No spark, no flame and no firing while solvent is open in the room. ' +
    'A dye beam has another colour: the eyewear for the nitrogen line does not stop it.',
  steps: [
    {
      key: 'sheets-read',
      type: 'confirm',
      title: 'Safety sheets of dye and solvent read',
      detail: 'Both lie at the bench. Note the dye, the solvent and the batch.',
      waive: 'never',
    },
    {
      key: 'no-firing',
      type: 'confirm',
      guards: 'shorting',
      title: 'Nothing fires: rigs in the room shorted',
      detail: 'A spark gap lights solvent vapour. Look at the shorts of every rig in the room.',
      waive: 'never',
    },
    {
      key: 'hood',
      type: 'confirm',
      title: 'Hood running, sash low',
      detail: 'Powder is weighed there too; a draught carries it.',
      waive: 'never',
    },
    {
      key: 'gloves',
      type: 'confirm',
      title: 'Gloves for this solvent, splash eyewear, coat',
      detail:
        'The glove maker’s table says how long it holds this solvent; thin nitrile lasts minutes in some. Change at once when wetted.',
      waive: 'never',
    },
    {
      key: 'fire',
      type: 'confirm',
      title: 'Extinguisher and spill kit within reach',
      detail: 'No hot plate, no ignition source, waste can earthed.',
      waive: 'reviewer',
    },
    {
      key: 'concentration',
      type: 'reading',
      title: 'Concentration made up',
      detail: 'By weight and volume as they were measured.',
      quantity: 'Concentration',
      unit: 'mmol/L',
      lowest: 0.001,
      highest: 100,
      highest_from_rig: null,
      waive: 'operator',
    },
    {
      key: 'label',
      type: 'confirm',
      title: 'Bottle labelled',
      detail: 'Dye, solvent, concentration, batch, date, name, hazard signs. Stored dark.',
      waive: 'never',
    },
    {
      key: 'cell-tight',
      type: 'confirm',
      title: 'Cell and hoses tight',
      detail: 'Run the pump for a minute over a tray with white paper under each joint.',
      waive: 'reviewer',
    },
    {
      key: 'vapour',
      type: 'confirm',
      title: 'Bottles shut and away, bench wiped, room aired',
      detail: 'Wipes into the closed solvent bin. Nobody smells solvent before a rig is charged.',
      waive: 'never',
    },
    {
      key: 'waste',
      type: 'confirm',
      title: 'Waste in its can, written up',
      detail: 'Halogenated apart from the rest. Never into the sink.',
      waive: 'reviewer',
    },
    {
      key: 'hands',
      type: 'confirm',
      title: 'Gloves off inside out, hands washed',
      detail: 'Soap and water, never solvent on skin. A coloured hand: say so, and see first aid.',
      waive: 'never',
    },
    {
      key: 'dye-eyewear',
      type: 'confirm',
      title: 'Eyewear for the dye’s wavelengths laid out',
      detail: 'For the pump line and for the dye’s whole band. Note the numbers on the frames.',
      waive: 'reviewer',
    },
  ],
};
