import { refused, ok, type Result } from '../units/result';
import { isGasName, type GasName } from './gas-table';
import {
  AIR_CRITERION,
  SF6_CRITERION,
  uniformVoltage_kV,
  type StreamerCriterion,
} from './streamer-criterion';

/** Largest x in bar cm for which the ratio of nitrogen to air is founded. */
export const N2_RATIO_UP_TO_BAR_CM = 5;

/** What a gas needs for the high-pd laws. All voltages are in kV and x in bar cm at 20 C. */
export interface GasLaw {
  readonly gas: GasName;
  readonly criterion: StreamerCriterion;
  /** Multiplies the voltage that the criterion gives. */
  readonly factor: (x_bar_cm: number) => number;
  /** Further factor on the low side, for what is not known about the gas. */
  readonly lowMargin: number;
  /** Uniform voltage the gas may reach at most, before the factors common to all gases. */
  readonly highest_kV: (x_bar_cm: number) => number;
  readonly relative: number;
  readonly lowestX_bar_cm: number;
  readonly highestX_bar_cm: number;
  readonly model: string;
  /** False: an order of size only, never for hold-off. */
  readonly usable: boolean;
}

/** N2 voltage as a share of air's, x at most 5 bar cm; held level beyond, where nothing founds it. */
export function nitrogenRatio(x_bar_cm: number): number {
  return 0.967 - 0.0167 * Math.max(0, Math.min(x_bar_cm, N2_RATIO_UP_TO_BAR_CM) - 1);
}

/**
 * The high-pd law of a gas, or the honest reason why there is none. `indicative` laws are given only when asked
 * for by name through `lawOrIndication`.
 */
export function gasLaw(gas: unknown): Result<GasLaw> {
  const law = lawOrIndication(gas);
  if (!law.ok || law.value.usable) return law;
  return refused({
    type: 'gas-without-law',
    field: 'gas',
    words: `${gasWord(law.value.gas)}: no law is good enough to plan with. It breaks at very roughly ${String(
      law.value.factor(1),
    )} of air, within 40 % and far off with a trace of impurity.`,
  });
}

/** As `gasLaw`, with the indication of about 40 % for argon, neon and helium let through. */
export function lawOrIndication(gas: unknown): Result<GasLaw> {
  if (!isGasName(gas)) {
    return refused({
      type: 'gas-unknown',
      field: 'gas',
      words:
        'Gas: mixtures and other gases have no law here. Choose one gas; a mixture is not the mean of its parts.',
    });
  }
  const law = LAWS[gas];
  return law === undefined
    ? refused({ type: 'gas-without-law', field: 'gas', words: NO_LAW_WORDS[gas] ?? '' })
    : ok(law);
}

/** Uniform-field voltage of a gas by its law, kV. */
export function uniformByLaw_kV(law: GasLaw, x_bar_cm: number): number {
  return law.factor(x_bar_cm) * uniformVoltage_kV(law.criterion, x_bar_cm);
}

const airUniform_kV = (x: number) => uniformVoltage_kV(AIR_CRITERION, x);

const AIR: GasLaw = {
  gas: 'air',
  criterion: AIR_CRITERION,
  factor: () => 1,
  lowMargin: 1,
  highest_kV: airUniform_kV,
  relative: 0.03,
  lowestX_bar_cm: 0.013,
  highestX_bar_cm: 50,
  model: 'Law for air, 24.36 x + 6.72 \u221ax',
  usable: true,
};

function shareOfAir(gas: GasName, share: number, relative: number): GasLaw {
  return {
    ...AIR,
    gas,
    relative,
    factor: () => share,
    lowMargin: 1 - relative,
    highest_kV: (x) => share * (1 + relative) * airUniform_kV(x),
    model: `${String(share)} of the law for air, within ${String(Math.round(relative * 100))} %`,
  };
}

const LAWS: Readonly<Partial<Record<GasName, GasLaw>>> = {
  air: AIR,
  N2: {
    ...AIR,
    gas: 'N2',
    factor: nitrogenRatio,
    lowMargin: 0.97,
    // Published tables put nitrogen up to 15 % above air, against every law: the high side believes them.
    highest_kV: (x) => 1.15 * airUniform_kV(x),
    relative: 0.05,
    highestX_bar_cm: N2_RATIO_UP_TO_BAR_CM,
    model: 'Law for nitrogen, 0.967 of air and less above 1 bar cm',
  },
  SF6: {
    gas: 'SF6',
    criterion: SF6_CRITERION,
    factor: () => 1,
    // Assumed: both constants are from memory and roughness decides above 2 bar.
    lowMargin: 0.95,
    highest_kV: (x) => 1.05 * uniformVoltage_kV(SF6_CRITERION, x),
    relative: 0.05,
    lowestX_bar_cm: 0.01,
    highestX_bar_cm: 50,
    model: 'Law for SF6, 0.38 + 88.5 x',
    usable: true,
  },
  CO2: shareOfAir('CO2', 0.88, 0.08),
  H2: shareOfAir('H2', 0.52, 0.12),
  Ar: { ...shareOfAir('Ar', 0.25, 0.4), usable: false },
  Ne: { ...shareOfAir('Ne', 0.15, 0.4), usable: false },
  He: { ...shareOfAir('He', 0.15, 0.4), usable: false },
};

const NO_LAW_WORDS: Readonly<Partial<Record<GasName, string>>> = {
  O2: 'Oxygen: published strengths contradict each other, some below air and some above it, so no voltage is given.',
  H2O: 'Water vapour: no breakdown law is known well enough, so no voltage is given.',
};

function gasWord(gas: GasName): string {
  return gas === 'Ar' ? 'Argon' : gas === 'Ne' ? 'Neon' : gas === 'He' ? 'Helium' : gas;
}
