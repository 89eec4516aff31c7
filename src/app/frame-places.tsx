import { useLocation } from 'react-router-dom';
import { PlacesBar, type Place } from '../components/places-bar';
import { paths } from '../config/paths';
import { useRigInHand } from './rig-in-hand';
import { useGo } from './use-go';

/** Places in order of use from the thumb outward. */
export function FramePlaces() {
  const { pathname } = useLocation();
  const rig = useRigInHand();
  const go = useGo();
  return (
    <PlacesBar
      label="Places"
      places={placesOf(rig?.id)}
      current={currentPlace(pathname)}
      switchLabel="open the places"
      onGo={(place) => go(place.href)}
    />
  );
}

function placesOf(rig: string | undefined): readonly Place[] {
  if (rig === undefined) {
    return [
      { key: 'bench', label: 'Bench', href: paths.bench() },
      { key: 'handover', label: 'Handover', href: paths.handover() },
    ];
  }
  return [
    { key: 'bench', label: 'Bench', href: paths.benchOf(rig) },
    { key: 'firings', label: 'Firings', href: paths.firings(rig) },
    { key: 'lookups', label: 'Lookups', href: paths.lookupsOf(rig) },
    { key: 'checks', label: 'Checks', href: paths.checks(rig) },
    { key: 'rigs', label: 'Rigs', href: paths.rigs() },
    { key: 'kit', label: 'Kit', href: paths.kit() },
  ];
}

/** Desk, Crew, Handover, Alignment, Notes and the settings have their place under Bench. */
const UNDER_BENCH: ReadonlySet<string> = new Set([
  'desk',
  'crew',
  'handover',
  'alignment',
  'notes',
  'settings',
  'sign-in',
]);

function currentPlace(pathname: string): string {
  const place = pathname.split('/')[1] ?? '';
  return UNDER_BENCH.has(place) ? 'bench' : place;
}
