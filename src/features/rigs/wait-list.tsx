import { Caution } from '../../components/caution';
import type { BleedWait } from '../../domain/capacitor/bleed';
import { formatFigure } from '../../domain/units/format-quantity';
import type { Result } from '../../domain/units/result';

/** Bleed time of every node; no number at all while one of them is not known. */
export function WaitList({ wait }: { readonly wait: Result<BleedWait> }) {
  if (!wait.ok)
    return (
      <section>
        <h2>Bleed of each node</h2>
        <p>{wait.refusal.words}</p>
      </section>
    );
  if (wait.value.type === 'unknown')
    return (
      <section>
        <h2>Bleed of each node</h2>
        <Caution>{wait.value.words}</Caution>
      </section>
    );
  const { nodes, wait_s } = wait.value;
  return (
    <section>
      <h2>Bleed of each node</h2>
      <ul className="rig-list">
        {nodes.map((node) => (
          <li key={node.name} className="rig-between">
            <span>{node.name}</span>
            <span className="nowrap">{secondsText(node.computed_s)}</span>
          </li>
        ))}
      </ul>
      <p className="muted">
        From the supply’s limit, so wait {wait_s}
        {'\u2009'}s, then short each by itself: no voltage is proven by a wait.
      </p>
    </section>
  );
}

export function secondsText(seconds: number): string {
  const decimals = seconds < 0.1 ? 3 : 1;
  return `${formatFigure(seconds, { digits: { decimals }, rounding: 'up' })}\u2009s`;
}
