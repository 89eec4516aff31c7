import { AgeScale } from './age-scale';
import { GapMark, type GapState } from './gap-mark';
import { HoldFill } from './hold-fill';
import { useHoldView } from './hold-stage';

export interface StateStripProps {
  readonly mark: GapState;
  readonly ground: 'outline' | 'half' | 'solid' | 'dash';
  readonly hatched?: boolean;
  readonly title: string;
  readonly state: string;
  /** For a narrow strip. */
  readonly shortState?: string;
  readonly detail?: string;
  readonly person?: string;
  readonly count?: string;
  /** Age of the state in hours, on the 12-hour scale at the foot. */
  readonly age_h?: number;
  /** Stands before the count when something has to be said, such as touches that were ignored. */
  readonly notice?: string;
  readonly onPress?: () => void;
  readonly pressLabel?: string;
}

/** The upper electrode: always there, its ground tells the state by lightness, and a hold closes over it. */
export function StateStrip(props: StateStripProps) {
  const hold = useHoldView();
  const { title, state, shortState = state, detail, person, count, notice } = props;
  const heard = [title, state, detail, person, count, notice, props.pressLabel].filter(Boolean).join(', ');
  return (
    <header className={`state-strip ground-${props.ground}${props.hatched === true ? ' hatched' : ''}`}>
      <button
        type="button"
        className="state-strip-press"
        aria-label={heard}
        disabled={props.onPress === undefined}
        onClick={props.onPress}
      >
        <span className="strip-clean">
          <GapMark state={props.mark} hatched={props.hatched === true} />
          <b>{title}</b>
          <b className="strip-state">{state}</b>
          <span className="strip-short">{shortState}</span>
          {detail ? <span className="strip-muted strip-detail">{detail}</span> : null}
        </span>
        <span className="strip-space" />
        <span className="strip-clean strip-end">
          {notice ? <b className="strip-notice">{notice}</b> : null}
          {person ? <span className="strip-muted strip-person">{person}</span> : null}
          {count ? <span className="strip-count">{count}</span> : null}
        </span>
      </button>
      <AgeScale age_h={props.age_h ?? null} />
      {hold.phase === 'idle' ? null : <HoldFill view={hold} />}
    </header>
  );
}
