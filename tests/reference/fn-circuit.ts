import type { Circuit, GapLaw } from '../../src/domain/circuit/circuit-input';
import {
  idealPeakCurrent,
  inversionHalfPeriod,
  inversionPeak,
  transferEfficiency,
  transferHalfPeriod,
  transferPeak,
} from '../../src/domain/circuit/ideals';
import { solveTransient, type Transient } from '../../src/domain/circuit/transient';
import { andThen, mapResult, ok, refused, type Result } from '../../src/domain/units/result';
import type { ReferenceFunction } from './fn-table';
import { InputProblem, type Inputs } from './inputs';

export const CIRCUIT_FUNCTIONS: Readonly<Record<string, ReferenceFunction>> = {
  'circuit.peakChannelVoltage': (i) => mapResult(transientOf(i), (found) => found.peakVoltage_V),
  'circuit.timeToPeak': (i) => mapResult(transientOf(i), (found) => found.peakVoltage_s),
  'circuit.riseTime': (i) => mapResult(transientOf(i), (found) => found.rise_s),
  'circuit.peakGapCurrent': (i) => mapResult(transientOf(i), (found) => found.peakGap_A),
  'circuit.peakChannelCurrent': (i) => andThen(transientOf(i), channelCurrent),
  'circuit.channelFires': (i) => mapResult(transientOf(i), (found) => found.fired_s !== null),
  'circuit.ideal.transferPeak': (i) => transferPeak(pairOf(i), i.number('V0_V')),
  'circuit.ideal.transferEfficiency': (i) => transferEfficiency(pairOf(i)),
  'circuit.ideal.transferHalfPeriod': (i) => transferHalfPeriod(pairOf(i), i.number('L_H')),
  'circuit.ideal.inversionPeak': (i) => inversionPeak(i.number('V0_V')),
  'circuit.ideal.inversionHalfPeriod': (i) => inversionHalfPeriod(i.number('C1_F'), i.number('L_H')),
  'circuit.ideal.peakCurrent': (i) =>
    idealPeakCurrent({
      charge_V: i.number('V0_V'),
      series_F: i.number('Cser_F'),
      inductance_H: i.number('L_H'),
    }),
};

function pairOf(i: Inputs) {
  return { dump_F: i.number('CD_F'), peaking_F: i.number('CP_F') };
}

function channelCurrent({ peakChannel_A }: Transient): Result<number> {
  return peakChannel_A === null
    ? refused({ type: 'channel-dark', words: 'the channel stays dark and carries no current' })
    : ok(peakChannel_A);
}

function transientOf(i: Inputs): Result<Transient> {
  return solveTransient(circuitOf(i.group('circuit')), { samples: 0 });
}

/** A circuit by the names that the check format gives its parts. */
export function circuitOf(i: Inputs): Circuit {
  const common = {
    charge_V: i.number('V0'),
    gap_H: i.number('Lg'),
    gap: gapOf(i),
    channel: {
      inductance_H: i.number('Lch'),
      break_V: i.has('Vbr') ? i.number('Vbr') : null,
      end_ohm: i.number('Rch_end'),
      start_ohm: i.number('Rch0'),
      fall_s: i.number('tau_c'),
    },
    window_s: i.number('t_end'),
  };
  switch (i.text('top')) {
    case 'transfer':
      return {
        ...common,
        topology: 'charge-transfer',
        dump_F: i.number('CD'),
        peaking_F: i.number('CP'),
        bleed_ohm: i.has('Rbleed') ? i.number('Rbleed') : null,
      };
    case 'lcinv':
      return {
        ...common,
        topology: 'lc-inversion',
        first_F: i.number('C1'),
        second_F: i.number('C2'),
        charging_H: i.number('Lc'),
        charging_ohm: i.number('Rc'),
      };
    default:
      throw new InputProblem(`topology ${i.text('top')} is not known`);
  }
}

function gapOf(i: Inputs): GapLaw {
  const ends = { end_ohm: i.number('Rg_end'), start_ohm: i.number('Rg0') };
  switch (i.text('gap')) {
    case 'exp':
      return { law: 'exponential', ...ends, fall_s: i.number('tau_g') };
    case 'rw':
      return {
        law: 'rompe-weizel',
        ...ends,
        gap_cm: i.number('d_cm'),
        pressure_atm_abs: i.number('p_atm'),
        constant_cm2_atm_V2s: i.number('a_rw'),
      };
    default:
      throw new InputProblem(`gap law ${i.text('gap')} is not known`);
  }
}
