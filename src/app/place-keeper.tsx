import { useEffect } from 'react';
import { useLocation } from 'react-router-dom';
import { paths } from '../config/paths';
import { useResume } from '../data/use-resume';
import { useSession } from '../data/use-session';

/** Remembers where the person is. `onPlace` is told once somebody has come to a place of their own. */
export function PlaceKeeper({ onPlace }: { readonly onPlace: () => void }) {
  const { route } = useResume();
  const { pathname } = useLocation();
  const session = useSession();
  const open = session.state === 'open';
  useEffect(() => {
    if (!open || isFrontDoor(pathname)) return;
    route(pathname);
    onPlace();
  }, [open, pathname, route, onPlace]);
  return null;
}

/** Where the app starts: it leads back to the last place, or to the rig in hand. */
export function isFrontDoor(pathname: string): boolean {
  return pathname === '/' || pathname === paths.bench();
}
