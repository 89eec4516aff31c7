import { useEffect, useMemo, useState } from 'react';
import type { Stamp } from '../domain/book/stamp';
import { declaredView, type DeclaredView } from '../domain/rules/declared-view';
import { missingToFire, type Missing } from '../domain/rules/readiness';
import { useClient, useMaybeLab } from './client-context';
import { useBookState, useFiring, useLab, usePerson, useRig } from './use-book';
import { useSession } from './use-session';

export interface Now {
  readonly stamp: Stamp;
  /** Server time plus monotonic time since, else the wall clock. */
  readonly best_ms: number;
}

/** The time, read again every so often. */
export function useNow(every_ms = 1000): Now {
  const client = useClient();
  const [now, setNow] = useState(() => read(client.here()));
  useEffect(() => {
    let callOff = () => {};
    const tick = () => {
      setNow(read(client.here()));
      callOff = client.ports.timers.after(every_ms, tick);
    };
    callOff = client.ports.timers.after(every_ms, tick);
    return () => {
      callOff();
    };
  }, [client, every_ms]);
  return now;
}

/** What is missing before the person who is open may open a firing; empty is ready, undefined is no such rig. */
export function useReadiness(rig: string): readonly Missing[] | undefined {
  const doc = useRig(rig);
  const session = useSession();
  const person = usePerson(session.state === 'open' ? session.person.id : null);
  const lab = useLab();
  const { device, filling } = useBookState();
  const { stamp, best_ms } = useNow();
  return useMemo(
    () =>
      doc === undefined
        ? undefined
        : missingToFire({ rig: doc, person, lab, device, stamp, now_ms: best_ms, filling }),
    [doc, person, lab, device, stamp, best_ms, filling],
  );
}

/** What may be believed about the rig from here, now. */
export function useDeclared(rig: string): DeclaredView | undefined {
  const doc = useRig(rig);
  const firing = useFiring(doc?.open_firings.at(-1) ?? '');
  const device = useMaybeLab()?.device().id ?? '';
  const { stamp } = useNow();
  return useMemo(
    () => (doc === undefined ? undefined : declaredView(doc, firing?.opened ?? null, { device, now: stamp })),
    [doc, firing, device, stamp],
  );
}

function read(here: ReturnType<ReturnType<typeof useClient>['here']>): Now {
  return { stamp: here.stamp(), best_ms: here.bestMs() };
}
