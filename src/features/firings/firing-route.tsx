import { useParams } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { usePerson } from '../../data/use-book';
import { useSession } from '../../data/use-session';
import { mayAppend } from '../../domain/rules/roles';
import { ClosedFiring } from './closed-firing';
import { OpenFiring } from './open-firing';
import { useFiringFacts } from './use-firing-facts';
import './firings.css';

/** One firing: the logging screen while it is open, the record of it afterwards. */
export function FiringRoute() {
  const { firing: id = '' } = useParams();
  const facts = useFiringFacts(id);
  const session = useSession();
  const person = usePerson(session.state === 'open' ? session.person.id : null);
  if (facts === undefined) {
    return (
      <Screen>
        <div className="firing-figure">
          <SaysBlock lead="This firing is not in the tablet’s Book.">
            The Book may still be filling.
          </SaysBlock>
        </div>
      </Screen>
    );
  }
  const mayLog = mayAppend(person?.role ?? null, 'firing.reading');
  return facts.firing.closed === null && mayLog ? (
    <OpenFiring key={id} facts={facts} />
  ) : (
    <ClosedFiring key={id} facts={facts} mayCorrect={mayLog} />
  );
}
