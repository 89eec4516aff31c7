import { useEffect, useMemo, useState } from 'react';
import { useFirings, useParts } from '../../data/use-book';
import { useReadingsOf } from '../../data/use-readings-of';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { WornPart } from '../../domain/rules/due';
import { driftWords, wornParts } from '../../domain/rules/due-wear';
import { rigCalibration } from '../../domain/rules/rig-calibration';

/** As far back as drift is looked for. */
const MOST_FIRINGS = 20;
/** The Bench is drawn and usable long before anything is fitted. */
const AFTER_MS = 1500;
const NONE: readonly string[] = [];

/** What only the firings themselves can tell: worn parts at once, drift a moment later. */
export function useWearFacts(rig: RigDoc): {
  readonly worn: readonly WornPart[];
  readonly drift: string | null;
} {
  const firings = useFirings(rig.id);
  const parts = useParts(rig.id);
  const [later, setLater] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLater(true), AFTER_MS);
    return () => {
      clearTimeout(timer);
    };
  }, []);
  const newest = useMemo(() => firings.slice(0, MOST_FIRINGS), [firings]);
  const ids = useMemo(() => (later ? newest.map((one) => one.id) : NONE), [later, newest]);
  const { state, readingsOf } = useReadingsOf(ids);
  const worn = useMemo(() => wornParts(rig, parts, firings), [rig, parts, firings]);
  const drift = useMemo(() => {
    if (!later || state === 'loading') return null;
    const found = rigCalibration({ rig, firings: newest, readingsOf });
    return driftWords(found.ok ? found.value : null);
  }, [later, state, rig, newest, readingsOf]);
  return useMemo(() => ({ worn, drift }), [worn, drift]);
}
