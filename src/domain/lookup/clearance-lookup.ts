import { bareClearance, CLEARANCE_FACTOR, voltageForClearance } from '../gap/clearance';
import { airPenalty, standardAtmosphere } from '../gap/open-air';
import { rigPulse } from '../rules/rig-pulse';
import type { Answer, Warning } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { andThen, ok, refused, type Result } from '../units/result';
import { labAir } from './ambient-field';
import { CLEARANCE_FIELDS } from './clearance-lookup-fields';
import { beside, entered, type Entered } from './entered';
import { numberAt } from './fields';
import { figureOf, spread, warningsOf } from './figures';
import type { Figure, Known, Lookup, LookupAnswer, Plot, Start, StartFrom, Values } from './lookup';

/** Air between bare parts, from needle points only (physics M). */
export const CLEARANCE_LOOKUP: Lookup = {
  key: 'clearance',
  title: 'Clearance',
  decides: 'How far apart bare parts stand in air, and which voltage a distance is for.',
  fields: CLEARANCE_FIELDS,
  start,
  answer: (values) =>
    andThen(entered(CLEARANCE_FIELDS, values), (input) => beside(answer(input, values), CLEARANCE_FIELDS)),
  solvable: [
    {
      field: 'voltage_kV',
      figure: 'distance',
      purpose: 'keep the distance',
      rounding: 'down',
      target: 'distance_mm',
      exact: (values, distance_mm) =>
        andThen(entered(CLEARANCE_FIELDS, { ...values, voltage_kV: 1, distance_mm }), (input) =>
          andThen(airAt(input), ({ penalty }) =>
            andThen(beside(standing_kV(distance_mm, penalty), CLEARANCE_FIELDS), (value) =>
              ok({ value, all: [value] }),
            ),
          ),
        ),
    },
  ],
};

function start(from: StartFrom): Start {
  const { spec } = from;
  const air = labAir(from);
  const pulse = spec === null ? null : rigPulse(spec);
  const voltage: Known = spec === null ? 'assumed' : 'rig';
  return {
    values: {
      ...air.values,
      voltage_kV: spec?.charging.supply_kV ?? 20,
      distance_mm: null,
      air_by: 'barometer',
      altitude_m: 0,
      humidity_percent: null,
      pulse_kV: pulse?.ok === true ? pulse.value.peak_kV : null,
    },
    known: {
      ...air.known,
      voltage_kV: voltage,
      distance_mm: 'assumed',
      air_by: 'assumed',
      altitude_m: 'assumed',
      humidity_percent: 'assumed',
    },
  };
}

interface Air {
  readonly penalty: Answer;
  readonly bar_abs: number;
  readonly warnings: readonly Warning[];
}

/** By altitude the low end of the weather counts. */
function airAt(input: Entered): Result<Air> {
  const altitude = input.maybe('altitude_m');
  const standard = altitude === null ? null : standardAtmosphere(altitude);
  if (standard?.ok === false) return standard;
  const bar_abs = standard === null ? input.number('ambient_bar_abs') : standard.value.band.low;
  const penalty = airPenalty({
    ambient_bar_abs: bar_abs,
    temperature_C: input.number('temperature_C'),
    humidity_percent: input.maybe('humidity_percent'),
  });
  if (!penalty.ok) return penalty;
  return ok({ penalty: penalty.value, bar_abs, warnings: penalty.value.warnings });
}

/** Distance for a voltage in this air; the table is asked at what the voltage counts as. */
function distanceFor(voltage_kV: number, penalty: Answer): Result<Answer> {
  const counts_kV = voltage_kV * penalty.value;
  const distance = bareClearance(counts_kV);
  if (distance.ok || distance.refusal.type !== 'too-large') return distance;
  return refused({
    type: 'outside-table',
    field: 'voltage_kV',
    words: `Peak voltage: in this air it counts as ${kV(counts_kV, 'up')}\u2009kV, and the table of needle points ends at 40\u2009kV. No clearance is given beyond it.`,
  });
}

function standing_kV(distance_mm: number, penalty: Answer): Result<number> {
  return andThen(voltageForClearance(distance_mm), ({ value }) => ok(value / penalty.value));
}

function answer(input: Entered, values: Values): Result<LookupAnswer> {
  const air = airAt(input);
  if (!air.ok) return air;
  const { penalty, bar_abs } = air.value;
  const voltage_kV = input.number('voltage_kV');
  const distance = distanceFor(voltage_kV, penalty);
  if (!distance.ok) return distance;
  const there_mm = input.maybe('distance_mm');
  const pulse_kV = numberAt(values, 'pulse_kV');
  return ok({
    figures: [
      figureOf(['distance', 'bare parts stand apart'], distance.value, {
        rounding: 'up',
        decimals: 0,
        weight: 'answer',
        note: 'between bare parts only; a person keeps farther off',
      }),
      ...thereFigures(there_mm, penalty),
      {
        key: 'needle',
        label: 'needle points break over at this voltage',
        value: distance.value.value / CLEARANCE_FACTOR,
        unit: 'mm',
        rounding: 'nearest',
        digits: 3,
        decimals: 1,
        weight: 'main',
      },
      ...pulseFigures(pulse_kV, { voltage_kV, penalty }),
      {
        key: 'counts_as',
        label: 'the voltage counts as, in the table\u2019s air',
        value: voltage_kV * penalty.value,
        unit: 'kV',
        rounding: 'up',
        digits: 3,
        decimals: 1,
        weight: 'side',
      },
      {
        key: 'air',
        label: 'air taken',
        value: bar_abs,
        unit: 'bar(abs)',
        rounding: 'down',
        digits: 3,
        decimals: 3,
        weight: 'side',
      },
    ],
    ...(there_mm === null ? {} : { says: verdict(there_mm, distance.value.value) }),
    model: `${distance.value.model}. ${penalty.model}`,
    valid: `${distance.value.valid}; ${penalty.valid}`,
    warnings: warningsOf([air.value, distance.value]),
    cautions: [
      'No air gap is a barrier for a person. Local rules and the qualified person responsible go before this distance.',
      'Along a surface it takes far more; sharp ends, wires that move, dust and insects shorten any distance.',
    ],
    plot: plotOf({ voltage_kV, penalty, distance: distance.value, there_mm }),
  });
}

function thereFigures(there_mm: number | null, penalty: Answer): readonly Figure[] {
  if (there_mm === null) return [];
  const shape = {
    key: 'stands',
    label: 'the distance that there is stands at most',
    unit: 'kV',
    rounding: 'down',
    digits: 3,
    decimals: 1,
    weight: 'answer',
  } as const;
  const standing = standing_kV(there_mm, penalty);
  if (!standing.ok) return [{ ...shape, value: 0, words: 'no voltage of the table' }];
  return [{ ...shape, value: standing.value, note: 'peak, in this air, with the factor of three kept' }];
}

function verdict(there_mm: number, needed_mm: number): string {
  return there_mm < needed_mm
    ? 'Too near: the distance that there is falls short of what is asked for.'
    : 'The distance that there is meets what is asked for between bare parts.';
}

function pulseFigures(
  pulse_kV: number | null,
  { voltage_kV, penalty }: { readonly voltage_kV: number; readonly penalty: Answer },
): readonly Figure[] {
  if (pulse_kV === null || pulse_kV <= voltage_kV) return [];
  const distance = distanceFor(pulse_kV, penalty);
  const shape = {
    key: 'pulse',
    label: `the same at the pulse\u2019s ceiling across the channel, ${kV(pulse_kV, 'up')}\u2009kV`,
    unit: 'mm',
    rounding: 'up',
    digits: 3,
    decimals: 0,
    weight: 'main',
  } as const;
  return distance.ok
    ? [{ ...shape, value: distance.value.value }]
    : [{ ...shape, value: 0, words: 'beyond the table: more than 114 mm' }];
}

function kV(value: number, rounding: 'up' | 'down'): string {
  return formatFigure(value, { digits: { decimals: 1 }, rounding });
}

interface PlotParts {
  readonly voltage_kV: number;
  readonly penalty: Answer;
  readonly distance: Answer;
  readonly there_mm: number | null;
}

const CURVE_PIECES = 40;

function plotOf({ voltage_kV, penalty, distance, there_mm }: PlotParts): Plot {
  const to = 40 / penalty.value;
  const points = spread({ from: 0, to }, CURVE_PIECES).flatMap((x) => {
    // The last point may lie over the table's end by a rounding error.
    const at = distanceFor(Math.min(x, to * (1 - 1e-12)), penalty);
    return at.ok ? [{ x, y: at.value.value }] : [];
  });
  const most = Math.max(...points.map(({ y }) => y), there_mm ?? 0) * 1.1;
  return {
    title: `Distance between bare parts at ${kV(voltage_kV, 'up')} kV peak: ${formatFigure(distance.value, { digits: { decimals: 0 }, rounding: 'up' })} mm`,
    x: { label: 'Peak voltage', unit: 'kV', min: 0, max: to, decimals: 0 },
    y: { label: 'Distance', unit: 'mm', min: 0, max: most, decimals: 0 },
    curves: [
      { label: 'bare parts', points, weight: 'curve' },
      {
        label: 'needle points break over',
        points: points.map(({ x, y }) => ({ x, y: y / CLEARANCE_FACTOR })),
        weight: 'thin',
      },
    ],
    point: { x: voltage_kV, low: distance.value, high: distance.value, y: distance.value },
    ...(there_mm === null
      ? {}
      : {
          limit: {
            y: there_mm,
            label: `there is ${formatFigure(there_mm, { digits: { decimals: 0 }, rounding: 'down' })}\u2009mm`,
          },
        }),
  };
}
