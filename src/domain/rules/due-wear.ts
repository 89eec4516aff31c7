import type { FiringDoc } from '../book/documents/firing';
import type { PartDoc } from '../book/documents/part';
import type { RigDoc } from '../book/documents/rig';
import { LIFE_FACTOR } from '../capacitor/life';
import type { WornPart } from './due';
import { partLedger, remainingWords, usedWords } from './part-ledger';
import type { RigCalibration } from './rig-calibration';

/**
 * Parts of the rig whose reckoned life is used up to where such parts begin to fail: a fifth of it, since the law holds
 * within a factor of five.
 */
export function wornParts(
  rig: RigDoc,
  parts: readonly PartDoc[],
  firings: readonly FiringDoc[],
): readonly WornPart[] {
  return parts.flatMap((part): WornPart[] => {
    if (part.retired !== null) return [];
    const { wear } = partLedger(part, rig, firings);
    if (wear === null || wear.used < 1 / LIFE_FACTOR) return [];
    const [warning] = wear.warnings;
    const words = `${usedWords(wear.used)} of its expected life is used, ${remainingWords(wear)} are left. ${warning?.words ?? ''}`;
    return [{ part: part.id, name: part.fitted.what, used: wear.used, words: words.trim() }];
  });
}

/** What the rig's own curve says of drift, in words; null while none stands out. */
export function driftWords(calibration: RigCalibration | null): string | null {
  const drift = calibration?.fit.drift;
  return drift === undefined || drift.type === 'none' || drift.type === 'too-few' ? null : drift.words;
}
