import { useState } from 'react';
import { HoldButton } from '../../components/hold-button';
import type { HoldOutcome } from '../../components/hold';
import { SlideConfirm } from '../../components/slide-confirm';
import { lastSeenWords, pendingWords, type Tablet } from './crew-rows';

interface Props {
  readonly tablet: Tablet;
  readonly now_ms: number;
  readonly mayRevoke: boolean;
  readonly revoke: (tablet: string) => Promise<HoldOutcome>;
}

/** One tablet. Revoking cannot be undone: a hold here, then a slide at another place. */
export function TabletRow({ tablet, now_ms, mayRevoke, revoke }: Props) {
  const [confirming, setConfirming] = useState(false);
  const [failed, setFailed] = useState<string | null>(null);
  const revoked = tablet.revoked_ms !== null;
  const finish = async (): Promise<void> => {
    setConfirming(false);
    const outcome = await revoke(tablet.id);
    setFailed(outcome.type === 'failed' ? outcome.words : null);
  };
  return (
    <div className="crew-tablet">
      <p>
        <b>{tablet.letter}</b> {tablet.name}
        {revoked ? <b>, revoked</b> : null}
      </p>
      <p className="muted">
        seen {lastSeenWords(tablet, now_ms)}, {tablet.last_seq} entries taken. Waiting then:{' '}
        {pendingWords(tablet, now_ms)}
      </p>
      {mayRevoke && !revoked && !confirming ? (
        <HoldButton
          label="Revoke"
          hold="second"
          holdLabel={`Hold: revoke tablet ${tablet.letter}`}
          onComplete={() => setConfirming(true)}
        />
      ) : null}
      {confirming ? (
        <div className="crew-slide">
          <SlideConfirm
            label={`Slide to revoke tablet ${tablet.letter} for good`}
            to="Revoke"
            cancelLabel="Keep it"
            onComplete={() => void finish()}
            onCancel={() => setConfirming(false)}
          />
        </div>
      ) : null}
      {failed === null ? null : <p role="alert">{failed}</p>}
    </div>
  );
}
