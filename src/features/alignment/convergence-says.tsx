import type { Convergence } from '../../domain/alignment/convergence';
import { formatFigure } from '../../domain/units/format-quantity';

const SHOWN = 5;

/** Whether it converges, and why it does not. */
export function ConvergenceSays({ convergence }: { readonly convergence: Convergence }) {
  const { state, lead, reasons, errors_mm } = convergence;
  if (state === 'nothing-measured') return null;
  const errors = errors_mm
    .slice(-SHOWN)
    .map((error) => formatFigure(error, { digits: { decimals: 2 }, rounding: 'up' }));
  return (
    <section className="align-says" aria-label="Convergence" role="status">
      <p>
        <b>{lead}</b>{' '}
        <span className="muted">
          Farther end off by {errors.join(', ')}
          {'\u2009'}mm.
        </span>
      </p>
      {reasons.map((reason) => (
        <p key={`${reason.type}${reason.words}`}>{reason.words}</p>
      ))}
    </section>
  );
}
