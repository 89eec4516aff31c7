import { useMemo } from 'react';
import { useFiring, useLab, useReadings, useRig } from '../../data/use-book';
import type { FiringDoc } from '../../domain/book/documents/firing';
import type { ReadingDoc } from '../../domain/book/documents/reading';
import { latestRevision, revisionById, type RigDoc, type RigRevision } from '../../domain/book/documents/rig';
import type { LabSettings } from '../../domain/book/rig-spec';
import { firingEnvelope, type FiringEnvelope } from './beyond-envelope';
import { standingRows, type StandingRow } from './reading-fit';

/** Everything that a firing's screen stands on. */
export interface FiringFacts {
  readonly firing: FiringDoc;
  readonly rig: RigDoc;
  /** The revision that it was opened on. */
  readonly revision: RigRevision;
  readonly envelope: FiringEnvelope;
  readonly settings: LabSettings | undefined;
  readonly zone: string;
  readonly loading: boolean;
  readonly readings: readonly ReadingDoc[];
  readonly rows: readonly StandingRow[];
}

export function useFiringFacts(id: string): FiringFacts | undefined {
  const firing = useFiring(id);
  const rig = useRig(firing?.parent ?? '');
  const settings = useLab()?.settings;
  const { state, readings } = useReadings(id);
  const rows = useMemo(() => standingRows(readings), [readings]);
  return useMemo(() => {
    if (firing === undefined || rig === undefined) return undefined;
    return {
      firing,
      rig,
      revision: revisionById(rig, firing.rig_revision) ?? latestRevision(rig),
      envelope: firingEnvelope(firing, rig),
      settings,
      zone: settings?.zone ?? firing.opened.stamp.zone,
      loading: state === 'loading',
      readings,
      rows,
    };
  }, [firing, rig, settings, state, readings, rows]);
}
