import { useState } from 'react';
import { Caution } from '../../components/caution';
import { Dialog } from '../../components/dialog';
import { shownFields } from '../../domain/lookup/fields';
import type { LookupAnswer } from '../../domain/lookup/lookup';
import type { LookupView } from './use-lookup';

interface Props {
  readonly view: LookupView;
  readonly answer: LookupAnswer;
}

/** The first caution in full; the others, with where the model holds and what each quantity is, one touch away. */
export function LookupCaution({ view, answer }: Props) {
  const [open, setOpen] = useState(false);
  const [first, ...others] = cautionsOf(view, answer);
  const more = others.length === 0 ? 'where it holds' : `${others.length} more, and where it holds`;
  const button = (
    <button type="button" className="lookup-more" onClick={() => setOpen(true)}>
      {first === undefined ? capital(more) : more}
    </button>
  );
  return (
    <>
      {first === undefined ? (
        <p className="says">{button}</p>
      ) : (
        <Caution>
          {first} {button}
        </Caution>
      )}
      {open ? <WhereItHolds view={view} answer={answer} onClose={() => setOpen(false)} /> : null}
    </>
  );
}

/** In the order in which they matter here and now: of this number, then of every such number. */
export function cautionsOf({ found }: Pick<LookupView, 'found'>, answer: LookupAnswer): readonly string[] {
  const [first, ...others] = answer.cautions;
  const several =
    found !== null && found.all.length > 1
      ? [`${found.all.length} settings meet what is wanted; the one nearest to the present value is shown.`]
      : [];
  return [
    ...(first === undefined ? [] : [first]),
    ...several,
    ...answer.warnings.map((warning) => warning.words),
    ...others,
  ];
}

function WhereItHolds({ view, answer, onClose }: Props & { readonly onClose: () => void }) {
  const { lookup, form } = view;
  return (
    <Dialog title="Before you trust this number" onClose={onClose} closeLabel="Done">
      <ul className="lookup-cautions">
        {cautionsOf(view, answer).map((words) => (
          <li key={words}>{words}</li>
        ))}
        <li>The model holds {answer.valid}.</li>
        <li>
          Local rules and the qualified person responsible come before any figure here. Holdoff measures
          nothing.
        </li>
      </ul>
      <h3 className="lookup-help-head">What each quantity is</h3>
      <dl className="lookup-help">
        {shownFields(lookup, form.values).map((field) => (
          <div key={field.key}>
            <dt>{field.label}</dt>
            <dd className="muted">{field.help}</dd>
          </div>
        ))}
      </dl>
    </Dialog>
  );
}

function capital(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
