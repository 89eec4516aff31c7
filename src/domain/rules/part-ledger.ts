import type { FiringDoc } from '../book/documents/firing';
import type { PartDoc } from '../book/documents/part';
import { latestRevision, revisionById, type RigDoc } from '../book/documents/rig';
import type { RigSpec } from '../book/rig-spec';
import { plyThickness_m } from '../capacitor/capacitance';
import { dielectricStress } from '../capacitor/stress';
import { firingsEndured, partLife, type PartLife } from './part-life';
import { formatFigure } from '../units/format-quantity';
import { partWear, type EnduredShots, type PartWear } from '../wear/part-wear';
import type { LifeLaw } from '../capacitor/life';

/** What a part has endured, and how much of its life that is reckoned to be. */
export interface PartLedger {
  readonly part: PartDoc;
  readonly life: PartLife;
  /** Stress at the envelope of the revision that is fired now, over what the part stands; null where it has none. */
  readonly stress_ratio: number | null;
  /** Null where no law of life is known for such a part; `words` then says why. */
  readonly wear: PartWear | null;
  readonly words: string;
}

/**
 * Film between foils lives by the eighth power of strength over stress, one shot at its strength itself (J. C. Martin's
 * rule for plastics, from memory). Bought parts follow their maker, whose rated life the rig does not know.
 */
const FILM_LAW: LifeLaw = { ratedShots: 1, exponent: 8 };

/** Ledger of a part: shots by whole firings, each at the envelope of the revision that was fired, which is the most it may have been. */
export function partLedger(part: PartDoc, rig: RigDoc, firings: readonly FiringDoc[]): PartLedger {
  const life = partLife(part, firings);
  const { spec } = latestRevision(rig);
  const stress_ratio = stressOf(part, spec);
  const common = { part, life, stress_ratio };
  const { place } = part.fitted;
  if (place !== 'first' && place !== 'second')
    return {
      ...common,
      wear: null,
      words: 'No law of life is known for this kind of part: its shots are counted.',
    };
  if (spec[place].kind === 'bank')
    return {
      ...common,
      wear: null,
      words: 'The life that its maker rates is not known here: its shots are counted.',
    };
  if (stress_ratio === null) return { ...common, wear: null, words: 'Its stress cannot be reckoned.' };
  const wear = partWear(FILM_LAW, enduredBy(part, rig, firings), stress_ratio);
  return wear.ok
    ? { ...common, wear: wear.value, words: '' }
    : { ...common, wear: null, words: wear.refusal.words };
}

function enduredBy(part: PartDoc, rig: RigDoc, firings: readonly FiringDoc[]): readonly EnduredShots[] {
  const here = firingsEndured(part, firings).flatMap((firing): EnduredShots[] => {
    const spec = revisionById(rig, firing.rig_revision)?.spec;
    const stress_ratio = spec === undefined ? null : stressOf(part, spec);
    return stress_ratio === null || firing.shots === 0 ? [] : [{ shots: firing.shots, stress_ratio }];
  });
  const now = stressOf(part, latestRevision(rig).spec);
  const { shots_before } = part.fitted;
  // What it endured elsewhere is taken at the stress that it has here: nobody knows the other.
  return shots_before === null || shots_before === 0 || now === null
    ? here
    : [{ shots: shots_before, stress_ratio: now }, ...here];
}

/** Envelope voltage over what the capacitor stands: the film's strength, or the rated voltage of a bank. */
function stressOf(part: PartDoc, spec: RigSpec): number | null {
  const { place } = part.fitted;
  if (place !== 'first' && place !== 'second') return null;
  const capacitor = spec[place];
  const { max_kV } = spec.envelope;
  if (capacitor.kind === 'bank') return max_kV / capacitor.rated_kV;
  const thickness = plyThickness_m(capacitor.plies, capacitor.ply_um);
  if (!thickness.ok) return null;
  const stress = dielectricStress(max_kV * 1000, thickness.value);
  return stress.ok ? stress.value.value / capacitor.strength_kV_mm : null;
}

/** Shots left as a band, its low end rounded down: "4,400 to 110,000 shots". */
export function remainingWords({ remaining }: PartWear): string {
  const { low, high } = remaining.band;
  const shown = (shots: number, rounding: 'down' | 'up'): string =>
    formatFigure(shots, { digits: { significant: 2 }, rounding });
  return `${shown(low, 'down')} to ${shown(high, 'up')} shots`;
}

export function shotsText(shots: number): string {
  return formatFigure(shots, { digits: { decimals: 0 }, rounding: 'up' });
}

/** Share in whole percent, rounded up; "under 1 %" where little is used. */
export function usedWords(used: number): string {
  if (used === 0) return 'nothing';
  return used < 0.01
    ? 'under 1\u2009%'
    : `${formatFigure(100 * used, { digits: { decimals: 0 }, rounding: 'up' })}\u2009%`;
}
