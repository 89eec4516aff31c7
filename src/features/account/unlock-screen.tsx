import { Link } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { paths } from '../../config/paths';
import type { PersonHere } from '../../data/session/session-types';
import { PeopleHere } from './people-here';
import './account.css';

/** What a locked tablet shows in place of any screen; the emergency card stays one touch away in the frame. */
export function UnlockScreen({ people }: { readonly people: readonly PersonHere[] }) {
  return (
    <Screen>
      <div className="account">
        <h1>Who is at the bench?</h1>
        <PeopleHere people={people} onOpened={() => undefined} />
        <p>
          <Link to={paths.signIn()}>Sign in as somebody else</Link>
        </p>
      </div>
    </Screen>
  );
}
