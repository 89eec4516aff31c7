import { useEffect, useState } from 'react';
import { createPortal } from 'react-dom';
import { HoldButton } from '../../components/hold-button';
import { useBookState } from '../../data/use-book';
import { PURPOSE_WORDS } from '../../domain/report/words';
import { bookWords, recordRows, whenWords } from './check-record';
import type { CheckWalk } from './use-check-walk';

/** The record of an ended check on paper, which is always daylight. */
export function PrintRecord({ walk }: { readonly walk: CheckWalk }) {
  const [printing, setPrinting] = useState(false);
  return (
    <div>
      <HoldButton label="Print the record" onComplete={() => setPrinting(true)} />
      {printing ? <Paper walk={walk} onDone={() => setPrinting(false)} /> : null}
    </div>
  );
}

function Paper({ walk, onDone }: { readonly walk: CheckWalk; readonly onDone: () => void }) {
  useEffect(() => {
    window.print();
    onDone();
    // eslint-disable-next-line react-hooks/exhaustive-deps -- printed once, as it stood when it was asked for
  }, []);
  return createPortal(<Record walk={walk} />, document.body);
}

export function Record({ walk }: { readonly walk: CheckWalk }) {
  const { check, sheet, rig, revision, settings, nameOf, progress } = walk;
  const book = useBookState();
  const zone = settings?.zone ?? 'Etc/UTC';
  const { ended, opened } = check;
  return (
    <section className="check-record" aria-label="Record of the check">
      <h1>
        {sheet.spec.title}: {rig.name}, revision {revision.number}
      </h1>
      <p>
        {PURPOSE_WORDS[sheet.spec.purpose]}, sheet version {sheet.version} published{' '}
        {whenWords(sheet.published.stamp, zone)} by {nameOf(sheet.published.by)}. Times of {zone}.
      </p>
      <p>
        Opened {whenWords(opened.stamp, zone)} by {nameOf(opened.by)}.{' '}
        {ended === null
          ? null
          : `${ended.how === 'closed' ? 'Closed' : 'Abandoned'} ${whenWords(ended.stamp, zone)} by ${nameOf(ended.by)}${
              ended.words === '' ? '' : `: ${ended.words}`
            }.`}
        {ended?.irregular === 'steps-missing'
          ? ' Closed with steps missing: it declared no readiness.'
          : null}
      </p>
      <p>
        <b>Caution:</b> {sheet.spec.caution}
      </p>
      <table>
        <thead>
          <tr>
            {['', 'Step', 'State', 'Found', 'By', 'When'].map((head) => (
              <th key={head} scope="col">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {recordRows({ progress, nameOf, zone }).map((row) => (
            <tr key={row.key}>
              <td>{row.no}</td>
              <td>{row.title}</td>
              <td>{row.state}</td>
              <td>{row.said}</td>
              <td>{row.by}</td>
              <td>{row.when}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p>{bookWords(check, book)}</p>
      <p>
        A declaration is no measurement. Holdoff measures nothing and switches nothing; local rules and the
        qualified person responsible come first.
      </p>
    </section>
  );
}
