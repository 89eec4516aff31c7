import { Screen } from '../../../components/frame';
import { SaysBlock } from '../../../components/says-block';
import { STEP_WORDS } from '../../../domain/report/sheet-words';
import type { StepType } from '../../../domain/book/sheet-spec';
import { PublishBlock } from './publish-block';
import { addStep } from './sheet-draft';
import { SheetHead } from './sheet-head';
import { StepCard } from './step-card';
import type { SheetEdit } from './use-sheet-edit';

const KINDS = Object.keys(STEP_WORDS) as readonly StepType[];

/** A sheet on the desk: its head, its steps in order, and what publishing it changes. */
export function SheetEditor({ edit }: { readonly edit: SheetEdit }) {
  const { draft, published, problems, save } = edit;
  return (
    <Screen>
      <div className="check-figure sheet-edit">
        <h1 className="check-title">
          {published === null
            ? 'New check sheet'
            : `${published.spec.title}, version ${published.version + 1}`}
        </h1>
        {save === 'not-saved' ? <SaysBlock>The draft could not be kept on this tablet.</SaysBlock> : null}
        <SheetHead edit={edit} />
        <section aria-label="Steps" className="sheet-section">
          <h2>Steps, in the order in which they are walked</h2>
          <ol className="sheet-steps">
            {draft.steps.map((step, at) => (
              <StepCard
                key={step.key}
                edit={edit}
                step={step}
                at={at}
                problems={problems.filter((one) => one.step === step.key)}
              />
            ))}
          </ol>
          <div className="sheet-row" role="group" aria-label="Add a step">
            <span className="muted">Add:</span>
            {KINDS.map((type) => (
              <button
                key={type}
                type="button"
                className="sheet-button"
                onClick={() => edit.set((now) => addStep(now, type))}
              >
                Add {STEP_WORDS[type]}
              </button>
            ))}
          </div>
        </section>
        <PublishBlock edit={edit} />
      </div>
    </Screen>
  );
}
