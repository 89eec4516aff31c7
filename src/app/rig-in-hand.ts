import { useEffect, useState } from 'react';
import { useLocation } from 'react-router-dom';
import { RIG_IN_HAND_KEY } from '../config/rig-in-hand';
import { useCheck, useFiring, useRigs } from '../data/use-book';
import type { RigDoc } from '../domain/book/documents/rig';

const ID = /[0-9a-f]{8}-[0-9a-f-]{27}/;

/** The rig that the path is about, else the one that was in hand last, else the first of the lab. */
export function useRigInHand(): RigDoc | undefined {
  const rigs = useRigs();
  const { pathname } = useLocation();
  const id = ID.exec(pathname)?.[0] ?? '';
  const firing = useFiring(id);
  const check = useCheck(id);
  const [last, setLast] = useState(() => window.localStorage.getItem(RIG_IN_HAND_KEY));
  const named = rigs.find((rig) => rig.id === id || rig.id === firing?.parent || rig.id === check?.parent);
  const inHand = named ?? rigs.find((rig) => rig.id === last) ?? rigs[0];
  useEffect(() => {
    if (named === undefined || named.id === last) return;
    window.localStorage.setItem(RIG_IN_HAND_KEY, named.id);
    setLast(named.id);
  }, [named, last]);
  return inHand;
}
