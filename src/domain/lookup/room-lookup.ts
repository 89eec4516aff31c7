import { andThen, type Result } from '../units/result';
import { beside, entered, type Entered } from './entered';
import type { Lookup, LookupAnswer, Values } from './lookup';
import { airAnswer } from './room-lookup-air';
import { ROOM_FIELDS } from './room-lookup-fields';
import { oxygenAnswer } from './room-lookup-oxygen';
import { pickUpAnswer } from './room-lookup-pick-up';
import { soundAnswer } from './room-lookup-sound';
import { roomStart } from './room-lookup-start';

/** The room around a rig: oxygen, ozone and nitrogen oxides, sound, pick-up (physics G, P, Q). */
export const ROOM_LOOKUP: Lookup = {
  key: 'room',
  title: 'Room',
  decides:
    'Whether the room keeps its oxygen, what discharges do to its air, how loud a shot is, what leads pick up.',
  fields: ROOM_FIELDS,
  first: 'room_m3',
  start: roomStart,
  answer: (values) =>
    andThen(entered(ROOM_FIELDS, values), (input) => beside(answer(input, values), ROOM_FIELDS, FIELD_NAMES)),
  solvable: [
    { field: 'air_changes_h', figure: 'oxygen', purpose: 'keep at least', rounding: 'up' },
    { field: 'flow_L_min', figure: 'oxygen', purpose: 'keep at least', rounding: 'down' },
    { field: 'room_m3', figure: 'oxygen_dump', purpose: 'keep at least', rounding: 'up' },
    { field: 'air_changes_h', figure: 'ozone', purpose: 'stay under', rounding: 'up' },
    { field: 'air_changes_h', figure: 'nox', purpose: 'stay under', rounding: 'up' },
    { field: 'corona_W', figure: 'ozone', purpose: 'stay under', rounding: 'down' },
    { field: 'distance_m', figure: 'peak', purpose: 'stay under', rounding: 'up' },
    { field: 'distance_m', figure: 'induced', purpose: 'stay under', rounding: 'up' },
    { field: 'loop_cm2', figure: 'induced', purpose: 'stay under', rounding: 'down' },
  ],
};

const FIELD_NAMES: Readonly<Record<string, string>> = {
  airChanges_h: 'air_changes_h',
  time_min: 'hours',
  power_W: 'corona_W',
  decay_per_h: 'decay_h',
  energy_J: 'shot_J',
  volume_L: 'cylinder_L',
  pressure: 'cylinder_bar_g',
  area_cm2: 'loop_cm2',
  quarter_s: 'quarter_ns',
  slope_A_s: 'current_A',
  gas_m3: 'cylinder_L',
};

function answer(input: Entered, values: Values): Result<LookupAnswer> {
  switch (input.choice('subject')) {
    case 'air':
      return airAnswer(input, values);
    case 'sound':
      return soundAnswer(input, values);
    case 'pick-up':
      return pickUpAnswer(input);
    default:
      return oxygenAnswer(input);
  }
}
