import { HoldButton } from '../../../components/hold-button';
import { MOST_NODES, MOST_POINTS, MOST_SCREWS } from './node-fields';
import { rowsOf, type ListKey } from './spec-texts';
import { EditFields } from './edit-section-fields';
import type { RigEdit } from './use-rig-edit';

interface ListWords {
  readonly list: ListKey;
  readonly one: string;
  readonly most: number;
  readonly says: string;
}

const LIST: Readonly<Record<'nodes' | 'shorting' | 'screws', ListWords>> = {
  nodes: {
    list: 'nodes',
    one: 'node',
    most: MOST_NODES,
    says: 'Name every node that stays charged by itself once the supply is off: each gets a ring in the drawing, a wait of its own and a short of its own.',
  },
  shorting: {
    list: 'shorting_points',
    one: 'shorting point',
    most: MOST_POINTS,
    says: 'Every point that the stick goes to, in the order of the make-safe sheet. At least one for each charged node.',
  },
  screws: {
    list: 'channel.screws',
    one: 'screw',
    most: MOST_SCREWS,
    says: 'The screws that move an electrode, counted from the A end of the active length. Alignment works with them.',
  },
};

/** A list of things that are there or not: each row with its fields, and one to add. */
export function SectionList({
  edit,
  section,
}: {
  readonly edit: RigEdit;
  readonly section: keyof typeof LIST;
}) {
  const { list, one, most, says } = LIST[section];
  const rows = rowsOf(edit.state.textOf(list));
  const others = edit.fields.filter((field) => !field.key.startsWith(`${list}.`));
  const refusal = edit.state.refusals[list];
  return (
    <>
      <p className="muted m-0">{says}</p>
      {refusal === undefined ? null : (
        <p className="field-refusal m-0" role="alert">
          {refusal}
        </p>
      )}
      {rows.map((row, i) => (
        <section key={row} className="edit-item" aria-label={`${one} ${i + 1}`}>
          <EditFields
            edit={edit}
            fields={edit.fields.filter(
              (field) => field.key === `${list}.${row}` || field.key.startsWith(`${list}.${row}.`),
            )}
          />
          <button type="button" className="edit-out" onClick={() => edit.takeRowOut(list, row)}>
            Take {one} {i + 1} out
          </button>
        </section>
      ))}
      {rows.length < most ? (
        <HoldButton label={`Add a ${one}`} onComplete={() => edit.addRow(list)} />
      ) : (
        <p className="muted m-0">No more than {most} can be written down.</p>
      )}
      <EditFields edit={edit} fields={others} />
    </>
  );
}
