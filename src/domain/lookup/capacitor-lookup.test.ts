import { describe, expect, it } from 'vitest';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { KETTLE_SPEC } from '../../../seeds/rigs/kettle';
import type { RigSpec } from '../book/rig-spec';
import { derivedFigure, rigDerived } from '../rules/rig-derived';
import { rigFigures } from '../rules/rig-figures';
import { anyValues, notShowable } from './any-values.fixture';
import { CAPACITOR_LOOKUP } from './capacitor-lookup';
import type { Figure, LookupAnswer, Values } from './lookup';
import { solveFor } from './solve';

const LAB = {
  name: 'Lab',
  zone: 'UTC',
  ambient_bar_abs: 0.966,
  ambient_C: 21,
  discharged_below_V: 50,
  working_alone: 'forbidden' as const,
  emergency: { isolator: '', ring: [], first_aid: '' },
};

const startOf = (spec: RigSpec | null) => CAPACITOR_LOOKUP.start({ spec, settings: LAB });

function answered(values: Values): LookupAnswer {
  const result = CAPACITOR_LOOKUP.answer(values);
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
}

function figure(values: Values, key: string): Figure {
  const found = answered(values).figures.find((one) => one.key === key);
  if (found === undefined) throw new Error(`no figure ${key}`);
  return found;
}

const HERON = startOf(HERON_SPEC).values;
const KETTLE = startOf(KETTLE_SPEC).values;

describe('the capacitor lookup, prefilled', () => {
  it('gives the digits of the rig\u2019s own figures', () => {
    const heron = rigDerived(HERON_SPEC, LAB);
    const own = (key: Parameters<typeof derivedFigure>[1]) => {
      const { figure: one } = derivedFigure(heron, key);
      return one.ok ? one.value.value : Number.NaN;
    };
    expect(figure(HERON, 'capacitance').value).toBe(own('first'));
    expect(figure(HERON, 'stress').value).toBe(own('stress_first'));
    expect(figure(HERON, 'margin').value).toBe(own('margin_first'));
    const kettle = rigFigures(KETTLE_SPEC, LAB);
    if (!kettle.ok) throw new Error(kettle.refusal.words);
    expect(figure(KETTLE, 'energy').value).toBeCloseTo(kettle.value.stored_J, 12);
    expect(figure(KETTLE, 'energy').note).toBe(kettle.value.hazard.words);
    expect(kettle.value.wait).toMatchObject({ wait_s: figure(KETTLE, 'wait').value });
    expect(figure(KETTLE, 'bleeds').value).toBeCloseTo(12.4, 1);
  });

  // The lab of the demo, computed apart from this code: 3.89 nF, 22.9 kV/mm, 3.5 times under 80.
  it('holds the demo\u2019s sheet', () => {
    expect(figure(HERON, 'capacitance').value).toBeCloseTo(3.89, 2);
    expect(figure(HERON, 'stress').value).toBeCloseTo(22.9, 1);
    expect(figure(HERON, 'margin').value).toBeCloseTo(3.5, 1);
  });

  it('says what comes from the rig, the lab and nobody', () => {
    const { known } = startOf(HERON_SPEC);
    expect(known).toMatchObject({
      ply_um: 'rig',
      below_V: 'lab',
      air_um: 'assumed',
      reversal_percent: 'assumed',
    });
    expect(startOf(null).known).toMatchObject({ supply_kV: 'assumed' });
  });

  it('shows no energy as if it were small without the supply beside it', () => {
    const alone = startOf(null).values;
    expect(figure(alone, 'energy').note).toContain('Enter the supply');
    expect(answered(alone).says).toContain('Enter the supply');
    expect(figure({ ...alone, supply_kV: 16, supply_mA: 1 }, 'energy').note).toContain(
      '16\u2009kV and 1\u2009mA',
    );
  });
});

describe('the capacitor lookup', () => {
  it('tells plies between foils from active plate pairs', () => {
    const plies = { ...HERON, plies: 8 };
    const pairs = { ...HERON, plate_pairs: 2 };
    expect(figure(plies, 'capacitance').value / figure(HERON, 'capacitance').value).toBeCloseTo(0.5, 12);
    expect(figure(plies, 'stress').value / figure(HERON, 'stress').value).toBeCloseTo(0.5, 12);
    expect(figure(pairs, 'capacitance').value / figure(HERON, 'capacitance').value).toBeCloseTo(2, 12);
    expect(figure(pairs, 'stress').value).toBe(figure(HERON, 'stress').value);
  });

  // Physics C: 20 um of air on 125 um PET (3.2) take 34 %; physics N: 15 kV there give 153 kV/mm on 250 um.
  it('counts an air film', () => {
    const film = { ...HERON, plies: 1, ply_um: 125, voltage_kV: 5 };
    const share = figure({ ...film, air_um: 20 }, 'capacitance').value / figure(film, 'capacitance').value;
    expect(share).toBeCloseTo(0.66, 2);
    const thick = { ...HERON, plies: 1, ply_um: 250, voltage_kV: 15, air_um: 20 };
    expect(figure(thick, 'air_field').value).toBeCloseTo(153, 0);
    expect(answered(thick).warnings.map(({ type }) => type)).toContain('air-film-breaks');
  });

  // Physics K6: edges of 125 and 250 um PET discharge from 1.06 and 1.55 kV; physics K7: 90 kV/mm at 125 um.
  it('gives the film\u2019s edges and its strength from the table', () => {
    const film = {
      ...HERON,
      film: 'table',
      plies: 1,
      ply_um: 125,
      eps_r: 1,
      strength_kV_mm: 1,
      voltage_kV: 5,
    };
    expect(figure(film, 'inception').value).toBeCloseTo(1.06, 1);
    expect(figure(film, 'strength').value).toBeCloseTo(90.8, 1);
    expect(figure({ ...film, edge_mm: 10 }, 'edge').value).toBeCloseTo(15, 9);
    expect(answered({ ...film, edge_mm: 10 }).warnings.map(({ type }) => type)).toContain('edge-too-short');
  });

  it('gives no wait without a bleed, and never one under a minute', () => {
    const unknown = { ...KETTLE, bleed_Mohm: null };
    expect(answered(unknown).figures.map(({ key }) => key)).not.toContain('wait');
    expect(answered(unknown).cautions[0]).toContain('treat it as charged');
    expect(figure({ ...KETTLE, bleed_Mohm: 1 }, 'wait').value).toBe(60);
  });

  it('takes a string of parts, and the fall of ceramic under voltage, for less and never for more', () => {
    const ceramic = { ...KETTLE, part: 'high-permittivity ceramic', voltage_kV: 30 };
    // Class falls of 20 to 60 % at rated voltage, from memory: the middle is 40 %.
    expect(figure(ceramic, 'under_voltage').value).toBeCloseTo(3, 9);
    expect(figure(ceramic, 'capacitance').value).toBeCloseTo(5, 9);
    const string = { ...KETTLE, in_series: 2, voltage_kV: 50 };
    expect(figure(string, 'capacitance').value).toBeCloseTo(2.5, 9);
    expect(figure(string, 'margin').value).toBeCloseTo(1.2, 9);
  });

  it('gives a life only from shots that somebody endured', () => {
    expect(answered(HERON).figures.map(({ key }) => key)).not.toContain('life');
    const tested = { ...HERON, endured_shots: 10_000, endured_kV: 16, shots: 2500 };
    expect(figure(tested, 'life').value).toBeCloseTo(10_000, 6);
    expect(figure(tested, 'life_used').value).toBeCloseTo(25, 9);
    expect(figure({ ...tested, endured_kV: 32 }, 'life').value).toBeCloseTo(10_000 * 2 ** 7.5, 3);
  });

  it.each([
    ['kind', 'gas'],
    ['ply_um', null],
    ['plies', 1.5],
    ['voltage_kV', Number.NaN],
    ['supply_kV', 1e9],
  ])('refuses %s %s beside its field', (field, value) => {
    expect(CAPACITOR_LOOKUP.answer({ ...HERON, [field]: value })).toMatchObject({ refusal: { field } });
  });

  it('asks for the figures of a film that the table does not hold', () => {
    expect(CAPACITOR_LOOKUP.answer({ ...HERON, dielectric: 'other', film: 'table' })).toMatchObject({
      refusal: { field: 'film' },
    });
  });

  it('solves for plies, voltage and area', () => {
    const find = (field: string, name: string, target: number) => {
      const solvable = CAPACITOR_LOOKUP.solvable.find((one) => one.field === field && one.figure === name)!;
      const found = solveFor(CAPACITOR_LOOKUP, HERON, { solvable, target });
      return found.ok ? found.value.value : found.refusal.words;
    };
    expect(find('plies', 'margin', 4)).toBe(5);
    // Half a ply more stress than it may have: 80/4 over 0.7 mm is 14 kV.
    expect(find('voltage_kV', 'margin', 4)).toBeCloseTo(14, 1);
    expect(find('width_mm', 'capacitance', 5)).toBeCloseTo(411.7, 0);
  });

  it('answers or refuses in words whatever is entered', { timeout: 60_000 }, () => {
    let answers = 0;
    for (const values of anyValues(CAPACITOR_LOOKUP, { seed: 4, count: 2000 })) {
      const result = CAPACITOR_LOOKUP.answer(values);
      if (result.ok) answers += 1;
      expect(result.ok ? notShowable(result.value) : result.refusal.words === '' ? ['no words'] : []).toEqual(
        [],
      );
    }
    expect(answers).toBeGreaterThan(1000);
  });
});
