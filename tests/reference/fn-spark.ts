import { resistivePhase, sparkRiseTime } from '../../src/domain/spark/resistive-phase';
import { sparkInductance } from '../../src/domain/spark/spark-inductance';
import { rompeWeizelResistance, toeplerResistance } from '../../src/domain/spark/spark-resistance';
import type { ReferenceFunction } from './fn-table';
import type { Inputs } from './inputs';

export const SPARK_FUNCTIONS: Readonly<Record<string, ReferenceFunction>> = {
  'spark.resistivePhase': (i) => resistivePhase(gapOf(i)),
  'spark.riseTime': (i) => sparkRiseTime({ ...gapOf(i), inductance_nH: i.number('L_nH') }),
  'spark.inductance': (i) =>
    sparkInductance({
      length_cm: i.number('l_cm'),
      radius_cm: i.number('a_cm'),
      return_cm: i.number('b_cm'),
    }),
  'spark.rompeWeizel': (i) =>
    rompeWeizelResistance({
      gap_cm: i.number('d_cm'),
      pressure_atm_abs: i.number('p_atm'),
      constant_cm2_atm_V2s: i.number('a_cm2_atm_per_V2s'),
      action_A2s: i.number('S_A2s'),
    }),
  'spark.toepler': (i) =>
    toeplerResistance({
      gap_cm: i.number('d_cm'),
      constant_Vs_cm: i.number('kT_Vs_per_cm'),
      charge_C: i.number('Q_C'),
    }),
};

function gapOf(i: Inputs) {
  return {
    drive_ohm: i.number('Z_ohm'),
    field_MV_m: i.number('E_MV_per_m'),
    densityRatio: i.number('rho_ratio', 1),
    channels: i.number('N', 1),
  };
}
