import type { ChartData, Point } from '../../components/chart/types';
import type { RigTransient } from '../../domain/rules/rig-circuit';
import { formatFigure } from '../../domain/units/format-quantity';

/** The wave shape of a rig as the chart takes it: channel voltage in kV, currents in kA on the same scale. */
export function waveChart({ answer, circuit }: RigTransient): ChartData {
  const { waveform, peakVoltage_V } = answer.transient;
  const { time_s, channel_V, gap_A, channel_A } = waveform;
  const curve = (values: readonly number[]): readonly Point[] =>
    time_s.map((time, i) => ({ x: time * 1e9, y: (values[i] ?? 0) / 1000 }));
  // The sign of the swing hangs on how the circuit is drawn; people draw the first peak upwards.
  const sign = firstPeak(channel_V) < 0 ? -1 : 1;
  const voltage = curve(channel_V).map(({ x, y }) => ({ x, y: sign * y }));
  const fired = answer.transient.fired_s !== null;
  const current = curve(fired ? channel_A : gap_A).map(({ x, y }) => ({ x, y: sign * y }));
  const all = [...voltage, ...current].map((point) => point.y);
  const end = (time_s.at(-1) ?? 0) * 1e9;
  const break_kV = circuit.channel.break_V === null ? null : circuit.channel.break_V / 1000;
  const high = Math.max(1, ...all, break_kV ?? 0) * 1.4; // the span stands above the curve
  const rise = riseSpan(voltage, peakVoltage_V / 1000);
  return {
    x: { min: 0, max: end, unit: 'ns', decimals: 1 },
    y: { min: Math.min(0, ...all) * 1.1, max: high, unit: 'kV', decimals: 1 },
    curves: [
      { points: voltage, weight: 'curve', label: 'channel, kV' },
      { points: current, weight: 'thin', label: fired ? 'channel, kA' : 'gap, kA' },
    ],
    ...(break_kV === null
      ? {}
      : { limit: { y: break_kV, label: `breaks at ${one(break_kV)} kV`, short: `${one(break_kV)} kV` } }),
    ...(rise === null ? {} : { spans: [rise] }),
  };
}

/** The peaks in one line: "Channel peaks at 16.8 kV after 28 ns, its current at 5.6 kA." */
export function waveWords({ answer, staticBreak }: RigTransient): string {
  const { peakVoltage_V, peakVoltage_s, peakChannel_A, peakGap_A } = answer.transient;
  const peak = `${three(peakVoltage_V / 1000)}\u2009kV after ${three(peakVoltage_s * 1e9)}\u2009ns`;
  const held = `It holds ${three(staticBreak.value)}\u2009kV at rest.`;
  return peakChannel_A === null
    ? `The channel stays dark: it peaks at ${peak}, the gap’s current at ${three(peakGap_A / 1000)}\u2009kA. ${held}`
    : `Channel peaks at ${peak}, its current at ${three(peakChannel_A / 1000)}\u2009kA. ${held}`;
}

function three(value: number): string {
  return formatFigure(value, { digits: { significant: 3 }, rounding: 'nearest' });
}

function firstPeak(values: readonly number[]): number {
  return values.reduce((most, value) => (Math.abs(value) > Math.abs(most) ? value : most), 0);
}

function riseSpan(voltage: readonly Point[], peak_kV: number) {
  const from = crossing(voltage, 0.1 * peak_kV);
  const to = crossing(voltage, 0.9 * peak_kV);
  if (from === null || to === null || to <= from) return null;
  const length = formatFigure(to - from, { digits: { significant: 2 }, rounding: 'up' });
  return { from, to, label: `${length}\u2009ns` };
}

function crossing(points: readonly Point[], level: number): number | null {
  for (const [i, point] of points.entries()) {
    const size = Math.abs(point.y);
    if (size < level) continue;
    const before = points[i - 1];
    if (before === undefined || size === Math.abs(before.y)) return point.x;
    return before.x + ((level - Math.abs(before.y)) / (size - Math.abs(before.y))) * (point.x - before.x);
  }
  return null;
}

function one(value: number): string {
  return formatFigure(value, { digits: { decimals: 1 }, rounding: 'nearest' });
}
