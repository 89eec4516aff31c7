import { describe, expect, it } from 'vitest';
import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import type { ReadingDoc } from '../../domain/book/documents/reading';
import type { RigSpec } from '../../domain/book/rig-spec';
import { firingRows } from '../../domain/report/firing-rows';
import { lawChart, residualChart } from './firing-charts';

const bank = { kind: 'bank', part: 'Ceramic', capacitance_nF: 5, rated_kV: 30 } as const;
const spec: RigSpec = {
  topology: 'charge-transfer',
  gap: {
    gas: 'N2',
    electrodes: 'domed',
    radius_mm: 12,
    radius_known: 'assumed',
    gap_mm: 3,
    gap_error_mm: 0.05,
    irradiated: true,
    lowest_bar_g: 0.8,
    highest_bar_g: 1.2,
    vessel: null,
  },
  first: bank,
  second: bank,
  channel: { length_mm: 280, spacing_a_mm: 4, spacing_b_mm: 4, gas: 'N2', across_kohm: 50 },
  charging: { supply_kV: 25, supply_mA: 1.5, ballast_Mohm: 25 },
  nodes: [{ name: 'Dump', holds: 'first', bleed_Mohm: 400 }],
  shorting_points: ['Dump'],
  beam: { pulse_energy_uJ: 150, wavelength_nm: 337.1 },
  model: { gap_nH: 28, channel_nH: 4, known: 'assumed' },
  envelope: { max_kV: 23, max_bar_g: 1.2, max_rate_Hz: 5 },
};

const values: ReadingValues = {
  voltage_kV: 18.8,
  how: 'self-break',
  pressure_bar_g: 1,
  gas: 'N2',
  flow_L_min: null,
  rate_Hz: 2,
  shots: 40,
  looked: 'even',
  output_uJ: null,
  ambient_bar_abs: 0.966,
  temperature_C: 21,
  humidity_pct: null,
  note: '',
  carried_over: [],
};

function reading(
  no: number,
  change: Partial<ReadingValues> = {},
  rest: Partial<ReadingDoc> = {},
): ReadingDoc {
  const stamp = {
    wall_ms: 0,
    offset_min: 0,
    zone: 'UTC',
    page_life: 'p',
    monotonic_ms: 0,
    time_uncertain: false,
  };
  const logged = { entry: `r${no}`, by: 'ada', device: 'a', stamp, at: no };
  return {
    kind: 'reading',
    id: `r${no}`,
    parent: 'f',
    rig: 'rig',
    no,
    original: { ...values, ...change },
    logged,
    irregular: null,
    corrections: [],
    struck: null,
    ...rest,
  };
}

const struck = { ...reading(9).logged, why: 'wrong rig' };

describe('plots of a firing', () => {
  it('holds every measured self-break, the odd ones with their number', () => {
    const rows = firingRows(
      [
        reading(1),
        reading(2, { voltage_kV: 12 }),
        reading(3, { how: 'set' }),
        reading(4, {}, { struck }),
        reading(5, {}, { irregular: 'stood-down' }),
      ],
      spec,
    );
    const chart = lawChart(rows, spec);
    expect(chart?.readings).toEqual([
      { x: 1, y: 18.8 },
      { x: 1, y: 12, odd: true, number: 'reading 2' },
      { x: 1, y: 18.8, odd: true, number: 'reading 5' },
    ]);
    expect(chart?.y.min).toBeLessThanOrEqual(12);
    expect(chart?.band?.points.every((point) => point.low < point.high)).toBe(true);
  });

  it('draws the residuals over the shots with a band of three sigma', () => {
    const rows = firingRows([reading(1), reading(2, { voltage_kV: 19.4 })], spec);
    const chart = residualChart(rows);
    expect(chart?.readings?.map((dot) => dot.x)).toEqual([40, 80]);
    const [first, second] = chart?.readings ?? [];
    expect((second?.y ?? 0) - (first?.y ?? 0)).toBeCloseTo(0.6, 9);
    const [band] = chart?.band?.points ?? [];
    expect(band?.high).toBeCloseTo(3 * (rows[0]?.sigma_kV ?? 0), 9);
  });

  it('plots nothing where nothing was measured, and no NaN where the law has no answer', () => {
    expect(lawChart(firingRows([reading(1, { how: 'held' })], spec), spec)).toBeNull();
    expect(residualChart([])).toBeNull();
    const below = firingRows([reading(1, { pressure_bar_g: -0.96 })], spec);
    expect(residualChart(below)).toBeNull();
    expect(JSON.stringify(lawChart(below, spec))).not.toMatch(/null|NaN/);
  });
});
