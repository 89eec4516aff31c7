import { formatFigure } from '../../domain/units/format-quantity';
import type { Axis } from './types';

export interface Tick {
  readonly value: number;
  readonly long: boolean;
  /** Null for a tick that carries no figure. */
  readonly label: string | null;
}

/**
 * Engineering ticks: a figure at every 1, 2 or 5 times a power of ten, a fifth (or a quarter) of that between.
 * `most` is how many figures there is room for.
 */
export function ticks(axis: Axis, most: number): readonly Tick[] {
  if (!(axis.max > axis.min) || !Number.isFinite(axis.max - axis.min)) return [];
  return axis.kind === 'log' && axis.min > 0 ? logTicks(axis, most) : linearTicks(axis, most);
}

function linearTicks(axis: Axis, most: number): readonly Tick[] {
  const { step, parts } = majorStep((axis.max - axis.min) / Math.max(1, most));
  const minor = step / parts;
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const first = Math.ceil(axis.min / minor - 1e-6);
  const last = Math.floor(axis.max / minor + 1e-6);
  return Array.from({ length: last - first + 1 }, (_, i) => {
    const count = first + i;
    const value = Number((count * minor).toPrecision(12));
    const long = count % parts === 0;
    return { value, long, label: long ? figure(value, decimals) : null };
  });
}

/** The smallest 1-2-5 step that is no shorter than the one asked for, and into how many parts it is cut. */
function majorStep(atLeast: number): { readonly step: number; readonly parts: number } {
  const power = 10 ** Math.floor(Math.log10(atLeast));
  const mantissa = atLeast / power;
  if (mantissa <= 1.0001) return { step: power, parts: 5 };
  if (mantissa <= 2.0001) return { step: 2 * power, parts: 4 };
  if (mantissa <= 5.0001) return { step: 5 * power, parts: 5 };
  return { step: 10 * power, parts: 5 };
}

function logTicks(axis: Axis, most: number): readonly Tick[] {
  const from = Math.floor(Math.log10(axis.min));
  const to = Math.ceil(Math.log10(axis.max));
  const decades = Math.log10(axis.max / axis.min);
  const shown = most >= decades * 3 ? [1, 2, 5] : [1];
  const found: Tick[] = [];
  for (let decade = from; decade <= to; decade += 1) {
    for (let digit = 1; digit < 10; digit += 1) {
      const value = Number((digit * 10 ** decade).toPrecision(12));
      if (value < axis.min * (1 - 1e-9) || value > axis.max * (1 + 1e-9)) continue;
      const label = shown.includes(digit) ? figure(value, Math.max(0, -decade)) : null;
      found.push({ value, long: digit === 1 || digit === 5, label });
    }
  }
  return found;
}

function figure(value: number, decimals: number): string {
  return formatFigure(value, { digits: { decimals: value === 0 ? 0 : decimals }, rounding: 'nearest' });
}
