import { useEffect, useRef } from 'react';
import { useLocation } from 'react-router-dom';
import { paths } from '../config/paths';
import { useResume } from '../data/use-resume';
import { useSession } from '../data/use-session';
import { useGo } from './use-go';

/** Remembers where the person is, and brings them back there once, when the app starts at its front door. */
export function PlaceKeeper() {
  const { place, route } = useResume();
  const { pathname } = useLocation();
  const session = useSession();
  const go = useGo();
  const cameBack = useRef(false);
  const open = session.state === 'open';
  useEffect(() => {
    if (!open) return;
    const atTheDoor = pathname === '/' || pathname === paths.bench();
    if (!cameBack.current && atTheDoor && place.route !== null && place.route !== pathname) {
      cameBack.current = true;
      go(place.route);
      return;
    }
    cameBack.current = true;
    route(pathname);
  }, [open, pathname, place.route, route, go]);
  return null;
}
