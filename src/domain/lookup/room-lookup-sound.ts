import { hearingDistance, peakSoundLevel } from '../room/sound';
import type { Answer } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { ok, type Result } from '../units/result';
import { energyWords } from './energy-words';
import type { Entered } from './entered';
import { allOf, figureOf, spread } from './figures';
import type { LookupAnswer, Plot, Values } from './lookup';

/** Peak limit for the ear: 140 dB. */
const LIMIT_DB = 140;
const CURVE_PIECES = 40;

/** The loudest a shot can be, and inside which distance ears are covered. */
export function soundAnswer(input: Entered, values: Values): Result<LookupAnswer> {
  const [shot_J, distance_m] = [input.number('shot_J'), input.number('distance_m')];
  const parts = allOf({ peak: peakSoundLevel(shot_J, distance_m), within: hearingDistance(shot_J) });
  if (!parts.ok) return parts;
  const { peak, within } = parts.value;
  return ok({
    figures: [
      figureOf(['peak', 'peak level at most'], peak, {
        rounding: 'up',
        decimals: 0,
        weight: 'answer',
        note: `${energyWords(shot_J, values)}, all of it as sound`,
      }),
      figureOf(['hearing', 'ears covered within'], within, {
        rounding: 'up',
        weight: 'answer',
        note: 'where it passes 140\u2009dB',
      }),
    ],
    says:
      peak.value > LIMIT_DB
        ? 'May pass 140 dB at this distance: hearing protection on, for everybody in the room.'
        : 'Under 140 dB peak for one shot in the open. Many shots a day have a lower limit.',
    model: peak.model,
    valid: peak.valid,
    warnings: peak.warnings,
    cautions: [
      'An enclosure that rings, a bare wall or a corner makes it louder. A sound level meter with a peak hold decides.',
      'Warn before each firing: a bang that startles makes hands move.',
    ],
    plot: plotOf({ shot_J, distance_m }, peak, within),
  });
}

function plotOf(
  { shot_J, distance_m }: { readonly shot_J: number; readonly distance_m: number },
  ...[peak, within]: readonly [Answer, Answer]
): Plot {
  const from = Math.max(0.05, Math.min(0.1, distance_m));
  const to = Math.min(1000, Math.max(10, 2 * distance_m, 2 * within.value));
  const points = spread({ from, to }, CURVE_PIECES, 'log').flatMap((x) => {
    const at = peakSoundLevel(shot_J, x);
    return at.ok ? [{ x, y: at.value.value, low: at.value.band.low, high: at.value.band.high }] : [];
  });
  const heights = [...points.flatMap(({ low, high }) => [low, high]), LIMIT_DB];
  return {
    title: `Peak sound level against distance: at most ${formatFigure(peak.value, { digits: { decimals: 0 }, rounding: 'up' })} dB at ${distance_m.toFixed(2)} metres`,
    x: { label: 'Distance', unit: 'm', min: from, max: to, kind: 'log' },
    y: {
      label: 'Peak level',
      unit: 'dB',
      min: Math.floor(Math.min(...heights) - 3),
      max: Math.ceil(Math.max(...heights) + 3),
      decimals: 0,
    },
    band: {
      points: points.map(({ x, low, high }) => ({ x, low, high })),
      above: 'louder than all its energy',
      below: 'quieter',
    },
    law: points.map(({ x, y }) => ({ x, y })),
    limit: { y: LIMIT_DB, label: '140\u2009dB' },
    point: { x: distance_m, low: peak.band.low, high: peak.band.high, y: peak.value },
  };
}
