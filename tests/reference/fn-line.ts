import { blumleinLoadVoltage, distributedHalfPeriod } from '../../src/domain/line/distributed';
import {
  channelLoopInductance,
  rectangularLoopInductance,
  spreadInductance,
} from '../../src/domain/line/loop';
import { pairAirImpedance } from '../../src/domain/line/pair';
import { sheetInductance, stripImpedance, transitTime } from '../../src/domain/line/strip';
import type { ReferenceFunction } from './fn-table';

export const LINE_FUNCTIONS: Readonly<Record<string, ReferenceFunction>> = {
  'line.stripImpedance': (i) =>
    stripImpedance({ spacing_m: i.number('h_m'), width_m: i.number('w_m'), eps_r: i.number('eps_r') }),
  'line.pairAirImpedance': (i) => pairAirImpedance({ width_m: i.number('w_m'), spacing_m: i.number('s_m') }),
  'line.transitTime': (i) => transitTime(i.number('L_m'), i.number('eps_r')),
  'line.sheetInductance': (i) =>
    sheetInductance({ spacing_m: i.number('h_m'), length_m: i.number('l_m'), width_m: i.number('w_m') }),
  'line.spreadInductance': (i) =>
    spreadInductance({ spacing_m: i.number('h_m'), foot_m: i.number('r1_m'), edge_m: i.number('r2_m') }),
  'line.rectLoopInductance': (i) =>
    rectangularLoopInductance({
      long_m: i.number('W_m'),
      short_m: i.number('H_m'),
      conductorRadius_m: i.number('a_m'),
    }),
  'line.channelLoopInductance': (i) => channelLoopInductance(i.number('S_m2'), i.number('l_m')),
  'line.distributedHalfPeriod': (i) =>
    distributedHalfPeriod({
      gap_H: i.number('Lgap_H'),
      sheet_H: i.number('Lsheet_H'),
      capacitance_F: i.number('C_F'),
    }),
  'line.blumleinLoadVoltage': (i) =>
    blumleinLoadVoltage({
      charge_V: i.number('V0_V'),
      load_ohm: i.number('R_ohm'),
      line_ohm: i.number('Z0_ohm'),
    }),
};
