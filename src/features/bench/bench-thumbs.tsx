import { useNavigate } from 'react-router-dom';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { paths } from '../../config/paths';
import { useNow } from '../../data/use-now';
import { useSession } from '../../data/use-session';
import { useBookState, useSheets } from '../../data/use-book';
import { useAppend, type AppendOutcome } from '../../data/use-append';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import type { DeclaredView } from '../../domain/rules/declared-view';
import { sheetFits } from '../../domain/rules/sheet-fits';
import { checkLapse } from '../../domain/rules/check-validity';
import { isRetractable } from '../../domain/rules/judge-rigs';
import type { DueNext } from './due-next';
import { useDueNext } from './use-due-next';

interface Props {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
}

const LABELS: Readonly<Record<DueNext['type'], string>> = {
  'go-on-firing': 'Back to\nfiring',
  'go-on-check': 'Go on\nwith check',
  'open-firing': 'Open\nfiring',
  'open-check': 'Open\ncheck',
};

export function BenchThumbs({ rig, view }: Props) {
  const due = useDueNext(rig, view);
  const go = useGo(rig);
  const label = due.type === 'open-check' && due.purpose === 'make-safe' ? 'Make\nsafe' : LABELS[due.type];
  return (
    <div className="bench-thumbs">
      <ThumbZone
        label="Actions"
        main={<ThumbDome size="big" label={label} onComplete={() => go(due)} />}
        others={[<HandsDome key="hands" rig={rig} />, <StandDownDome key="down" rig={rig} />]}
      />
    </div>
  );
}

/** On a phone these two stand in the figure: over it they would cover a third of the screen. */
export function BenchActsInFigure({ rig }: { readonly rig: RigDoc }) {
  return (
    <div className="bench-acts">
      <HandsDome rig={rig} />
      <StandDownDome rig={rig} />
    </div>
  );
}

/** Opening a check writes an entry only when one sheet fits; with several the person chooses on the Checks screen. */
function useGo(rig: RigDoc) {
  const navigate = useNavigate();
  const append = useAppend();
  const sheets = useSheets();
  return async (due: DueNext) => {
    if (due.type === 'go-on-firing') return void navigate(paths.firing(due.firing));
    if (due.type === 'go-on-check') return void navigate(paths.check(due.check));
    if (due.type === 'open-firing') return void navigate(paths.openFiring(rig.id));
    const revision = latestRevision(rig);
    const fitting = sheets.filter(({ spec }) => spec.purpose === due.purpose && sheetFits(spec, rig));
    const [only] = fitting;
    if (only === undefined || fitting.length > 1) return void navigate(paths.checks(rig.id));
    const outcome = await append({
      kind: 'check.opened',
      body: { rig: rig.id, rig_revision: revision.entry, sheet: only.id },
    });
    if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words } as const;
    void navigate(paths.check(outcome.entry.id));
    return { type: 'settled' } as const;
  };
}

function HandsDome({ rig }: { readonly rig: RigDoc }) {
  const append = useAppend();
  const session = useSession();
  const me = session.state === 'open' ? session.person.id : null;
  const mine = rig.hands.findLast((tag) => tag.by === me);
  const { device } = useBookState();
  const { stamp } = useNow(10_000);
  const counts = rig.ready_check !== null && checkLapse(rig, device, stamp) === null;
  if (mine === undefined) {
    return (
      <ThumbDome
        critical
        hold="second"
        label="Hands in"
        holdLabel={counts ? 'Hold: hands in, voids the check' : 'Hold: hands in'}
        onComplete={async () =>
          settle(await append({ kind: 'hands.in', subject: rig.id, body: { where: '' } }))
        }
      />
    );
  }
  return (
    <ThumbDome
      critical
      hold="second"
      label="Hands out"
      holdLabel="Hold: hands out"
      onComplete={async () =>
        settle(await append({ kind: 'hands.out', subject: rig.id, body: { tag: mine.entry } }))
      }
    />
  );
}

function StandDownDome({ rig }: { readonly rig: RigDoc }) {
  const append = useAppend();
  const session = useSession();
  const { stamp } = useNow();
  const me = session.state === 'open' ? session.person.id : null;
  const own = rig.stand_downs.findLast((down) => isRetractable(down, me, stamp));
  if (own !== undefined) {
    const body = { stand_down: own.entry, incident: null };
    return (
      <ThumbDome
        critical
        hold="second"
        label="Retract stand-down"
        holdLabel="Hold: retract the stand-down"
        onComplete={async () =>
          settle(await append({ kind: 'rig.stand-down-retracted', subject: rig.id, body }))
        }
      />
    );
  }
  return (
    <ThumbDome
      critical
      hold="second"
      label="Stand rig down"
      holdLabel={`Hold: stand ${rig.name} down`}
      onComplete={async () =>
        settle(
          await append({ kind: 'rig.stood-down', subject: rig.id, body: { why: 'Stood down at the bench' } }),
        )
      }
    />
  );
}

function settle(outcome: AppendOutcome) {
  return outcome.type === 'logged'
    ? ({ type: 'settled' } as const)
    : ({ type: 'failed', words: outcome.words } as const);
}
