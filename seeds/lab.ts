import type { LabSettings } from '../src/domain/book/rig-spec';
import { namedId } from './named-id';

export const DEMO_LAB = { id: namedId('lab'), name: 'Thornwick Pulse Bench', zone: 'Europe/London' } as const;

export interface DemoTablet {
  readonly id: string;
  readonly letter: string;
  readonly name: string;
}

/** Two tablets of the month behind us. Their keys are thrown away at seeding, so nobody can write as them again. */
export const BENCH_TABLET: DemoTablet = {
  id: namedId('tablet/a'),
  letter: 'A',
  name: 'Bench tablet, Pulse Room',
};
export const DESK_TABLET: DemoTablet = { id: namedId('tablet/b'), letter: 'B', name: 'Window bench tablet' };
export const DEMO_TABLETS: readonly DemoTablet[] = [BENCH_TABLET, DESK_TABLET];

/** Every room and number is invented; extensions ring nobody outside a house that does not exist. */
export const DEMO_LAB_SETTINGS: LabSettings = {
  name: DEMO_LAB.name,
  zone: DEMO_LAB.zone,
  ambient_bar_abs: 0.966,
  ambient_C: 21,
  discharged_below_V: 50,
  working_alone: 'forbidden',
  emergency: {
    isolator:
      'Red rotary isolator, left of the inner door of the Pulse Room (T-14), shoulder height. It cuts all three benches. ' +
      'Capacitors stay charged after it: short with the stick before you touch anything or anybody on the rig.',
    ring: [
      { who: 'Thornwick site desk, day and night', number: 'ext. 5500' },
      { who: 'First aider on duty, Mill Corridor', number: 'ext. 5520' },
      { who: 'Inge Sorrel, lead', number: 'ext. 5514' },
      { who: 'Milo Venn, safety reviewer', number: 'ext. 5517' },
    ],
    first_aid:
      'Isolate and short first, then help. Not breathing: start resuscitation, send somebody for the defibrillator by ' +
      'the Mill Corridor stairs. After any shock see a doctor the same day, even when nothing hurts. Beam in the eye: ' +
      'no rubbing, cover it, eye clinic at once.',
  },
};
