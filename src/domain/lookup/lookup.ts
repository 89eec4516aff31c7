import type { LabSettings, RigSpec } from '../book/rig-spec';
import type { Warning } from '../units/answer';
import type { Rounding } from '../units/format-quantity';
import type { Result } from '../units/result';

/** Where an input's value comes from; it stands beside the value. */
export type Known = 'rig' | 'lab' | 'assumed' | 'what-if';

/** A unit that the Keypad offers beside the field's own. Null where it cannot be told, as gauge without an ambient. */
export interface UnitChoice {
  readonly key: string;
  readonly label: string;
  readonly toOwn: (typed: number, values: Values) => number | null;
  readonly fromOwn: (own: number, values: Values) => number | null;
  readonly decimals: number;
}

/** A number that goes in. `min` and `max` are those of the physics, `slide` is what a slider offers of them. */
export interface NumberField {
  readonly kind: 'number';
  readonly key: string;
  readonly label: string;
  /** As it stands on screen; a pressure says bar(g) or bar(abs). */
  readonly unit: string;
  readonly units?: readonly UnitChoice[];
  readonly min: number;
  readonly max: number;
  readonly minExcluded?: boolean;
  readonly step: number;
  readonly decimals: number;
  readonly slide: { readonly from: number; readonly to: number; readonly scale: 'linear' | 'log' };
  /** True where the lookup answers without it, for "not known". */
  readonly optional?: boolean;
  /** True where only whole numbers have a meaning. */
  readonly whole?: boolean;
  /** Short help in our own words: what it is, where to measure it. */
  readonly help: string;
  /** Left out of the screen for these values, as the ply of a bank of parts. */
  readonly shownFor?: (values: Values) => boolean;
}

/** A choice that goes in: gas, dielectric, topology. */
export interface ChoiceField {
  readonly kind: 'choice';
  readonly key: string;
  readonly label: string;
  readonly options: readonly { readonly value: string; readonly label: string }[];
  readonly help: string;
  readonly shownFor?: (values: Values) => boolean;
}

/** Words that go in, as a chemical formula. */
export interface TextField {
  readonly kind: 'text';
  readonly key: string;
  readonly label: string;
  readonly help: string;
  readonly shownFor?: (values: Values) => boolean;
}

export type Field = NumberField | ChoiceField | TextField;

/**
 * Values by the field's key, in the field's own unit; null where none is known. A key that no field names is what the rig says
 * and nobody enters here, as the vessel's rating: an answer does without it where it is missing.
 */
export type Values = Readonly<Record<string, number | string | null>>;

/** What there is to start from; both may be missing. `envelope` is that of the standing permit. */
export interface StartFrom {
  readonly spec: RigSpec | null;
  readonly settings: LabSettings | null;
  readonly envelope?: RigSpec['envelope'] | null;
  /** The rig's own self-break curve, where measured self-breaks gave one. */
  readonly own?: OwnCurve | null;
}

/** A rig's own curve as a lookup draws it: the law at the gap plus an offset, times a scale, over what was read. */
export interface OwnCurve {
  readonly scale: number;
  readonly offset_mm: number;
  readonly from_bar_abs: number;
  readonly to_bar_abs: number;
}

/** What a lookup starts from: the rig in hand and the lab, or nothing at all. */
export interface Start {
  readonly values: Values;
  /** By field: where the value comes from. */
  readonly known: Readonly<Record<string, Known>>;
}

/** One figure of the answer, rounded to its harmless side wherever it is shown. */
export interface Figure {
  readonly key: string;
  readonly label: string;
  readonly value: number;
  readonly unit: string;
  readonly low?: number;
  readonly high?: number;
  readonly rounding: Rounding;
  /** Counting digits. */
  readonly digits: number;
  /** Digits after the point instead, where other screens show this figure so. */
  readonly decimals?: number;
  /** `answer`: the large one of the screen; at most two. */
  readonly weight: 'answer' | 'main' | 'side';
  /** Words instead of the figure, where none can be given. */
  readonly words?: string;
  /** Which face of the answer's slice it is; a slice needs both and stands on the plot's own scale. */
  readonly face?: 'low' | 'law' | 'high';
  /** A line under it: "stand at most 13.4 kV". */
  readonly note?: string;
}

export interface PlotAxis {
  readonly label: string;
  readonly unit: string;
  readonly min: number;
  readonly max: number;
  readonly kind?: 'linear' | 'log';
  readonly decimals?: number;
}

/** What stands beside the answer: a curve or a wave shape, with band, limits and the working point. */
export interface Plot {
  readonly title: string;
  readonly x: PlotAxis;
  readonly y: PlotAxis;
  readonly band?: {
    readonly points: readonly { readonly x: number; readonly low: number; readonly high: number }[];
    /** What the ground above and below the band means. */
    readonly above: string;
    readonly below: string;
  };
  readonly law?: readonly { readonly x: number; readonly y: number }[];
  readonly curves?: readonly {
    readonly label: string;
    readonly points: readonly { readonly x: number; readonly y: number }[];
    readonly weight: 'thin' | 'curve';
  }[];
  readonly own?: {
    readonly points: readonly { readonly x: number; readonly y: number }[];
    readonly label?: string;
  };
  readonly window?: { readonly min: number; readonly max: number };
  readonly limit?: { readonly y: number; readonly label: string; readonly short?: string };
  readonly wall?: { readonly from: number; readonly label: string };
  readonly point?: { readonly x: number; readonly low: number; readonly high: number; readonly y?: number };
  readonly spans?: readonly { readonly from: number; readonly to: number; readonly label: string }[];
  readonly notValid?: { readonly from: number; readonly label: string };
}

/** An answer whole: figures, model, validity, what to read before acting on it. */
export interface LookupAnswer {
  readonly figures: readonly Figure[];
  /** A verdict in words, as "Fast enough for nitrogen, if nothing else is wrong." */
  readonly says?: string;
  readonly model: string;
  readonly valid: string;
  readonly warnings: readonly Warning[];
  /** The cautions that belong to the number; the first stands beside it in full. */
  readonly cautions: readonly string[];
  readonly plot?: Plot;
  /** The face that the answer leans on. */
  readonly lean?: 'low' | 'high';
}

/** One quantity that may be solved for: which input is sought so that which figure reaches a wanted value. */
export interface Solvable {
  /** Key of the input that is found. */
  readonly field: string;
  /** Key of the figure that is to be reached. */
  readonly figure: string;
  /** What the found value is for, where that decides which side it leans on: "to hold off at least". */
  readonly purpose?: string;
  /** Which way the found value rounds so that the target is still met. */
  readonly rounding: Rounding;
  /** Key of the input that holds the wanted value, where the lookup has one; screens ask for it beside the others otherwise. */
  readonly target?: string;
  /** The domain's own inverse, where it is better than a search; `all` in rising order, the field's own unit. */
  readonly exact?: (
    values: Values,
    target: number,
  ) => Result<{ readonly value: number; readonly all: readonly number[] }>;
}

/**
 * A lookup as data: what goes in, where it comes from, and what comes out. Screens, the sweep, the solve and the tests all
 * run over this one shape, so a new lookup needs no screen of its own.
 */
export interface Lookup {
  /** Stands in the address and in kept entries: never renamed. */
  readonly key: string;
  readonly title: string;
  /** What it decides, in one line for the list of lookups. */
  readonly decides: string;
  readonly fields: readonly Field[];
  /** From the rig and the lab; both may be missing. Never a made-up ambient pressure. */
  readonly start: (from: StartFrom) => Start;
  /** Key of the field that is chosen first; the first number otherwise. */
  readonly first?: string;
  /**
   * Pure and total: any value of any field gives an answer or a refusal in words, never a throw and never a NaN. A search or a
   * sweep wants no plot; a lookup whose plot takes time leaves it out then.
   */
  readonly answer: (values: Values, wants?: { readonly plot: boolean }) => Result<LookupAnswer>;
  readonly solvable: readonly Solvable[];
  /** Takes longer than a frame: screens ask a worker. */
  readonly slow?: true;
}
