import { erfc } from '../numerics/erfc';
import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { ok, type Result } from '../units/result';

/**
 * Chance of an early break per shot when the gap is held `margin_sigma` standard deviations below its mean
 * self-break: half of erfc(k/sqrt 2). Source: the normal law; seen for short nitrogen gaps (Cai et al. 2010,
 * abstract read). The tail of a worn or dirty gap is longer.
 */
export function earlyBreakProbability(margin_sigma: number): Result<Answer> {
  const margin = checkNumber(margin_sigma, {
    field: 'margin_sigma',
    name: 'Margin',
    unit: '\u03c3',
    min: -10,
    max: 37,
  });
  if (!margin.ok) return margin;
  return ok(
    answer({
      value: 0.5 * erfc(margin.value / Math.SQRT2),
      unit: '1',
      relative: 0,
      model: 'Normal scatter of self-break',
      valid: 'conditioned gap; worn or dirty electrodes break early far more often',
      warnings:
        margin.value > 3
          ? [
              {
                type: 'tail-assumed',
                words: 'The normal tail is an assumption; worn electrodes have a longer one.',
              },
            ]
          : [],
    }),
  );
}
