interface TicksProps<V extends string> {
  readonly label: string;
  readonly hint?: string;
  readonly options: readonly { readonly value: V; readonly label: string }[];
  readonly chosen: readonly V[];
  readonly onChange: (chosen: readonly V[]) => void;
}

/** Several of some: each stands between two faces or does not. */
export function Ticks<V extends string>({ label, hint, options, chosen, onChange }: TicksProps<V>) {
  return (
    <div className="sheet-row" role="group" aria-label={label}>
      <span>
        {label} {hint === undefined ? null : <span className="muted">{hint}</span>}
      </span>
      <div className="choice">
        {options.map(({ value, label: name }) => {
          const on = chosen.includes(value);
          return (
            <button
              key={value}
              type="button"
              role="checkbox"
              aria-checked={on}
              onClick={() => onChange(on ? chosen.filter((one) => one !== value) : [...chosen, value])}
            >
              {name}
            </button>
          );
        })}
      </div>
    </div>
  );
}
