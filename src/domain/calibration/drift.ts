import { fitLine } from '../numerics/line-fit';
import { answer, withBand, type Answer, type Basis } from '../units/answer';
import { studentQuantile, studentTails } from '../numerics/student-t';

/** Whether a rig's self-break moves with its shots, beyond what its scatter would show by chance. */
export type Drift = Basis &
  (
    | { readonly type: 'too-few'; readonly words: string }
    | {
        readonly type: 'none' | 'rising' | 'falling';
        /** Relative change in a thousand shots, with its interval. */
        readonly per1000: { readonly value: number; readonly low: number; readonly high: number };
        /** The same as an answer. */
        readonly slope: Answer;
        /** Chance of such a slope without any drift. */
        readonly chance: number;
        readonly words: string;
      }
  );

const BASIS: Basis = {
  model: 'Student\u2019s test on the slope of the residuals, two-sided at 5\u2009%',
  valid: 'six readings or more at different shots; one test in twenty speaks without cause',
  warnings: [],
};

const FEWEST = 6;
const SIGNIFICANT = 0.05;
// Readings that fit to the last digit still have a meter behind them.
const LEAST_SCATTER = 1e-9;

/**
 * Tests the residuals of a fit (relative) for a slope over shot numbers: Student's test at 5 %, two-sided. Six readings
 * at least, at different shots. The words name the chance, since one test in twenty speaks without cause.
 */
export function testDrift(points: readonly { readonly shot: number; readonly residual: number }[]): Drift {
  const line =
    points.length < FEWEST ? undefined : fitLine(points.map(({ shot, residual }) => [shot, residual]));
  if (line === undefined) {
    return { ...BASIS, type: 'too-few', words: 'Drift: too few readings at different shots to tell.' };
  }
  const freedom = points.length - 2;
  const error = Math.max(line.slopeError, LEAST_SCATTER * Math.abs(line.slope));
  const chance = error === 0 ? 1 : studentTails(line.slope / error, freedom);
  const half = studentQuantile(SIGNIFICANT, freedom) * line.slopeError;
  const per1000 = {
    value: 1000 * line.slope,
    low: 1000 * (line.slope - half),
    high: 1000 * (line.slope + half),
  };
  if (chance > SIGNIFICANT) {
    return {
      ...BASIS,
      type: 'none',
      per1000,
      slope: slopeAnswer(per1000),
      chance,
      words: 'No drift that stands out of the scatter.',
    };
  }
  const type = line.slope > 0 ? 'rising' : 'falling';
  const percent = (100 * Math.abs(per1000.value)).toPrecision(2);
  const words = `Self-break is ${type} by ${percent} % in a thousand shots; by chance alone that shows in ${(100 * chance).toPrecision(1)} % of runs.`;
  return {
    ...BASIS,
    type,
    per1000,
    slope: slopeAnswer(per1000),
    chance,
    words,
    warnings: [{ type: 'drift', words }],
  };
}

function slopeAnswer(per1000: {
  readonly value: number;
  readonly low: number;
  readonly high: number;
}): Answer {
  const { model, valid } = BASIS;
  const one = answer({ value: per1000.value, unit: '1 per 1,000 shots', relative: 0, model, valid });
  return withBand(one, per1000);
}
