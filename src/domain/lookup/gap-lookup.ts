import { reachableVoltage, supplyReach, type Charging } from '../charging/supply-reach';
import type { Electrodes } from '../gap/electrodes';
import type { GapInput, GapSetup } from '../gap/gap-input';
import { gapFor, pressureFor, type GapPurpose } from '../gap/gap-solve';
import { isGasName } from '../gap/gas-table';
import { selfBreak, type GapAnswer } from '../gap/self-break';
import { workingPoint, type GapCondition, type WorkingPoint } from '../gap/working-point';
import { DIAL_ERRORS } from '../rules/rig-gap';
import { formatFigure } from '../units/format-quantity';
import { mapResult, ok, refused, type Refusal, type Result } from '../units/result';
import { numberAt, textAt } from './fields';
import { GAP_FIELDS, SHAPES } from './gap-lookup-fields';
import { gapFigures, heldFigures, supplyFigures } from './gap-lookup-figures';
import { gapPlot } from './gap-lookup-plot';
import { gapStart } from './gap-lookup-start';
import type { Lookup, LookupAnswer, Solvable, Values } from './lookup';

/** Breakdown of a spark gap, always with both sides (physics A, K and M). */
export const GAP_LOOKUP: Lookup = {
  key: 'gap',
  title: 'Gap',
  decides: 'Which gap, gas and pressure hold off which voltage, and at which they break.',
  fields: GAP_FIELDS,
  first: 'pressure',
  start: gapStart,
  answer,
  solvable: [...purposes('pressure', solvePressure), ...purposes('gap_mm', solveGap)],
};

function purposes(
  field: string,
  solve: (values: Values, target: Target) => Result<Solved>,
): readonly Solvable[] {
  const of = (purpose: Target['purpose']) => (values: Values, voltage_kV: number) =>
    solve(values, { purpose, voltage_kV });
  return [
    {
      field,
      figure: 'low',
      purpose: 'hold off at least',
      rounding: 'up',
      target: 'voltage_kV',
      exact: of('hold-off-at-least'),
    },
    {
      field,
      figure: 'high',
      purpose: 'break at most',
      rounding: 'down',
      target: 'voltage_kV',
      exact: of('break-at-most'),
    },
  ];
}

/** The gap without its pressure, as the physics takes it. Missing fields are refused there by name. */
export function gapSetupAt(values: Values): Result<GapSetup> {
  const { gas, electrodes } = values;
  if (!isGasName(gas)) return refused(choose('gas', 'Gas', 'choose one of the list'));
  const shape = SHAPES.find((each) => each === electrodes);
  if (shape === undefined) return refused(choose('electrodes', 'Electrodes', 'choose their shape'));
  for (const [key, name] of ASKED) {
    if (numberAt(values, key) === null)
      return refused({ type: 'empty', field: key, words: `${name}: enter a number.` });
  }
  return ok({
    gas,
    electrodes: electrodesAt(values, shape),
    gap_mm: numberAt(values, 'gap_mm') ?? 0,
    u_gap_mm: numberAt(values, 'gap_error_mm') ?? 0,
    u_pressure_bar: DIAL_ERRORS.pressure_bar,
    temperature_C: numberAt(values, 'temperature_C') ?? 0,
    u_temperature_C: DIAL_ERRORS.temperature_C,
    // Whatever is not said to be lit counts as dark: the wider band.
    irradiated: textAt(values, 'irradiated') === 'uv',
  });
}

function electrodesAt(values: Values, shape: Electrodes['shape']): Electrodes {
  const radius_mm = numberAt(values, 'radius_mm');
  if (shape === 'capped-rods') return { shape, radius_mm, rod_length_mm: numberAt(values, 'rod_length_mm') };
  if (shape !== 'hex-bars') return { shape, radius_mm };
  const facing = textAt(values, 'facing');
  return {
    shape,
    flats_mm: numberAt(values, 'flats_mm'),
    corner_mm: numberAt(values, 'corner_mm'),
    facing: facing === 'flats' || facing === 'edges' ? facing : null,
  };
}

const ASKED = [
  ['gap_mm', 'Gap'],
  ['temperature_C', 'Temperature'],
  ['gap_error_mm', 'Gap error'],
] as const;

function choose(field: string, name: string, what: string): Refusal {
  return { type: 'unknown-choice', field, words: `${name}: ${what}.` };
}

function answer(values: Values, wants = { plot: true }): Result<LookupAnswer> {
  const setup = gapSetupAt(values);
  if (!setup.ok) return named(setup);
  const ambient = ambientAt(values);
  if (!ambient.ok) return ambient;
  const gauge = numberAt(values, 'pressure');
  if (gauge === null)
    return refused({ type: 'empty', field: 'pressure', words: 'Pressure: enter a number.' });
  const input: GapInput = { ...setup.value, pressure: { bar_abs: gauge + ambient.value } };
  const broken = selfBreak(input);
  if (!broken.ok) return named(broken);
  const held = heldAt(values, broken.value);
  if (!held.ok) return held;
  const parts = { values, input, ambient_bar_abs: ambient.value, gap: broken.value, held: held.value };
  return ok(answerOf(parts, wants));
}

interface Parts {
  readonly values: Values;
  readonly input: GapInput;
  readonly ambient_bar_abs: number;
  readonly gap: GapAnswer;
  readonly held: WorkingPoint | null;
}

function answerOf(parts: Parts, wants: { readonly plot: boolean }): LookupAnswer {
  const { values, input, ambient_bar_abs, gap, held } = parts;
  const charging = chargingAt(values);
  const reachable = charging === null ? null : reachableVoltage(charging);
  const reach = charging === null ? null : supplyReach(charging, gap);
  const reachable_kV = reachable?.ok === true ? reachable.value.value : null;
  return {
    figures: [...gapFigures(gap, input), ...heldFigures(held), ...supplyFigures(reachable_kV)],
    model: `${gap.model}, ${percent(gap.band.below)} to ${percent(gap.band.above)}\u00a0% with the setting errors. Ambient ${ambient_bar_abs.toFixed(3)}\u00a0bar(abs)`,
    valid: gap.valid,
    warnings: [...gap.warnings, ...(held?.warnings ?? [])],
    cautions: [
      ...(reach?.ok === true && reach.value.type !== 'reaches' ? [reach.value.words] : []),
      'With a person near, no gas gap is a barrier.',
    ],
    lean: 'high',
    ...(wants.plot ? { plot: gapPlot({ values, input, ambient_bar_abs, gap, reachable_kV }) } : {}),
  };
}

function heldAt(values: Values, gap: GapAnswer): Result<WorkingPoint | null> {
  const voltage_kV = numberAt(values, 'voltage_kV');
  if (voltage_kV === null) return ok(null);
  const condition = (textAt(values, 'condition') ?? '') as GapCondition;
  return workingPoint({ voltage_kV, lowSide_kV: gap.low_kV, condition });
}

/** Null without a rig: nothing is assumed about a supply. */
function chargingAt(values: Values): Charging | null {
  const supply_kV = numberAt(values, 'supply_kV');
  const supply_mA = numberAt(values, 'supply_mA');
  const ballast_Mohm = numberAt(values, 'ballast_Mohm');
  if (supply_kV === null || supply_mA === null || ballast_Mohm === null) return null;
  return { supply_kV, supply_mA, ballast_Mohm, bleed_Mohm: numberAt(values, 'bleed_Mohm') };
}

const AMBIENT = { field: 'ambient_bar_abs', low: 0.3, high: 1.1 } as const;

function ambientAt(values: Values): Result<number> {
  const ambient = numberAt(values, AMBIENT.field);
  if (ambient === null) {
    return refused({
      type: 'no-ambient',
      field: AMBIENT.field,
      words: 'Ambient: enter the ambient pressure; it has no default.',
    });
  }
  if (ambient < AMBIENT.low || ambient > AMBIENT.high) {
    return refused({
      type: 'out-of-range',
      field: AMBIENT.field,
      words: `Ambient: must be from ${AMBIENT.low} to ${AMBIENT.high}\u2009bar(abs).`,
    });
  }
  return ok(ambient);
}

interface Solved {
  readonly value: number;
  readonly all: readonly number[];
}

interface Target {
  readonly purpose: Exclude<GapPurpose, 'law'>;
  readonly voltage_kV: number;
}

function solvePressure(values: Values, target: Target): Result<Solved> {
  const setup = gapSetupAt(values);
  if (!setup.ok) return named(setup);
  const ambient = ambientAt(values);
  if (!ambient.ok) return ambient;
  return named(
    mapResult(pressureFor(setup.value, target), ({ value, all }) => ({
      value: value - ambient.value,
      all: all.map((bar_abs) => bar_abs - ambient.value),
    })),
  );
}

function solveGap(values: Values, target: Target): Result<Solved> {
  // The gap that stands there is not asked about, so it may be missing or out of range.
  const setup = gapSetupAt({ ...values, gap_mm: 1 });
  if (!setup.ok) return named(setup);
  const ambient = ambientAt(values);
  if (!ambient.ok) return ambient;
  const gauge = numberAt(values, 'pressure');
  if (gauge === null)
    return refused({ type: 'empty', field: 'pressure', words: 'Pressure: enter a number.' });
  const solution = gapFor({ ...setup.value, pressure: { bar_abs: gauge + ambient.value } }, target);
  return named(mapResult(solution, ({ value, all }) => ({ value, all })));
}

/** Refusals of the physics name its own inputs; here they stand beside the field of this lookup. */
const FIELD_NAMES: Readonly<Record<string, string>> = { u_gap_mm: 'gap_error_mm' };

function named<T>(result: Result<T>): Result<T> {
  if (result.ok || result.refusal.field === undefined) return result;
  const field = FIELD_NAMES[result.refusal.field] ?? result.refusal.field;
  if (GAP_FIELDS.some((each) => each.key === field)) return refused({ ...result.refusal, field });
  const { type, words } = result.refusal;
  return refused({ type, words });
}

function percent(share: number): string {
  const sign = share < 0 ? '\u2212' : '+';
  return `${sign}${formatFigure(Math.abs(share) * 100, { digits: { decimals: 0 }, rounding: 'up' })}`;
}
