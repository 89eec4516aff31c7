import type { Answer, Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import type { Result } from '../units/result';

/** Oxygen in dry air, %. */
export const AIR_OXYGEN = 20.95;
/** Below it air counts as oxygen-deficient: 29 CFR 1910.146, read. Leave the room. */
export const OXYGEN_LIMIT = 19.5;

const LITRES_PER_M3 = 1000;
const MINUTES_PER_HOUR = 60;

const FLOW_RULE = { field: 'flow_L_min', name: 'Flow', unit: 'L/min', min: 0, max: 1e5 } as const;
const ROOM_RULE = { field: 'room_m3', name: 'Room volume', unit: 'm\u00b3', min: 0.1, max: 1e6 } as const;
const AIR_CHANGES_RULE = {
  field: 'airChanges_h',
  name: 'Air changes',
  unit: '1/h',
  min: 0,
  max: 1000,
} as const;
const TIME_RULE = { field: 'time_min', name: 'Time', unit: 'min', min: 0, max: 1e6 } as const;
const RELEASE_RULE = { field: 'gas_m3', name: 'Gas released', unit: 'm\u00b3', min: 0, max: 1e5 } as const;

/** An inert gas flowing into a room. */
export interface Inflow {
  readonly flow_L_min: number;
  readonly room_m3: number;
}

/** Oxygen after a time in a room without any ventilation, %: 20.95 e^(-Qt/V), well mixed. */
export function oxygenSealed({ flow_L_min, room_m3 }: Inflow, time_min: number): Result<Answer> {
  return computed(
    [checkNumber(flow_L_min, FLOW_RULE), checkNumber(room_m3, ROOM_RULE), checkNumber(time_min, TIME_RULE)],
    () =>
      oxygen(
        AIR_OXYGEN * Math.exp((-flow_L_min * time_min) / (LITRES_PER_M3 * room_m3)),
        'Sealed room, well mixed',
      ),
  );
}

/** Oxygen in the long run with ventilation, %: 20.95 Qa/(Qa + Q), Qa the fresh inflow. Without ventilation it is 0. */
export function oxygenVentilated({ flow_L_min, room_m3 }: Inflow, airChanges_h: number): Result<Answer> {
  return computed(
    [
      checkNumber(flow_L_min, FLOW_RULE),
      checkNumber(room_m3, ROOM_RULE),
      checkNumber(airChanges_h, AIR_CHANGES_RULE),
    ],
    () =>
      oxygen(
        AIR_OXYGEN * freshShare(flow_L_min, freshAir_L_min(room_m3, airChanges_h)),
        'Ventilated room in the long run',
      ),
  );
}

/** Oxygen after a time with ventilation, %, from plain air at the start. */
export function oxygenTransient(
  { flow_L_min, room_m3 }: Inflow,
  airChanges_h: number,
  time_min: number,
): Result<Answer> {
  return computed(
    [
      checkNumber(flow_L_min, FLOW_RULE),
      checkNumber(room_m3, ROOM_RULE),
      checkNumber(airChanges_h, AIR_CHANGES_RULE),
      checkNumber(time_min, TIME_RULE),
    ],
    () => {
      const fresh = freshAir_L_min(room_m3, airChanges_h);
      const floor = freshShare(flow_L_min, fresh);
      const left = Math.exp((-(fresh + flow_L_min) * time_min) / (LITRES_PER_M3 * room_m3));
      return oxygen(AIR_OXYGEN * (floor + (1 - floor) * left), 'Ventilated room, well mixed');
    },
  );
}

/** Minutes until a sealed room is down to 19.5 %, min. Round it down; near the outlet it comes much sooner. */
export function timeToOxygenLimit({ flow_L_min, room_m3 }: Inflow): Result<Answer> {
  return computed(
    [checkNumber(flow_L_min, { ...FLOW_RULE, min: 1e-6 }), checkNumber(room_m3, ROOM_RULE)],
    () => ({
      value: ((LITRES_PER_M3 * room_m3) / flow_L_min) * Math.log(AIR_OXYGEN / OXYGEN_LIMIT),
      unit: 'min',
      model: 'Sealed room, well mixed',
      valid: 'well mixed; near the outlet and close to the floor it comes much sooner',
      relative: { below: 0.5, above: 0.05 },
    }),
  );
}

/** Oxygen after a whole cylinder has gone into the room, mixing as it flows, %: 20.95 e^(-Vg/V). */
export function oxygenAfterDumpMixed(gas_m3: number, room_m3: number): Result<Answer> {
  return computed([checkNumber(gas_m3, RELEASE_RULE), checkNumber(room_m3, ROOM_RULE)], () =>
    oxygen(AIR_OXYGEN * Math.exp(-gas_m3 / room_m3), 'Whole cylinder, mixing as it flows'),
  );
}

/** The same where the gas pushes plain air out and then mixes, %: 20.95 (1 - Vg/V), the lower and the one to show. */
export function oxygenAfterDumpDisplaced(gas_m3: number, room_m3: number): Result<Answer> {
  return computed([checkNumber(gas_m3, RELEASE_RULE), checkNumber(room_m3, ROOM_RULE)], () =>
    oxygen(AIR_OXYGEN * Math.max(0, 1 - gas_m3 / room_m3), 'Whole cylinder, air pushed out first'),
  );
}

/** Room that keeps 19.5 % after such a release, m3, air pushed out first: Vg/(1 - 19.5/20.95). Round it up. */
export function roomForDump(gas_m3: number): Result<Answer> {
  return computed([checkNumber(gas_m3, RELEASE_RULE)], () => ({
    value: gas_m3 / (1 - OXYGEN_LIMIT / AIR_OXYGEN),
    unit: 'm\u00b3',
    model: 'Whole cylinder, air pushed out first',
    valid: 'well mixed; near the outlet there is less oxygen in any room',
    relative: { below: 0, above: 0.1 },
  }));
}

/** What an oxygen content does to a person; the words are common safety practice, figures from memory save 19.5. */
export function oxygenWords(oxygen_percent: number): string {
  if (oxygen_percent >= OXYGEN_LIMIT) return 'Above the limit when well mixed; near the outlet it is lower.';
  if (oxygen_percent >= 16) return 'Below 19.5 %: leave the room. Judgement fails before one notices.';
  if (oxygen_percent >= 10) return 'Disabling: a person does not get out unaided.';
  return 'A breath or two makes a person collapse, without warning.';
}

function freshAir_L_min(room_m3: number, airChanges_h: number): number {
  return (LITRES_PER_M3 * room_m3 * airChanges_h) / MINUTES_PER_HOUR;
}

// Neither gas nor ventilation leaves plain air.
function freshShare(flow: number, fresh: number): number {
  return flow === 0 ? 1 : fresh / (fresh + flow);
}

function oxygen(value: number, model: string) {
  const warnings: readonly Warning[] =
    value < OXYGEN_LIMIT ? [{ type: 'oxygen-deficient', words: oxygenWords(value) }] : [];
  return {
    value,
    unit: '%',
    model,
    valid: 'well mixed; near the outlet it is lower, and an oxygen meter is no substitute for leaving',
    relative: { below: 0.1, above: 0 },
    warnings,
  };
}
