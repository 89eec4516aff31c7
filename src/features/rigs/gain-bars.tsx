import type { RigTransient } from '../../domain/rules/rig-circuit';
import { formatQuantity } from '../../domain/units/format-quantity';

/** Rise of the current and the life of nitrogen's upper level as two bars on one scale: the first should be the shorter. */
export function GainBars({ transient }: { readonly transient: RigTransient }) {
  const { currentRise_s, gain } = transient;
  if (currentRise_s === null)
    return <p className="muted m-0">The channel stays dark: there is no rise to weigh.</p>;
  const rise_ns = currentRise_s * 1e9;
  const life_ns = gain?.lifetime_ns ?? null;
  const longest = Math.max(rise_ns, life_ns ?? 0);
  return (
    <div className="gain-bars">
      <Bar label="Current rises in" value_ns={rise_ns} longest_ns={longest} rounding="up" />
      {life_ns === null ? null : (
        <Bar label="Upper level lives" value_ns={life_ns} longest_ns={longest} rounding="down" />
      )}
      {gain === null ? (
        <p className="muted m-0">No gain window is known for this gas.</p>
      ) : (
        <p className="m-0">{gain.words}</p>
      )}
    </div>
  );
}

interface BarProps {
  readonly label: string;
  readonly value_ns: number;
  readonly longest_ns: number;
  readonly rounding: 'up' | 'down';
}

function Bar({ label, value_ns, longest_ns, rounding }: BarProps) {
  const shown = formatQuantity(value_ns, 'ns', { digits: { significant: 2 }, rounding });
  return (
    <div className="gain-bar">
      <span>{label}</span>
      <span className="gain-track" aria-hidden="true">
        <i style={{ width: `${(100 * value_ns) / longest_ns}%` }} />
      </span>
      <b className="nowrap">{shown}</b>
    </div>
  );
}
