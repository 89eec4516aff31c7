import type { BenchGapLaw, CircuitParts } from '../circuit/circuit-parts';
import { windowFor } from '../circuit/circuit-parts';
import { uniformBreakdown } from '../gap/uniform-law';
import { isGasName } from '../gap/gas-table';
import { channelLoopInductance, rectangularLoopInductance } from '../line/loop';
import type { Feed } from '../line/lumped-verdict';
import { strapInductance } from '../line/pair';
import { sheetFeed } from '../line/sheet-feed';
import { sheetInductance } from '../line/strip';
import { LEADS_UH } from '../rules/rig-circuit';
import { sparkInductance } from '../spark/spark-inductance';
import { answer, type Answer } from '../units/answer';
import { mapResult, ok, refused, type Result } from '../units/result';
import type { Entered } from './entered';

/** Radius of a spark; 0.1 to 0.5 mm (physics B). */
const SPARK_RADIUS_CM = 0.02;
/** What stands for no resistor across the channel of an LC inversion. */
const OPEN_OHM = 1e8;

/** What was entered as a circuit, with the inductances and the static break that it rests on. */
export interface CircuitInput {
  readonly parts: CircuitParts;
  readonly gap_nH: Answer;
  readonly channel_nH: Answer;
  /** Null where the channel's gas has no law and its break was entered. */
  readonly staticBreak: Answer | null;
}

export function circuitInput(input: Entered): Result<CircuitInput> {
  const gap_nH = gapInductance(input);
  if (!gap_nH.ok) return gap_nH;
  const channel_nH = channelInductance(input);
  if (!channel_nH.ok) return channel_nH;
  const feed = feedAt(input);
  if (!feed.ok) return feed;
  const staticBreak = channelStaticAt(input);
  if (!staticBreak.ok && input.choice('break_by') === 'static') return staticBreak;
  const static_kV = staticBreak.ok ? staticBreak.value : null;
  const topology = input.choice('topology') === 'lc-inversion' ? 'lc-inversion' : 'charge-transfer';
  const first_nF = input.number('first_nF');
  const loop = {
    topology,
    first_nF,
    second_nF: input.maybe('second_nF') ?? first_nF / input.number('ratio'),
    gap_nH: gap_nH.value.value,
    feed: feed.value,
  } as const;
  const gap = gapLawAt(input);
  if (!gap.ok) return gap;
  return ok({
    gap_nH: gap_nH.value,
    channel_nH: channel_nH.value,
    staticBreak: static_kV,
    parts: {
      ...loop,
      charge_kV: input.number('charge_kV'),
      gap: gap.value,
      channel_nH: channel_nH.value.value,
      channel: {
        break_kV: breakAt(input, static_kV),
        start_ohm: input.number('channel_start_ohm'),
        end_ohm: input.number('channel_end_ohm'),
        fall_ns: input.number('channel_fall_ns'),
      },
      ...acrossAt(input),
      window_ns: input.maybe('window_ns') ?? windowFor(loop),
    },
  });
}

function breakAt(input: Entered, staticBreak: Answer | null): number | null {
  switch (input.choice('break_by')) {
    case 'static':
      return staticBreak === null ? null : input.number('over_static') * staticBreak.value;
    case 'voltage':
      return input.number('break_kV');
    default:
      return null;
  }
}

function channelStaticAt(input: Entered): Result<Answer> {
  const gas = input.choice('channel_gas');
  if (!isGasName(gas)) {
    return refused({
      type: 'unknown-choice',
      field: 'channel_gas',
      words: 'Channel gas: choose one of the list.',
    });
  }
  const broken = uniformBreakdown(gas, {
    pressure_bar_abs: input.number('ambient_bar_abs'),
    gap_cm: input.number('spacing_mm') / 10,
    temperature_C: input.number('temperature_C'),
  });
  if (broken.ok) return broken;
  const { type, field, words } = broken.refusal;
  return refused({ type, field: field === 'gas' ? 'channel_gas' : 'spacing_mm', words: `Channel: ${words}` });
}

function gapInductance(input: Entered): Result<Answer> {
  const loop = loopInductance(input);
  const return_mm = input.maybe('return_mm');
  if (!loop.ok || return_mm === null) return loop;
  const spark = sparkInductance({
    length_cm: input.number('gap_mm') / 10,
    radius_cm: SPARK_RADIUS_CM,
    return_cm: return_mm / 10,
  });
  return mapResult(spark, ({ value, band }) => ({
    ...loop.value,
    value: loop.value.value + value,
    band: { low: loop.value.band.low + band.low, high: loop.value.band.high + band.high },
    model: `${loop.value.model}, and the spark in its return`,
  }));
}

function loopInductance(input: Entered): Result<Answer> {
  const by = input.choice('gap_by');
  if (by === 'known') return ok(entered_nH(input.number('gap_nH')));
  if (by === 'loop') {
    return rectangularLoopInductance({
      long_m: input.number('loop_long_mm') / 1000,
      short_m: input.number('loop_short_mm') / 1000,
      conductorRadius_m: input.number('wire_radius_mm') / 1000,
    });
  }
  const strap = {
    width_m: input.number('strap_width_mm') / 1000,
    spacing_m: input.number('strap_spacing_mm') / 1000,
    length_m: input.number('strap_length_mm') / 1000,
  };
  return by === 'straps' ? strapInductance(strap) : sheetInductance(strap);
}

function channelInductance(input: Entered): Result<Answer> {
  return input.choice('channel_by') === 'known'
    ? ok(entered_nH(input.number('channel_nH')))
    : channelLoopInductance(input.number('section_mm2') * 1e-6, input.number('channel_length_mm') / 1000);
}

function entered_nH(value: number): Answer {
  return answer({ value, unit: 'nH', relative: 0, model: 'As entered', valid: 'this loop' });
}

function feedAt(input: Entered): Result<Feed | null> {
  if (input.choice('feed') !== 'sheet') return ok(null);
  return sheetFeed({
    along_m: input.number('feed_along_mm') / 1000,
    across_m: input.number('feed_across_mm') / 1000,
    thickness_m: input.number('feed_thickness_mm') / 1000,
    eps_r: input.number('feed_eps_r'),
    pairs: input.number('feed_pairs'),
  });
}

function gapLawAt(input: Entered): Result<BenchGapLaw> {
  const ends = { start_ohm: input.number('gap_start_ohm'), end_ohm: input.number('gap_end_ohm') };
  if (input.choice('gap_law') === 'exponential') {
    return ok({ law: 'exponential', ...ends, fall_ns: input.number('gap_fall_ns') });
  }
  const pressure_bar_abs = input.number('pressure_bar_g') + input.number('ambient_bar_abs');
  if (!(pressure_bar_abs > 0)) {
    return refused({
      type: 'below-vacuum',
      field: 'pressure_bar_g',
      words: 'Gap pressure: below vacuum at this ambient pressure.',
    });
  }
  return ok({
    law: 'rompe-weizel',
    ...ends,
    gap_mm: input.number('gap_mm'),
    pressure_bar_abs,
    constant_cm2_atm_V2s: input.number('rw_constant'),
  });
}

function acrossAt(input: Entered): Pick<CircuitParts, 'across_kohm' | 'charging_uH' | 'charging_ohm'> {
  const across_kohm = input.maybe('across_kohm');
  const inductor_uH = input.maybe('inductor_uH');
  return {
    across_kohm,
    charging_uH: inductor_uH ?? LEADS_UH,
    charging_ohm:
      inductor_uH === null
        ? across_kohm === null
          ? OPEN_OHM
          : across_kohm * 1000
        : input.number('inductor_ohm'),
  };
}
