/** A laser dye that a small rig may pump. Check the label: salts and hydrates differ. */
export interface Dye {
  readonly name: string;
  readonly formula: string;
  readonly caution: string;
}

const TOXIC = 'Treat as toxic: gloves, no dust, no skin contact.';

/** Formulas by composition; names as sold. */
export const DYES: readonly Dye[] = [
  { name: 'rhodamine 6G chloride', formula: 'C28H31ClN2O3', caution: TOXIC },
  { name: 'rhodamine B chloride', formula: 'C28H31ClN2O3', caution: TOXIC },
  { name: 'coumarin 1 (47, 460)', formula: 'C14H17NO2', caution: TOXIC },
  { name: 'coumarin 102 (480)', formula: 'C16H17NO2', caution: TOXIC },
  { name: 'coumarin 153', formula: 'C16H14F3NO2', caution: TOXIC },
  { name: 'coumarin 120', formula: 'C10H9NO2', caution: TOXIC },
  { name: '4-methylumbelliferone', formula: 'C10H8O3', caution: TOXIC },
  { name: 'DCM', formula: 'C19H17N3O', caution: `${TOXIC} Suspected to be mutagenic.` },
  { name: 'fluorescein', formula: 'C20H12O5', caution: TOXIC },
  { name: 'disodium fluorescein', formula: 'C20H10Na2O5', caution: TOXIC },
  { name: 'POPOP', formula: 'C24H16N2O2', caution: TOXIC },
  { name: 'PBD', formula: 'C20H14N2O', caution: TOXIC },
];

/** A solvent and what to mind beside sparks. */
export const SOLVENT_CAUTIONS: readonly { readonly solvent: string; readonly words: string }[] = [
  { solvent: 'ethanol', words: 'Flammable: no open cell beside a spark gap.' },
  { solvent: 'methanol', words: 'Flammable and toxic: no open cell beside a spark gap, no skin contact.' },
  { solvent: 'DMSO', words: 'Carries dye through the skin.' },
  { solvent: 'toluene', words: 'Flammable and toxic.' },
];
