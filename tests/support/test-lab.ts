import { randomUUID } from 'node:crypto';
import type { Role } from '../../src/domain/book/bodies/people-bodies';
import type { ReadingValues } from '../../src/domain/book/bodies/firing-bodies';
import type { LabSettings, RigSpec } from '../../src/domain/book/rig-spec';
import type { SheetSpec } from '../../src/domain/book/sheet-spec';
import type { TestServer } from './test-server';
import { TestTablet } from './test-tablet';

export const TEST_PASSWORD = 'a long enough word 17';

export const testSettings: LabSettings = {
  name: 'Test bench',
  zone: 'Europe/Vienna',
  ambient_bar_abs: 0.966,
  ambient_C: 21,
  discharged_below_V: 50,
  working_alone: 'allowed',
  emergency: { isolator: 'By the door', ring: [], first_aid: 'Short first' },
};

export const testSpec: RigSpec = {
  topology: 'charge-transfer',
  gap: {
    gas: 'N2',
    electrodes: 'domed',
    radius_mm: 12,
    radius_known: 'measured',
    gap_mm: 3,
    gap_error_mm: 0.05,
    irradiated: false,
    lowest_bar_g: 0,
    highest_bar_g: 1.2,
    vessel: null,
  },
  first: { kind: 'bank', part: 'C1', capacitance_nF: 5, rated_kV: 30 },
  second: { kind: 'bank', part: 'C2', capacitance_nF: 1.4, rated_kV: 30 },
  channel: { length_mm: 280, spacing_a_mm: 4, spacing_b_mm: 4, gas: 'N2', across_kohm: 50 },
  charging: { supply_kV: 25, supply_mA: 1.5, ballast_Mohm: 25 },
  nodes: [{ name: 'dump capacitor', holds: 'first', bleed_Mohm: 400 }],
  shorting_points: ['dump capacitor'],
  beam: { pulse_energy_uJ: 150, wavelength_nm: 337.1 },
  model: { gap_nH: 28, channel_nH: 4, known: 'assumed' },
  envelope: { max_kV: 22, max_bar_g: 1.2, max_rate_Hz: 5 },
};

export const testReading: ReadingValues = {
  voltage_kV: 18.8,
  how: 'self-break',
  pressure_bar_g: 1,
  gas: 'N2',
  flow_L_min: 2,
  rate_Hz: 1,
  shots: 10,
  looked: 'even',
  output_uJ: 140,
  ambient_bar_abs: 0.966,
  temperature_C: 21,
  humidity_pct: 40,
  note: '',
  carried_over: [],
};

export const testSheet: SheetSpec = {
  title: 'Before firing',
  purpose: 'before-firing',
  topologies: ['charge-transfer'],
  caution: 'Treat as charged.',
  steps: [{ type: 'confirm', key: 'hands-out', title: 'Hands and tags out', detail: '', waive: 'never' }],
};

export interface TestPerson {
  readonly id: string;
  readonly email: string;
}

export interface TestLab {
  readonly id: string;
  readonly epoch: string;
  readonly lead: TestPerson;
  /** A fresh tablet with this person signed in. */
  readonly tablet: (person: TestPerson) => Promise<TestTablet>;
  /** Joins a person of that role through the Book, written by the lead. */
  readonly join: (role: Role, name?: string) => Promise<TestPerson>;
}

let count = 0;

/** A lab with a lead whose tablet has letter A. */
export async function createTestLab(server: TestServer): Promise<TestLab> {
  const { accounts, handover } = server.context;
  const add = async (name: string): Promise<TestPerson> => {
    count += 1;
    const email = `${name.toLowerCase()}-${count}-${randomUUID().slice(0, 8)}@bench.example`;
    return { id: await accounts.addPerson({ email, name, password: TEST_PASSWORD }), email };
  };
  const lead = await add('Inge');
  const { id, epoch } = await handover.foundLab({
    settings: testSettings,
    lead: { id: lead.id, name: 'Inge' },
  });
  const tablet = async (person: TestPerson): Promise<TestTablet> => {
    const made = new TestTablet(server.url);
    const answer = await made.signIn(person.email, TEST_PASSWORD, { lab: id });
    if (answer.status !== 200) throw new Error(`sign-in failed: ${JSON.stringify(answer.body)}`);
    return made;
  };
  const leadTablet = await tablet(lead);
  return {
    id,
    epoch,
    lead,
    tablet,
    async join(role, name = 'Ada') {
      const person = await add(name);
      const entry = leadTablet.seal('person.joined', person.id, { name, role });
      let answer = await leadTablet.push([entry]);
      // A test that sets the clock on has let the lead's access token run out.
      if (answer.status === 401) {
        await leadTablet.signIn(lead.email, TEST_PASSWORD, { lab: id });
        answer = await leadTablet.push([entry]);
      }
      if (answer.status !== 200 || answer.body.results[0]?.outcome !== 'applied')
        throw new Error(`joining failed: ${JSON.stringify(answer.body)}`);
      return person;
    },
  };
}
