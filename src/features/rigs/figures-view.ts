import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import { dielectricStress } from '../../domain/capacitor/stress';
import { highestRate, reachableVoltage, supplyReach } from '../../domain/charging/supply-reach';
import { selfBreak, type GapAnswer } from '../../domain/gap/self-break';
import { capacitance_F, chargingOf, rigFigures, type RigFigures } from '../../domain/rules/rig-figures';
import { gapInputOf } from '../../domain/rules/rig-gap';
import { formatFigure, type Rounding } from '../../domain/units/format-quantity';
import type { Result } from '../../domain/units/result';

type Lab = Pick<LabSettings, 'discharged_below_V' | 'ambient_bar_abs' | 'ambient_C'>;

/** A derived figure as a row of the fields column; without a value, `refusal` says why. */
export interface FigureRow {
  readonly key: string;
  readonly label: string;
  readonly source: string;
  readonly value: string | null;
  readonly unit: string;
  readonly refusal: string | null;
}

export interface NodeWait {
  readonly name: string;
  /** Null where the bleed of this node is not known. */
  readonly bleed_Mohm: number | null;
  readonly computed: string | null;
}

export interface BreakSides {
  readonly low: string;
  readonly law: string;
  readonly high: string;
  readonly warnings: readonly string[];
}

export interface RigView {
  readonly rows: readonly FigureRow[];
  /** Energy with the supply's kV and mA and what it can do; never an energy alone. */
  readonly hazard: string | null;
  readonly first_nF: string;
  readonly second_nF: string;
  readonly sides:
    { readonly ok: true; readonly value: BreakSides } | { readonly ok: false; readonly words: string };
  readonly nodes: readonly NodeWait[];
  /** Why there is no wait; null when there is one. */
  readonly no_wait: string | null;
  /** What the supply does to the gap at the highest working pressure, where it does not surely fire it. */
  readonly may_sit_charged: string | null;
}

/** Everything of a rig that the physics of this version gives, rounded away from the danger. */
export function rigView(spec: RigSpec, lab: Lab): RigView {
  const figures = rigFigures(spec, lab);
  const gap = breakAt(spec, lab, spec.gap.highest_bar_g);
  return {
    rows: [stored(spec, figures), ...stress(spec), rate(spec, lab, figures), reach(spec), wait(figures)],
    hazard: figures.ok ? figures.value.hazard.words : null,
    first_nF: nanofarad(capacitance_F(spec.first)),
    second_nF: nanofarad(capacitance_F(spec.second)),
    sides: gap.ok ? { ok: true, value: sidesOf(gap.value) } : { ok: false, words: gap.refusal.words },
    nodes: nodesOf(spec, figures),
    no_wait: figures.ok && figures.value.wait.type === 'unknown' ? figures.value.wait.words : null,
    may_sit_charged: gap.ok ? maySitCharged(spec, gap.value) : null,
  };
}

function breakAt(spec: RigSpec, lab: Lab, pressure_bar_g: number): Result<GapAnswer> {
  const { ambient_bar_abs, ambient_C } = lab;
  return selfBreak(gapInputOf(spec, { pressure_bar_g, ambient_bar_abs, temperature_C: ambient_C }));
}

function maySitCharged(spec: RigSpec, gap: GapAnswer): string | null {
  const answer = supplyReach(chargingOf(spec), gap);
  return answer.ok && answer.value.type !== 'reaches' ? answer.value.words : null;
}

function stored(spec: RigSpec, figures: Result<RigFigures>): FigureRow {
  const { supply_kV, supply_mA } = spec.charging;
  const source = `${supply_kV}\u2009kV, ${supply_mA}\u2009mA`;
  const row = { key: 'stored', label: 'Stored', source, unit: 'J' };
  return figures.ok ? { ...row, ...figure(figures.value.stored_J, 2, 'up') } : { ...row, ...none(figures) };
}

/** Taken from the supply's limit, since a gap that stays shut lets it through; the worse of the two sheets. */
function stress(spec: RigSpec): FigureRow[] {
  const sheets = [spec.first, spec.second].flatMap((one) => (one.kind === 'sheet' ? [one] : []));
  const answers = sheets.map((sheet) => ({
    sheet,
    answer: dielectricStress(spec.charging.supply_kV * 1000, sheet.ply_um * sheet.plies * 1e-6),
  }));
  const [worst] = answers.toSorted((a, b) => valueOf(b.answer) - valueOf(a.answer));
  if (worst === undefined) return [];
  const source = `limit ${worst.sheet.strength_kV_mm}`;
  const row = { key: 'stress', label: 'Stress', source, unit: 'kV/mm' };
  return [
    worst.answer.ok
      ? { ...row, ...figure(worst.answer.value.value, 3, 'up') }
      : { ...row, ...none(worst.answer) },
  ];
}

/** In the middle of the working pressures; the envelope is a limit of its own, and the smaller of the two counts. */
function rate(spec: RigSpec, lab: Lab, figures: Result<RigFigures>): FigureRow {
  const middle_bar_g = (spec.gap.lowest_bar_g + spec.gap.highest_bar_g) / 2;
  const at = formatFigure(middle_bar_g, { digits: { decimals: 2 }, rounding: 'nearest' });
  const row = { key: 'rate', label: 'Rate at most', source: `at ${at}\u2009bar(g)`, unit: 'Hz' };
  const gap = breakAt(spec, lab, middle_bar_g);
  if (!figures.ok) return { ...row, ...none(figures) };
  if (!gap.ok) return { ...row, ...none(gap) };
  const { first_F, second_F } = figures.value;
  const answer = highestRate(chargingOf(spec), {
    capacitance_F: spec.topology === 'lc-inversion' ? first_F + second_F : first_F,
    break_kV: gap.value.law_kV,
  });
  if (!answer.ok) return { ...row, ...none(answer) };
  const { max_rate_Hz } = spec.envelope;
  if (answer.value.value > max_rate_Hz)
    return { ...row, source: 'by the envelope', ...figure(max_rate_Hz, 2, 'down') };
  return { ...row, ...figure(answer.value.value, 2, 'down') };
}

function reach(spec: RigSpec): FigureRow {
  const row = { key: 'reach', label: 'Reach', source: 'past ballast', unit: 'kV' };
  const answer = reachableVoltage(chargingOf(spec));
  return answer.ok ? { ...row, ...figure(answer.value.value, 3, 'down') } : { ...row, ...none(answer) };
}

function wait(figures: Result<RigFigures>): FigureRow {
  const row = { key: 'wait', label: 'Wait', source: 'before the stick', unit: 's' };
  if (!figures.ok) return { ...row, ...none(figures) };
  const { wait: found } = figures.value;
  if (found.type === 'unknown') return { ...row, value: null, refusal: 'A bleed is not known: no number.' };
  const computed = formatFigure(found.computed_s, { digits: { significant: 3 }, rounding: 'up' });
  return {
    ...row,
    source: `bleeds in ${computed}\u2009s`,
    value: formatFigure(found.wait_s, { digits: { decimals: 0 }, rounding: 'up' }),
    refusal: null,
  };
}

function nodesOf(spec: RigSpec, figures: Result<RigFigures>): readonly NodeWait[] {
  const known = figures.ok && figures.value.wait.type === 'known' ? figures.value.wait.nodes : [];
  const own = spec.nodes.map(({ name, bleed_Mohm }) => ({ name, bleed_Mohm, computed: waitOf(known, name) }));
  const joined = known.filter((node) => !spec.nodes.some(({ name }) => name === node.name));
  return [...own, ...joined.map(({ name }) => ({ name, bleed_Mohm: null, computed: waitOf(known, name) }))];
}

function waitOf(
  known: readonly { readonly name: string; readonly computed_s: number }[],
  name: string,
): string | null {
  const node = known.find((one) => one.name === name);
  return node === undefined
    ? null
    : formatFigure(node.computed_s, { digits: { decimals: node.computed_s < 0.1 ? 3 : 1 }, rounding: 'up' });
}

function sidesOf(gap: GapAnswer): BreakSides {
  const at = (value: number, rounding: Rounding): string =>
    formatFigure(value, { digits: { decimals: value < 10 ? 2 : 1 }, rounding });
  return {
    low: at(gap.low_kV, 'down'),
    law: at(gap.law_kV, 'nearest'),
    high: at(gap.high_kV, 'up'),
    warnings: gap.warnings.map((warning) => warning.words),
  };
}

function nanofarad(farad: Result<number>): string {
  return farad.ok
    ? formatFigure(farad.value * 1e9, { digits: { significant: 3 }, rounding: 'nearest' })
    : '\u2013';
}

function figure(value: number, significant: number, rounding: Rounding) {
  return { value: formatFigure(value, { digits: { significant }, rounding }), refusal: null };
}

function none(result: { readonly ok: false; readonly refusal: { readonly words: string } }) {
  return { value: null, refusal: result.refusal.words };
}

function valueOf(result: Result<{ readonly value: number }>): number {
  return result.ok ? result.value.value : 0;
}
