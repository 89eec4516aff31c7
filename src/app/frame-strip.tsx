import { useLocation } from 'react-router-dom';
import { StateStrip } from '../components/state-strip';
import { paths } from '../config/paths';
import { useAuthor } from '../data/use-author';
import { useFirings, useHeldBack, useLab, usePending } from '../data/use-book';
import { useDeclared } from '../data/use-now';
import { useSession } from '../data/use-session';
import type { RigDoc } from '../domain/book/documents/rig';
import { ageWords, agoWords, clockWords } from '../domain/report/time-words';
import type { DeclaredView } from '../domain/rules/declared-view';
import { stripState } from '../features/bench/strip-state';
import { useNoiseWords } from './noise-watch';
import { useRigInHand } from './rig-in-hand';
import { useGo } from './use-go';

const HOUR_MS = 3_600_000;

/** The upper electrode of every screen: rig, declared state with its age, who holds the tablet, what waits. */
export function FrameStrip() {
  const rig = useRigInHand();
  const session = useSession();
  const view = useDeclared(rig?.id ?? '');
  const person = session.state === 'open' ? session.person.name : undefined;
  const count = useCountWords();
  const notice = useNoiseWords();
  const extra = {
    ...(person === undefined ? {} : { person }),
    ...(count === undefined ? {} : { count }),
    ...(notice === null ? {} : { notice }),
  };
  if (rig === undefined || view === undefined) {
    return (
      <StateStrip
        mark="dashed"
        ground="dash"
        title="Holdoff"
        state={session.state === 'no-lab' ? 'not signed in' : 'the Book is filling'}
        {...extra}
      />
    );
  }
  return <RigStrip rig={rig} view={view} extra={extra} />;
}

interface RigStripProps {
  readonly rig: RigDoc;
  readonly view: DeclaredView;
  readonly extra: { readonly person?: string; readonly count?: string; readonly notice?: string };
}

function RigStrip({ rig, view, extra }: RigStripProps) {
  const go = useGo();
  const { pathname } = useLocation();
  const drawn = stripState(view);
  const detail = useDetail(rig, view);
  const face = paths.face(rig.id);
  const known = view.state !== 'not-known';
  return (
    <StateStrip
      mark={drawn.mark}
      ground={drawn.ground}
      hatched={drawn.hatched}
      title={rig.name}
      state={drawn.words}
      shortState={drawn.short}
      {...(detail === undefined ? {} : { detail })}
      {...(known && view.age_ms !== null ? { age_h: view.age_ms / HOUR_MS } : {})}
      {...extra}
      onPress={() => go(pathname === face ? paths.benchOf(rig.id) : face)}
      pressLabel="show the bench face"
    />
  );
}

function useDetail(rig: RigDoc, view: DeclaredView): string | undefined {
  const by = useAuthor(rig, view.trace);
  const down = useAuthor(rig, view.stood_down[0] ?? null);
  const lab = useLab();
  const firings = useFirings(rig.id);
  const zone = lab?.settings.zone ?? 'Etc/UTC';
  if (view.stood_down.length > 0) return `by ${down}`;
  if (view.state === 'not-known') {
    const when = view.trace === null ? '' : `, ${clockWords(view.trace.stamp.wall_ms, zone)}`;
    return `${view.why ?? ''}${view.why === 'tablet restarted' ? '' : when}`;
  }
  if (view.age_ms === null) return by === '' ? undefined : by;
  if (view.state === 'firing') {
    const open = firings.find((firing) => rig.open_firings.includes(firing.id));
    return `${open?.number ?? ''} open ${ageWords(view.age_ms)}`;
  }
  return `${agoWords(view.age_ms)}, ${by}`;
}

function useCountWords(): string | undefined {
  const pending = usePending();
  const held = useHeldBack().filter((one) => one.mine).length;
  const words = [
    pending.count > 0 ? `${pending.count} to hand over` : '',
    held > 0 ? `${held} held back` : '',
  ].filter((word) => word !== '');
  return words.length === 0 ? undefined : words.join(', ');
}
