import { useMemo } from 'react';
import { useFiring, useLab, useReadings, useRig } from '../../data/use-book';
import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import type { FiringDoc } from '../../domain/book/documents/firing';
import { standingReading, type ReadingDoc } from '../../domain/book/documents/reading';
import { latestRevision, revisionById, type RigDoc, type RigRevision } from '../../domain/book/documents/rig';

/** What traces of a firing are held against. */
export interface TraceFacts {
  readonly firing: FiringDoc;
  readonly rig: RigDoc;
  /** The revision that the firing was opened on. */
  readonly revision: RigRevision;
  readonly readings: readonly ReadingDoc[];
  readonly zone: string;
}

export function useTraceFacts(id: string): TraceFacts | undefined {
  const firing = useFiring(id);
  const rig = useRig(firing?.parent ?? '');
  const zone = useLab()?.settings.zone;
  const { readings } = useReadings(id);
  return useMemo(() => {
    if (firing === undefined || rig === undefined) return undefined;
    const revision = revisionById(rig, firing.rig_revision) ?? latestRevision(rig);
    return { firing, rig, revision, readings, zone: zone ?? firing.opened.stamp.zone };
  }, [firing, rig, readings, zone]);
}

/** The reading by the number that was entered; undefined for an empty field, or where there is no such reading. */
export function readingByNo(readings: readonly ReadingDoc[], no: number | null): ReadingDoc | undefined {
  return no === null ? undefined : readings.find((reading) => reading.no === no);
}

/** What a reading says now; null where it was struck, or where two corrections stand against each other. */
export function valuesOf(reading: ReadingDoc | undefined): ReadingValues | null {
  if (reading === undefined) return null;
  const now = standingReading(reading);
  return now.type === 'stands' ? now.values : null;
}
