import { useState } from 'react';
import { Link } from 'react-router-dom';
import { Dialog } from '../../components/dialog';
import { paths } from '../../config/paths';
import { tabText, type TextTable } from '../../domain/lookup/table';
import type { LookupForm } from './lookup-form';
import { PrintSheet } from './print-sheet';
import { shownTable } from './lookup-tables';
import type { LookupView } from './use-lookup';

/** What else may be done with an answer, in one quiet line under it. */
export function LookupActions({ view }: { readonly view: LookupView }) {
  const { form, change } = view;
  const { copied, copy } = useCopy();
  const [printing, setPrinting] = useState(false);
  const ready = view.answer !== null && view.refusal === null;
  const show = (next: LookupForm['view']) => change((now) => ({ ...now, view: next }));
  return (
    <nav className="lookup-actions" aria-label="With this lookup">
      {form.view === 'sweep' ? (
        <button type="button" className="lookup-act" onClick={() => show('answer')}>
          Answer
        </button>
      ) : (
        <button type="button" className="lookup-act" onClick={() => show('sweep')}>
          Sweep
        </button>
      )}
      <button
        type="button"
        className="lookup-act"
        disabled={!ready}
        onClick={() => void shownTable(view).then(copy)}
      >
        Copy as table
      </button>
      <button type="button" className="lookup-act" disabled={!ready} onClick={() => setPrinting(true)}>
        Print for the wall
      </button>
      <Link className="lookup-act" to={paths.lookups()}>
        All lookups
      </Link>
      <span role="status" className="lookup-status">
        {copied === 'copied' ? 'Copied.' : ''}
      </span>
      {copied !== null && copied !== 'copied' ? (
        <Dialog title="Not copied" onClose={() => copy(null)} closeLabel="Done">
          <p>
            This browser does not let the app copy. The table stands here: select it and copy it yourself.
          </p>
          <textarea className="lookup-copy" aria-label="Table" readOnly rows={8} value={copied} />
        </Dialog>
      ) : null}
      {printing ? <PrintSheet view={view} onDone={() => setPrinting(false)} /> : null}
    </nav>
  );
}

/** Null before anything was copied, else how it went: the text itself where the browser refused. */
function useCopy() {
  const [copied, setCopied] = useState<string | null>(null);
  const copy = (table: TextTable | null) => {
    if (table === null) {
      setCopied(null);
      return;
    }
    const text = tabText(table);
    const clipboard = navigator.clipboard as Clipboard | undefined;
    const written =
      clipboard === undefined ? Promise.reject(new Error('no clipboard here')) : clipboard.writeText(text);
    written.then(
      () => setCopied('copied'),
      () => setCopied(text),
    );
  };
  return { copied, copy };
}
