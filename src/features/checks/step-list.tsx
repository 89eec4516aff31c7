import { STATE_WORDS, recordWords, waiveWords } from './step-words';
import type { CheckWalk } from './use-check-walk';

/** The whole sheet: what is in the Book for each step, and what is still to come. A touch shows a step. */
export function StepList({ walk }: { readonly walk: CheckWalk }) {
  const { progress, shown, change, nameOf, sheet } = walk;
  return (
    <section className="check-figure" aria-label="All steps">
      <h1 className="check-title">{sheet.spec.title}</h1>
      <ol className="check-list">
        {progress.steps.map((one, i) => (
          <li key={one.step.key}>
            <button
              type="button"
              aria-current={one === shown ? 'step' : undefined}
              onClick={() => {
                const viewed = one.step.key === progress.next?.key ? null : one.step.key;
                change((now) => ({ ...now, viewed, again: null, keypad: false, list: false }));
              }}
            >
              <span className="check-list-no">{i + 1}</span>
              <span className="check-list-words">
                <span>{one.step.title}</span>
                <span className="muted">
                  {one.record === null ? waiveWords(one.step.waive) : recordWords(one, nameOf)}
                </span>
              </span>
              <b>{STATE_WORDS[one.state]}</b>
            </button>
          </li>
        ))}
      </ol>
    </section>
  );
}
