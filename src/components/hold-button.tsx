import { ElectrodeBody } from './electrode-body';
import { HOLD_PIECES, type HoldKind, type HoldWork } from './hold';
import { useHold } from './use-hold';

export interface HoldButtonProps {
  readonly label: string;
  readonly hold?: HoldKind;
  readonly holdLabel?: string;
  readonly onComplete: HoldWork;
  readonly failedWords?: string;
  readonly disabled?: boolean;
  readonly reason?: string;
  /** The one that the eye should find: metal with a brass face, whose pieces must be told apart in any light. */
  readonly main?: boolean;
}

/** An action away from the thumb zone: same face, same count of pieces, standing in line with what it acts on. */
export function HoldButton(props: HoldButtonProps) {
  const { label, hold = 'touch', disabled = false, main = false } = props;
  const { phase, holdProps } = useHold({
    kind: hold,
    label: props.holdLabel ?? label,
    onComplete: props.onComplete,
    disabled,
    ...(props.failedWords === undefined ? {} : { failedWords: props.failedWords }),
  });
  return (
    <button
      type="button"
      className={`hold-button${main ? ' main' : ''}`}
      data-phase={phase}
      aria-disabled={disabled}
      aria-description={props.reason}
      {...holdProps}
    >
      <ElectrodeBody
        facing="up"
        tone={main ? 'metal' : 'raised'}
        rim={main ? 'brass' : 'quiet'}
        pieces={HOLD_PIECES[hold]}
        edge={0.04}
        sagitta={0.022}
      />
      <span className="hold-button-label">{label}</span>
    </button>
  );
}
