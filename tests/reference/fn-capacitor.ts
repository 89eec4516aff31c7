import { minimumStrength, relativePermittivity } from '../../src/domain/capacitor/dielectrics';
import { edgeDischargeInception } from '../../src/domain/capacitor/edge';
import { fringeExcess } from '../../src/domain/capacitor/fringe';
import { lifeShots } from '../../src/domain/capacitor/life';
import { areaStrengthRatio, punctureProbability } from '../../src/domain/capacitor/puncture';
import { bleedPower, bleedTime } from '../../src/domain/capacitor/bleed';
import { sheetCapacitance } from '../../src/domain/capacitor/capacitance';
import { shotCharge, storedEnergy } from '../../src/domain/capacitor/energy';
import { arcThreshold, reflexThreshold, shockThreshold } from '../../src/domain/capacitor/hazard';
import { exceedsTouchLimit } from '../../src/domain/capacitor/touch';
import {
  airFilmField,
  dielectricStress,
  petMinimumStrength,
  stressMargin,
} from '../../src/domain/capacitor/stress';
import { repetitionRate, supplyPower } from '../../src/domain/charging/relaxation';
import type { ReferenceFunction } from './fn-table';

export const CAPACITOR_FUNCTIONS: Readonly<Record<string, ReferenceFunction>> = {
  'capacitor.energy': (i) => storedEnergy(i.number('C_F'), i.number('V_V')),
  'capacitor.shotCharge': (i) => shotCharge(i.number('C_F'), i.number('V0_V'), i.number('reversal')),
  'capacitor.sheet': (i) =>
    sheetCapacitance({
      eps_r: i.number('eps_r'),
      area_m2: i.number('area_m2'),
      thickness_m: i.number('t_m'),
      layers: i.number('n_parallel', 1),
    }),
  'capacitor.stress': (i) => dielectricStress(i.number('V_V'), i.number('t_m')),
  'capacitor.stressMargin': (i) => stressMargin(i.number('V_V'), i.number('t_m'), i.number('E_bd_kV_mm')),
  'capacitor.airFilmField': (i) =>
    airFilmField({
      voltage_V: i.number('V_V'),
      thickness_um: i.number('t_um'),
      eps_r: i.number('eps_r'),
      air_um: i.number('g_um'),
    }),
  'capacitor.dielectric.petMinStrength': (i) => petMinimumStrength(i.number('t_um')),
  'capacitor.dielectric.relativePermittivity': (i) => relativePermittivity(i.text('material')),
  'capacitor.dielectric.strength': (i) => minimumStrength(i.text('material'), i.number('thickness_mm')),
  'capacitor.fringeExcess': (i) => fringeExcess(i.number('w_m'), i.number('t_m')),
  'capacitor.pdInceptionMin': (i) => edgeDischargeInception(i.number('t_um'), i.number('eps_r')),
  'capacitor.areaStrengthRatio': (i) => areaStrengthRatio(i.number('A_over_A0'), i.number('beta')),
  'capacitor.punctureProbability': (i) =>
    punctureProbability({
      stress_over_E63: i.number('E_over_E63'),
      area_ratio: i.number('A_over_A0'),
      beta: i.number('beta'),
    }),
  'capacitor.life': (i) =>
    lifeShots({ ratedShots: i.number('N0'), exponent: i.number('k') }, i.number('E_over_E0')),
  'capacitor.bleedTime': (i) =>
    bleedTime(
      { resistance_ohm: i.number('R_ohm'), capacitance_F: i.number('C_F') },
      i.number('V0_V'),
      i.number('Vsafe_V'),
    ),
  'capacitor.bleedPower': (i) => bleedPower(i.number('R_ohm'), i.number('V0_V')),
  'capacitor.hazard.exceedsTouchLimit': (i) => exceedsTouchLimit(i.number('C_F'), i.number('V_V')),
  'capacitor.hazard.reflexThreshold': (i) => reflexThreshold(i.number('V_V')),
  'capacitor.hazard.shockThreshold': (i) => shockThreshold(i.number('V_V')),
  'capacitor.hazard.arcThreshold': (i) => arcThreshold(i.number('V_V')),
  'charging.repetitionRate': (i) =>
    repetitionRate({
      ballast_ohm: i.number('R_ohm'),
      capacitance_F: i.number('C_F'),
      supply_V: i.number('Vs_V'),
      break_V: i.number('Vb_V'),
    }),
  'charging.supplyPower': (i) =>
    supplyPower({
      capacitance_F: i.number('C_F'),
      break_V: i.number('Vb_V'),
      supply_V: i.number('Vs_V'),
      rate_Hz: i.number('f_Hz'),
    }),
};
