import { Screen } from '../../components/frame';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { useLab } from '../../data/use-book';
import { useHandover } from '../../data/use-handover';
import { EntryList } from './entry-list';
import { HandoverStatus } from './handover-status';
import { HeldList } from './held-list';
import { TabletFacts } from './tablet-facts';
import './handover.css';

/** What waits, what came of it, and what this tablet keeps it in. */
export function HandoverRoute() {
  const handover = useHandover();
  const lab = useLab();
  const zone = lab?.settings.zone ?? 'Etc/UTC';
  const busy = handover.state === 'exchanging';
  return (
    <Screen
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label={busy ? 'Handing\nover' : 'Hand over\nnow'}
              disabled={busy}
              {...(busy ? { reason: 'An exchange with the server is running.' } : {})}
              onComplete={handover.exchange}
            />
          }
        />
      }
    >
      <div className="handover">
        <HandoverStatus handover={handover} zone={zone} />
        <HeldList zone={zone} />
        <EntryList zone={zone} />
        <TabletFacts />
      </div>
    </Screen>
  );
}
