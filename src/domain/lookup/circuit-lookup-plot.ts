import type { CircuitAnswer } from '../circuit/circuit-answer';
import type { CircuitParts } from '../circuit/circuit-parts';
import { formatFigure } from '../units/format-quantity';
import type { Plot } from './lookup';

/** Channel voltage over time with both currents on the same paper, the rise, the breakdown and where it breaks. */
export function circuitPlot(parts: CircuitParts, { transient, peakVoltage }: CircuitAnswer): Plot {
  const { time_s, channel_V, gap_A, channel_A } = transient.waveform;
  const x = time_s.map((seconds) => seconds * 1e9);
  const [voltage, gap, channel] = [channel_V, gap_A, channel_A].map((curve) =>
    curve.map((one) => one / 1000),
  );
  const to = x.at(-1) ?? 1;
  const lines = [voltage, gap, channel].map((curve) => curve ?? []);
  const [kV = [], gap_kA = [], channel_kA = []] = lines;
  // Upwards is what the channel sees first, whichever sign that has.
  const sign = signOfPeak(kV);
  const most_kV = largest(kV);
  const times = currentScale(most_kV, Math.max(largest(gap_kA), largest(channel_kA)));
  const points = (curve: readonly number[], by: number) => curve.map((y, i) => ({ x: x[i] ?? 0, y: y * by }));
  const curves = [
    { label: 'channel voltage', points: points(kV, sign), weight: 'curve' as const },
    { label: `gap current, ${timesText(times)}kA`, points: points(gap_kA, times), weight: 'thin' as const },
    ...(transient.fired_s === null
      ? []
      : [
          {
            label: `channel current, ${timesText(times)}kA`,
            points: points(channel_kA, sign * times),
            weight: 'thin' as const,
          },
        ]),
  ];
  const all = curves.flatMap((curve) => curve.points.map((point) => point.y));
  const peak_kV = transient.peakVoltage_V / 1000;
  const peak_ns = transient.peakVoltage_s * 1e9;
  const { break_kV } = parts.channel;
  // Where it breaks is where the voltage crosses the dashed limit: a second span there would lie on the first.
  const spans = riseSpan(x, kV);
  return {
    title: `Channel voltage over ${formatFigure(to, { digits: { significant: 3 }, rounding: 'nearest' })} ns: peak ${text(peak_kV)} kV at ${text(peak_ns)} ns`,
    x: { label: 'Time', unit: 'ns', min: 0, max: to, decimals: 0 },
    y: {
      label: 'Channel voltage',
      unit: 'kV',
      min: 1.05 * Math.min(0, ...all),
      max: 1.1 * Math.max(...all),
      decimals: 1,
    },
    curves,
    point: {
      x: peak_ns,
      y: peak_kV,
      low: peakVoltage.band.low / 1000,
      high: peakVoltage.band.high / 1000,
    },
    ...(break_kV === null || break_kV > 1.5 * most_kV
      ? {}
      : { limit: { y: break_kV, label: `channel breaks ${text(break_kV)}\u2009kV`, short: 'breaks' } }),
    ...(spans.length === 0 ? {} : { spans }),
  };
}

function signOfPeak(kV: readonly number[]): number {
  let best = 0;
  for (const one of kV) if (Math.abs(one) > Math.abs(best)) best = one;
  return best < 0 ? -1 : 1;
}

function largest(curve: readonly number[]): number {
  return curve.reduce((most, one) => Math.max(most, Math.abs(one)), 0);
}

const STEPS = [1, 2, 5] as const;

/** A round factor that brings the currents near the height of the voltage. */
function currentScale(most_kV: number, most_kA: number): number {
  if (!(most_kV > 0) || !(most_kA > 0)) return 1;
  const wanted = most_kV / most_kA;
  const power = 10 ** Math.floor(Math.log10(wanted));
  const step = STEPS.findLast((each) => each * power <= wanted) ?? 1;
  return Number((step * power).toPrecision(3));
}

function timesText(times: number): string {
  return times === 1 ? '' : `${String(times)}\u2009\u00d7\u2009`;
}

/** From a tenth to nine tenths of the highest, first crossings, as the rise is counted. */
function riseSpan(x: readonly number[], kV: readonly number[]) {
  const most = largest(kV);
  const first = (share: number) => x[kV.findIndex((one) => Math.abs(one) >= share * most)];
  const from = first(0.1);
  const to = first(0.9);
  if (from === undefined || to === undefined || !(to > from)) return [];
  return [{ from, to, label: 'rise' }];
}

function text(value: number): string {
  return formatFigure(value, { digits: { significant: 3 }, rounding: 'nearest' });
}
