import type { CapacitorSpec } from '../book/rig-spec';
import { MATERIALS } from '../capacitor/dielectrics';
import { PART_CLASSES } from '../capacitor/parts';
import type { Known, Start, StartFrom, Values } from './lookup';

const SHEET = {
  dielectric: 'PET',
  film: 'table',
  eps_r: 3.2,
  strength_kV_mm: 80,
  ply_um: 175,
  plies: 4,
  plate_pairs: 1,
  length_mm: 300,
  width_mm: 300,
} as const;
const BANK = { part: 'not known', part_nF: 1, parts: 4, rated_kV: 30 } as const;

const ASSUMED: Values = {
  kind: 'sheet',
  voltage_kV: 15,
  supply_kV: null,
  supply_mA: null,
  ...SHEET,
  air_um: 0,
  edge_mm: null,
  ...BANK,
  in_series: 1,
  reversal_percent: 100,
  endured_shots: null,
  endured_kV: null,
  shots: null,
  bleed_Mohm: null,
  below_V: 50,
};

/** The rig's first capacitor at the supply's limit. Without a rig nothing is said of a supply. */
export function capacitorStart({ spec, settings }: StartFrom): Start {
  const known: Record<string, Known> = {};
  for (const key of Object.keys(ASSUMED)) known[key] = 'assumed';
  const lab = settings === null ? {} : { below_V: settings.discharged_below_V };
  for (const key of Object.keys(lab)) known[key] = 'lab';
  if (spec === null) return { values: { ...ASSUMED, ...lab }, known };
  const { supply_kV, supply_mA } = spec.charging;
  const node = spec.nodes.find(({ holds }) => holds === 'first');
  const said: Values = {
    ...capacitorValues(spec.first),
    voltage_kV: supply_kV,
    supply_kV,
    supply_mA,
    bleed_Mohm: node?.bleed_Mohm ?? null,
  };
  for (const key of Object.keys(said)) known[key] = 'rig';
  // An LC inversion reverses its first capacitor wholly; how far a transfer swings back nobody has said.
  const reversal_percent = spec.topology === 'lc-inversion' ? 100 : 50;
  return { values: { ...ASSUMED, ...lab, reversal_percent, ...said }, known };
}

/** A rig's capacitor as the fields take it. */
export function capacitorValues(capacitor: CapacitorSpec): Values {
  if (capacitor.kind === 'bank') {
    const { capacitance_nF, rated_kV, parts = 1, catalogue } = capacitor;
    return {
      kind: 'bank',
      part: PART_CLASSES.find((name) => name === catalogue) ?? 'not known',
      part_nF: capacitance_nF / parts,
      parts,
      rated_kV,
    };
  }
  const { eps_r, strength_kV_mm, ply_um, plies, plate_pairs, length_mm, width_mm } = capacitor;
  return {
    kind: 'sheet',
    dielectric: materialIn(capacitor.dielectric),
    film: 'entered',
    eps_r,
    strength_kV_mm,
    ply_um,
    plies,
    plate_pairs,
    length_mm,
    width_mm,
  };
}

/** The table's material that the rig's own words name, as in "PET film". */
function materialIn(words: string): string {
  const plain = words.toLowerCase();
  return MATERIALS.find((name) => plain.includes(name.toLowerCase())) ?? 'other';
}
