import { useEffect, useState } from 'react';
import { createPortal } from 'react-dom';
import { useLab } from '../../data/use-book';
import { useNow } from '../../data/use-now';
import { useSession } from '../../data/use-session';
import { heldStill, type TextTable } from '../../domain/lookup/table';
import { cautionsOf } from './lookup-caution';
import { wallTableOf } from './lookup-tables';
import { aboutWords } from './lookup-words';
import type { SweepPlan } from './sweep-plan';
import type { LookupView } from './use-lookup';

interface Props {
  readonly view: LookupView;
  readonly onDone: () => void;
}

/** Prints a bench table and is gone again. On paper it is always daylight. */
export function PrintSheet({ view, onDone }: Props) {
  const [wall, setWall] = useState<{ readonly table: TextTable; readonly plan: SweepPlan } | null>(null);
  useEffect(() => {
    let wanted = true;
    void wallTableOf(view).then((made) => {
      if (!wanted) return;
      if (made === null) onDone();
      else setWall(made);
    });
    return () => {
      wanted = false;
    };
    // eslint-disable-next-line react-hooks/exhaustive-deps -- what was on screen when it was asked for is printed
  }, []);
  useEffect(() => {
    if (wall === null) return;
    window.print();
    onDone();
  }, [wall, onDone]);
  return wall === null ? null : createPortal(<Sheet view={view} {...wall} />, document.body);
}

function Sheet({
  view,
  table,
  plan,
}: {
  readonly view: LookupView;
  readonly table: TextTable;
  readonly plan: SweepPlan;
}) {
  const { lookup, form, values, answer } = view;
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const session = useSession();
  const { best_ms } = useNow(60_000);
  const day = new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: zone }).format(best_ms);
  const who = session.state === 'open' ? session.person.name : 'nobody signed in';
  if (answer === null) return null;
  return (
    <section className="print-sheet" aria-label="Bench table">
      <h1>
        {lookup.title}, {aboutWords(view)}
      </h1>
      <p>
        {plan.figures.map((figure) => figure.label).join(', ')} against {plan.field.label.toLowerCase()}. With{' '}
        {heldStill({ lookup, values, known: form.known }, plan.field.key).join('; ')}.
      </p>
      <table>
        <thead>
          <tr>
            {table.head.map((head) => (
              <th key={head} scope="col">
                {head}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {table.rows.map((row) => (
            <tr key={row[0]}>
              {row.map((cell, i) => (
                <td key={table.head[i]}>{cell === '' ? '\u2013' : cell}</td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <ul>
        {cautionsOf(view, answer).map((words) => (
          <li key={words}>{words}</li>
        ))}
      </ul>
      <p>
        Model: {answer.model}. It holds {answer.valid}.
      </p>
      <p>
        Computed on {day} by {who}. Holdoff measures nothing and switches nothing; local rules and the
        qualified person responsible come first.
      </p>
    </section>
  );
}
