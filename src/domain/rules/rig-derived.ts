import type { LabSettings, RigSpec } from '../book/rig-spec';
import { eyewearFor, type EyewearLine } from '../beam/eyewear';
import type { HazardBand } from '../capacitor/hazard';
import type { BleedWait } from '../capacitor/bleed';
import { supplyReach, type SupplyReach } from '../charging/supply-reach';
import { selfBreak, type GapAnswer } from '../gap/self-break';
import type { Answer, Warning } from '../units/answer';
import type { Rounding } from '../units/format-quantity';
import { andThen, mapResult, ok, refused, type Result } from '../units/result';
import { rigBeam, type RigBeam } from './rig-beam';
import { rigTransient, type RigTransient } from './rig-circuit';
import { chargingOf, rigFigures, type RigFigures } from './rig-figures';
import { circuitFigures, energyFigures, rateFigure, reachFigure, stressFigures } from './rig-derived-figures';
import { gapInputOf } from './rig-gap';

export type DerivedKey =
  | 'first'
  | 'second'
  | 'stored'
  | 'stored_at_break'
  | 'self_break'
  | 'reach'
  | 'stress_first'
  | 'margin_first'
  | 'stress_second'
  | 'margin_second'
  | 'ideal_peak'
  | 'channel_static'
  | 'channel_peak'
  | 'time_to_peak'
  | 'rise'
  | 'current_rise'
  | 'gap_current'
  | 'channel_current'
  | 'rate'
  | 'eyewear';

/** One figure of a rig, as every screen and every paper shows it. */
export interface DerivedFigure {
  readonly key: DerivedKey;
  readonly label: string;
  /** In the unit of its answer; refused in words where there is none. */
  readonly figure: Result<Answer>;
  readonly rounding: Rounding;
  /** Counting digits. */
  readonly digits: number;
  /** What stands beside it: what it was taken at, and what it means. Never empty for an energy. */
  readonly words: string;
  /** The words are a caution and are shown in full. */
  readonly caution: boolean;
}

/** Everything that a rig's numbers give by the physics of this version. */
export interface RigDerived {
  /** Middle of the working pressures and the lab's air: where self-break, rate and wave shape are taken. */
  readonly at: {
    readonly pressure_bar_g: number;
    readonly ambient_bar_abs: number;
    readonly temperature_C: number;
  };
  readonly figures: readonly DerivedFigure[];
  /** From the supply's limit: the energy with its supply beside it, and what a touch does. */
  readonly hazard: Result<HazardBand>;
  /** Every node by itself, and the wait that covers them all; no number where a bleed is not known. */
  readonly wait: Result<BleedWait>;
  readonly selfBreak: Result<GapAnswer>;
  readonly reach: Result<SupplyReach>;
  /** Wave shape, energy ledger and gain window at the self-break voltage of the law. */
  readonly transient: Result<RigTransient>;
  readonly eyewear: Result<{
    readonly lines: readonly EyewearLine[];
    readonly warnings: readonly Warning[];
    readonly beam: RigBeam;
  }>;
}

export type DerivedSettings = Pick<LabSettings, 'discharged_below_V' | 'ambient_bar_abs' | 'ambient_C'>;

/**
 * Everything that Holdoff derives from a rig. Pure and total: what cannot be given is refused in words in its own place
 * and takes nothing else with it. About 5 ms; with `transient` false the wave shape is left out for whoever asks a worker.
 */
export function rigDerived(
  spec: RigSpec,
  settings: DerivedSettings,
  wants: { readonly transient: boolean } = { transient: true },
): RigDerived {
  const at = {
    pressure_bar_g: (spec.gap.lowest_bar_g + spec.gap.highest_bar_g) / 2,
    ambient_bar_abs: settings.ambient_bar_abs,
    temperature_C: settings.ambient_C,
  };
  const figures = rigFigures(spec, settings);
  const broken = selfBreak(gapInputOf(spec, at));
  const reach = andThen(broken, (gap) => supplyReach(chargingOf(spec), gap));
  const transient = wants.transient
    ? transientAt(spec, { at, broken, reach })
    : refused({ type: 'not-asked', words: 'The wave shape was not asked for.' });
  const eyewear = eyewearOf(spec, figures);
  return {
    at,
    figures: [
      ...energyFigures(spec, { figures, broken, at }),
      reachFigure(reach),
      ...stressFigures(spec, { figures, reach }),
      ...circuitFigures(spec, { figures, transient, broken, at }),
      rateFigure(spec, { figures, broken }),
      eyewearFigure(eyewear),
    ],
    hazard: mapResult(figures, ({ hazard }) => hazard),
    wait: mapResult(figures, ({ wait }) => wait),
    selfBreak: broken,
    reach,
    transient,
    eyewear,
  };
}

/** One figure of a rig by its key. */
export function derivedFigure({ figures }: RigDerived, key: DerivedKey): DerivedFigure {
  const found = figures.find((figure) => figure.key === key);
  if (found === undefined) throw new Error(`no figure ${key}`);
  return found;
}

/** A rig's transient at its self-break; refused where the supply never brings it there. */
function transientAt(
  spec: RigSpec,
  from: {
    readonly at: RigDerived['at'];
    readonly broken: Result<GapAnswer>;
    readonly reach: Result<SupplyReach>;
  },
): Result<RigTransient> {
  const { at, broken, reach } = from;
  if (!broken.ok) return broken;
  if (!reach.ok) return reach;
  if (reach.value.type === 'never-fires') {
    return refused({ type: 'never-fires', words: reach.value.words });
  }
  return rigTransient(spec, {
    charge_kV: broken.value.law_kV,
    pressure_bar_abs: at.pressure_bar_g + at.ambient_bar_abs,
    ambient_bar_abs: at.ambient_bar_abs,
    temperature_C: at.temperature_C,
  });
}

function eyewearOf(spec: RigSpec, figures: Result<RigFigures>): RigDerived['eyewear'] {
  return andThen(figures, ({ stored_J }) =>
    andThen(rigBeam(spec, stored_J), (beam) =>
      mapResult(eyewearFor([beam.line]), ({ lines, warnings }) => ({ lines, warnings, beam })),
    ),
  );
}

function eyewearFigure(eyewear: RigDerived['eyewear']): DerivedFigure {
  const common = { key: 'eyewear', label: 'Eyewear density', rounding: 'up', digits: 2 } as const;
  if (!eyewear.ok) return { ...common, figure: eyewear, words: '', caution: false };
  const { lines, warnings, beam } = eyewear.value;
  const density = Math.max(...lines.map((line) => line.density));
  const assumed = beam.assumed.length === 0 ? '' : ` Assumed: ${beam.assumed.join('; ')}.`;
  return {
    ...common,
    figure: ok({
      value: density,
      unit: '1',
      band: { low: density, high: density },
      model: 'Exposure over limit, decades, rounded up to a tenth',
      valid: 'a working day in the beam at the envelope\u2019s rate; one end of the channel',
      warnings,
    }),
    words: `At least this at ${beam.line.wavelength_nm}\u2009nm, stated on the eyewear.${assumed}`,
    caution: true,
  };
}
