import { hazardBand } from '../capacitor/hazard';
import type { GainVerdict } from '../channel/gain-window';
import { circuitAnswer, type CircuitAnswer } from '../circuit/circuit-answer';
import { circuitFrom } from '../circuit/circuit-parts';
import { currentRise_s } from '../circuit/current-rise';
import { channelGain, WAVE_POINTS } from '../rules/rig-circuit';
import { firesWords } from '../rules/rig-derived-figures';
import { formatFigure } from '../units/format-quantity';
import { andThen, ok, refused, type Refusal, type Result } from '../units/result';
import { CIRCUIT_FIELDS } from './circuit-lookup-fields';
import {
  idealFigures,
  inputFigures,
  ledgerFigures,
  solvedFigures,
  type Solved,
} from './circuit-lookup-figures';
import { circuitInput, type CircuitInput } from './circuit-lookup-parts';
import { circuitPlot } from './circuit-lookup-plot';
import { circuitStart } from './circuit-lookup-start';
import { beside, entered, type Entered } from './entered';
import { shownFields } from './fields';
import { warningsOf } from './figures';
import type { Lookup, LookupAnswer, Values } from './lookup';

/** The transient of a rig: channel voltage, currents, rise, energy and gain window (physics D, E and L). */
export const CIRCUIT_LOOKUP: Lookup = {
  key: 'circuit',
  title: 'Circuit',
  decides: 'How high and how fast the channel goes, and whether that is in time for nitrogen.',
  fields: CIRCUIT_FIELDS,
  first: 'second_nF',
  start: circuitStart,
  answer: (values, wants = { plot: true }) =>
    andThen(entered(CIRCUIT_FIELDS, values), (input) =>
      besideShown(beside(answer(input, wants.plot), CIRCUIT_FIELDS, NAMES), values),
    ),
  solvable: [
    { field: 'second_nF', figure: 'peak', purpose: 'peak at least', rounding: 'down' },
    { field: 'ratio', figure: 'peak', purpose: 'peak at least', rounding: 'up' },
    { field: 'charge_kV', figure: 'peak', purpose: 'peak at least', rounding: 'up' },
    { field: 'gap_nH', figure: 'rise', purpose: 'rise within', rounding: 'down' },
    { field: 'gap_nH', figure: 'peak', purpose: 'peak at least', rounding: 'down' },
    { field: 'channel_nH', figure: 'current_rise', purpose: 'rise within', rounding: 'down' },
    { field: 'spacing_mm', figure: 'over_voltage', purpose: 'go past static by', rounding: 'down' },
  ],
  slow: true,
};

/** Refusals of the physics name its own inputs. */
const NAMES: Readonly<Record<string, string>> = {
  charge_V: 'charge_kV',
  dump_F: 'first_nF',
  first_F: 'first_nF',
  peaking_F: 'second_nF',
  second_F: 'second_nF',
  gap_H: 'gap_nH',
  bleed_ohm: 'across_kohm',
  charging_H: 'inductor_uH',
  charging_ohm: 'across_kohm',
  'gap.end_ohm': 'gap_end_ohm',
  'gap.start_ohm': 'gap_start_ohm',
  'gap.fall_s': 'gap_fall_ns',
  'gap.gap_cm': 'gap_mm',
  'gap.pressure_atm_abs': 'pressure_bar_g',
  'gap.constant_cm2_atm_V2s': 'rw_constant',
  'channel.inductance_H': 'channel_nH',
  'channel.break_V': 'break_kV',
  'channel.end_ohm': 'channel_end_ohm',
  'channel.start_ohm': 'channel_start_ohm',
  'channel.fall_s': 'channel_fall_ns',
  window_s: 'window_ns',
  conductorRadius_m: 'wire_radius_mm',
  long_m: 'loop_long_mm',
  short_m: 'loop_short_mm',
  section_m2: 'section_mm2',
  width_m: 'strap_width_mm',
  spacing_m: 'strap_spacing_mm',
  length_m: 'strap_length_mm',
  return_cm: 'return_mm',
  length_cm: 'gap_mm',
  sheet_H: 'feed_thickness_mm',
  transit_s: 'feed_along_mm',
  plate_pairs: 'feed_pairs',
  rise_s: 'wanted_rise_ns',
};

/** What stands for a field that these values do not show. */
const INSTEAD: Readonly<Record<string, string>> = {
  gap_nH: 'gap_by',
  channel_nH: 'channel_by',
  second_nF: 'ratio',
  break_kV: 'over_static',
};

function besideShown(result: Result<LookupAnswer>, values: Values): Result<LookupAnswer> {
  if (result.ok || result.refusal.field === undefined) return result;
  const { field } = result.refusal;
  const instead = INSTEAD[field];
  const shown = shownFields({ fields: CIRCUIT_FIELDS }, values).some(({ key }) => key === field);
  return shown || instead === undefined ? result : refused({ ...result.refusal, field: instead });
}

function answer(input: Entered, plot: boolean): Result<LookupAnswer> {
  const made = circuitInput(input);
  if (!made.ok) return made;
  const wanted_ns = input.maybe('wanted_rise_ns');
  const solved = circuitAnswer(circuitFrom(made.value.parts), {
    samples: WAVE_POINTS,
    ...(wanted_ns === null ? {} : { wantedRise_s: wanted_ns * 1e-9 }),
  });
  if (solved.ok) return ok(waveAnswer(input, { made: made.value, solved: solved.value, plot }));
  return solved.refusal.type === 'travelling-waves'
    ? lumpedAnswer(input, made.value, solved.refusal)
    : solved;
}

const WAVE_CAUTIONS = [
  'A misfire leaves the capacitors charged, and a shot may leave the second one reversed. Short each by itself.',
  'Size film and edges for twice the charging voltage. Local rules and the person responsible decide.',
] as const;

interface Wave {
  readonly made: CircuitInput;
  readonly solved: CircuitAnswer;
  readonly plot: boolean;
}

function waveAnswer(input: Entered, { made, solved, plot }: Wave): LookupAnswer {
  const gain = gainAt(input, made, solved);
  const of: Solved = { made, solved, gain, currentRise_s: currentRise_s(solved.transient.waveform) };
  const { model, valid } = solved.peakVoltage;
  return {
    figures: [
      ...solvedFigures(of),
      ...ledgerFigures(of, storedNote(input, made)),
      ...idealFigures(made.parts),
      ...inputFigures(made),
    ],
    says: [firesWords({ answer: solved }), gain?.words ?? noGainWords(input, solved)]
      .filter((one) => one !== '')
      .join(' '),
    model,
    valid,
    warnings: warningsOf([
      solved,
      ...(made.staticBreak === null ? [] : [made.staticBreak]),
      made.gap_nH,
      made.channel_nH,
      ...(gain === null ? [] : [gain]),
    ]),
    cautions: WAVE_CAUTIONS,
    ...(plot ? { plot: circuitPlot(made.parts, solved) } : {}),
  };
}

function gainAt(input: Entered, made: CircuitInput, solved: CircuitAnswer): GainVerdict | null {
  if (made.staticBreak === null) return null;
  const oxygen = input.maybe('oxygen_percent');
  return channelGain(solved, {
    gas: input.choice('channel_gas'),
    spacing_mm: input.number('spacing_mm'),
    staticBreak_kV: made.staticBreak.value,
    ambient_bar_abs: input.number('ambient_bar_abs'),
    temperature_C: input.number('temperature_C'),
    oxygen_share: oxygen === null ? null : oxygen / 100,
  });
}

function noGainWords(input: Entered, { fires }: CircuitAnswer): string {
  const gas = input.choice('channel_gas');
  if (!fires.asGiven) return '';
  return gas === 'N2' || gas === 'air'
    ? 'No gain window can be judged for these figures.'
    : `No gain window is judged for ${gas}.`;
}

/** Energy never stands without its supply. */
function storedNote(input: Entered, { parts }: CircuitInput): string | null {
  const kV = input.maybe('supply_kV');
  const mA = input.maybe('supply_mA');
  if (kV === null || mA === null) return null;
  const charged_nF = parts.first_nF + (parts.topology === 'lc-inversion' ? parts.second_nF : 0);
  const band = hazardBand(charged_nF * 1e-9, { kV: Math.max(kV, parts.charge_kV), mA });
  return band.ok ? band.value.words : null;
}

/** Where waves travel on the sheet no wave shape is given: only what holds without one, and the reason. */
function lumpedAnswer(input: Entered, made: CircuitInput, why: Refusal): Result<LookupAnswer> {
  const { parts } = made;
  const ideals = idealFigures(parts);
  if (ideals.length === 0) return refused(why);
  const transit_ns = (parts.feed?.transit_s ?? 0) * 1e9;
  const transit = formatFigure(transit_ns, { digits: { significant: 3 }, rounding: 'nearest' });
  return ok({
    figures: [
      {
        key: 'peak',
        label: 'channel peak',
        value: 0,
        unit: 'kV',
        rounding: 'nearest',
        digits: 3,
        weight: 'answer',
        words: 'not given: waves travel on the sheet',
      },
      {
        key: 'rise',
        label: 'rise of the channel voltage',
        value: 0,
        unit: 'ns',
        rounding: 'up',
        digits: 3,
        weight: 'answer',
        words: `not given: one transit takes ${transit}\u2009ns`,
      },
      ...ideals.map((figure) => ({ ...figure, weight: 'main' as const })),
      ...inputFigures(made),
    ],
    says: why.words,
    model: 'Lossless lumped parts, as a ceiling alone',
    valid: 'where waves travel on a sheet no circuit of lumped parts gives a peak or a rise',
    warnings: [{ type: why.type, words: why.words }],
    cautions: [
      ...WAVE_CAUTIONS,
      ...(storedNote(input, made) === null ? [] : [storedNote(input, made) ?? '']),
    ],
  });
}
