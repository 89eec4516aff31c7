import type { KitItem } from '../../src/domain/book/bodies/kit-bodies';

export interface DemoPiece {
  readonly number: string;
  readonly name: string;
  readonly item: KitItem;
  readonly note: string;
  /** Days after the last day of the month; before it where negative. */
  readonly due_days: number | null;
  readonly holder: 'ada' | 'milo' | 'heron' | 'kettle' | null;
}

const uv = (density: number): KitItem => ({
  type: 'eyewear',
  densities: [{ from_nm: 190, to_nm: 375, density }],
  visible_transmission_pct: 70,
});

const dyePair: KitItem = {
  type: 'eyewear',
  densities: [
    { from_nm: 190, to_nm: 400, density: 6 },
    { from_nm: 420, to_nm: 540, density: 4 },
  ],
  visible_transmission_pct: 35,
};

const stick: KitItem = { type: 'shorting-stick', resistor_kohm: 10, rated_kV: 40 };

function spare(count: number, minimum: number): KitItem {
  return { type: 'spare', count, minimum, catalogue: null };
}

/** The register of the demo lab; every piece is invented. */
export const demoRegister: readonly DemoPiece[] = [
  { number: 'E1', name: 'Clear UV pair', item: uv(6), note: '', due_days: 160, holder: 'ada' },
  { number: 'E2', name: 'Clear UV pair', item: uv(6), note: '', due_days: 160, holder: 'milo' },
  { number: 'E3', name: 'Orange pair for dye', item: dyePair, note: '', due_days: 21, holder: null },
  {
    number: 'E4',
    name: 'Old UV pair',
    item: uv(4),
    note: 'Scratched on the left.',
    due_days: -12,
    holder: null,
  },
  { number: 'K1', name: 'Stick, bench 1', item: stick, note: '', due_days: 200, holder: 'kettle' },
  { number: 'K2', name: 'Stick, bench 2', item: stick, note: '', due_days: 200, holder: 'heron' },
  {
    number: 'M1',
    name: 'Probe 1,000 to 1',
    item: { type: 'meter', measures: 'voltage by probe', rated_kV: 40 },
    note: '',
    due_days: 95,
    holder: null,
  },
  {
    number: 'M2',
    name: 'Hand meter',
    item: { type: 'meter', measures: 'voltage below 1 kV', rated_kV: 1 },
    note: '',
    due_days: -40,
    holder: null,
  },
  {
    number: 'V1',
    name: 'Relief valve of Kettle',
    item: { type: 'relief-valve', set_bar_g: 1.5 },
    note: '',
    due_days: 60,
    holder: 'kettle',
  },
  {
    number: 'V2',
    name: 'Relief valve of Heron',
    item: { type: 'relief-valve', set_bar_g: 1 },
    note: '',
    due_days: 60,
    holder: 'heron',
  },
  {
    number: 'R1',
    name: 'Nitrogen regulator',
    item: { type: 'regulator', gas: 'N2', max_bar_g: 2 },
    note: '',
    due_days: 300,
    holder: 'kettle',
  },
  {
    number: 'C7',
    name: 'Nitrogen',
    item: { type: 'cylinder', gas: 'N2', water_L: 20, pressure_bar_g: 142 },
    note: '',
    due_days: null,
    holder: 'kettle',
  },
  {
    number: 'Y1',
    name: 'Supply key, bench 1',
    item: { type: 'key', opens: 'the supply of Kettle' },
    note: '',
    due_days: null,
    holder: 'ada',
  },
  {
    number: 'S1',
    name: 'Ceramic 1.0 nF, 30 kV',
    item: spare(2, 3),
    note: '',
    due_days: null,
    holder: null,
  },
  {
    number: 'S2',
    name: 'PET film, 175 µm, sheet',
    item: spare(8, 4),
    note: '',
    due_days: null,
    holder: null,
  },
];
