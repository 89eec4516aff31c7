import { useEffect, useRef, type KeyboardEvent } from 'react';
import { STEP_WORDS } from '../../../domain/report/sheet-words';
import { moveStep, takeStepOut, type DraftProblem, type StepDraft } from './sheet-draft';
import { StepFields } from './step-fields';
import type { SheetEdit } from './use-sheet-edit';

interface StepCardProps {
  readonly edit: SheetEdit;
  readonly step: StepDraft;
  readonly at: number;
  readonly problems: readonly DraftProblem[];
}

/** One step: closed a line with its place, open with all that it says. */
export function StepCard({ edit, step, at, problems }: StepCardProps) {
  const { draft, set, change } = edit;
  const open = draft.open === step.key;
  const name = step.title.trim() === '' ? 'no title yet' : step.title;
  const { root, move } = useMoving(edit, step.key, at);
  return (
    <li ref={root} className="sheet-step" aria-label={`Step ${at + 1}: ${name}`} onKeyDown={byKeys}>
      <div className="sheet-step-head">
        <button
          type="button"
          className="sheet-step-title"
          aria-expanded={open}
          onClick={() => change({ open: open ? null : step.key })}
        >
          <span className="check-list-no">{at + 1}</span>
          <span className="check-list-words">
            <span>{name}</span>
            <span className="muted">{STEP_WORDS[step.type]}</span>
          </span>
        </button>
        <button
          type="button"
          className="sheet-button"
          data-move="-1"
          aria-label={`Step ${at + 1} up`}
          disabled={at === 0}
          onClick={() => move(-1)}
        >
          up
        </button>
        <button
          type="button"
          className="sheet-button"
          data-move="1"
          aria-label={`Step ${at + 1} down`}
          disabled={at === draft.steps.length - 1}
          onClick={() => move(1)}
        >
          down
        </button>
        <button
          type="button"
          className="sheet-button"
          aria-label={`Take step ${at + 1} out`}
          onClick={() => set((now) => takeStepOut(now, step.key))}
        >
          take out
        </button>
      </div>
      {problems.map((one) => (
        <p
          key={one.words}
          className={one.weight === 'refusal' ? 'field-refusal' : 'muted'}
          role={one.weight === 'refusal' ? 'alert' : undefined}
        >
          {one.words}
        </p>
      ))}
      {open ? <StepFields edit={edit} step={step} /> : null}
    </li>
  );

  function byKeys(event: KeyboardEvent): void {
    if (!event.altKey || (event.key !== 'ArrowUp' && event.key !== 'ArrowDown')) return;
    event.preventDefault();
    move(event.key === 'ArrowUp' ? -1 : 1);
  }
}

/** A step that was moved keeps the hand on it: a browser drops the focus of what is put elsewhere in the page. */
function useMoving({ set }: SheetEdit, key: string, at: number) {
  const root = useRef<HTMLLIElement>(null);
  const moved = useRef<-1 | 1 | null>(null);
  useEffect(() => {
    const by = moved.current;
    moved.current = null;
    if (by === null) return;
    const wanted = root.current?.querySelector<HTMLButtonElement>(`[data-move="${by}"]`);
    const other = root.current?.querySelector<HTMLButtonElement>(`[data-move="${-by}"]`);
    (wanted?.disabled === true ? other : wanted)?.focus();
  }, [at]);
  const move = (by: -1 | 1): void => {
    set((now) => moveStep(now, key, by));
    moved.current = by;
  };
  return { root, move };
}
