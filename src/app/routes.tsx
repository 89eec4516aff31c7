import { lazy } from 'react';
import { patterns } from '../config/paths';
import { BenchRoute } from '../features/bench/bench-route';

const SignInRoute = lazy(() =>
  import('../features/account/sign-in-route').then((m) => ({ default: m.SignInRoute })),
);
const SettingsRoute = lazy(() =>
  import('../features/account/settings-route').then((m) => ({ default: m.SettingsRoute })),
);
const BenchFaceRoute = lazy(() =>
  import('../features/bench/bench-face-route').then((m) => ({ default: m.BenchFaceRoute })),
);
const PeopleRoute = lazy(() =>
  import('../features/bench/people-route').then((m) => ({ default: m.PeopleRoute })),
);
const DueRoute = lazy(() => import('../features/bench/due-route').then((m) => ({ default: m.DueRoute })));
const LookupsRoute = lazy(() =>
  import('../features/lookups/lookups-route').then((m) => ({ default: m.LookupsRoute })),
);
const LookupRoute = lazy(() =>
  import('../features/lookups/lookup-route').then((m) => ({ default: m.LookupRoute })),
);
const ChecksRoute = lazy(() =>
  import('../features/checks/checks-route').then((m) => ({ default: m.ChecksRoute })),
);
const CheckRoute = lazy(() =>
  import('../features/checks/check-route').then((m) => ({ default: m.CheckRoute })),
);
const SheetsRoute = lazy(() =>
  import('../features/checks/sheets/sheets-route').then((m) => ({ default: m.SheetsRoute })),
);
const SheetRoute = lazy(() =>
  import('../features/checks/sheets/sheet-route').then((m) => ({ default: m.SheetRoute })),
);
const NewSheetRoute = lazy(() =>
  import('../features/checks/sheets/new-sheet-route').then((m) => ({ default: m.NewSheetRoute })),
);
const ChangeSheetRoute = lazy(() =>
  import('../features/checks/sheets/change-sheet-route').then((m) => ({ default: m.ChangeSheetRoute })),
);
const FiringsRoute = lazy(() =>
  import('../features/firings/firings-route').then((m) => ({ default: m.FiringsRoute })),
);
const OpenFiringRoute = lazy(() =>
  import('../features/firings/open-firing-route').then((m) => ({ default: m.OpenFiringRoute })),
);
const FiringRoute = lazy(() =>
  import('../features/firings/firing-route').then((m) => ({ default: m.FiringRoute })),
);
const NotesRoute = lazy(() =>
  import('../features/notes/notes-route').then((m) => ({ default: m.NotesRoute })),
);
const AboutNotesRoute = lazy(() =>
  import('../features/notes/about-notes-route').then((m) => ({ default: m.AboutNotesRoute })),
);
const TracesRoute = lazy(() =>
  import('../features/traces/traces-route').then((m) => ({ default: m.TracesRoute })),
);
const CalibrationRoute = lazy(() =>
  import('../features/firings/calibration-route').then((m) => ({ default: m.CalibrationRoute })),
);
const CompareRoute = lazy(() =>
  import('../features/firings/compare-route').then((m) => ({ default: m.CompareRoute })),
);
const RigsRoute = lazy(() => import('../features/rigs/rigs-route').then((m) => ({ default: m.RigsRoute })));
const RigRoute = lazy(() => import('../features/rigs/rig-route').then((m) => ({ default: m.RigRoute })));
const ReviseRigRoute = lazy(() =>
  import('../features/rigs/revise-rig-route').then((m) => ({ default: m.ReviseRigRoute })),
);
const NewRigRoute = lazy(() =>
  import('../features/rigs/new-rig-route').then((m) => ({ default: m.NewRigRoute })),
);
const RigPartsRoute = lazy(() =>
  import('../features/rigs/parts/rig-parts-route').then((m) => ({ default: m.RigPartsRoute })),
);
const AlignmentRoute = lazy(() =>
  import('../features/alignment/alignment-route').then((m) => ({ default: m.AlignmentRoute })),
);
const KitRoute = lazy(() => import('../features/kit/kit-route').then((m) => ({ default: m.KitRoute })));
const KitAddRoute = lazy(() =>
  import('../features/kit/kit-add-route').then((m) => ({ default: m.KitAddRoute })),
);
const KitPieceRoute = lazy(() =>
  import('../features/kit/kit-piece-route').then((m) => ({ default: m.KitPieceRoute })),
);
const HandoverRoute = lazy(() =>
  import('../features/handover/handover-route').then((m) => ({ default: m.HandoverRoute })),
);
const CrewRoute = lazy(() => import('../features/crew/crew-route').then((m) => ({ default: m.CrewRoute })));
const DeskRoute = lazy(() => import('../features/desk/desk-route').then((m) => ({ default: m.DeskRoute })));
const DeskFiringRoute = lazy(() =>
  import('../features/desk/desk-firing-route').then((m) => ({ default: m.DeskFiringRoute })),
);
const DeskRigRoute = lazy(() =>
  import('../features/desk/desk-rig-route').then((m) => ({ default: m.DeskRigRoute })),
);
const DeskHeldRoute = lazy(() =>
  import('../features/desk/desk-held-route').then((m) => ({ default: m.DeskHeldRoute })),
);
const EmergencyRoute = lazy(() =>
  import('../features/emergency/emergency-route').then((m) => ({ default: m.EmergencyRoute })),
);
const ClaimsRoute = lazy(() =>
  import('../features/emergency/claims-route').then((m) => ({ default: m.ClaimsRoute })),
);

export interface AppRoute {
  readonly path: string;
  readonly screen: React.ComponentType;
  /** Named when the area fails. */
  readonly area: string;
  /** Opens while the tablet is locked. */
  readonly open?: true;
}

export const ROUTES: readonly AppRoute[] = [
  { path: patterns.benchOf, screen: BenchRoute, area: 'Bench' },
  { path: patterns.face, screen: BenchFaceRoute, area: 'Bench' },
  { path: patterns.people, screen: PeopleRoute, area: 'Bench' },
  { path: patterns.due, screen: DueRoute, area: 'Bench' },
  { path: patterns.lookupsOf, screen: LookupsRoute, area: 'Lookups' },
  { path: patterns.lookup, screen: LookupRoute, area: 'Lookups' },
  { path: patterns.lookupWithoutRig, screen: LookupRoute, area: 'Lookups' },
  // Making safe may be walked before any PIN; the screens themselves refuse the others.
  { path: patterns.checks, screen: ChecksRoute, area: 'Checks', open: true },
  { path: patterns.check, screen: CheckRoute, area: 'Checks', open: true },
  { path: patterns.sheets, screen: SheetsRoute, area: 'Checks' },
  { path: patterns.newSheet, screen: NewSheetRoute, area: 'Checks' },
  { path: patterns.sheet, screen: SheetRoute, area: 'Checks' },
  { path: patterns.changeSheet, screen: ChangeSheetRoute, area: 'Checks' },
  { path: patterns.openFiring, screen: OpenFiringRoute, area: 'Firings' },
  { path: patterns.firings, screen: FiringsRoute, area: 'Firings' },
  { path: patterns.calibration, screen: CalibrationRoute, area: 'Firings' },
  { path: patterns.compareFirings, screen: CompareRoute, area: 'Firings' },
  { path: patterns.firing, screen: FiringRoute, area: 'Firings' },
  { path: patterns.notes, screen: NotesRoute, area: 'Notes' },
  { path: patterns.notesOf, screen: AboutNotesRoute, area: 'Notes' },
  { path: patterns.traces, screen: TracesRoute, area: 'Firings' },
  { path: patterns.rigs, screen: RigsRoute, area: 'Rigs' },
  { path: patterns.newRig, screen: NewRigRoute, area: 'Rigs' },
  { path: patterns.rigParts, screen: RigPartsRoute, area: 'Rigs' },
  { path: patterns.reviseRig, screen: ReviseRigRoute, area: 'Rigs' },
  { path: patterns.rig, screen: RigRoute, area: 'Rigs' },
  { path: patterns.alignment, screen: AlignmentRoute, area: 'Alignment' },
  { path: patterns.kit, screen: KitRoute, area: 'Kit' },
  { path: patterns.kitAdd, screen: KitAddRoute, area: 'Kit' },
  { path: patterns.kitPiece, screen: KitPieceRoute, area: 'Kit' },
  { path: patterns.desk, screen: DeskRoute, area: 'Desk' },
  { path: patterns.deskFiring, screen: DeskFiringRoute, area: 'Desk' },
  { path: patterns.deskRig, screen: DeskRigRoute, area: 'Desk' },
  { path: patterns.deskHeld, screen: DeskHeldRoute, area: 'Desk' },
  { path: patterns.crew, screen: CrewRoute, area: 'Crew' },
  { path: patterns.handover, screen: HandoverRoute, area: 'Handover' },
  { path: patterns.settings, screen: SettingsRoute, area: 'Settings' },
  { path: patterns.emergency, screen: EmergencyRoute, area: 'Emergency', open: true },
  { path: patterns.claims, screen: ClaimsRoute, area: 'Emergency' },
  { path: patterns.signIn, screen: SignInRoute, area: 'Sign-in', open: true },
];
