import { describe, expect, it } from 'vitest';
import { rigLaw } from '../../domain/calibration/rig-law';
import { rigCalibration, rigGapOf } from '../../domain/rules/rig-calibration';
import { calibrationChart, fitFigures, leftOutWords, residualChart, residualsOf } from './calibration-view';
import { firingChart } from './firing-chart';
import { FIRING, readingDoc, RIG, SPEC } from './firing.fixture';
import { nextBase } from './reading-form';

const SCALE = 0.95;
const law = rigLaw(rigGapOf(SPEC));

/** Twelve self-breaks at the rig's own scale; the ninth is far below. */
const readings = Array.from({ length: 12 }, (_, i) => {
  const pressure_bar_g = 0.8 + 0.05 * (i % 6);
  const kV = law({ gap_mm: 3, pressure_bar_abs: pressure_bar_g + 0.966, temperature_C: 21 });
  const own = (kV.ok ? kV.value : NaN) * SCALE * (i % 2 === 0 ? 1.006 : 0.994);
  return readingDoc(i + 1, { pressure_bar_g, voltage_kV: i === 8 ? 0.7 * own : own });
});
const found = rigCalibration({ rig: RIG, firings: [FIRING], readingsOf: () => readings });
if (!found.ok) throw new Error(found.refusal.words);
const calibration = found.value;

describe('the calibration screen', () => {
  it('gives each fitted number with its interval', () => {
    const figures = fitFigures(calibration, SPEC);
    expect(figures.map(({ label }) => label)).toEqual([
      'Scale, own over law',
      'Scatter of single shots',
      'Self-breaks used',
    ]);
    expect(figures[0]?.words).toMatch(/^0\.9(49|50|51) \(0\.94\d to 0\.95\d\)$/);
    expect(figures[2]?.words).toBe('11, at 1.77 to 2.02\u2009bar(abs)');
  });

  it('names the reading out of the family and keeps it out of the residuals', () => {
    expect(calibration.fit.outliers.map(({ name }) => name)).toEqual(['A-119 no. 9']);
    const residuals = residualsOf(calibration);
    expect(residuals).toHaveLength(11);
    expect(residuals.map(({ point }) => point.no)).not.toContain(9);
    expect(Math.max(...residuals.map(({ residual }) => Math.abs(residual)))).toBeLessThan(0.01);
  });

  it('draws the own curve under the law, over what was read and no further', () => {
    const chart = calibrationChart(calibration, SPEC);
    const own = chart?.own?.points ?? [];
    expect(own.length).toBeGreaterThan(10);
    for (const { x, y } of own) {
      expect(x).toBeGreaterThanOrEqual(1.766 - 1e-9);
      expect(x).toBeLessThanOrEqual(2.016 + 1e-9);
      expect(y).toBeLessThan(chart!.law!.find((one) => one.x >= x - 1e-9)!.y);
    }
    expect(chart?.readings?.filter((dot) => dot.odd).map((dot) => dot.number)).toEqual(['A-119 no. 9']);
  });

  it('holds every residual within its axes', () => {
    const chart = residualChart(calibration);
    for (const { x, y } of chart?.readings ?? []) {
      expect(x >= chart!.x.min && x <= chart!.x.max).toBe(true);
      expect(y >= chart!.y.min && y <= chart!.y.max).toBe(true);
    }
  });

  it('says what was not used and why', () => {
    expect(leftOutWords({ ...calibration.left_out, irregular: 2, 'left-out': 1 })).toBe(
      '2 irregular, 1 left out by the reviewer',
    );
    expect(leftOutWords(calibration.left_out)).toBe('');
  });

  it('is drawn over the law in the chart of a firing', () => {
    const input = { spec: SPEC, values: nextBase(readings[0]!.original).values, rows: [], sigmas: new Map() };
    const chart = firingChart({ ...input, own: calibration });
    expect(chart?.own?.points.length).toBeGreaterThan(2);
    expect(firingChart({ ...input, own: null })?.own).toBeUndefined();
    expect(
      firingChart({ ...input, values: { ...input.values, gas: 'air' }, own: calibration })?.own,
    ).toBeUndefined();
  });
});
