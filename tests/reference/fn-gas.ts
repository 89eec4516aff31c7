import { freeVolumeIdeal, freeVolumeReal } from '../../src/domain/gas/cylinder';
import { nitrogenCompressibility } from '../../src/domain/gas/nitrogen-state';
import { purgeResidual } from '../../src/domain/gas/purge';
import {
  oxygenAfterDumpDisplaced,
  oxygenAfterDumpMixed,
  oxygenSealed,
  oxygenTransient,
  oxygenVentilated,
  timeToOxygenLimit,
} from '../../src/domain/gas/room-oxygen';
import { hoopStress, storedEnergyBrode } from '../../src/domain/gas/vessel';
import { nitrogenOxideLevel, ozoneLevel } from '../../src/domain/room/air-quality';
import { inducedVoltage, radiatedField } from '../../src/domain/room/pick-up';
import { peakSoundLevel } from '../../src/domain/room/sound';
import type { ReferenceFunction } from './fn-table';
import type { Inputs } from './inputs';

const REFERENCE_C = 20;

export const GAS_FUNCTIONS: Readonly<Record<string, ReferenceFunction>> = {
  'gas.nitrogenCompressibility': (i) =>
    nitrogenCompressibility(i.number('p_bar'), i.number('T_C', REFERENCE_C)),
  'gas.cylinderFreeVolumeIdeal': (i) => freeVolumeIdeal(cylinderOf(i)),
  'gas.cylinderFreeVolumeReal': (i) => freeVolumeReal(cylinderOf(i)),
  'gas.purgeResidual': (i) => purgeResidual(i.number('n_volumes')),
  'gas.roomOxygenSealed': (i) => oxygenSealed(inflowOf(i), i.number('t_min')),
  'gas.roomOxygenVentilated': (i) => oxygenVentilated(inflowOf(i), i.number('ACH')),
  'gas.roomOxygenTransient': (i) => oxygenTransient(inflowOf(i), i.number('ACH'), i.number('t_min')),
  'gas.timeToOxygenLimit': (i) => timeToOxygenLimit(inflowOf(i)),
  'gas.roomOxygenDumpMixed': (i) => oxygenAfterDumpMixed(i.number('Vgas_m3'), i.number('V_m3')),
  'gas.roomOxygenDumpDisplaced': (i) => oxygenAfterDumpDisplaced(i.number('Vgas_m3'), i.number('V_m3')),
  'vessel.hoopStressThick': (i) =>
    hoopStress({
      pressure_bar_g: i.number('p_gauge_bar'),
      inner_mm: i.number('r_i_mm'),
      outer_mm: i.number('r_o_mm'),
    }),
  'vessel.storedEnergyBrode': (i) =>
    storedEnergyBrode({
      pressure_bar_abs: i.number('p_bar_abs'),
      ambient_bar_abs: i.number('p0_bar'),
      volume_L: i.number('V_L'),
    }),
  'room.ozone': (i) =>
    ozoneLevel(
      {
        power_W: i.number('P_W'),
        yield_g_kWh: i.number('yield_g_kWh'),
        decay_per_h: i.number('decay_per_h'),
      },
      roomOf(i),
    ),
  'room.nox': (i) =>
    nitrogenOxideLevel({ power_W: i.number('P_W'), molecules_per_J: i.number('molecules_per_J') }, roomOf(i)),
  'sound.peakUpper': (i) => peakSoundLevel(i.number('E_J'), i.number('r_m')),
  'emi.inducedVoltage': (i) =>
    inducedVoltage({
      area_cm2: i.number('A_cm2'),
      distance_m: i.number('r_m'),
      slope_A_s: i.number('dIdt_A_s'),
    }),
  'emi.loopField': (i) =>
    radiatedField({
      area_cm2: i.number('A_cm2'),
      distance_m: i.number('r_m'),
      current_A: i.number('I_A'),
      quarter_s: i.number('t_quarter_s'),
    }),
};

function cylinderOf(i: Inputs) {
  return {
    volume_L: i.number('V_L'),
    pressure_bar_abs: i.number('p_bar_abs'),
    temperature_C: i.number('T_C', REFERENCE_C),
  };
}

function inflowOf(i: Inputs) {
  return { flow_L_min: i.number('Q_L_min'), room_m3: i.number('V_m3') };
}

function roomOf(i: Inputs) {
  return { room_m3: i.number('V_m3'), airChanges_h: i.number('ACH') };
}
