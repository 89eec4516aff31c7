import { useId, useState, type SyntheticEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { paths } from '../../config/paths';
import { useSession, useSessionActions } from '../../data/use-session';
import { PeopleHere } from './people-here';
import { PinNew } from './pin-new';
import './account.css';

/** Signing in on this tablet, choosing a PIN, or changing to somebody who has signed in on it before. */
export function SignInRoute() {
  const session = useSession();
  const [choosingPin, setChoosingPin] = useState(false);
  const navigate = useNavigate();
  if (choosingPin && session.state === 'open') {
    return (
      <Screen>
        <PinNew name={session.person.name} onDone={() => void navigate(paths.bench())} />
      </Screen>
    );
  }
  return (
    <Screen>
      <div className="account">
        {session.state === 'no-lab' ? (
          <SaysBlock lead="This tablet belongs to no lab yet.">
            Signing in enrols it: it gets a letter of its own and fills its Book. This needs the network once.
          </SaysBlock>
        ) : null}
        {session.state === 'no-lab' || session.people.length === 0 ? null : (
          <PeopleHere people={session.people} />
        )}
        <SignInForm
          onSignedIn={(pinNeeded) => (pinNeeded ? setChoosingPin(true) : void navigate(paths.bench()))}
        />
      </div>
    </Screen>
  );
}

function SignInForm({ onSignedIn }: { readonly onSignedIn: (pinNeeded: boolean) => void }) {
  const { signIn } = useSessionActions();
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const [says, setSays] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const id = useId();
  const submit = async (event: SyntheticEvent) => {
    event.preventDefault();
    if (email.trim() === '' || password === '') {
      setSays('Enter your e-mail address and your password.');
      return;
    }
    setBusy(true);
    const outcome = await signIn({ email: email.trim(), password, device_name: deviceName() });
    setBusy(false);
    if (outcome.type === 'signed-in') onSignedIn(outcome.pin_needed);
    else setSays(outcome.words);
  };
  return (
    <form className="sign-in" onSubmit={(event) => void submit(event)} aria-label="Sign in" noValidate>
      <h1>Sign in</h1>
      <label htmlFor={`${id}e`}>E-mail</label>
      <input
        id={`${id}e`}
        type="email"
        autoComplete="username"
        value={email}
        onChange={(event) => setEmail(event.target.value)}
      />
      <label htmlFor={`${id}p`}>Password</label>
      <input
        id={`${id}p`}
        type="password"
        autoComplete="current-password"
        value={password}
        onChange={(event) => setPassword(event.target.value)}
      />
      {says === null ? null : (
        <p role="alert">
          <b>{says}</b>
        </p>
      )}
      <button type="submit" className="plain-action" disabled={busy}>
        {busy ? 'Signing in' : 'Sign in'}
      </button>
    </form>
  );
}

/** Only a name for Crew to tell tablets apart; people can read it there. */
function deviceName(): string {
  const { userAgent } = navigator;
  const system =
    ['Android', 'iPad', 'iPhone', 'Windows', 'Macintosh', 'Linux'].find((name) => userAgent.includes(name)) ??
    'Browser';
  return `${system}, ${window.screen.width} by ${window.screen.height}`;
}
