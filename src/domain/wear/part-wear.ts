import { LIFE_FACTOR, lifeShots, type LifeLaw } from '../capacitor/life';
import { checkNumber } from '../units/check-number';
import { ok, refused, type Result } from '../units/result';
import { answer, type Answer, type Basis, type Warning } from '../units/answer';

/** Shots that a part endured at one stress. */
export interface EnduredShots {
  readonly shots: number;
  /** Stress over the rated stress, peak to peak for reversing duty. */
  readonly stress_ratio: number;
}

export interface PartWear extends Basis {
  /** Life used up: 1 is the expected life, by the sum of shots over expected shots. */
  readonly used: number;
  readonly shots: number;
  readonly highestStress_ratio: number;
  /** Shots left at the planned stress, with the band of the life law. Round it down. */
  readonly remaining: Answer;
  /** Life used up, with the band of the life law. Round it up. */
  readonly usedLife: Answer;
}

const MODEL = 'Sum of shots over expected shots (Miner)';
const VALID = 'within a factor of 5; a part that was once punctured or overheated is outside it';

/**
 * Wear of a part from what it endured: each shot counts as one over the shots expected at its stress (Miner 1945, from
 * memory), and what is left of 1 is turned into shots at the planned stress. Within a factor of five like the law; the
 * low end counts the life used five times as fast.
 */
export function partWear(
  law: LifeLaw,
  endured: readonly EnduredShots[],
  planned_ratio: number,
): Result<PartWear> {
  let used = 0;
  let shots = 0;
  let highestStress_ratio = 0;
  for (const one of endured) {
    const count = checkNumber(one.shots, { field: 'shots', name: 'Shots', unit: '', min: 0, max: 1e15 });
    if (!count.ok) return count;
    const life = lifeShots(law, one.stress_ratio);
    if (!life.ok) return refused(life.refusal);
    used += one.shots / life.value.value;
    shots += one.shots;
    if (one.shots > 0) highestStress_ratio = Math.max(highestStress_ratio, one.stress_ratio);
  }
  const planned = lifeShots(law, planned_ratio);
  if (!planned.ok) return planned;
  const expected = planned.value.value;
  const warnings = warningsOf(used, highestStress_ratio);
  const left = (share: number) => Math.max(0, 1 - share) * expected;
  const remaining: Answer = {
    ...planned.value,
    value: left(used),
    // Either the law is five times too long, or five times too short.
    band: { low: left(LIFE_FACTOR * used) / LIFE_FACTOR, high: left(used / LIFE_FACTOR) * LIFE_FACTOR },
    model: MODEL,
    warnings: [...planned.value.warnings, ...warnings],
  };
  const usedLife = answer({
    value: used,
    unit: '1',
    relative: { below: 1 - 1 / LIFE_FACTOR, above: LIFE_FACTOR - 1 },
    model: MODEL,
    valid: VALID,
    warnings,
  });
  return ok({
    used,
    shots,
    highestStress_ratio,
    remaining,
    usedLife,
    model: MODEL,
    valid: VALID,
    warnings,
  });
}

function warningsOf(used: number, highest: number): readonly Warning[] {
  const warnings: Warning[] = [];
  if (used >= 1) {
    warnings.push({
      type: 'life-used',
      words: 'The expected life is used up: replace the part before the next firing.',
    });
  } else if (used >= 1 / LIFE_FACTOR) {
    warnings.push({
      type: 'life-in-band',
      words: 'Within the spread of such parts it may fail any time now.',
    });
  }
  if (highest > 1) {
    warnings.push({ type: 'over-stressed', words: 'It has stood more than its rated stress.' });
  }
  return warnings;
}
