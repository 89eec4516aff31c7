import { inducedVoltage, radiatedField } from '../room/pick-up';
import type { Answer } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { ok, type Result } from '../units/result';
import type { Entered } from './entered';
import { allOf, figureOf, spread, warningsOf } from './figures';
import type { LookupAnswer, Plot } from './lookup';

const CURVE_PIECES = 40;
/** Below it nothing is drawn: a scale of decades has no 0. */
const LEAST_V = 1e-9;

interface Setting {
  readonly area_cm2: number;
  readonly distance_m: number;
  readonly slope_A_s: number;
}

/** What a shot induces in a loop near its lead, and the field that it radiates: both upper bounds. */
export function pickUpAnswer(input: Entered): Result<LookupAnswer> {
  const [current_A, quarter_s] = [input.number('current_A'), input.number('quarter_ns') * 1e-9];
  const distance_m = input.number('distance_m');
  const setting: Setting = {
    area_cm2: input.number('loop_cm2'),
    distance_m,
    // A sine is steepest at its start: current times 2 pi f, with the quarter period for f.
    slope_A_s: (current_A * Math.PI) / (2 * quarter_s),
  };
  const parts = allOf({
    induced: inducedVoltage(setting),
    field: radiatedField({ area_cm2: input.number('lead_cm2'), distance_m, current_A, quarter_s }),
  });
  if (!parts.ok) return parts;
  const { induced, field } = parts.value;
  return ok({
    figures: [
      figureOf(['induced', 'induced in the loop at most'], induced, {
        rounding: 'up',
        weight: 'answer',
        note: 'within a factor of three',
      }),
      figureOf(['field', 'radiated field at most'], field, {
        rounding: 'up',
        weight: 'answer',
        note: 'within a factor of three',
      }),
      {
        key: 'slope',
        label: 'current slope',
        value: setting.slope_A_s,
        unit: 'A/s',
        rounding: 'up',
        digits: 3,
        weight: 'main',
      },
    ],
    model: `${induced.model}; ${field.model.toLowerCase()}`,
    valid: `${induced.valid}. Field: ${field.valid}`,
    warnings: warningsOf([induced, field]),
    cautions: [
      'A meter that is read during a shot proves nothing, and one that saw a shot may be broken: prove it before and after.',
      'No reading stands in for the shorting stick. Keep leads short, twisted and away from the discharge.',
    ],
    plot: plotOf(setting, induced),
  });
}

function plotOf(setting: Setting, induced: Answer): Plot {
  const { distance_m } = setting;
  const from = Math.max(0.05, Math.min(0.1, distance_m));
  const to = Math.min(1000, Math.max(5, 2 * distance_m));
  const points = spread({ from, to }, CURVE_PIECES, 'log').flatMap((x) => {
    const at = inducedVoltage({ ...setting, distance_m: x });
    return at.ok ? [{ x, y: at.value.value, low: at.value.band.low, high: at.value.band.high }] : [];
  });
  const heights = points.flatMap(({ low, high }) => [low, high]).filter((y) => y > LEAST_V);
  const drawn = induced.band.low > LEAST_V;
  return {
    title: `Voltage induced in the loop against distance: at most ${formatFigure(induced.value, { digits: { significant: 2 }, rounding: 'up' })} volts at ${distance_m.toFixed(2)} metres`,
    x: { label: 'Distance', unit: 'm', min: from, max: to, kind: 'log' },
    y: {
      label: 'Induced',
      unit: 'V',
      min: drawn ? Math.min(...heights) / 2 : 0.1,
      max: drawn ? Math.max(...heights) * 2 : 1,
      kind: 'log',
    },
    ...(drawn
      ? {
          band: {
            points: points.map(({ x, low, high }) => ({ x, low, high })),
            above: 'more',
            below: 'less',
          },
          law: points.map(({ x, y }) => ({ x, y })),
          point: { x: distance_m, low: induced.band.low, high: induced.band.high, y: induced.value },
        }
      : {}),
  };
}
