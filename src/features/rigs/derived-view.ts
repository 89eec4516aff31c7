import type { CircuitAnswer } from '../../domain/circuit/circuit-answer';
import { currentRise_s } from '../../domain/circuit/current-rise';
import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import { circuitFigures } from '../../domain/rules/rig-derived-figures';
import {
  rigDerived,
  type DerivedFigure,
  type DerivedKey,
  type DerivedSettings,
  type RigDerived,
} from '../../domain/rules/rig-derived';
import {
  channelGain,
  circuitOf,
  narrowest_mm,
  type RigCircuit,
  type RigTransient,
} from '../../domain/rules/rig-circuit';
import { rigFigures } from '../../domain/rules/rig-figures';
import { formatFigure, type Rounding } from '../../domain/units/format-quantity';
import { mapResult, refused, type Result } from '../../domain/units/result';

/** A derived figure as a row: what it is, what it is worth, and what to read before acting on it. */
export interface DerivedRow {
  readonly key: DerivedKey;
  readonly label: string;
  readonly value: string | null;
  readonly unit: string;
  readonly refusal: string | null;
  readonly words: string;
  readonly caution: boolean;
  /** Null for what is exact, and where there is no figure. */
  readonly band: string | null;
  readonly model: string;
  readonly valid: string;
  readonly warnings: readonly string[];
}

/** Rows in the order of the domain; only those asked for, where some are. */
export function derivedRows(derived: RigDerived, keys?: readonly DerivedKey[]): readonly DerivedRow[] {
  const wanted =
    keys === undefined
      ? derived.figures
      : keys.flatMap((key) => derived.figures.filter((figure) => figure.key === key));
  return wanted.map(rowOf);
}

function rowOf({ key, label, figure, rounding, digits, words, caution }: DerivedFigure): DerivedRow {
  const common = { key, label, words, caution };
  if (!figure.ok) {
    const none = { value: null, unit: '', band: null, model: '', valid: '', warnings: [] };
    return { ...common, ...none, refusal: figure.refusal.words };
  }
  const { value, unit, band, model, valid, warnings } = figure.value;
  const scale = unit === 'A' && Math.abs(value) >= 1000 ? { size: 1000, unit: 'kA' } : { size: 1, unit };
  const shown = (one: number, towards: Rounding): string =>
    formatFigure(one / scale.size, { digits: { significant: digits }, rounding: towards });
  return {
    ...common,
    value: shown(value, rounding),
    unit: scale.unit === '1' ? '' : scale.unit,
    refusal: null,
    band: band.low === band.high ? null : `${shown(band.low, 'down')} to ${shown(band.high, 'up')}`,
    model,
    valid,
    warnings: warnings.map((warning) => warning.words),
  };
}

/** The circuit that a worker is asked for; refused where the rig never fires, or where no circuit can be made of it. */
export function circuitToSolve(spec: RigSpec, derived: RigDerived): Result<RigCircuit> {
  const { at, selfBreak, reach } = derived;
  if (!selfBreak.ok) return selfBreak;
  if (!reach.ok) return reach;
  if (reach.value.type === 'never-fires') return refused({ type: 'never-fires', words: reach.value.words });
  return circuitOf(spec, {
    charge_kV: selfBreak.value.law_kV,
    pressure_bar_abs: at.pressure_bar_g + at.ambient_bar_abs,
    ambient_bar_abs: at.ambient_bar_abs,
    temperature_C: at.temperature_C,
  });
}

/** What the worker solved, laid beside the figures that needed no worker. */
export function withTransient(
  spec: RigSpec,
  settings: DerivedSettings,
  solved: Result<RigTransient>,
): RigDerived {
  const derived = derivedOf(spec, settings);
  const filled = circuitFigures(spec, {
    figures: rigFigures(spec, settings),
    broken: derived.selfBreak,
    at: derived.at,
    transient: solved,
  });
  return {
    ...derived,
    transient: solved,
    figures: derived.figures.map((figure) => filled.find((one) => one.key === figure.key) ?? figure),
  };
}

export function derivedOf(spec: RigSpec, settings: DerivedSettings): RigDerived {
  return rigDerived(spec, settings, { transient: false });
}

/** A worker's answer as the transient of the rig that it was asked for. */
export function transientOf(
  spec: RigSpec,
  rig: RigCircuit,
  { answer, settings }: { readonly answer: Result<CircuitAnswer>; readonly settings: LabSettings },
): Result<RigTransient> {
  return mapResult(answer, (solved) => ({
    ...rig,
    answer: solved,
    currentRise_s: currentRise_s(solved.transient.waveform),
    gain: channelGain(solved, {
      gas: spec.channel.gas,
      spacing_mm: narrowest_mm(spec.channel),
      staticBreak_kV: rig.staticBreak.value,
      ambient_bar_abs: settings.ambient_bar_abs,
      temperature_C: settings.ambient_C,
      oxygen_share: null,
    }),
  }));
}
