import { Screen } from '../../components/frame';
import { Table, type Column } from '../../components/table';
import { DeskProvider } from '../../data/desk/use-desk-query';
import { useLab, usePerson } from '../../data/use-book';
import { useNow } from '../../data/use-now';
import { useSession } from '../../data/use-session';
import type { CrewAnswer } from '../../domain/report/desk-shapes';
import { agoWords } from '../../domain/report/time-words';
import { ROLE_WORDS } from '../../domain/report/words';
import { isRole } from '../../domain/rules/roles';
import { TabletRow } from './tablet-row';
import { inUseFirst } from './crew-rows';
import { useCrew } from './use-crew';
import './crew.css';

export function CrewRoute() {
  return (
    <DeskProvider>
      <Screen>
        <CrewPage />
      </Screen>
    </DeskProvider>
  );
}

function CrewPage() {
  const crew = useCrew();
  const lab = useLab();
  const { stamp, best_ms } = useNow(10_000);
  const session = useSession();
  const me = usePerson(session.state === 'open' ? session.person.id : null);
  const mayRevoke = isRole(me?.role ?? null, 'lead');
  return (
    <div className="crew">
      <h1>Crew{lab === undefined ? '' : ` of ${lab.settings.name}`}</h1>
      {crew.words === null ? null : (
        <p role="status">
          {crew.words}{' '}
          <span className="muted">
            {crew.fetched_ms === 0
              ? 'Nothing was fetched on this tablet before.'
              : `What stands here was fetched ${agoWords(Math.max(0, stamp.wall_ms - crew.fetched_ms))}.`}
          </span>
        </p>
      )}
      {crew.crew === undefined ? (
        <p className="muted">{crew.words === null ? 'Asking the server.' : ''}</p>
      ) : (
        <>
          <People people={crew.crew.people} />
          <section>
            <h2>Tablets</h2>
            <ul className="crew-list">
              {inUseFirst(crew.crew.tablets).map((tablet) => (
                <li key={tablet.id}>
                  <TabletRow tablet={tablet} now_ms={best_ms} mayRevoke={mayRevoke} revoke={crew.revoke} />
                </li>
              ))}
            </ul>
            <p className="muted">
              A revoked tablet applies nothing more and loses nothing. What it already holds stays readable to
              whoever holds it: Holdoff does not encrypt it.{mayRevoke ? '' : ' Revoking is for a lead.'}
            </p>
          </section>
        </>
      )}
    </div>
  );
}

type Person = CrewAnswer['people'][number];

const COLUMNS: readonly Column<Person>[] = [
  { key: 'name', head: 'name', align: 'start', cell: (row) => row.name },
  {
    key: 'role',
    head: 'role',
    align: 'start',
    cell: (row) => (row.role === null ? 'removed' : ROLE_WORDS[row.role]),
  },
];

function People({ people }: { readonly people: readonly Person[] }) {
  return (
    <section>
      <h2>People</h2>
      <Table
        caption="People and their roles"
        columns={COLUMNS}
        rows={people}
        rowKey={(row) => row.id}
        foot={`${people.length} in all`}
      />
    </section>
  );
}
