import { ElectrodeBody } from './electrode-body';

export interface FacingPairProps {
  readonly title: string;
  /** The substance, in the gap. */
  readonly children: string;
  readonly foot: string;
  readonly footEnd?: string;
  readonly chosen?: boolean;
  readonly onPress: () => void;
}

/** One thing that waits: what it is above, its substance in the gap, who and how old below. */
export function FacingPair({ title, children, foot, footEnd, chosen = false, onPress }: FacingPairProps) {
  const tone = chosen ? 'text' : 'metal';
  return (
    <button
      type="button"
      className={`facing-pair${chosen ? ' chosen' : ''}`}
      aria-pressed={chosen}
      onClick={onPress}
    >
      <span className="pair-body upper">
        <ElectrodeBody facing="down" tone={tone} edge={0.036} sagitta={0.026} />
        <b>{title}</b>
      </span>
      <span className="pair-void">{children}</span>
      <span className="pair-body lower">
        <ElectrodeBody facing="up" tone={tone} edge={0.036} sagitta={0.026} />
        <span>{foot}</span>
        {footEnd ? <span>{footEnd}</span> : null}
      </span>
    </button>
  );
}
