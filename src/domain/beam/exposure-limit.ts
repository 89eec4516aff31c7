import { answer, type Answer, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { andThen, mapResult, ok, refused, type Refusal, type Result } from '../units/result';
import { PULSE_TIME_RULE, WAVELENGTH_RULE } from './photon';
import { visibleSumLimit } from './visible-sum';

/** Most UV-A that skin and eye may take in a day, J/m2: ICNIRP's wording, seen in a secondary note (physics K8). */
export const UVA_DAY_J_M2 = 1e4;
/** The classic nitrogen line, for which rates and trains are worked out unless another is named. */
export const NITROGEN_LINE_NM = 337.1;

const UVA = { from: 315, to: 400 };
const VISIBLE_TO_NM = 700;
const THERMAL_FROM_S = 1e-9;
const THERMAL_TO_S = 10;
const VISIBLE_FROM_S = 1e-11;
const VISIBLE_TO_S = 5e-6;

const SENSITISED: Warning = {
  type: 'sensitised',
  words: 'Lower for sensitised skin and under photosensitising drugs. Under a limit is not harmless.',
};

/**
 * Exposure limit of eye and skin for one pulse, J/m2. 315 to 400 nm: 5600 t^0.25 from 1 ns to 10 s, 3e10 t below 1 ns
 * (IEC 60825-14, table read), the day's 1e4 beyond. Visible, 10 ps to 5 us: 2e-3 (ICNIRP 2013 and IEC 60825-1:2014,
 * from memory), 18 t^0.75 up to 10 s. Refused elsewhere.
 */
export function singlePulseLimit(wavelength_nm: number, pulse_s: number): Result<Answer> {
  return andThen(singleLimit(wavelength_nm, pulse_s), (value) =>
    ok(limit(value, isUva(wavelength_nm) ? 'UV-A, one pulse' : 'Visible, one pulse')),
  );
}

/**
 * The visible limit of older tables, J/m2: 5e-3 from 1 ns to 18 us (read), 18 t^0.75 up to 10 s. For comparison only: the present
 * limit for nanosecond pulses is 2.5 times lower.
 */
export function visibleOldLimit(wavelength_nm: number, pulse_s: number): Result<Answer> {
  const wavelength = checkNumber(wavelength_nm, { ...WAVELENGTH_RULE, min: UVA.to, max: VISIBLE_TO_NM });
  if (!wavelength.ok) return wavelength;
  const pulse = checkNumber(pulse_s, { ...PULSE_TIME_RULE, min: THERMAL_FROM_S, max: THERMAL_TO_S });
  if (!pulse.ok) return pulse;
  const superseded = { type: 'superseded', words: 'Superseded: plan with the present limit.' };
  return ok({
    ...limit(pulse.value <= 18e-6 ? 5e-3 : 18 * pulse.value ** 0.75, 'Visible, older table'),
    warnings: [superseded, SENSITISED],
  });
}

/** Limit on what all pulses of an exposure add up to, J/m2, UV-A only: 5600 T^0.25 up to 10 s, then 1e4 for the day. */
export function cumulativeLimit(wavelength_nm: number, exposure_s: number): Result<Answer> {
  return andThen(cumulative(wavelength_nm, exposure_s), (value) =>
    ok(limit(value, 'UV-A, sum of an exposure')),
  );
}

/** UV-A dose of a day, J/m2: 1e4, whatever the time. The laxer 10 W/m2 of one table is never used. */
export function dailyUvaLimit(wavelength_nm: number, exposure_s: number): Result<Answer> {
  const bad = uvaRefusal(wavelength_nm) ?? timeRefusal(exposure_s);
  return bad === undefined ? ok(limit(UVA_DAY_J_M2, 'UV-A, dose of a day')) : refused(bad);
}

/**
 * Limit for each pulse of a train by its number, J/m2: the single-pulse limit times N^-0.25 (2006/25/EC, table 2.6,
 * read). Newer rules keep this for thermal limits only; keeping it is the cautious reading.
 */
export function trainLimit(
  pulses: number,
  pulse_s: number,
  wavelength_nm = NITROGEN_LINE_NM,
): Result<Answer> {
  const number = checkNumber(pulses, { field: 'pulses', name: 'Pulses', unit: '', min: 1, max: 1e15 });
  if (!number.ok) return number;
  return andThen(singleLimit(wavelength_nm, pulse_s), (value) =>
    ok(limit(value * number.value ** -0.25, 'Single pulse and number of pulses')),
  );
}

/** A train of equal pulses. */
export interface PulseTrain {
  readonly rate_Hz: number;
  readonly pulse_s: number;
  readonly exposure_s: number;
  readonly wavelength_nm?: number;
}

/** Limit for each pulse of a train, J/m2: the least of single pulse, share of the sum, and number of pulses. */
export function perPulseLimit(train: PulseTrain): Result<Answer> {
  const { rate_Hz, pulse_s, exposure_s, wavelength_nm = NITROGEN_LINE_NM } = train;
  const rate = checkNumber(rate_Hz, { field: 'rate_Hz', name: 'Rate', unit: 'Hz', min: 1e-6, max: 1e9 });
  if (!rate.ok) return rate;
  const sum = sumLimit(wavelength_nm, exposure_s);
  if (!sum.ok) return sum;
  const single = singleLimit(wavelength_nm, pulse_s);
  if (!single.ok) return single;
  const pulses = Math.max(1, rate.value * exposure_s);
  const rules = [
    ['single pulse', single.value],
    ['share of the sum', sum.value / pulses],
    ['number of pulses', single.value * pulses ** -0.25],
  ] as const;
  const least = rules.reduce((best, rule) => (rule[1] < best[1] ? rule : best));
  return ok(limit(least[1], `Least of three rules: ${least[0]}`));
}

function singleLimit(wavelength_nm: number, pulse_s: number): Result<number> {
  const wavelength = checkNumber(wavelength_nm, WAVELENGTH_RULE);
  if (!wavelength.ok) return wavelength;
  const pulse = checkNumber(pulse_s, PULSE_TIME_RULE);
  if (!pulse.ok) return pulse;
  const t = pulse.value;
  if (isUva(wavelength.value)) {
    if (t < THERMAL_FROM_S) return ok(3e10 * t);
    return ok(t <= THERMAL_TO_S ? 5.6e3 * t ** 0.25 : UVA_DAY_J_M2);
  }
  if (wavelength.value >= UVA.to && wavelength.value <= VISIBLE_TO_NM) {
    if (t >= VISIBLE_FROM_S && t <= VISIBLE_TO_S) return ok(2e-3);
    if (t > VISIBLE_TO_S && t <= THERMAL_TO_S) return ok(18 * t ** 0.75);
    return refused({
      type: 'no-limit-kept',
      field: 'pulse_s',
      words: 'Pulse length: no visible limit is kept here for pulses under 10\u2009ps or beyond 10\u2009s.',
    });
  }
  return refused({
    type: 'no-limit-kept',
    field: 'wavelength_nm',
    words: 'Wavelength: limits are kept here from 315 to 700\u2009nm only.',
  });
}

function sumLimit(wavelength_nm: number, exposure_s: number): Result<number> {
  if (!(wavelength_nm >= UVA.to && wavelength_nm <= VISIBLE_TO_NM))
    return cumulative(wavelength_nm, exposure_s);
  return mapResult(visibleSumLimit(wavelength_nm, exposure_s), ({ value }) => value);
}

function cumulative(wavelength_nm: number, exposure_s: number): Result<number> {
  const bad = uvaRefusal(wavelength_nm) ?? timeRefusal(exposure_s);
  if (bad !== undefined) return refused(bad);
  if (exposure_s <= THERMAL_FROM_S) return ok(3e10 * exposure_s);
  return ok(exposure_s < THERMAL_TO_S ? Math.min(UVA_DAY_J_M2, 5.6e3 * exposure_s ** 0.25) : UVA_DAY_J_M2);
}

function isUva(wavelength_nm: number): boolean {
  return wavelength_nm >= UVA.from && wavelength_nm < UVA.to;
}

function uvaRefusal(wavelength_nm: number): Refusal | undefined {
  const wavelength = checkNumber(wavelength_nm, WAVELENGTH_RULE);
  if (!wavelength.ok) return wavelength.refusal;
  return isUva(wavelength.value)
    ? undefined
    : {
        type: 'no-limit-kept',
        field: 'wavelength_nm',
        words: 'Wavelength: sums and day doses are kept here for 315 to 400\u2009nm only.',
      };
}

function timeRefusal(exposure_s: number): Refusal | undefined {
  const time = checkNumber(exposure_s, {
    ...PULSE_TIME_RULE,
    field: 'exposure_s',
    name: 'Exposure',
    max: 1e5,
  });
  return time.ok ? undefined : time.refusal;
}

function limit(value: number, model: string): Answer {
  return answer({
    value,
    unit: 'J/m\u00b2',
    model,
    valid: 'averaged over 1\u2009mm (UV) or 7\u2009mm (visible); round it down',
    relative: 0,
    warnings: [SENSITISED],
  });
}
