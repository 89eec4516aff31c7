import { checkNumber, type NumberRule } from '../units/check-number';
import { firstRefusal, type Refusal } from '../units/result';
import type { ChannelLaw, Circuit, GapLaw } from './circuit-input';

export const CHARGE_RULE: NumberRule = {
  field: 'charge_V',
  name: 'Charging voltage',
  unit: 'V',
  min: 1,
  max: 1e6,
};
export const CAPACITANCE_RULE: NumberRule = {
  field: 'capacitance_F',
  name: 'Capacitance',
  unit: 'F',
  min: 1e-13,
  max: 1e-3,
};
export const INDUCTANCE_RULE: NumberRule = {
  field: 'inductance_H',
  name: 'Inductance',
  unit: 'H',
  min: 1e-11,
  max: 1,
};

/** An end of a falling resistance may be nothing at all; its start may not. */
const END_OHM = { unit: '\u2126', min: 0, max: 1e4 };
const START_OHM = { unit: '\u2126', min: 0.1, max: 1e8 };
const FALL_S = { unit: 's', min: 1e-12, max: 1e-3 };

/** The first thing wrong with a circuit, or undefined. */
export function badCircuit(circuit: Circuit): Refusal | undefined {
  return (
    firstRefusal([
      checkNumber(circuit.charge_V, CHARGE_RULE),
      checkNumber(circuit.gap_H, { ...INDUCTANCE_RULE, field: 'gap_H', name: 'Inductance of the gap' }),
      checkNumber(circuit.window_s, {
        field: 'window_s',
        name: 'Length of the transient',
        unit: 's',
        min: 1e-10,
        max: 1e-3,
      }),
    ]) ??
    badParts(circuit) ??
    badGapLaw(circuit.gap) ??
    badChannel(circuit.channel)
  );
}

function badParts(circuit: Circuit): Refusal | undefined {
  const capacitor = (field: string, name: string) => ({ ...CAPACITANCE_RULE, field, name });
  if (circuit.topology === 'charge-transfer') {
    return firstRefusal([
      checkNumber(circuit.dump_F, capacitor('dump_F', 'Dump capacitor')),
      checkNumber(circuit.peaking_F, capacitor('peaking_F', 'Peaking capacitor')),
      ...(circuit.bleed_ohm === null
        ? []
        : [
            checkNumber(circuit.bleed_ohm, {
              field: 'bleed_ohm',
              name: 'Resistance across the peaking capacitor',
              unit: '\u2126',
              min: 1,
              max: 1e12,
            }),
          ]),
    ]);
  }
  return firstRefusal([
    checkNumber(circuit.first_F, capacitor('first_F', 'First capacitor')),
    checkNumber(circuit.second_F, capacitor('second_F', 'Second capacitor')),
    checkNumber(circuit.charging_H, {
      ...INDUCTANCE_RULE,
      field: 'charging_H',
      name: 'Charging inductor',
    }),
    checkNumber(circuit.charging_ohm, {
      field: 'charging_ohm',
      name: 'Resistance of the charging inductor',
      unit: '\u2126',
      min: 0,
      max: 1e8,
    }),
  ]);
}

function badGapLaw(gap: GapLaw): Refusal | undefined {
  const ends = firstRefusal([
    checkNumber(gap.end_ohm, { field: 'gap.end_ohm', name: 'Last resistance of the gap', ...END_OHM }),
    checkNumber(gap.start_ohm, { field: 'gap.start_ohm', name: 'First resistance of the gap', ...START_OHM }),
  ]);
  if (ends !== undefined) return ends;
  if (gap.law === 'exponential') {
    return firstRefusal([
      checkNumber(gap.fall_s, { field: 'gap.fall_s', name: 'Fall time of the gap', ...FALL_S }),
    ]);
  }
  return firstRefusal([
    checkNumber(gap.gap_cm, { field: 'gap.gap_cm', name: 'Gap', unit: 'cm', min: 1e-3, max: 100 }),
    checkNumber(gap.pressure_atm_abs, {
      field: 'gap.pressure_atm_abs',
      name: 'Pressure of the gap',
      unit: 'atm(abs)',
      min: 1e-2,
      max: 100,
    }),
    checkNumber(gap.constant_cm2_atm_V2s, {
      field: 'gap.constant_cm2_atm_V2s',
      name: 'Constant of Rompe and Weizel',
      unit: 'cm\u00b2\u2009atm/(V\u00b2\u2009s)',
      min: 1e-2,
      max: 100,
    }),
  ]);
}

function badChannel(channel: ChannelLaw): Refusal | undefined {
  return firstRefusal([
    checkNumber(channel.inductance_H, {
      ...INDUCTANCE_RULE,
      field: 'channel.inductance_H',
      name: 'Inductance of the channel',
    }),
    ...(channel.break_V === null
      ? []
      : [
          checkNumber(channel.break_V, {
            field: 'channel.break_V',
            name: 'Breakdown voltage of the channel',
            unit: 'V',
            min: 1,
            max: 1e7,
          }),
        ]),
    checkNumber(channel.end_ohm, {
      field: 'channel.end_ohm',
      name: 'Last resistance of the channel',
      ...END_OHM,
    }),
    checkNumber(channel.start_ohm, {
      field: 'channel.start_ohm',
      name: 'First resistance of the channel',
      ...START_OHM,
    }),
    checkNumber(channel.fall_s, {
      field: 'channel.fall_s',
      name: 'Fall time of the channel',
      ...FALL_S,
    }),
  ]);
}
