import { useEffect, useState } from 'react';
import { useLocation } from 'react-router-dom';
import { useCheck, useFiring, useRigs } from '../data/use-book';
import { useResume } from '../data/use-resume';
import type { RigDoc } from '../domain/book/documents/rig';

const KEY = 'holdoff.rig-in-hand';
const ID = /[0-9a-f]{8}-[0-9a-f-]{27}/;

/** The rig that the path is about, else the one that was in hand last, else the first of the lab. */
export function useRigInHand(): RigDoc | undefined {
  const rigs = useRigs();
  const { pathname } = useLocation();
  // The strict store outlives a kill; what the browser keeps beside it may be seconds old.
  const { place } = useResume();
  const named = useRigOf(pathname);
  const atStart = useRigOf(place.route ?? '');
  const [last, setLast] = useState<string | null>(null);
  const before = last ?? atStart?.id ?? window.localStorage.getItem(KEY);
  useEffect(() => {
    if (named === undefined || named.id === last) return;
    window.localStorage.setItem(KEY, named.id);
    setLast(named.id);
  }, [named, last]);
  return named ?? rigs.find((rig) => rig.id === before) ?? rigs[0];
}

/** The rig of a path that names a rig, a firing or a check. */
function useRigOf(path: string): RigDoc | undefined {
  const rigs = useRigs();
  const id = ID.exec(path)?.[0] ?? '';
  const firing = useFiring(id);
  const check = useCheck(id);
  return rigs.find((rig) => rig.id === id || rig.id === firing?.parent || rig.id === check?.parent);
}
