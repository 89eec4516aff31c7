import { HoldButton } from '../../components/hold-button';
import { appVersion, buildTime } from '../../config/build';
import { useBookState } from '../../data/use-book';
import { useNotices } from '../../data/use-notices';
import { useStorage } from '../../data/use-storage';
import { useUpdate } from '../../data/use-update';
import { bytesWords } from './entry-row';

/** The tablet itself: its letter, its storage, its version, and what went wrong at its start. */
export function TabletFacts() {
  const { notices, seen } = useNotices();
  const { letter, revision, hash, filling } = useBookState();
  const { used_bytes, quota_bytes, words } = useStorage();
  return (
    <section>
      <h2>This tablet</h2>
      {notices.length === 0 ? null : (
        <div className="handover-update" role="status">
          <ul className="handover-list">
            {notices.map((notice) => (
              <li key={notice}>
                <b>{notice}</b>
              </li>
            ))}
          </ul>
          <HoldButton label="I have read it" onComplete={seen} />
        </div>
      )}
      <dl className="handover-facts">
        <dt>Letter</dt>
        <dd>{letter}</dd>
        <dt>Book</dt>
        <dd>
          {filling ? 'filling, ' : ''}revision {revision}, hash{' '}
          <span className="handover-hash">{hash.slice(0, 16)}</span>
        </dd>
        <dt>Storage</dt>
        <dd>
          {words}
          {used_bytes === null ? null : (
            <span className="muted">
              {' '}
              {bytesWords(used_bytes)} used{quota_bytes === null ? '' : ` of ${bytesWords(quota_bytes)}`}
            </span>
          )}
        </dd>
        <dt>Version</dt>
        <dd>
          {appVersion} <span className="muted">built {buildTime.slice(0, 16).replace('T', ' ')} UTC</span>
        </dd>
      </dl>
      <UpdateNotice />
    </section>
  );
}

function UpdateNotice() {
  const update = useUpdate();
  if (update.state === 'none') return null;
  return (
    <div className="handover-update">
      <p>{update.words}</p>
      <HoldButton
        label="Load the new version"
        disabled={!update.may_accept}
        {...(update.may_accept ? {} : { reason: 'A firing or check of this tablet is open.' })}
        onComplete={update.accept}
      />
    </div>
  );
}
