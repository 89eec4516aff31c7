import type { KitItem } from '../../domain/book/bodies/kit-bodies';
import type { KitDoc } from '../../domain/book/documents/kit';
import type { Trace } from '../../domain/book/documents/trace';

export const NOW_MS = Date.UTC(2026, 11, 1, 12);
export const DAY_MS = 86_400_000;

export const TRACE: Trace = {
  entry: 'entry',
  by: 'ada',
  device: 'tablet',
  at: 1,
  stamp: {
    wall_ms: NOW_MS - 40 * DAY_MS,
    offset_min: 0,
    zone: 'Europe/London',
    page_life: 'life',
    monotonic_ms: 0,
    time_uncertain: false,
  },
};

const EYEWEAR: KitItem = {
  type: 'eyewear',
  densities: [{ from_nm: 190, to_nm: 375, density: 6 }],
  visible_transmission_pct: null,
};

export function kitDoc(parts: Partial<KitDoc> = {}): KitDoc {
  return {
    kind: 'kit',
    id: parts.number ?? 'E1',
    parent: null,
    number: 'E1',
    name: 'UV pair',
    note: '',
    item: EYEWEAR,
    added: TRACE,
    due_ms: null,
    state: 'fit',
    holder: null,
    held: null,
    history: [],
    ...parts,
  };
}

export const spareDoc = (number: string, count: number, minimum: number): KitDoc =>
  kitDoc({ number, name: `Spare ${number}`, item: { type: 'spare', count, minimum, catalogue: null } });
