import type { RigSpec } from '../../domain/book/rig-spec';
import type { Answer } from '../../domain/units/answer';
import { formatFigure } from '../../domain/units/format-quantity';
import { formatSi } from '../../domain/units/format-si';
import type { Simulated } from './simulated';
import type { Measured } from './trace-figures';

export interface ComparisonRow {
  readonly key: string;
  readonly label: string;
  readonly measured: string;
  readonly simulated: string;
}

const NONE = '\u2013';

/** Measured beside simulated, a row each; a dash where there is no figure. */
export function comparison(
  one: Measured,
  simulated: Simulated | null,
  { model }: Pick<RigSpec, 'model'>,
): readonly ComparisonRow[] {
  const peak = `${digits(one.peak)}\u2009${one.unit}`;
  return [
    {
      key: 'peak',
      label: 'Peak, from rest',
      measured: peak,
      simulated:
        simulated === null
          ? NONE
          : `${digits(simulated.peak.value)}\u2009${one.unit}, ${digits(simulated.peak.band.low)} to ${digits(simulated.peak.band.high)}`,
    },
    {
      key: 'rise',
      label: 'Rise, 10 to 90 %',
      measured: seconds(one.rise_s),
      simulated: seconds(simulated?.rise_s ?? null),
    },
    { key: 'delay', label: `Delay, ${one.after}`, measured: seconds(one.delay_s), simulated: NONE },
    { key: 'ring', label: 'Ring', measured: banded(one.ring_Hz, 'Hz'), simulated: NONE },
    {
      key: 'inductance',
      label: 'Inductance from the ring',
      measured: banded(one.inductance_H, 'H'),
      simulated: `gap ${digits(model.gap_nH)}\u2009nH, channel ${digits(model.channel_nH)}\u2009nH`,
    },
  ];
}

function digits(value: number): string {
  return formatFigure(value, { digits: { significant: 3 }, rounding: 'nearest' });
}

function seconds(value: number | null): string {
  return value === null ? NONE : formatSi(value, 's', { significant: 3, rounding: 'nearest' });
}

function banded(one: Answer | null, unit: string): string {
  if (one === null) return NONE;
  const plain = { significant: 3, rounding: 'nearest' } as const;
  const share = (one.band.high - one.value) / one.value;
  const wide = formatFigure(share * 100, { digits: { significant: 1 }, rounding: 'up' });
  return `${formatSi(one.value, unit, plain)} \u00b1${wide}\u2009%`;
}
