import type { RigSpec } from '../../domain/book/rig-spec';
import { specDifference } from '../../domain/report/spec-words';
import type { SpecChange } from '../../domain/rules/loosening';

interface Props {
  readonly change: SpecChange;
  readonly topology: RigSpec['topology'];
}

/** One field of a difference: what it was, what it is, and whether a permit leans on it. */
export function ChangeRow({ change, topology }: Props) {
  const { label, before, after } = specDifference(change, topology);
  return (
    <div className="rig-change">
      <span>{label}</span>
      <span className="muted">
        <span className="heard-only">was </span>
        {before}
      </span>
      <b>
        <span className="heard-only">is </span>
        {after}
      </b>
      <span>{change.loosens ? 'Loosens' : change.safety ? 'Touches safety' : ''}</span>
    </div>
  );
}
