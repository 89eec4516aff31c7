import { andThen, type Result } from '../units/result';
import { beside, entered, type Entered } from './entered';
import { cylinderAnswer } from './gas-lookup-cylinder';
import { GAS_FIELDS } from './gas-lookup-fields';
import { purgeAnswer } from './gas-lookup-purge';
import { gasStart } from './gas-lookup-start';
import { vesselAnswer } from './gas-lookup-vessel';
import type { Lookup, LookupAnswer } from './lookup';

/** Cylinder, purge and pressed vessel (physics G, P). */
export const GAS_LOOKUP: Lookup = {
  key: 'gas',
  title: 'Gas',
  decides: 'How long the cylinder lasts, when to order, how long to purge, what the pressed body carries.',
  fields: GAS_FIELDS,
  first: 'cylinder_bar_g',
  start: gasStart,
  answer: (values) =>
    andThen(entered(GAS_FIELDS, values), (input) => beside(answer(input), GAS_FIELDS, NAMES)),
  solvable: [
    { field: 'cylinder_bar_g', figure: 'hours', purpose: 'last at least', rounding: 'up' },
    { field: 'flow_L_min', figure: 'hours', purpose: 'last at least', rounding: 'down' },
    { field: 'volumes', figure: 'residual', purpose: 'leave at most', rounding: 'up' },
    { field: 'volumes', figure: 'oxygen', purpose: 'leave at most', rounding: 'up' },
    { field: 'flow_L_min', figure: 'purge', purpose: 'take at most', rounding: 'up' },
    { field: 'wall_mm', figure: 'hoop', purpose: 'carry at most', rounding: 'up' },
    { field: 'vessel_bar_g', figure: 'hoop', purpose: 'carry at most', rounding: 'down' },
  ],
};

const NAMES: Readonly<Record<string, string>> = {
  volume_L: 'cylinder_L',
  pressure: 'cylinder_bar_g',
  rest_bar_abs: 'rest_bar_g',
  ambient: 'ambient_bar_abs',
  pressure_bar_g: 'vessel_bar_g',
  outer_mm: 'wall_mm',
};

function answer(input: Entered): Result<LookupAnswer> {
  const subject = input.choice('subject');
  if (subject === 'purge') return purgeAnswer(input);
  return subject === 'vessel' ? vesselAnswer(input) : cylinderAnswer(input);
}
