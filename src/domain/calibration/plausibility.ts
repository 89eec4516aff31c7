import { gapFor, pressureFor } from '../gap/gap-solve';
import type { GapInput } from '../gap/gap-input';
import { selfBreak } from '../gap/self-break';
import { answer, withBand, type Answer, type Basis, type Warning } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { ok, refused, type Result } from '../units/result';

/** How the voltage of a reading came about: set on the supply, held without breaking, or measured at self-break. */
export type HowMeasured = 'set' | 'held' | 'self-break';

export interface PlausibilityInput {
  /** The gap as it was at the reading: its own pressure and temperature, the rig's setting errors. */
  readonly gap: GapInput;
  readonly how: HowMeasured;
  readonly voltage_kV: number;
  /** Whether the gap broke at all; a dark gap says that it held. */
  readonly broke: boolean;
  /** Sigmas of the readings just before, newest first, for the rule of two in three. */
  readonly before: readonly number[];
  /** What the rig's own calibration expects here; it then decides on a self-break in the law's place. */
  readonly own?: OwnExpectation | undefined;
}

/** Self-break by the rig's own curve, with one sigma of single shots. */
export interface OwnExpectation {
  readonly expected_kV: number;
  readonly sigma_kV: number;
  /** Beyond the gaps and pressures that were read, where the law goes on deciding. */
  readonly extrapolated: boolean;
}

/** A cause that would explain the reading, with how far the setting would have to be off. */
export interface RankedCause {
  readonly words: string;
  /** Size of the slip in units of that setting's own error: the smaller, the likelier. */
  readonly errors: number;
}

export interface Plausibility extends Basis {
  /** By the rig's own curve or by the law. */
  readonly against: 'own' | 'law';
  readonly expected_kV: number;
  readonly low_kV: number;
  readonly high_kV: number;
  /** One sigma of law, settings and scatter together, kV. */
  readonly sigma_kV: number;
  /** Deviation of a measured self-break in sigmas; null where the voltage was not a self-break. */
  readonly sigma: number | null;
  readonly fits: boolean;
  /** One sentence for the person who has just logged. */
  readonly words: string;
  /** Likeliest first; empty when the reading fits. */
  readonly causes: readonly RankedCause[];
  /** What the law expects, with one sigma either side as its band. */
  readonly expected: Answer;
  /** Deviation of a measured self-break in sigmas; null as `sigma` is. */
  readonly deviation: Answer | null;
}

const MODEL = 'Reading against the law, sigma of law, settings and scatter together';
const OWN_MODEL = 'Reading against the rig\u2019s own curve, sigma of its single shots';
const VALID = 'where the gap\u2019s law holds; a rig\u2019s own fit knows its scatter better';

/** Speaks at 3 sigma, or at two of three beyond 2 sigma on the same side. */
const ALONE_SIGMA = 3;
const REPEATED_SIGMA = 2;
/** Physics of the streamer integral, never better than 3 % (physics K3). */
const LAW_SHARE = 0.03;
/** Shot-to-shot scatter of a pressurised gap, 2 to 6 % (physics A(e), from memory); the lower end finds more. */
const SCATTER_SHARE = 0.02;

/**
 * Says at once how a reading compares with what physics expects of this gap. Valid where `selfBreak` is; refused in
 * words outside. Without a calibration of the rig's own the sigma is that of the law.
 */
export function plausibility(input: PlausibilityInput): Result<Plausibility> {
  const sides = selfBreak(input.gap);
  if (!sides.ok) return refused(sides.refusal);
  const { law_kV, low_kV, high_kV } = sides.value;
  const own = input.own === undefined || input.own.extrapolated ? null : input.own;
  const expected_kV = own?.expected_kV ?? law_kV;
  const sigma_kV = own?.sigma_kV ?? law_kV * relativeSigma(input.gap);
  const model = own === null ? MODEL : OWN_MODEL;
  const common = {
    against: own === null ? ('law' as const) : ('own' as const),
    expected_kV,
    low_kV,
    high_kV,
    sigma_kV,
    expected: withBand(answer({ value: expected_kV, unit: 'kV', relative: 0, model, valid: VALID }), {
      low: expected_kV - sigma_kV,
      high: expected_kV + sigma_kV,
    }),
    model,
    valid: VALID,
  };
  if (input.how === 'self-break' && input.broke) {
    const sigma = (input.voltage_kV - expected_kV) / sigma_kV;
    const speaks = Math.abs(sigma) >= ALONE_SIGMA || repeats(sigma, input.before);
    // Against the own curve a slip is measured from where this gap really breaks, not from the law.
    const asByLaw = { ...input, voltage_kV: (input.voltage_kV * law_kV) / expected_kV };
    const causes = speaks ? rankedCauses(asByLaw) : [];
    return ok({
      ...common,
      sigma,
      fits: !speaks,
      words: selfBreakWords(
        { sigma, share: input.voltage_kV / expected_kV - 1, speaks },
        own === null ? 'the law' : 'its own curve',
      ),
      causes,
      deviation: deviationOf(sigma, model),
      warnings: speaks ? [DOES_NOT_FIT] : [],
    });
  }
  const said = withoutSelfBreak(input, low_kV, high_kV);
  return ok({
    ...common,
    sigma: null,
    deviation: null,
    ...said,
    warnings: [...(said.fits ? [] : [DOES_NOT_FIT]), ...(input.broke ? [] : [MAY_SIT_CHARGED])],
  });
}

const DOES_NOT_FIT: Warning = {
  type: 'does-not-fit',
  words: 'The reading does not fit the gap as it is declared: find out why before firing on.',
};
const MAY_SIT_CHARGED: Warning = {
  type: 'may-sit-charged',
  words: 'A gap that did not break may leave the rig charged.',
};

/** A reading a sigma off its own scatter shifts the count by one. */
function deviationOf(sigma: number, model: string): Answer {
  const one = answer({ value: sigma, unit: 'sigma', relative: 0, model, valid: VALID });
  return withBand(one, { low: sigma - 1, high: sigma + 1 });
}

function relativeSigma({
  gap_mm,
  u_gap_mm,
  pressure,
  u_pressure_bar,
  temperature_C,
  u_temperature_C,
}: GapInput): number {
  return Math.hypot(
    LAW_SHARE,
    SCATTER_SHARE,
    u_gap_mm / gap_mm,
    u_pressure_bar / pressure.bar_abs,
    u_temperature_C / (temperature_C + 273.15),
  );
}

function repeats(sigma: number, before: readonly number[]): boolean {
  if (Math.abs(sigma) < REPEATED_SIGMA) return false;
  return before
    .slice(0, 2)
    .some((earlier) => Math.abs(earlier) >= REPEATED_SIGMA && Math.sign(earlier) === Math.sign(sigma));
}

interface Judged {
  readonly sigma: number;
  readonly share: number;
  readonly speaks: boolean;
}

function selfBreakWords({ sigma, share, speaks }: Judged, what: string): string {
  const side = sigma < 0 ? 'below' : 'above';
  const size = formatFigure(Math.abs(sigma), { digits: { decimals: 1 }, rounding: 'nearest' });
  if (!speaks) return `Fits: ${size} σ ${side} ${what}.`;
  const percent = formatFigure(Math.abs(share) * 100, { digits: { decimals: 0 }, rounding: 'nearest' });
  return `Does not fit: ${percent} % ${sigma < 0 ? 'low' : 'high'}, ${size} σ ${side} ${what}.`;
}

function withoutSelfBreak(input: PlausibilityInput, low_kV: number, high_kV: number) {
  const { broke, voltage_kV } = input;
  if (broke && voltage_kV < low_kV) {
    const words = `Does not fit: it broke below ${kV(low_kV, 'down')}, where nothing should fire.`;
    return { fits: false, words, causes: rankedCauses(input) };
  }
  if (!broke && voltage_kV > high_kV) {
    const words = `Does not fit: it held above ${kV(high_kV, 'up')}. The gap may sit charged.`;
    return { fits: false, words, causes: rankedCauses(input) };
  }
  const words = broke
    ? 'Broke within its two sides; only a measured self-break says more.'
    : `Held; it may hold up to ${kV(high_kV, 'up')}. The gap may sit charged.`;
  return { fits: true, words, causes: [] };
}

function kV(value: number, rounding: 'down' | 'up'): string {
  return `${formatFigure(value, { digits: { decimals: 1 }, rounding })}\u2009kV`;
}

/** Each cause alone, worked out as the slip that would make the law give the reading, and ranked by its own error. */
function rankedCauses({ gap, voltage_kV }: PlausibilityInput): readonly RankedCause[] {
  const target = { purpose: 'law', voltage_kV } as const;
  const causes: RankedCause[] = [];
  const asGap = gapFor(gap, target);
  if (asGap.ok) {
    const slip_mm = asGap.value.value - gap.gap_mm;
    causes.push(
      cause(
        `gap ${sized(slip_mm, 2, 'mm')} ${slip_mm < 0 ? 'smaller' : 'wider'}`,
        slip_mm / nonZero(gap.u_gap_mm, 0.05),
      ),
    );
  }
  const asPressure = pressureFor(gap, target);
  if (asPressure.ok) {
    const slip_bar = asPressure.value.value - gap.pressure.bar_abs;
    const words = `pressure ${sized(slip_bar, 2, 'bar')} ${slip_bar < 0 ? 'lower' : 'higher'}`;
    causes.push(cause(words, slip_bar / nonZero(gap.u_pressure_bar, 0.02)));
    // At constant pressure density goes as 1/T, so the pressure that explains it gives the temperature that would.
    const warmer_K = (gap.temperature_C + 273.15) * (gap.pressure.bar_abs / asPressure.value.value - 1);
    if (warmer_K > 0) causes.push(cause(`gas ${sized(warmer_K, 0, 'K')} warmer`, warmer_K / WARM_GAS_K));
  }
  causes.push(
    cause(
      voltage_kV < selfBreakOf(gap) ? 'electrode damaged or dirty' : 'no UV on the gap, or another gas',
      SURFACE_ERRORS,
    ),
  );
  return causes.toSorted((a, b) => a.errors - b.errors);
}

/** A fast run warms the gas of a small gap by some tens of kelvin; common practice, no source. */
const WARM_GAS_K = 15;
/** Where a damaged electrode stands in the ranking: behind slips of up to three errors; common practice, no source. */
const SURFACE_ERRORS = 3;

function selfBreakOf(gap: GapInput): number {
  const sides = selfBreak(gap);
  return sides.ok ? sides.value.law_kV : 0;
}

function cause(words: string, errors: number): RankedCause {
  return { words, errors: Math.abs(errors) };
}

function nonZero(value: number, otherwise: number): number {
  return value > 0 ? value : otherwise;
}

function sized(value: number, decimals: number, unit: string): string {
  return `${formatFigure(Math.abs(value), { digits: { decimals }, rounding: 'nearest' })}\u2009${unit}`;
}
