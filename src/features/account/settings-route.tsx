import { useNavigate } from 'react-router-dom';
import { Choice } from '../../components/choice';
import { Screen } from '../../components/frame';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { FOOT_KEY_SETTINGS, type FootKeySetting } from '../../data/display-settings';
import { useDisplay } from '../../data/use-display';
import { useSession, useSessionActions } from '../../data/use-session';
import { Ruler } from './ruler';
import './account.css';

const FOOT_KEY_WORDS: Readonly<Record<FootKeySetting, string>> = {
  either: 'F13 or Page Down',
  F13: 'F13 alone',
  F14: 'F14',
  PageDown: 'Page Down alone',
  PageUp: 'Page Up',
};

/** How this tablet looks and who holds it. */
export function SettingsRoute() {
  const { settings, change } = useDisplay();
  const { lock, signOut } = useSessionActions();
  const session = useSession();
  const navigate = useNavigate();
  return (
    <Screen
      thumbs={
        <ThumbZone
          label="Actions"
          main={<ThumbDome size="big" label="Lock" onComplete={() => void lock()} />}
          others={[
            <ThumbDome key="person" label="Change person" onComplete={() => void navigate(paths.signIn())} />,
          ]}
        />
      }
    >
      <div className="account settings">
        <h1>Settings of this tablet</h1>
        <p className="muted">Thumb in use</p>
        <Choice
          label="Thumb in use"
          options={[
            { value: 'right', label: 'right hand' },
            { value: 'left', label: 'left hand' },
          ]}
          value={settings.hand}
          onChange={(hand) => change({ ...settings, hand })}
        />
        <p className="muted">Light</p>
        <Choice
          label="Light"
          options={[
            { value: 'by-place', label: 'by place' },
            { value: 'dark', label: 'dark' },
            { value: 'daylight', label: 'daylight' },
          ]}
          value={settings.theme}
          onChange={(theme) => change({ ...settings, theme })}
        />
        <p className="muted">Eyewear</p>
        <Choice
          label="Eyewear"
          options={[
            { value: 'off', label: 'eyewear off' },
            { value: 'on', label: 'eyewear on' },
          ]}
          value={settings.eyewear ? 'on' : 'off'}
          onChange={(eyewear) => change({ ...settings, eyewear: eyewear === 'on' })}
        />
        <p className="muted">Text size</p>
        <Choice
          label="Text size"
          options={[
            { value: '1', label: '100 %' },
            { value: '1.25', label: '125 %' },
            { value: '1.5', label: '150 %' },
            { value: '2', label: '200 %' },
          ]}
          value={String(settings.scale)}
          onChange={(scale) => change({ ...settings, scale: Number(scale) })}
        />
        <p className="muted">Wired foot key</p>
        <Choice
          label="Wired foot key"
          options={FOOT_KEY_SETTINGS.map((value) => ({ value, label: FOOT_KEY_WORDS[value] }))}
          value={settings.foot_key}
          onChange={(foot_key) => change({ ...settings, foot_key })}
        />
        <p className="muted">A short press of it</p>
        <Choice
          label="A short press of it"
          options={[
            { value: 'log', label: 'logs the reading again' },
            { value: 'burst', label: 'starts and stops a burst' },
          ]}
          value={settings.foot_does}
          onChange={(foot_does) => change({ ...settings, foot_does })}
        />
        <p className="muted">Held for a second it stands the rig down, whatever is chosen here.</p>
        <Ruler px_per_mm={settings.px_per_mm} onChange={(px_per_mm) => change({ ...settings, px_per_mm })} />
        {session.state === 'open' ? (
          <p>
            {session.person.name}, {session.online === 'signed-in' ? 'signed in' : 'not signed in online'}.{' '}
            <button type="button" className="plain-link" onClick={() => void signOut()}>
              Sign out online
            </button>{' '}
            Entries on this tablet stay and go on being handed over.
          </p>
        ) : null}
      </div>
    </Screen>
  );
}
