import { purgeResidual, purgeVolumes } from '../gas/purge';
import { AIR_OXYGEN } from '../gas/room-oxygen';
import type { Answer } from '../units/answer';
import { BAR_PER_ATM } from '../units/pressure';
import { formatFigure } from '../units/format-quantity';
import { ok, type Result } from '../units/result';
import type { Entered } from './entered';
import { allOf, figureOf, spread } from './figures';
import type { Figure, LookupAnswer, Plot } from './lookup';

/** Oxygen that a nitrogen channel still works with, %: physics O. */
const WANTED_OXYGEN = 0.5;
const CURVE_PIECES = 40;
const SECONDS_PER_MINUTE = 60;

/** How long to purge, and what of the old gas is left then. */
export function purgeAnswer(input: Entered): Result<LookupAnswer> {
  const volumes = input.number('volumes');
  const pressure_bar_abs = input.number('purge_bar_g') + input.number('ambient_bar_abs');
  const flow_L_min = input.number('flow_L_min');
  // A volume of pressed gas, as the flowmeter counts it; that it counts at 15 C is within its error.
  const volume_L = (input.number('volume_cm3') / 1000) * (pressure_bar_abs / BAR_PER_ATM);
  const parts = allOf({
    left: purgeResidual(volumes),
    needed: purgeVolumes(WANTED_OXYGEN / AIR_OXYGEN),
  });
  if (!parts.ok) return parts;
  const { left, needed } = parts.value;
  const seconds = (SECONDS_PER_MINUTE * volumes * volume_L) / flow_L_min;
  return ok({
    figures: [
      {
        key: 'purge',
        label: 'purge for',
        value: seconds,
        low: seconds * 0.95,
        high: seconds * 1.05,
        unit: 's',
        rounding: 'up',
        digits: 3,
        weight: 'answer',
        ...(seconds < 120 ? {} : { note: `that is ${minutesText(seconds)}` }),
      },
      figureOf(['residual', 'of the old gas left'], left, {
        rounding: 'up',
        times: 100,
        unit: '%',
        weight: 'answer',
      }),
      oxygenFigure(left),
      {
        key: 'gas_used',
        label: 'gas that this takes, at 15\u00a0\u00b0C and 1 atm',
        value: volumes * volume_L,
        unit: 'L',
        rounding: 'up',
        digits: 3,
        weight: 'main',
      },
      figureOf(['needed', 'volumes down to 0.5 % of oxygen, from air'], needed, {
        rounding: 'up',
        digits: 2,
        weight: 'side',
      }),
    ],
    says: saysOf(left),
    model: left.model,
    valid: left.valid,
    warnings: left.warnings,
    cautions: [
      'Vent it where it cannot gather: what leaves the body comes into the room.',
      'A purge is a time at a flow that somebody reads. It proves nothing about what is in the body.',
    ],
    plot: plotOf(volumes, left),
  });
}

function minutesText(seconds: number): string {
  return `${formatFigure(seconds / SECONDS_PER_MINUTE, { digits: { decimals: 0 }, rounding: 'up' })}\u2009min`;
}

function oxygenFigure(left: Answer): Figure {
  return figureOf(['oxygen', 'oxygen left, if it was full of air'], left, {
    rounding: 'up',
    times: AIR_OXYGEN,
    unit: '%',
  });
}

function saysOf(left: Answer): string {
  const oxygen = AIR_OXYGEN * left.band.high;
  return oxygen <= WANTED_OXYGEN
    ? 'Under half a per cent of oxygen even if it mixes badly.'
    : 'Above half a per cent of oxygen if it mixes badly: a nitrogen channel wants less.';
}

function plotOf(volumes: number, left: Answer): Plot {
  const to = Math.max(8, volumes * 1.2);
  const points = spread({ from: 0, to }, CURVE_PIECES).flatMap((x) => {
    const at = purgeResidual(x);
    return at.ok
      ? [{ x, y: 100 * at.value.value, low: 100 * at.value.band.low, high: 100 * at.value.band.high }]
      : [];
  });
  const least = Math.min(0.01, ...points.map(({ low }) => low), 100 * left.band.low);
  const percent = formatFigure(100 * left.value, { digits: { significant: 2 }, rounding: 'up' });
  return {
    title: `Old gas left after ${volumes.toFixed(1)} volumes: ${percent} per cent`,
    x: { label: 'Volumes', unit: '', min: 0, max: to, decimals: 1 },
    y: { label: 'Old gas left', unit: '%', min: least, max: 100, kind: 'log' },
    band: {
      points: points.map(({ x, low, high }) => ({ x, low, high })),
      above: 'mixes worse',
      below: 'mixes better',
    },
    law: points.map(({ x, y }) => ({ x, y })),
    point: { x: volumes, low: 100 * left.band.low, high: 100 * left.band.high, y: 100 * left.value },
    limit: { y: (100 * WANTED_OXYGEN) / AIR_OXYGEN, label: '0.5\u2009% of oxygen' },
  };
}
