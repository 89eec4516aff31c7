import { answer, withBand, type Answer, type Basis, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { CHANNEL_PRESSURE_RULE, reducedField } from './reduced-field';
import { upperStateLifetimeWithOxygen } from './upper-state';

/** What a shot does in the channel, as computed or measured. */
export interface GainInput {
  /** 10 to 90 % of the channel current. */
  readonly currentRise_ns: number;
  readonly peak_kV: number;
  /** Static break of the channel's own gap. */
  readonly staticBreak_kV: number;
  readonly gap_cm: number;
  readonly pressure_bar_abs: number;
  readonly temperature_C: number;
  /** Share of oxygen in the gas; 0.21 for air. */
  readonly oxygen_share: number;
}

/** One thing that helps or hinders, from 0 (kills it) to 1 (as wanted). */
export interface GainReason {
  readonly type: 'rise' | 'over-voltage' | 'field' | 'oxygen';
  readonly mark: number;
  readonly words: string;
}

/** How far the conditions for gain are met. A score with its reasons, weakest first; never a promise of light. */
export interface GainVerdict extends Basis {
  /** From 0 to 100. */
  readonly score: number;
  readonly lifetime_ns: number;
  readonly field_Td: number;
  readonly reasons: readonly GainReason[];
  readonly words: string;
  /** The score with the band that lifetime and field leave open; the marks themselves have none. */
  readonly rating: Answer;
  readonly lifetime: Answer;
  readonly field: Answer;
}

const MODEL = 'Geometric mean of four marks';
const VALID = 'nitrogen and air; practice and not kinetics: it orders settings and predicts no output';
const NO_PROMISE: Warning = {
  type: 'no-promise',
  words: 'A score for comparing settings of one rig, not a forecast of light.',
};

/** From memory: over-voltage 1.3 to 1.5 of the static break, 150 to 300 Td, under 0.5 % oxygen. */
const OVER_VOLTAGE = { poor: 1, good: 1.4 };
const FIELD_TD = { poor: 120, good: 200, high: 350, far: 700 };
const OXYGEN = { good: 0.005, poor: 0.21 };

/**
 * Scores the gain window of a nitrogen channel: the current must rise within the upper level's life, well above static
 * break, at the right reduced field, without oxygen. The marks are founded on practice and not on kinetics: the score
 * orders settings, it does not predict output.
 */
export function gainWindow(input: GainInput): Result<GainVerdict> {
  const bad = firstRefusal([
    checkNumber(input.currentRise_ns, {
      field: 'currentRise_ns',
      name: 'Rise of the current',
      unit: 'ns',
      min: 0.01,
      max: 1e5,
    }),
    checkNumber(input.peak_kV, { field: 'peak_kV', name: 'Peak voltage', unit: 'kV', min: 0, max: 1000 }),
    checkNumber(input.staticBreak_kV, {
      field: 'staticBreak_kV',
      name: 'Static break',
      unit: 'kV',
      min: 0.1,
      max: 1000,
    }),
    checkNumber(input.pressure_bar_abs, CHANNEL_PRESSURE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const lifetime = upperStateLifetimeWithOxygen(input);
  if (!lifetime.ok) return lifetime;
  const field = reducedField({
    voltage_V: input.peak_kV * 1000,
    gap_cm: input.gap_cm,
    pressure_bar_abs: input.pressure_bar_abs,
    temperature_K: input.temperature_C + 273.15,
  });
  if (!field.ok) return field;
  const lifetime_ns = lifetime.value.value;
  const field_Td = field.value.value;
  const reasons = reasonsOf(input, lifetime_ns, field_Td).toSorted((a, b) => a.mark - b.mark);
  const score = scoreOf(reasons);
  return ok({
    score,
    lifetime_ns,
    field_Td,
    reasons,
    words: verdictWords(score, reasons[0]),
    rating: ratingOf(input, score, { lifetime: lifetime.value.band, field: field.value.band }),
    lifetime: lifetime.value,
    field: field.value,
    model: MODEL,
    valid: VALID,
    warnings: [NO_PROMISE, ...lifetime.value.warnings],
  });
}

function reasonsOf(input: GainInput, lifetime_ns: number, field_Td: number): readonly GainReason[] {
  return [
    riseReason(input.currentRise_ns / lifetime_ns),
    overVoltageReason(input.peak_kV / input.staticBreak_kV),
    fieldReason(field_Td),
    oxygenReason(input.oxygen_share),
  ];
}

function scoreOf(reasons: readonly GainReason[]): number {
  const product = reasons.reduce((sofar, { mark }) => sofar * mark, 1);
  return Math.floor(100 * product ** (1 / reasons.length));
}

/** The field helps up to a point and hinders beyond it, so all corners are asked and not the ends alone. */
function ratingOf(
  input: GainInput,
  score: number,
  bands: { readonly lifetime: Answer['band']; readonly field: Answer['band'] },
): Answer {
  const { lifetime, field } = bands;
  const corners = [lifetime.low, lifetime.high].flatMap((ns) =>
    [field.low, field.high].map((Td) => scoreOf(reasonsOf(input, ns, Td))),
  );
  const one = answer({ value: score, unit: 'points', model: MODEL, valid: VALID, relative: 0 });
  return withBand(one, { low: Math.min(...corners), high: Math.max(...corners) });
}

function verdictWords(score: number, weakest: GainReason | undefined): string {
  const start =
    score >= 70 ? 'Conditions look good' : score >= 35 ? 'Conditions are doubtful' : 'Conditions look poor';
  return weakest === undefined ? `${start}.` : `${start}; weakest: ${weakest.words} No promise of light.`;
}

function riseReason(lives: number): GainReason {
  const words =
    lives <= 1
      ? 'the current rises within the upper level\u2019s life.'
      : `the current rises over ${lives.toFixed(1)} lives of the upper level.`;
  return { type: 'rise', mark: Math.min(1, lives ** -1), words };
}

function overVoltageReason(ratio: number): GainReason {
  const words = `the channel peaks at ${ratio.toFixed(2)} of its static break.`;
  return { type: 'over-voltage', mark: climb(ratio, OVER_VOLTAGE.poor, OVER_VOLTAGE.good), words };
}

function fieldReason(field_Td: number): GainReason {
  const rising = climb(field_Td, FIELD_TD.poor, FIELD_TD.good);
  const falling = 1 - climb(field_Td, FIELD_TD.high, FIELD_TD.far);
  return {
    type: 'field',
    mark: Math.min(rising, falling),
    words: `the reduced field peaks at ${field_Td.toFixed(0)}\u2009Td.`,
  };
}

function oxygenReason(share: number): GainReason {
  // In air it still lases, weakly.
  const mark = 1 - 0.8 * climb(Math.log(Math.max(share, 1e-9)), Math.log(OXYGEN.good), Math.log(OXYGEN.poor));
  return { type: 'oxygen', mark, words: `the gas holds ${(100 * share).toFixed(2)} % oxygen.` };
}

function climb(value: number, from: number, to: number): number {
  return Math.max(0, Math.min(1, (value - from) / (to - from)));
}
