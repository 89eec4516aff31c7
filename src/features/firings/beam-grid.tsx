import type { MouseEvent } from 'react';
import { HoldButton } from '../../components/hold-button';
import { gridHalf_mm, placeOnGrid } from './beam-place';
import { beamWords } from './reading-group';

interface BeamGridProps {
  readonly x_mm: number | null;
  readonly y_mm: number | null;
  readonly onPlace: (at: { readonly x_mm: number; readonly y_mm: number } | null) => void;
}

const STEPS = [
  { label: 'left', x: -1, y: 0 },
  { label: 'up', x: 0, y: 1 },
  { label: 'down', x: 0, y: -1 },
  { label: 'right', x: 1, y: 0 },
] as const;

/** The spot on millimetre paper: a touch sets it, four steps move it by a millimetre. */
export function BeamGrid({ x_mm, y_mm, onPlace }: BeamGridProps) {
  const half = gridHalf_mm(x_mm, y_mm);
  const at = beamWords({ beam_x_mm: x_mm, beam_y_mm: y_mm });
  const touch = (event: MouseEvent<SVGSVGElement>): void => {
    onPlace(placeOnGrid(event, event.currentTarget.getBoundingClientRect(), half));
  };
  const lines = Array.from({ length: 2 * half + 1 }, (_, i) => i - half).filter(
    (mm) => mm % (half / 10) === 0,
  );
  return (
    <div
      className="beam"
      role="group"
      aria-label={`Beam position: ${at === '' ? 'not set' : `${at}\u2009mm`}`}
    >
      <svg
        className="beam-grid"
        viewBox={`${-half} ${-half} ${2 * half} ${2 * half}`}
        aria-hidden="true"
        onClick={touch}
      >
        <path
          className="beam-lines"
          d={lines.map((mm) => `M${mm} ${-half}V${half}M${-half} ${mm}H${half}`).join('')}
        />
        <path className="beam-axes" d={`M0 ${-half}V${half}M${-half} 0H${half}`} />
        {x_mm === null || y_mm === null ? null : (
          <circle className="beam-spot" cx={x_mm} cy={-y_mm} r={half * 0.045} />
        )}
      </svg>
      <div className="beam-steps">
        <p role="status">
          {at === '' ? 'Touch the grid where the spot sits.' : `${at}\u2009mm, right and up of centre`}
        </p>
        <p className="muted">Edge of the grid: {half} mm from the centre.</p>
        {STEPS.map((step) => (
          <HoldButton
            key={step.label}
            label={`1 mm ${step.label}`}
            onComplete={() => {
              onPlace({ x_mm: (x_mm ?? 0) + step.x, y_mm: (y_mm ?? 0) + step.y });
            }}
          />
        ))}
        <HoldButton
          label="Not seen"
          onComplete={() => {
            onPlace(null);
          }}
        />
      </div>
    </div>
  );
}
