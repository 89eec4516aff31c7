import type { CheckWalk } from './use-check-walk';

/** Words to a step, such as the numbers on the eyewear. */
export function StepNote({ walk, step }: { readonly walk: CheckWalk; readonly step: string }) {
  return (
    <label className="check-words-label">
      <span className="muted">Note</span>
      <textarea
        className="check-words"
        rows={2}
        maxLength={2000}
        value={walk.draft.notes[step] ?? ''}
        onChange={(event) => {
          const { value } = event.target;
          walk.change((now) => ({ ...now, notes: { ...now.notes, [step]: value } }));
        }}
      />
    </label>
  );
}
