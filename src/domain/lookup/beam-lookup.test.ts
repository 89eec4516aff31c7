import { describe, expect, it } from 'vitest';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { createAsked } from './asked.fixture';
import { BEAM_LOOKUP as BEAM } from './beam-lookup';
import { solveFor } from './solve';

const { asked, figure, refusal, values } = createAsked(BEAM, {
  spec: HERON_SPEC,
  settings: DEMO_LAB_SETTINGS,
});

// Physics H, worked: 1 mJ, 5 ns, 1 x 5 mm, 2 x 6 mrad.
const WORKED = {
  pulse_energy_uJ: 1000,
  wavelength_nm: 337.1,
  pulse_ns: 5,
  width_mm: 1,
  height_mm: 5,
  divergence_width_mrad: 2,
  divergence_height_mrad: 6,
  rate_Hz: 0.001,
  exposure_s: 1,
};

describe('the beam lookup', () => {
  it('calls the pulse energy the rig’s only where it is the one that the rig declares', () => {
    const knownAt = (pulse_energy_uJ: number) => {
      const spec = { ...HERON_SPEC, beam: { ...HERON_SPEC.beam, pulse_energy_uJ } };
      return BEAM.start({ spec, settings: DEMO_LAB_SETTINGS }).known['pulse_energy_uJ'];
    };
    expect(knownAt(60)).toBe('assumed');
    expect(knownAt(5000)).toBe('rig');
  });

  it('gives the worked beam: 47.1 J/m2, 200 J/m2, density 0.7 up, 0.67 m', () => {
    expect(figure('limit_single', WORKED).value).toBeCloseTo(47.1, 1);
    expect(figure('exposure', WORKED).value).toBeCloseTo(200, 6);
    expect(figure('od_pulse', WORKED).value).toBe(0.7);
    expect(figure('distance_pulse', WORKED).value).toBeCloseTo(0.67, 2);
    expect(figure('hazard_distance', WORKED).value).toBeCloseTo(0.67, 2);
  });

  // 100 uJ through 1 x 5 mm is under its single-pulse limit, but 10 Hz use up the day in 50 s (physics H).
  it('uses up a day in 50 s at 10 Hz although one pulse is under its limit', () => {
    const slow = { ...WORKED, pulse_energy_uJ: 100, rate_Hz: 10, exposure_s: 100 };
    expect(figure('distance_pulse', slow).value).toBe(0);
    expect(figure('dose_time', slow).value).toBeCloseTo(50, 6);
    expect(figure('dose_share', slow).value).toBeCloseTo(200, 6);
    expect(figure('hazard_distance', slow).value).toBeGreaterThan(0);
    expect(asked(slow).says).toMatch(/the time in the beam is over it/);
    expect(asked({ ...slow, pulse_ns: 0.6 }).says).toMatch(/^One pulse at the aperture is over/);
  });

  // Photon of 337.1 nm: 3.678 eV; 100 uJ are 1.70e14 of them (physics E).
  it('counts photons', () => {
    expect(figure('photon', WORKED).value).toBeCloseTo(3.678, 3);
    expect(figure('photons', { ...WORKED, pulse_energy_uJ: 100 }).value / 1e14).toBeCloseTo(1.7, 2);
    expect(figure('peak', WORKED).value).toBeCloseTo(200, 9);
  });

  // 20 uJ of dye light: density 2.4 for one pulse, spot on paper from 5.6 cm (physics O).
  it('asks for a second density where a dye is pumped', () => {
    const pump_uJ = (20 * 460) / 337.1;
    const dye = { ...WORKED, pulse_energy_uJ: pump_uJ, second: 'dye', dye_nm: 460 };
    expect(figure('dye_energy', dye).value).toBeCloseTo(20, 9);
    expect(figure('od_dye', dye).value).toBe(2.5);
    expect(figure('diffuse_dye', dye).value).toBeCloseTo(5.64, 2);
    expect(asked(WORKED).figures.map(({ key }) => key)).not.toContain('od_dye');
  });

  it('plans with a thousandth of what the rig stores, which is more than its meter read', () => {
    expect(values()['pulse_energy_uJ']).toBeCloseTo(901, 0);
  });

  it('finds the pulse energy that reaches no farther than a bench', () => {
    const at = values({ ...WORKED, rate_Hz: 10, exposure_s: 10 });
    const found = solveFor(BEAM, at, { solvable: BEAM.solvable[0]!, target: 2 });
    if (!found.ok) throw new Error(found.refusal.words);
    const reach = found.value.answer.figures.find(({ key }) => key === 'hazard_distance');
    expect(reach?.value).toBeLessThanOrEqual(2);
    expect(reach?.value).toBeGreaterThan(1.9);
  });

  it.each([
    [{ wavelength_nm: 266 }, 'wavelength_nm'],
    [{ second: 'dye', dye_nm: 800 }, 'dye_nm'],
    [{ second: 'dye', dye_nm: 330 }, 'dye_nm'],
    [{ exposure_s: null }, 'exposure_s'],
    [{ wavelength_nm: 500, pulse_ns: 1e-4 }, 'pulse_ns'],
  ])('refuses %j beside %s', (change, field) => {
    expect(refusal(change)).toMatchObject({ field });
  });
});
