import { useId, type KeyboardEvent } from 'react';
import { ElectrodeBody } from './electrode-body';
import { Reading } from './reading';

export interface QuantityFieldProps {
  readonly label: string;
  readonly source?: string;
  /** Size of a step in words: stands beside the source. */
  readonly stepWords?: string;
  /** Formatted; null while nothing is entered. */
  readonly value: string | null;
  readonly unit: string;
  readonly carried?: boolean;
  readonly onStep: (direction: -1 | 1) => void;
  /** Opens the keypad. */
  readonly onOpen: () => void;
  readonly lessLabel: string;
  readonly moreLabel: string;
  readonly refusal?: string;
  /** Makes the label a button, for its help. */
  readonly onLabel?: () => void;
}

const STEPS: Readonly<Record<string, -1 | 1>> = { ArrowUp: 1, ArrowRight: 1, ArrowDown: -1, ArrowLeft: -1 };

/** The chosen field: minus and plus are two facing electrodes, and the value lies between them. */
export function QuantityField(props: QuantityFieldProps) {
  const { label, source, stepWords, value, unit, onStep, onOpen, refusal } = props;
  const id = useId();
  const step = (event: KeyboardEvent): void => {
    const direction = STEPS[event.key];
    if (direction === undefined) return;
    event.preventDefault();
    onStep(direction);
  };
  return (
    <div className="quantity-field" role="group" aria-labelledby={`${id}l`} onKeyDown={step}>
      <div className="quantity-head">
        {props.onLabel === undefined ? (
          <span id={`${id}l`}>{label}</span>
        ) : (
          <button type="button" id={`${id}l`} className="quantity-label" onClick={props.onLabel}>
            {label}
          </button>
        )}
        {source ? <span className="muted quantity-source">{stepWords ? `${source},` : source}</span> : null}
        {stepWords ? <span className="muted">{stepWords}</span> : null}
      </div>
      <div className="quantity-line">
        <button type="button" className="step less" aria-label={props.lessLabel} onClick={() => onStep(-1)}>
          <ElectrodeBody facing="right" rim="face" edge={0.115} sagitta={0.058} />
          <span aria-hidden="true">{'\u2212'}</span>
        </button>
        <button
          type="button"
          className="quantity-value"
          aria-invalid={refusal !== undefined}
          aria-describedby={refusal === undefined ? undefined : `${id}r`}
          onClick={onOpen}
        >
          <Reading value={value ?? '\u2013'} unit={unit} carried={props.carried === true} />
        </button>
        <button type="button" className="step more" aria-label={props.moreLabel} onClick={() => onStep(1)}>
          <ElectrodeBody facing="left" rim="face" edge={0.115} sagitta={0.058} />
          <span aria-hidden="true">+</span>
        </button>
      </div>
      {refusal ? (
        <p id={`${id}r`} className="field-refusal" role="alert">
          {refusal}
        </p>
      ) : null}
    </div>
  );
}
