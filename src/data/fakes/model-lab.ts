import { bodyText, sealEntry } from '../../domain/book/entry';
import { GENESIS_HASH, uuidFromBytes } from '../../domain/book/ids';
import { versionOf, type BodyOf, type Kind } from '../../domain/book/kinds';
import type { RigSpec } from '../../domain/book/rig-spec';
import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import type { SheetSpec } from '../../domain/book/sheet-spec';
import type { RandomBytes } from '../ports/ports';
import { appendToBook } from './model-book';
import { modelServer, type ModelServer } from './model-server';

export interface ModelLab {
  readonly server: ModelServer;
  readonly ada: string;
  readonly milo: string;
  readonly inge: string;
  readonly rig: string;
  readonly sheet: string;
  /** Brings an applied entry in from somewhere else. */
  readonly write: <K extends Kind>(kind: K, author: string, entry: WrittenEntry<K>) => string;
}

export interface WrittenEntry<K extends Kind> {
  readonly subject?: string;
  readonly body: BodyOf<K>;
}

export const PASSWORD = 'a long enough password';

/** A lab with an operator, a reviewer, a lead, one rig and one sheet, for tests. */
export function modelLab(random: RandomBytes, now_ms: () => number): ModelLab {
  const server = modelServer(random, now_ms);
  const id = () => uuidFromBytes(random(16));
  const [ada, milo, inge, device] = [id(), id(), id(), id()] as const;
  let seq = 0;
  const write: ModelLab['write'] = (kind, author, { subject, body }) => {
    const own = id();
    seq += 1;
    const stamp = {
      wall_ms: now_ms(),
      offset_min: 0,
      zone: 'Etc/UTC',
      page_life: device,
      monotonic_ms: seq,
      time_uncertain: false,
    };
    const entry = sealEntry(
      {
        lab: server.lab.id,
        id: own,
        device,
        seq,
        kind,
        version: versionOf(kind),
        subject: subject ?? own,
        author,
        witness: null,
        base: { epoch: server.book.epoch, revision: 0, hash: GENESIS_HASH },
        stamp,
      },
      bodyText(body, '00'.repeat(16)),
    );
    appendToBook(server.book, entry, { verdict: 'applied', reason: null, received_ms: now_ms() });
    return own;
  };
  const join = (person: string, name: string, role: 'operator' | 'reviewer' | 'lead') => {
    write('person.joined', inge, { subject: person, body: { name, role } });
    server.people.push({ id: person, name, email: `${name.toLowerCase()}@lab.example`, password: PASSWORD });
  };
  join(inge, 'Inge', 'lead');
  join(milo, 'Milo', 'reviewer');
  join(ada, 'Ada', 'operator');
  const rig = write('rig.created', milo, { body: { name: 'Heron', number: '10', spec: modelSpec() } });
  const sheet = write('sheet.published', milo, { body: { spec: modelSheet, replaces: null } });
  const until_ms = now_ms() + 30 * 24 * 60 * 60_000;
  write('person.authorised', milo, { subject: ada, body: { rig, task: 'fire', until_ms, words: '' } });
  const { envelope } = modelSpec();
  write('permit.granted', milo, { subject: rig, body: { rig_revision: rig, envelope, until_ms, words: '' } });
  return { server, ada, milo, inge, rig, sheet, write };
}

export function modelSpec(change: Partial<RigSpec['envelope']> = {}): RigSpec {
  const bank = { kind: 'bank', part: 'ceramic', capacitance_nF: 3.9, rated_kV: 30 } as const;
  return {
    topology: 'lc-inversion',
    gap: {
      gas: 'N2',
      electrodes: 'domed',
      radius_mm: 12,
      radius_known: 'measured',
      gap_mm: 2.6,
      gap_error_mm: 0.05,
      irradiated: true,
      lowest_bar_g: 0.2,
      highest_bar_g: 0.8,
      vessel: null,
    },
    first: bank,
    second: bank,
    channel: { length_mm: 240, spacing_a_mm: 2.5, spacing_b_mm: 2.5, gas: 'N2', across_kohm: 5 },
    charging: { supply_kV: 16, supply_mA: 1, ballast_Mohm: 20 },
    nodes: [{ name: 'first capacitor', holds: 'first', bleed_Mohm: 500 }],
    shorting_points: ['first capacitor'],
    beam: { pulse_energy_uJ: 60, wavelength_nm: 337 },
    model: { gap_nH: 25, channel_nH: 5, known: 'assumed' },
    envelope: { max_kV: 16, max_bar_g: 0.8, max_rate_Hz: 5, ...change },
  };
}

const modelSheet: SheetSpec = {
  title: 'Before firing',
  purpose: 'before-firing',
  topologies: ['lc-inversion'],
  caution: 'A check proves nothing by itself.',
  steps: [
    { key: 'hands-out', title: 'Hands and tags out', detail: '', waive: 'never', type: 'confirm' },
    { key: 'eyewear', title: 'Eyewear on', detail: '', waive: 'never', type: 'confirm' },
  ],
};

export function modelReading(change: Partial<ReadingValues> = {}): ReadingValues {
  return {
    voltage_kV: 12.2,
    how: 'self-break',
    pressure_bar_g: 0.4,
    gas: 'N2',
    flow_L_min: null,
    rate_Hz: 1,
    shots: 20,
    looked: 'even',
    output_uJ: null,
    ambient_bar_abs: 0.966,
    temperature_C: 21,
    humidity_pct: null,
    note: '',
    carried_over: [],
    ...change,
  };
}
