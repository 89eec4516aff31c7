import { useEffect, useMemo, useState } from 'react';
import { useFirings } from './use-book';
import { useReadingsOf } from './use-readings-of';
import type { FiringDoc } from '../domain/book/documents/firing';
import type { RigDoc } from '../domain/book/documents/rig';
import type { OwnCurve } from '../domain/lookup/lookup';
import { rigCalibration, type RigCalibration } from '../domain/rules/rig-calibration';
import type { Result } from '../domain/units/result';

/** Firings whose readings are fetched: the newest, since a gap wears. */
const MOST_FIRINGS = 60;
/** A screen at the rig is drawn before anything is fitted. */
const AFTER_MS = 400;
const NONE: readonly FiringDoc[] = [];

/** The calibration of a rig from its firings; undefined while their readings are being fetched. */
export function useRigCalibration(rig: RigDoc): Result<RigCalibration> | undefined {
  return useCalibrationFrom(rig, useFirings(rig.id));
}

/**
 * What a firing is held against: the calibration by the firings opened before it, so that no reading vouches for itself.
 * Null where there is none, or none yet.
 */
export function useCalibrationBefore(rig: RigDoc, firing: FiringDoc): RigCalibration | null {
  const firings = useFirings(rig.id);
  const due = useAfterFirstPaint();
  const opened_ms = firing.opened.stamp.wall_ms;
  const earlier = useMemo(
    () => (due ? firings.filter((one) => one.opened.stamp.wall_ms < opened_ms) : NONE),
    [due, firings, opened_ms],
  );
  const found = useCalibrationFrom(rig, earlier);
  return found?.ok === true ? found.value : null;
}

/** The own curve as lookups draw it; null where there is none, none yet, or no rig. */
export function useOwnCurve(rig: RigDoc | undefined): OwnCurve | null {
  const firings = useFirings(rig?.id ?? '');
  const due = useAfterFirstPaint();
  const found = useCalibrationFrom(rig, due ? firings : NONE);
  return useMemo(() => {
    if (found?.ok !== true) return null;
    const { scale, offset_mm, read } = found.value.fit;
    const [from_bar_abs, to_bar_abs] = read.pressure_bar_abs;
    return { scale: scale.value, offset_mm: offset_mm?.value ?? 0, from_bar_abs, to_bar_abs };
  }, [found]);
}

function useAfterFirstPaint(): boolean {
  const [due, setDue] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setDue(true), AFTER_MS);
    return () => {
      clearTimeout(timer);
    };
  }, []);
  return due;
}

function useCalibrationFrom(
  rig: RigDoc | undefined,
  firings: readonly FiringDoc[],
): Result<RigCalibration> | undefined {
  const newest = useSteady(useMemo(() => firings.slice(0, MOST_FIRINGS), [firings]));
  const ids = useMemo(() => newest.map((one) => one.id), [newest]);
  const { state, readingsOf } = useReadingsOf(ids);
  const revisions = rig?.revisions;
  return useMemo(
    () =>
      rig === undefined || (state === 'loading' && newest.length > 0)
        ? undefined
        : rigCalibration({ rig, firings: newest, readingsOf }),
    // eslint-disable-next-line react-hooks/exhaustive-deps -- a rig is a new object at every entry about it; its revisions count
    [revisions, newest, state, readingsOf],
  );
}

/** The list as it was while its members are the same: a reading logged elsewhere makes the list anew and nothing in it. */
function useSteady<T>(list: readonly T[]): readonly T[] {
  const [kept, setKept] = useState(list);
  const same = kept.length === list.length && kept.every((one, i) => one === list[i]);
  if (!same) setKept(list);
  return same ? kept : list;
}
