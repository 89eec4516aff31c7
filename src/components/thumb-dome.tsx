import { ElectrodeBody } from './electrode-body';
import { HOLD_PIECES, type HoldKind, type HoldWork } from './hold';
import { useHold } from './use-hold';

export interface ThumbDomeProps {
  /** `\n` breaks the line. */
  readonly label: string;
  readonly size?: 'big' | 'small';
  readonly hold?: HoldKind;
  /** Stands in the strip while held; the label on one line when left out. */
  readonly holdLabel?: string;
  readonly onComplete: HoldWork;
  readonly failedWords?: string;
  readonly disabled?: boolean;
  /** Why it cannot be pressed, for whoever hears the screen. */
  readonly reason?: string;
  /** Closes, declares or stands down: nothing may stand within 13 mm of it. */
  readonly critical?: boolean;
}

/** The lower electrode: a domed block under the thumb. Its rim tells how long to hold. */
export function ThumbDome(props: ThumbDomeProps) {
  const { label, size = 'small', hold = 'touch', disabled = false, critical = false } = props;
  const { phase, holdProps } = useHold({
    kind: hold,
    label: props.holdLabel ?? label.replaceAll('\n', ' '),
    onComplete: props.onComplete,
    disabled,
    ...(props.failedWords === undefined ? {} : { failedWords: props.failedWords }),
  });
  const big = size === 'big';
  return (
    <button
      type="button"
      className={`thumb-dome ${size}${critical ? ' critical' : ''}`}
      data-phase={phase}
      aria-disabled={disabled}
      aria-description={props.reason}
      {...holdProps}
    >
      <ElectrodeBody
        facing="up"
        tone="raised"
        rim={big && !disabled ? 'brass' : 'quiet'}
        pieces={HOLD_PIECES[hold]}
        {...(big ? {} : { edge: 0.047, sagitta: 0.027 })}
      />
      <span className="thumb-dome-label">{label}</span>
    </button>
  );
}
