import { useRef, type KeyboardEvent } from 'react';

export interface ChoiceOption<V extends string> {
  readonly value: V;
  readonly label: string;
  readonly disabled?: boolean;
}

export interface ChoiceProps<V extends string> {
  readonly label: string;
  readonly options: readonly ChoiceOption<V>[];
  readonly value: V | null;
  readonly onChange: (value: V) => void;
}

/** A row of targets; the chosen one stands between two faces. Arrow keys move the choice, as in any group of radios. */
export function Choice<V extends string>({ label, options, value, onChange }: ChoiceProps<V>) {
  const group = useRef<HTMLDivElement>(null);
  const open = options.filter((option) => option.disabled !== true);
  const entry = open.find((option) => option.value === value) ?? open[0];

  const move = (event: KeyboardEvent): void => {
    const step = STEPS[event.key];
    if (step === undefined || open.length === 0) return;
    event.preventDefault();
    const at = open.findIndex((option) => option.value === value);
    const next = open[(Math.max(at, 0) + (at < 0 ? 0 : step) + open.length) % open.length];
    if (next === undefined) return;
    onChange(next.value);
    group.current?.querySelector<HTMLElement>(`[data-value="${CSS.escape(next.value)}"]`)?.focus();
  };

  return (
    <div ref={group} className="choice" role="radiogroup" aria-label={label} onKeyDown={move}>
      {options.map((option) => (
        <button
          key={option.value}
          type="button"
          role="radio"
          aria-checked={option.value === value}
          data-value={option.value}
          disabled={option.disabled === true}
          tabIndex={option.value === entry?.value ? 0 : -1}
          onClick={() => onChange(option.value)}
        >
          {option.label}
        </button>
      ))}
    </div>
  );
}

const STEPS: Readonly<Record<string, -1 | 1>> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 };
