import { ENERGY_DIGITS } from '../capacitor/energy-text';
import type { GainVerdict } from '../channel/gain-window';
import type { CircuitAnswer } from '../circuit/circuit-answer';
import type { CircuitParts } from '../circuit/circuit-parts';
import {
  idealPeakCurrent,
  inversionHalfPeriod,
  inversionPeak,
  seriesCapacitance_F,
  transferEfficiency,
  transferHalfPeriod,
  transferPeak,
} from '../circuit/ideals';
import { distributedHalfPeriod } from '../line/distributed';
import { rigCurrentRise } from '../rules/rig-derived-figures';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import type { CircuitInput } from './circuit-lookup-parts';
import { figureOf } from './figures';
import type { Figure } from './lookup';

/** A circuit with its wave shape. */
export interface Solved {
  readonly made: CircuitInput;
  readonly solved: CircuitAnswer;
  readonly gain: GainVerdict | null;
  readonly currentRise_s: number | null;
}

const KV = { times: 1e-3, unit: 'kV' } as const;
const NS = { times: 1e9, unit: 'ns' } as const;

export function solvedFigures({ made, solved, gain, currentRise_s }: Solved): readonly Figure[] {
  const { peakVoltage, timeToPeak, rise, peakGapCurrent, peakChannelCurrent } = solved;
  const current = rigCurrentRise(solved, currentRise_s);
  return [
    figureOf(['peak', 'channel peak'], peakVoltage, { ...KV, rounding: 'nearest', weight: 'answer' }),
    figureOf(['rise', 'rise of the channel voltage'], rise, { ...NS, rounding: 'up', weight: 'answer' }),
    ...(current.ok
      ? [figureOf(['current_rise', 'rise of the channel current'], current.value, { rounding: 'up' })]
      : [dark('current_rise', 'rise of the channel current')]),
    figureOf(['time_to_peak', 'time to the peak'], timeToPeak, { ...NS, rounding: 'nearest' }),
    figureOf(['gap_current', 'peak current of the gap'], peakGapCurrent, {
      times: 1e-3,
      unit: 'kA',
      rounding: 'nearest',
    }),
    ...(peakChannelCurrent === null
      ? [dark('channel_current', 'peak current of the channel')]
      : [
          figureOf(['channel_current', 'peak current of the channel'], peakChannelCurrent, {
            times: 1e-3,
            unit: 'kA',
            rounding: 'nearest',
          }),
        ]),
    ...overVoltage(made, peakVoltage),
    ...(gain === null
      ? []
      : [
          figureOf(['gain', 'gain window, of 100'], gain.rating, { rounding: 'down', decimals: 0, unit: '' }),
          figureOf(['lifetime', 'life of the upper level'], gain.lifetime, {
            rounding: 'down',
            weight: 'side',
          }),
          figureOf(['field', 'reduced field at the peak'], gain.field, {
            rounding: 'nearest',
            weight: 'side',
          }),
        ]),
  ];
}

function overVoltage({ staticBreak }: CircuitInput, peak: Answer): readonly Figure[] {
  if (staticBreak === null) return [];
  const share = (volts: number) => volts / 1000 / staticBreak.value;
  return [
    {
      key: 'over_voltage',
      label: 'channel peak over its static break',
      value: share(peak.value),
      low: share(peak.band.low),
      high: share(peak.band.high),
      unit: '',
      rounding: 'down',
      digits: 3,
      weight: 'main',
    },
  ];
}

function dark(key: string, label: string): Figure {
  return {
    key,
    label,
    value: 0,
    unit: '',
    rounding: 'nearest',
    digits: 3,
    weight: 'main',
    words: 'none: the channel stays dark',
  };
}

/** Where the energy went, in hundredths of what was stored; joules only beside the supply. */
export function ledgerFigures({ made: { parts }, solved }: Solved, stored: string | null): readonly Figure[] {
  const { energy, peakVoltage_V } = solved.transient;
  const percent = (key: string, label: string, joule: number): Figure => ({
    key,
    label,
    value: (100 * joule) / energy.start_J,
    unit: '%',
    rounding: 'nearest',
    digits: 2,
    weight: 'main',
  });
  const taken = parts.topology === 'charge-transfer' ? 'across the channel' : 'the charging element';
  const peaking_J = 0.5 * parts.second_nF * 1e-9 * peakVoltage_V ** 2;
  return [
    {
      key: 'stored',
      label: 'stored as it closes',
      value: energy.start_J,
      unit: 'J',
      rounding: 'up',
      digits: ENERGY_DIGITS,
      weight: 'main',
      ...(stored === null
        ? { words: 'enter the supply\u2019s kV and mA: an energy says nothing without them' }
        : { note: stored }),
    },
    percent('channel_share', 'into the channel', energy.channel_J),
    percent('gap_share', 'lost in the gap', energy.gap_J),
    percent('left_share', 'left at the end of the window', energy.left_J),
    {
      ...percent(
        'feed_share',
        `lost in ${taken === 'across the channel' ? 'what lies ' : ''}${taken}`,
        energy.feed_J,
      ),
      weight: 'side',
    },
    ...(parts.topology === 'charge-transfer'
      ? [percent('efficiency', 'on the peaking capacitor at its peak', peaking_J)]
      : []),
    {
      key: 'audit',
      label: 'energy not accounted for',
      value: Math.abs(energy.audit),
      unit: '',
      rounding: 'up',
      digits: 1,
      weight: 'side',
      note: 'the error of the computation alone',
    },
  ];
}

/** Ceilings without losses; a figure that cannot be given is left out. */
export function idealFigures(parts: CircuitParts): readonly Figure[] {
  const { topology, charge_kV, feed } = parts;
  const charge_V = charge_kV * 1000;
  const pair = { dump_F: parts.first_nF * 1e-9, peaking_F: parts.second_nF * 1e-9 };
  const inductance_H = parts.gap_nH * 1e-9 + (feed?.sheet_H ?? 0) / 3;
  const inverts = topology === 'lc-inversion';
  const peak = inverts ? inversionPeak(charge_V) : transferPeak(pair, charge_V);
  const half = inverts
    ? inversionHalfPeriod(pair.dump_F, inductance_H)
    : transferHalfPeriod(pair, inductance_H);
  const current = idealPeakCurrent({
    charge_V,
    series_F: inverts ? pair.dump_F : seriesCapacitance_F(pair),
    inductance_H,
  });
  return [
    ...one(peak, ['ideal_peak', 'channel peak without losses'], KV),
    ...one(half, ['ideal_time', 'half period without losses'], NS),
    ...one(current, ['ideal_current', 'gap current without losses'], { times: 1e-3, unit: 'kA' }),
    ...(inverts
      ? []
      : one(transferEfficiency(pair), ['ideal_efficiency', 'transfer without losses'], {
          times: 100,
          unit: '%',
        })),
    ...(feed === null
      ? []
      : one(
          distributedHalfPeriod({
            gap_H: parts.gap_nH * 1e-9,
            sheet_H: feed.sheet_H,
            capacitance_F: pair.dump_F,
          }),
          ['line_time', 'half period of the sheet as a line'],
          NS,
        )),
  ];
}

function one(
  result: Result<Answer>,
  name: readonly [key: string, label: string],
  scale: { readonly times: number; readonly unit: string },
): readonly Figure[] {
  if (!result.ok) return [];
  // A ceiling has no band worth showing: all of it lies below.
  const value = result.value.value;
  return [
    figureOf(
      name,
      { ...result.value, band: { low: value, high: value } },
      {
        ...scale,
        rounding: 'nearest',
        weight: 'side',
      },
    ),
  ];
}

/** What the dimensions gave, and what the channel breaks at. */
export function inputFigures({ parts, gap_nH, channel_nH, staticBreak }: CircuitInput): readonly Figure[] {
  const { break_kV } = parts.channel;
  return [
    {
      key: 'ratio_found',
      label: 'first over second capacitor',
      value: parts.first_nF / parts.second_nF,
      unit: '',
      rounding: 'nearest',
      digits: 3,
      weight: 'side',
    },
    figureOf(['gap_loop', 'inductance of the gap\u2019s loop'], gap_nH, { rounding: 'up', weight: 'side' }),
    ...(parts.feed === null
      ? []
      : [
          {
            key: 'sheet',
            label: 'inductance of the sheet',
            value: parts.feed.sheet_H * 1e9,
            unit: 'nH',
            rounding: 'up' as const,
            digits: 3,
            weight: 'side' as const,
          },
          {
            key: 'transit',
            label: 'one transit of the sheet',
            value: parts.feed.transit_s * 1e9,
            unit: 'ns',
            rounding: 'up' as const,
            digits: 3,
            weight: 'side' as const,
          },
        ]),
    figureOf(['channel_loop', 'inductance of the channel'], channel_nH, { rounding: 'up', weight: 'side' }),
    ...(staticBreak === null
      ? []
      : [
          figureOf(['static', 'static break of the channel'], staticBreak, {
            rounding: 'nearest',
            weight: 'side',
          }),
        ]),
    ...(break_kV === null
      ? []
      : [
          {
            key: 'breaks',
            label: 'channel taken to break at',
            value: break_kV,
            unit: 'kV',
            rounding: 'nearest' as const,
            digits: 3,
            weight: 'side' as const,
          },
        ]),
  ];
}
