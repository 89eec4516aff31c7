import { headRevisions, revisionById, type RigDoc, type RigRevision } from '../../domain/book/documents/rig';
import { specChanges, type SpecChange } from '../../domain/rules/loosening';

/** A field in which the revisions of a parting differ, or which one of them changed. */
export interface PartingRow {
  readonly field: string;
  /** In the revision that they go back to. */
  readonly before: SpecChange['before'];
  /** In each revision, in their order. */
  readonly values: readonly SpecChange['after'][];
  /** Whose limit rules meanwhile; null where the field is no limit, or all say the same. */
  readonly stricter: number | null;
}

const LIMITS = new Set(['envelope.max_kV', 'envelope.max_bar_g', 'envelope.max_rate_Hz']);

/** What every revision of a parting changed against the one that they all go back to. */
export function partingRows(rig: RigDoc): readonly PartingRow[] {
  const heads = headRevisions(rig);
  const base = commonBase(rig, heads);
  if (base === undefined || heads.length < 2) return [];
  const changes = heads.map((head) => specChanges(base.spec, head.spec));
  const fields = [...new Set(changes.flatMap((one) => one.map((change) => change.field)))];
  return fields.map((field) => {
    const found = changes.map((one) => one.find((change) => change.field === field));
    const before = found.find((change) => change !== undefined)?.before ?? null;
    const values = found.map((change) => (change === undefined ? before : change.after));
    return { field, before, values, stricter: stricterOf(field, values) };
  });
}

function stricterOf(field: string, values: readonly SpecChange['after'][]): number | null {
  if (!LIMITS.has(field) || new Set(values).size < 2) return null;
  const numbers = values.map((value) => (typeof value === 'number' ? value : Infinity));
  return numbers.indexOf(Math.min(...numbers));
}

/** The latest revision that all of them descend from. */
function commonBase(rig: RigDoc, heads: readonly RigRevision[]): RigRevision | undefined {
  const [first, ...others] = heads.map((head) => ancestry(rig, head));
  return first?.find((revision) => others.every((line) => line.some((one) => one.entry === revision.entry)));
}

function ancestry(rig: RigDoc, head: RigRevision): readonly RigRevision[] {
  const line: RigRevision[] = [];
  let next: RigRevision | undefined = head;
  while (next !== undefined && !line.includes(next)) {
    line.push(next);
    next = next.based_on === null ? undefined : revisionById(rig, next.based_on);
  }
  return line;
}
