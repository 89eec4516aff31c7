import { useId } from 'react';

export interface WordsFieldProps {
  readonly label: string;
  readonly value: string;
  readonly onChange: (value: string) => void;
  readonly rows?: number;
  /** Stands beside the label: what the words are for. */
  readonly hint?: string;
  readonly maxLength?: number;
  readonly refusal?: string;
}

/** Words typed by a person. The only place where the system keyboard comes up: no figure is entered here. */
export function WordsField(props: WordsFieldProps) {
  const { label, value, onChange, rows = 2, hint, maxLength = 2000, refusal } = props;
  const id = useId();
  return (
    <div className="words-field">
      <label htmlFor={id}>
        {label} {hint ? <span className="muted">{hint}</span> : null}
      </label>
      <textarea
        id={id}
        rows={rows}
        maxLength={maxLength}
        value={value}
        aria-invalid={refusal !== undefined}
        aria-describedby={refusal === undefined ? undefined : `${id}r`}
        onChange={(event) => onChange(event.target.value)}
      />
      {refusal ? (
        <p id={`${id}r`} className="field-refusal" role="alert">
          {refusal}
        </p>
      ) : null}
    </div>
  );
}
