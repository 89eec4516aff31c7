import type { CircuitAnswer } from '../../domain/circuit/circuit-answer';
import { currentRise_s } from '../../domain/circuit/current-rise';
import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import { circuitFigures } from '../../domain/rules/rig-derived-figures';
import { rigDerived, type DerivedSettings, type RigDerived } from '../../domain/rules/rig-derived';
import {
  channelGain,
  circuitOf,
  narrowest_mm,
  type RigCircuit,
  type RigTransient,
} from '../../domain/rules/rig-circuit';
import { rigFigures } from '../../domain/rules/rig-figures';
import { mapResult, refused, type Result } from '../../domain/units/result';

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
