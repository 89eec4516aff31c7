import { Suspense, useCallback, useState } from 'react';
import { Navigate, Route, Routes, useLocation } from 'react-router-dom';
import { Screen, FrameProvider } from '../components/frame';
import { EmergencyTooth } from '../components/emergency-tooth';
import { SaysBlock } from '../components/says-block';
import { paths, patterns } from '../config/paths';
import { DisplayProvider } from '../data/use-display';
import { useResume } from '../data/use-resume';
import { useSession } from '../data/use-session';
import { UnlockScreen } from '../features/account/unlock-screen';
import { AreaBoundary } from './area-boundary';
import { FramePlaces } from './frame-places';
import { FrameStrip } from './frame-strip';
import { NoiseProvider } from './noise-watch';
import { isFrontDoor, PlaceKeeper } from './place-keeper';
import { useRigInHand } from './rig-in-hand';
import { ROUTES, type AppRoute } from './routes';
import { useGo } from './use-go';
import './shell.css';

/** The frame round every screen, and who may see which while the tablet is locked. */
export function Shell() {
  const { pathname } = useLocation();
  const go = useGo();
  const [cameBack, setCameBack] = useState(false);
  const cameToPlace = useCallback(() => setCameBack(true), []);
  const atDesk = pathname.startsWith(paths.desk());
  return (
    <DisplayProvider place={atDesk ? 'desk' : 'bench'}>
      <NoiseProvider>
        <PlaceKeeper onPlace={cameToPlace} />
        <FrameProvider
          strip={<FrameStrip />}
          tooth={
            <EmergencyTooth
              label="Emergency"
              href={paths.emergency()}
              onPress={() => go(paths.emergency())}
            />
          }
          places={<FramePlaces />}
        >
          <Routes>
            {ROUTES.map((route) => (
              <Route key={route.path} path={route.path} element={<Guarded route={route} />} />
            ))}
            <Route path={patterns.bench} element={<FrontDoor cameBack={cameBack} />} />
            <Route
              path={patterns.lookups}
              element={<ToRig to={paths.lookupsOf} otherwise={paths.lookupsOf('none')} />}
            />
            <Route path="/" element={<Navigate to={paths.bench()} replace />} />
            <Route path="*" element={<Nowhere />} />
          </Routes>
        </FrameProvider>
      </NoiseProvider>
    </DisplayProvider>
  );
}

function Guarded({ route }: { readonly route: AppRoute }) {
  const session = useSession();
  if (session.state === 'no-lab' && route.path !== patterns.signIn)
    return <Navigate to={paths.signIn()} replace />;
  const { screen: RouteScreen, area } = route;
  if (session.state === 'locked' && route.open !== true) return <UnlockScreen people={session.people} />;
  return (
    <AreaBoundary key={route.path} area={area}>
      <Suspense fallback={<Screen>{null}</Screen>}>
        <RouteScreen />
      </Suspense>
    </AreaBoundary>
  );
}

/** After a kill the app comes back to the same place; later the front door is just the Bench. */
function FrontDoor({ cameBack }: { readonly cameBack: boolean }) {
  const session = useSession();
  const { place } = useResume();
  if (session.state === 'open' && !cameBack && place.route !== null && !isFrontDoor(place.route)) {
    return <Navigate to={place.route} replace />;
  }
  return <ToRig to={paths.benchOf} />;
}

/** A place without a rig in its path goes to the rig in hand. */
function ToRig({
  to,
  otherwise,
}: {
  readonly to: (rig: string) => string;
  /** Where to go while the Book holds no rig. */
  readonly otherwise?: string;
}) {
  const session = useSession();
  const rig = useRigInHand();
  if (session.state === 'no-lab') return <Navigate to={paths.signIn()} replace />;
  if (session.state === 'locked') return <UnlockScreen people={session.people} />;
  if (rig !== undefined) return <Navigate to={to(rig.id)} replace />;
  if (otherwise !== undefined) return <Navigate to={otherwise} replace />;
  return (
    <Screen>
      <SaysBlock lead="The Book of this tablet is still empty.">
        It fills as soon as the server answers. Until then no rig can be shown.
      </SaysBlock>
    </Screen>
  );
}

function Nowhere() {
  return (
    <Screen>
      <SaysBlock lead="There is no such page.">Choose a place below.</SaysBlock>
    </Screen>
  );
}
