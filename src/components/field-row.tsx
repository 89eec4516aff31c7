import type { ReactNode } from 'react';
import { Reading } from './reading';

export interface FieldRowProps {
  readonly label: string;
  /** How it is known: measured, assumed, carried over. */
  readonly source?: string;
  /** Null while nothing is entered. */
  readonly value: ReactNode;
  readonly unit?: string;
  readonly carried?: boolean;
  readonly onPress?: () => void;
  readonly refusal?: string;
}

/** A field that is not being changed, or a derived figure when it cannot be pressed. */
export function FieldRow(props: FieldRowProps) {
  const { label, source, value, unit = '', carried = false, onPress, refusal } = props;
  const content = (
    <>
      <span className="field-label">
        <span>{label}</span>
        {source ? <span className="muted">{source}</span> : null}
        {refusal ? <b className="field-refusal">{refusal}</b> : null}
      </span>
      {value === null ? (
        <span className="field-empty muted">{unit === '' ? '\u2013' : `\u2013 ${unit}`}</span>
      ) : (
        <Reading value={value} unit={unit} carried={carried} />
      )}
    </>
  );
  return onPress === undefined ? (
    <div className="field-row">{content}</div>
  ) : (
    <button type="button" className="field-row" aria-invalid={refusal !== undefined} onClick={onPress}>
      {content}
    </button>
  );
}
