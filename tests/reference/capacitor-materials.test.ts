import { describe, expect, it } from 'vitest';
import { minimumStrength, relativePermittivity, type Material } from '../../src/domain/capacitor/dielectrics';
import { edgeDischargeInception, slidingDischargeInception } from '../../src/domain/capacitor/edge';
import { fringeExcess, sheetWithAirFilm } from '../../src/domain/capacitor/fringe';
import { sheetCapacitance } from '../../src/domain/capacitor/capacitance';
import { punctureProbability } from '../../src/domain/capacitor/puncture';
import { needleGap } from '../../src/domain/gap/needle-gap';
import { pairAirImpedance } from '../../src/domain/line/pair';
import { off, valueOf } from './answer-value';

const VACUUM_OHM = 376.730313668;

describe('dielectrics', () => {
  // Minimum of a BOPET data sheet, read: kV/mm at um.
  it.each([
    [75, 115],
    [100, 100],
    [125, 90],
    [150, 85],
    [175, 80],
    [200, 70],
    [250, 65],
    [300, 60],
    [350, 55],
  ])('PET of %d um stands %d kV/mm at least', (um, kV_mm) => {
    expect(off(minimumStrength('PET', um / 1000), kV_mm)).toBeLessThan(0.045);
  });

  // Polyimide film data sheet, read: 3000 V/mil at 5 mil. Never the typical 154.
  it('polyimide of 127 um stands 118 kV/mm', () => {
    expect(off(minimumStrength('Polyimide', 0.127), 3000 / 25.4)).toBeLessThan(0.002);
  });

  // Textbook values: von Hippel, Dielectric Materials and Applications (1954), at 1 MHz, from memory.
  it.each<[Material, number]>([
    ['LDPE', 2.26],
    ['PTFE', 2.1],
    ['polypropylene', 2.2],
    ['PMMA', 2.76],
    ['soda-lime glass', 6.9],
  ])('%s: %d within its band', (material, eps_r) => {
    const answer = relativePermittivity(material);
    expect(answer.ok && answer.value.band.low).toBeLessThanOrEqual(eps_r);
    expect(answer.ok && answer.value.band.high).toBeGreaterThanOrEqual(eps_r);
  });
});

describe('edges', () => {
  // Two strips of width w, t apart, by Hammerstad and Jensen (1980): C per metre is 1/(Z c).
  it.each([
    [5, 0.015],
    [10, 0.01],
    [25, 0.005],
    [100, 0.003],
  ])('a strip %d times as wide as thick: edges by the impedance within %d', (ratio, tolerance) => {
    const ohm = valueOf(pairAirImpedance({ width_m: ratio * 1e-3, spacing_m: 1e-3 }));
    expect(off(fringeExcess(ratio * 1e-3, 1e-3), VACUUM_OHM / ohm / ratio - 1)).toBeLessThan(
      tolerance * ratio,
    );
    expect(
      Math.abs((1 + valueOf(fringeExcess(ratio * 1e-3, 1e-3))) / (VACUUM_OHM / ohm / ratio) - 1),
    ).toBeLessThan(tolerance);
  });

  // 163 (t/eps_r)^0.46 V rms, t in um: the inception law of dry-type insulation, from memory.
  it.each([
    [50, 3.2],
    [125, 3.2],
    [125, 2.25],
    [250, 3.2],
    [500, 2.2],
  ])('%d um of permittivity %d discharges from 0.83 to 1.1 of the recalled law', (um, eps_r) => {
    const recalled_V = Math.SQRT2 * 163 * (um / eps_r) ** 0.46;
    const share = valueOf(edgeDischargeInception(um, eps_r)) / recalled_V;
    expect(share).toBeGreaterThan(0.83);
    expect(share).toBeLessThan(1.1);
  });

  // 5 to 9 kV on 0.125 to 0.25 mm of PET: Toepler's constants, from memory.
  it.each([125, 250])('sliding discharges over %d um of PET start between 4 and 9 kV', (um) => {
    const kV = valueOf(slidingDischargeInception(um, 3.2));
    expect(kV).toBeGreaterThan(4);
    expect(kV).toBeLessThan(9);
  });

  // 20 um of air on 125 um of PET take about a third: series capacitors, by hand.
  it('an air film takes a third of a thin sheet', () => {
    const sheet = { eps_r: 3.2, area_m2: 0.09, thickness_m: 125e-6, layers: 1 };
    const share = valueOf(sheetWithAirFilm({ ...sheet, air_m: 20e-6 })) / valueOf(sheetCapacitance(sheet));
    expect(share).toBeCloseTo(1 / (1 + (3.2 * 20) / 125), 9);
  });
});

describe('chance of puncture', () => {
  // By the meaning of E63, and for ten weak links at once.
  it.each([
    [1, 1, 1 - Math.exp(-1)],
    [1, 10, 1 - Math.exp(-10)],
    [0.5, 1, 1 - Math.exp(-(0.5 ** 10))],
  ])('at %d of E63 and %d areas: %d', (...[stress_over_E63, area_ratio, expected]) => {
    expect(off(punctureProbability({ stress_over_E63, area_ratio, beta: 10 }), expected)).toBeLessThan(1e-12);
  });
});

describe('needle points', () => {
  // AIEE spark-gap table, read in a public reprint: kV peak and cm.
  it.each([
    [5, 0.42],
    [10, 0.85],
    [20, 1.75],
    [40, 3.81],
  ])('%d kV jump %d cm', (kV, cm) => {
    expect(off(needleGap(kV), cm)).toBeLessThan(1e-9);
  });
});
