import type { AlignmentDoc } from './alignment';
import type { CheckDoc } from './check';
import type { ClaimDoc } from './claim';
import type { CrewDoc } from './crew';
import type { FiringDoc } from './firing';
import type { HeldDoc } from './held';
import type { IncidentDoc } from './incident';
import type { KitDoc } from './kit';
import type { LabDoc } from './lab';
import type { LookupDoc } from './lookup';
import type { NoteDoc, PhotoDoc, TraceDoc } from './note';
import type { PartDoc } from './part';
import type { PersonDoc } from './person';
import type { ReadingDoc } from './reading';
import type { RigDoc } from './rig';
import type { SheetDoc } from './sheet';
import type { CorrectionDoc } from './versions';

/** What the folds give. Every document has a kind, an id and the parent that lists filter on. */
export type Document =
  | LabDoc
  | CrewDoc
  | PersonDoc
  | RigDoc
  | SheetDoc
  | CheckDoc
  | FiringDoc
  | ReadingDoc
  | CorrectionDoc
  | ClaimDoc
  | IncidentDoc
  | LookupDoc
  | PartDoc
  | KitDoc
  | AlignmentDoc
  | NoteDoc
  | PhotoDoc
  | TraceDoc
  | HeldDoc;
export type DocKind = Document['kind'];
export type DocOf<K extends DocKind> = Extract<Document, { kind: K }>;
export interface DocKey {
  readonly kind: DocKind;
  readonly id: string;
}

export function docKey(key: DocKey): string {
  return `${key.kind}/${key.id}`;
}
