interface Props {
  readonly px_per_mm: number | null;
  readonly onChange: (px_per_mm: number | null) => void;
}

const BAR_MM = 50;
const REFERENCE_PX_PER_MM = 5.2;

/** Hold a ruler to the bar: lengths of targets and type are in real millimetres from then on. */
export function Ruler({ px_per_mm, onChange }: Props) {
  const now = px_per_mm ?? REFERENCE_PX_PER_MM;
  return (
    <div className="ruler">
      <p className="muted">Ruler: make the bar exactly {BAR_MM} mm long</p>
      <div className="ruler-bar" style={{ width: `${BAR_MM * now}px` }} />
      <label className="ruler-range">
        <span className="muted">{now.toFixed(2)} px per mm</span>
        <input
          type="range"
          min={2.5}
          max={12}
          step={0.02}
          value={now}
          onChange={(event) => onChange(Number(event.target.value))}
          aria-label="Pixels per millimetre"
        />
      </label>
      <button type="button" className="plain-link" onClick={() => onChange(null)}>
        Back to the reference tablet
      </button>
    </div>
  );
}
