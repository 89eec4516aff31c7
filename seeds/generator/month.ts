import { DESK_TABLET } from '../lab';
import { ADA, INGE, MILO } from '../people';
import type { DemoRig } from '../rigs/demo-rig';
import { HERON } from '../rigs/heron';
import { KETTLE } from '../rigs/kettle';
import { WREN } from '../rigs/wren';
import type { Bench } from './bench';
import {
  askForPermit,
  changeGas,
  correctShots,
  declareShorted,
  grantTooLate,
  handsInAndOut,
} from './bench-life';
import { alignHeron, copyRegister } from './kit-and-alignment';
import { fireRig, type FiringPlan } from './fire-rig';
import { answerIncident, reportFlashover, returnRig } from './incident';
import { bringInCrew, createRig, publishLaterSheets } from './people-and-sheets';
import { reviewFirings } from './review-firings';
import { grantPermit, reviseRig } from './revisions-and-permits';
import type { Weather } from './weather';
import type { WorkingDay } from './working-days';

/** Working days of the month; the plan below names them by their number, 0 to 21. */
export const MONTH_DAYS = 22;

/** What happens on a day, by local time as hours and minutes: 940 is twenty to ten. */
export type Appointment = readonly [day: number, time: number, act: (today: Weather) => void];

/** Firings that stay unreviewed, by the day and rig that they were fired on. */
const LAST_KETTLE_DAY = 21;
const LAST_HERON_DAY = 20;

/** The month as it went, in order. `waiting` is filled with the firings that are left for the demo's reviewer. */
export function planMonth(bench: Bench, lastDay: WorkingDay): readonly Appointment[] {
  const waiting = new Set<string>();
  let incident = '';
  const create = (rig: DemoRig) => () => createRig(bench, rig, lastDay);
  const permit = (rig: DemoRig) => () => grantPermit(bench, rig, lastDay);
  const revise = (rig: DemoRig) => () => reviseRig(bench, rig);
  const fire = (rig: DemoRig, readings: number, more: FiringDetails) => (weather: Weather) => {
    const firing = fireRig(bench, { rig, readings, weather, ...(rig === WREN ? AT_WINDOW : {}), ...more });
    if (more.waits === true) waiting.add(firing);
  };
  const review = () => () => reviewFirings(bench, waiting);

  return [
    [0, 830, () => bringInCrew(bench)],
    [0, 900, create(KETTLE)],
    [0, 930, create(HERON)],
    [0, 1100, permit(KETTLE)],
    [0, 1400, fire(KETTLE, 12, { arcs: 0.2, summary: 'First light of this build.' })],
    [0, 1630, revise(KETTLE)],
    [1, 900, permit(KETTLE)],
    [1, 910, permit(HERON)],
    [1, 930, create(WREN)],
    [1, 1100, fire(HERON, 10, { summary: 'Swept from 0.2 to 0.6 bar(g).' })],
    [1, 1340, permit(WREN)],
    [1, 1400, fire(WREN, 9, { arcs: 0.3, summary: 'Lights at the A end first.' })],
    [1, 1700, review()],
    [2, 1000, fire(KETTLE, 14, { arcs: 0.2, summary: 'Same sweep as on the first day.' })],
    [2, 1630, revise(KETTLE)],
    [3, 900, permit(KETTLE)],
    [3, 1000, fire(HERON, 12, { summary: 'A second sweep; steady.' })],
    [3, 1530, () => handsInAndOut(bench, KETTLE, { where: 'Channel, A end', minutes: 35 })],
    [3, 1700, review()],
    [4, 1400, fire(KETTLE, 16, { arcs: 0.1, summary: 'A end opened by an eighth of a turn: more even.' })],
    [5, 930, fire(KETTLE, 11, { summary: 'Short sweep before the rebuild.' })],
    [5, 1400, fire(WREN, 8, { arcs: 0.3, summary: '' })],
    [5, 1700, review()],
    [6, 930, () => handsInAndOut(bench, KETTLE, { where: 'Peaking bank', minutes: 50 })],
    [6, 1030, revise(KETTLE)],
    [6, 1130, permit(KETTLE)],
    [
      6,
      1400,
      fire(HERON, 10, {
        flashover: 9,
        summary: 'Stopped by a flashover at the edge of C1; see the incident.',
        beforeClosing: () => {
          incident = reportFlashover(bench, HERON);
        },
      }),
    ],
    [6, 1640, () => answerIncident(bench, incident)],
    [7, 1000, fire(KETTLE, 18, { summary: 'New peaking bank: more light at the same voltage.' })],
    [7, 1500, revise(HERON)],
    [7, 1700, review()],
    [8, 900, () => returnRig(bench, HERON, incident)],
    [8, 920, permit(HERON)],
    [8, 1000, fire(HERON, 14, { summary: 'First firing on four plies.' })],
    [8, 1400, revise(KETTLE)],
    [8, 1630, permit(KETTLE)],
    [
      9,
      1000,
      fire(KETTLE, 15, {
        summary: 'Relief valve quiet throughout.',
        beforeClosing: (one) => correctShots(bench, one),
      }),
    ],
    [9, 1400, fire(WREN, 12, { arcs: 0.2, summary: '' })],
    [9, 1700, review()],
    [10, 930, () => grantTooLate(bench, KETTLE)],
    [10, 1130, permit(KETTLE)],
    [10, 1400, fire(HERON, 16, { summary: 'Long sweep; no tracking on the edges afterwards.' })],
    [11, 1000, fire(KETTLE, 13, { by: MILO.id, second: ADA.id, summary: 'First time up to 1.2 bar(g).' })],
    [11, 1400, revise(WREN)],
    [11, 1700, review()],
    [12, 900, permit(WREN)],
    [12, 1000, fire(WREN, 10, { summary: 'Both ends light now.' })],
    [12, 1330, () => changeGas(bench, KETTLE, 'New nitrogen cylinder, lines purged with five volumes.')],
    [12, 1400, fire(KETTLE, 20, { summary: 'New cylinder: no change in the curve.' })],
    [12, 1700, review()],
    [13, 1000, fire(HERON, 12, { summary: '' })],
    [13, 1500, revise(KETTLE)],
    [13, 1630, permit(KETTLE)],
    [14, 1000, fire(KETTLE, 17, { summary: 'Curve taken again on the final settings.' })],
    [14, 1700, review()],
    [15, 900, () => handsInAndOut(bench, HERON, { where: 'Across the channel', minutes: 25 })],
    [15, 930, revise(HERON)],
    [15, 1100, permit(HERON)],
    [15, 1400, fire(HERON, 15, { summary: 'Rests at zero before each shot now.' })],
    [15, 1630, revise(WREN)],
    [16, 1000, fire(HERON, 20, { summary: 'Endurance: twenty readings without a misfire.' })],
    [
      16,
      1400,
      fire(WREN, 8, {
        summary: 'Stopped when Milo asked for the permit.',
        unready: 'I took the permit of revision 2A for this one and had fired before I saw it.',
      }),
    ],
    [16, 1630, permit(WREN)],
    [16, 1700, review()],
    [17, 1000, fire(KETTLE, 22, { summary: 'Long sweep for the calibration.' })],
    [17, 1400, fire(WREN, 11, { summary: 'Under its own permit this time.' })],
    [17, 1700, review()],
    [18, 1000, fire(HERON, 13, { summary: '' })],
    [18, 1700, review()],
    [19, 1000, fire(KETTLE, 16, { summary: 'Dye cell in the beam from reading 5 on.' })],
    [19, 1400, fire(WREN, 9, { summary: '' })],
    [19, 1700, review()],
    [
      LAST_HERON_DAY,
      1000,
      fire(HERON, 17, {
        waits: true,
        beyond: { at: 9, bar_g: 0.62 },
        summary: 'Gauge crept past 0.6 once; turned back.',
      }),
    ],
    [20, 1330, revise(WREN)],
    [
      20,
      1500,
      () => askForPermit(bench, HERON, 'Up to 0.8 bar(g) for the pressure sweep of next week, please.'),
    ],
    [
      LAST_KETTLE_DAY,
      1000,
      fire(KETTLE, 19, { waits: true, early: 11, summary: 'One early break at reading 12.' }),
    ],
    [21, 1640, () => declareShorted(bench, KETTLE)],
    // At the end of the plan: an entry before would shift every die roll behind it.
    [21, 1700, () => alignHeron(bench)],
    [21, 1730, () => copyRegister(bench, lastDay)],
    [21, 1745, () => publishLaterSheets(bench)],
  ];
}

type FiringDetails = Omit<FiringPlan, 'rig' | 'readings' | 'weather'> & { readonly waits?: boolean };

/** Wren stands at the window, with Inge's desk beside it. */
const AT_WINDOW = { tablet: DESK_TABLET, second: INGE.id };
