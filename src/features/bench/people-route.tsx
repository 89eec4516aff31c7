import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { Caution } from '../../components/caution';
import { Screen } from '../../components/frame';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { WordsField } from '../../components/words-field';
import { useBookState, useLab, useRig } from '../../data/use-book';
import { useNames } from '../../data/use-names';
import { useDeclared, useNow } from '../../data/use-now';
import { useSession } from '../../data/use-session';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { GuestForm } from './guest-form';
import { GuestList } from './guest-list';
import { HandsList } from './hands-list';
import { tagEffect } from './tag-effect';
import { usePeopleActs, type PeopleActs } from './use-people-acts';
import './bench.css';

/** Whose hands are in, and who else is there. */
export function PeopleRoute() {
  const { rig: id = '' } = useParams();
  const rig = useRig(id);
  const view = useDeclared(id);
  if (rig === undefined || view === undefined) {
    return (
      <Screen>
        <div className="bench-page">
          <SaysBlock lead="This rig is not in the tablet’s Book.">It may still be filling.</SaysBlock>
        </div>
      </Screen>
    );
  }
  return <People rig={rig} view={view} />;
}

function People({ rig, view }: { readonly rig: RigDoc; readonly view: DeclaredView }) {
  const acts = usePeopleActs(rig);
  const session = useSession();
  const me = session.state === 'open' ? session.person.id : null;
  const [briefing, setBriefing] = useState(acts.guest.restored);
  return (
    <Screen
      thumbs={
        briefing ? (
          <GuestThumbs acts={acts} onDone={() => setBriefing(false)} />
        ) : (
          <HandsThumbs acts={acts} onGuest={() => setBriefing(true)} />
        )
      }
    >
      <div className="bench-page">
        {briefing ? (
          <GuestForm acts={acts} me={me} />
        ) : (
          <AtTheRig rig={rig} view={view} acts={acts} me={me} />
        )}
      </div>
    </Screen>
  );
}

interface AtTheRigProps {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
  readonly acts: PeopleActs;
  readonly me: string | null;
}

function AtTheRig({ rig, view, acts, me }: AtTheRigProps) {
  const zone = useLab()?.settings.zone ?? 'Etc/UTC';
  const nameOf = useNames();
  const { device } = useBookState();
  const { stamp } = useNow(10_000);
  const effect = tagEffect(rig, view, { device, now: stamp });
  return (
    <>
      <h1>At {rig.name}</h1>
      {effect.caution === null ? null : <Caution>{effect.caution}</Caution>}
      <HandsList rig={rig} acts={acts} me={me} nameOf={nameOf} zone={zone} now={stamp} />
      <WordsField
        label="Where your hands go"
        hint="may be left out"
        rows={1}
        maxLength={200}
        value={acts.where.value}
        onChange={acts.where.set}
      />
      <p className="muted">{effect.words}</p>
      <GuestList rig={rig} acts={acts} nameOf={nameOf} now={stamp} />
    </>
  );
}

function HandsThumbs({ acts, onGuest }: { readonly acts: PeopleActs; readonly onGuest: () => void }) {
  return (
    <ThumbZone
      label="Actions"
      main={
        <ThumbDome
          size="big"
          critical
          hold="second"
          label={'Hands\nin'}
          holdLabel="Hold: hands in"
          onComplete={acts.handsIn}
        />
      }
      others={[<ThumbDome key="guest" label="Check a guest in" onComplete={onGuest} />]}
    />
  );
}

function GuestThumbs({ acts, onDone }: { readonly acts: PeopleActs; readonly onDone: () => void }) {
  return (
    <ThumbZone
      label="Actions"
      main={
        <ThumbDome
          size="big"
          hold="half-second"
          label={'Hold to\ncheck in'}
          holdLabel="Hold: check the guest in"
          onComplete={async () => {
            const outcome = await acts.guestIn();
            if (outcome.type === 'settled') onDone();
            return outcome;
          }}
        />
      }
      others={[<ThumbDome key="back" label="Back, keep the draft" onComplete={onDone} />]}
    />
  );
}
