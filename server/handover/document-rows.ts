import type { Document } from '../../src/domain/book/documents/document';
import { standingReview, type FiringDoc } from '../../src/domain/book/documents/firing';
import type { HeldDoc } from '../../src/domain/book/documents/held';
import { standingReading, type ReadingDoc } from '../../src/domain/book/documents/reading';
import type { RigDoc } from '../../src/domain/book/documents/rig';
import type { ChangedDocument } from './book-store';

type Cell = string | number | boolean | null;
type Row = Readonly<Record<string, Cell>>;

export function toDocumentRow(lab: string, { doc, made, revision }: ChangedDocument): Row {
  return {
    lab,
    id: doc.id,
    kind: doc.kind,
    parent: doc.parent,
    list_state: listState(doc),
    made_revision: made,
    revision,
    doc: JSON.stringify(doc),
  };
}

/** What lists filter on; null where no list asks. */
export function listState(doc: Document): string | null {
  switch (doc.kind) {
    case 'firing':
      return firingState(doc);
    case 'incident':
      return doc.closed === null ? 'open' : 'closed';
    case 'held':
      return heldState(doc);
    case 'rig':
      return rigWaits(doc) ? 'waiting' : 'quiet';
    default:
      return null;
  }
}

function firingState(firing: FiringDoc): string {
  const review = standingReview(firing);
  if (review !== null) return review.verdict;
  return firing.closed === null ? 'open' : 'closed';
}

function heldState(held: HeldDoc): string {
  if (held.adopted !== null) return 'adopted';
  return held.dismissed === null ? 'standing' : 'dismissed';
}

/** A parting, or a permit asked for a revision that still stands. */
function rigWaits(rig: RigDoc): boolean {
  return (
    rig.heads.length > 1 ||
    rig.permits_asked.some((one) => !one.answered && rig.heads.includes(one.rig_revision))
  );
}

/** What a reading says now. Of two corrections that part, the original's values stand here, marked. */
export function toReadingRow(lab: string, reading: ReadingDoc, { made, revision }: ChangedDocument): Row {
  const now = standingReading(reading);
  const values = now.type === 'stands' ? now.values : reading.original;
  const { by, device, stamp } = reading.logged;
  return {
    lab,
    id: reading.id,
    firing: reading.parent,
    rig: reading.rig,
    no: reading.no,
    made_revision: made,
    revision,
    state: now.type,
    irregular: reading.irregular,
    corrected: now.type === 'stands' && now.corrected,
    author: by,
    device,
    wall_ms: stamp.wall_ms,
    time_uncertain: stamp.time_uncertain,
    how: values.how,
    voltage_kV: values.voltage_kV,
    pressure_bar_g: values.pressure_bar_g,
    gas: values.gas,
    flow_L_min: values.flow_L_min,
    rate_Hz: values.rate_Hz,
    shots: values.shots,
    looked: values.looked,
    output_uJ: values.output_uJ,
    ambient_bar_abs: values.ambient_bar_abs,
    temperature_C: values.temperature_C,
    humidity_pct: values.humidity_pct,
  };
}
