import { latestRevision, type RigDoc } from '../book/documents/rig';
import type { SheetSpec } from '../book/sheet-spec';

/** Whether a sheet is for this rig: its circuit, and the rig itself where the sheet names some. */
export function sheetFits(spec: SheetSpec, rig: RigDoc): boolean {
  return spec.topologies.includes(latestRevision(rig).spec.topology) && namesRig(spec, rig.id);
}

export function namesRig({ rigs = [] }: SheetSpec, rig: string): boolean {
  return rigs.length === 0 || rigs.includes(rig);
}
