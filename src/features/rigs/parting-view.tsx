import { Link } from 'react-router-dom';
import { Caution } from '../../components/caution';
import { paths } from '../../config/paths';
import { useNames } from '../../data/use-names';
import {
  headRevisions,
  revisionById,
  rulingEnvelope,
  type RigDoc,
  type RigRevision,
} from '../../domain/book/documents/rig';
import { envelopeWords } from '../../domain/report/permit-words';
import { specFieldWords, specValueWords } from '../../domain/report/spec-words';
import { momentWords } from '../../domain/report/time-words';
import { partingRows } from './parting-rows';
import { useMay } from './use-may';

/** Two people revised the rig apart from each other: what each changed, side by side, and who settles it. */
export function PartingView({ rig, zone }: { readonly rig: RigDoc; readonly zone: string }) {
  const heads = headRevisions(rig);
  const may = useMay();
  const nameOf = useNames();
  const [first] = heads;
  if (heads.length < 2 || first === undefined) return null;
  const rows = partingRows(rig);
  const { topology } = first.spec;
  return (
    <section className="parting" aria-label="Parting">
      <h2>Parting: revisions {heads.map((head) => head.number).join(' and ')} stand against each other</h2>
      <Caution>
        The stricter limit of each pair rules: {envelopeWords(rulingEnvelope(rig))}. No permit rules and
        nobody may fire until a reviewer or a lead settles it by naming {heads.length === 2 ? 'both' : 'all'}{' '}
        and keeping one.
      </Caution>
      <div className="parting-table">
        <table className="figures">
          <caption className="heard-only">What each revision says where they differ</caption>
          <thead>
            <tr>
              <th scope="col" className="start">
                Field
              </th>
              <th scope="col" className="start">
                Before
              </th>
              {heads.map((head) => (
                <th key={head.entry} scope="col" className="start">
                  {head.number}, {nameOf(head.by)}
                  <br />
                  <span className="muted">{momentWords(head.stamp.wall_ms, zone)}</span>
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((row) => (
              <tr key={row.field}>
                <th scope="row" className="start">
                  {specFieldWords(row.field, topology).label}
                </th>
                <td className="start muted">{specValueWords(row.before, row.field, topology)}</td>
                {row.values.map((value, i) => (
                  <td key={heads[i]?.entry} className="start">
                    {value === row.before ? (
                      <span className="muted">as before</span>
                    ) : (
                      <b>{specValueWords(value, row.field, topology)}</b>
                    )}
                    {row.stricter === i ? ' rules' : ''}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {heads.map((head) => (
        <p key={head.entry} className="m-0">
          <b>{head.number}</b> {head.why} <span className="muted">{baseWords(rig, head)}</span>
        </p>
      ))}
      <p className="m-0">
        <Link to={paths.deskRig(rig.id)} className="underline">
          {may('parting.settled') ? 'Settle it at the Desk' : 'How it stands at the Desk'}
        </Link>
      </p>
    </section>
  );
}

function baseWords(rig: RigDoc, head: RigRevision): string {
  const base = head.based_on === null ? undefined : revisionById(rig, head.based_on);
  return base === undefined ? '' : `on ${base.number}`;
}
