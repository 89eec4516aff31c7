import { wholeGas } from '../gas/cylinder-stock';
import {
  oxygenAfterDumpDisplaced,
  oxygenAfterDumpMixed,
  oxygenSealed,
  oxygenTransient,
  oxygenVentilated,
  oxygenWords,
  OXYGEN_LIMIT,
  timeToOxygenLimit,
  type Inflow,
} from '../gas/room-oxygen';
import type { Answer } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { ok, type Result } from '../units/result';
import type { Entered } from './entered';
import { allOf, figureOf, spread, warningsOf } from './figures';
import type { Figure, LookupAnswer, Plot } from './lookup';

const MINUTES_PER_HOUR = 60;
const CURVE_PIECES = 40;

interface Setting {
  readonly inflow: Inflow;
  readonly air_changes_h: number;
  readonly hours: number;
}

/** Oxygen in the room while gas flows, and when a whole cylinder escapes: the lower of both ways is shown. */
export function oxygenAnswer(input: Entered): Result<LookupAnswer> {
  const setting: Setting = {
    inflow: { flow_L_min: input.number('flow_L_min'), room_m3: input.number('room_m3') },
    air_changes_h: input.number('air_changes_h'),
    hours: input.number('hours'),
  };
  const { inflow, air_changes_h, hours } = setting;
  const whole = wholeGas({
    gas: 'N2',
    volume_L: input.number('cylinder_L'),
    pressure_bar_abs: input.number('cylinder_bar_g') + input.number('ambient_bar_abs'),
    temperature_C: input.number('temperature_C'),
  });
  if (!whole.ok) return whole;
  const gas_m3 = whole.value.band.high / 1000;
  const parts = allOf({
    now: oxygenTransient(inflow, air_changes_h, hours * MINUTES_PER_HOUR),
    sealed: oxygenSealed(inflow, hours * MINUTES_PER_HOUR),
    long: oxygenVentilated(inflow, air_changes_h),
    displaced: oxygenAfterDumpDisplaced(gas_m3, inflow.room_m3),
    mixed: oxygenAfterDumpMixed(gas_m3, inflow.room_m3),
  });
  if (!parts.ok) return parts;
  const { now, sealed, long, displaced, mixed } = parts.value;
  return ok({
    figures: [
      oxygen(['oxygen', `oxygen after ${hoursText(hours)}`], now, {
        weight: 'answer',
        note: oxygenWords(now.value),
      }),
      oxygen(['oxygen_dump', 'if the whole cylinder escapes'], displaced, {
        weight: 'answer',
        note: oxygenWords(displaced.value),
      }),
      oxygen(['oxygen_mixed', 'the same, mixing as it flows'], mixed),
      ...limitFigures(inflow),
      oxygen(['oxygen_long', 'with the ventilation, in the long run'], long),
      oxygen(['oxygen_sealed', 'without any ventilation'], sealed),
      figureOf(['whole', 'gas in the cylinder, at 15\u00a0\u00b0C and 1 atm'], whole.value, {
        rounding: 'up',
        times: 1e-3,
        unit: 'm\u00b3',
        weight: 'side',
      }),
    ],
    says: saysOf(now.value, displaced.value),
    model: `${now.model}; ${displaced.model.toLowerCase()}`,
    valid: now.valid,
    warnings: warningsOf([now, displaced]),
    cautions: [
      'Lack of oxygen gives no warning: a person feels well and falls. Under 19.5 % leave, and let nobody go in to help without air of their own.',
      'A meter on the wall and the local rules decide, not this sum. Carbon dioxide harms long before it displaces oxygen.',
    ],
    plot: plotOf(setting, now),
  });
}

function oxygen(
  named: readonly [key: string, label: string],
  of: Answer,
  extra: Partial<Figure> = {},
): Figure {
  return { ...figureOf(named, of, { rounding: 'down', decimals: 1 }), ...extra };
}

function hoursText(hours: number): string {
  return `${formatFigure(hours, { digits: { significant: 3 }, rounding: 'nearest' })}\u2009h`;
}

function limitFigures(inflow: Inflow): readonly Figure[] {
  const time = timeToOxygenLimit(inflow);
  if (!time.ok) return [];
  return [
    figureOf(['limit_time', 'a sealed room is down to 19.5 % after'], time.value, {
      rounding: 'down',
      times: 1 / MINUTES_PER_HOUR,
      unit: 'h',
      note: 'near the outlet far sooner',
    }),
  ];
}

function saysOf(now: number, dump: number): string {
  if (now < OXYGEN_LIMIT)
    return 'This flow takes the room under 19.5 %: more air, less gas, or a duct outside.';
  return dump < OXYGEN_LIMIT
    ? 'The flow leaves enough when well mixed; a cylinder that empties itself does not.'
    : 'Above 19.5 % when well mixed, with the flow and with the whole cylinder.';
}

function plotOf({ inflow, air_changes_h, hours }: Setting, now: Answer): Plot {
  const to = Math.max(1, 1.25 * hours);
  const at = (x: number) => oxygenTransient(inflow, air_changes_h, x * MINUTES_PER_HOUR);
  const points = spread({ from: 0, to }, CURVE_PIECES);
  const curve = (law: (x: number) => Result<Answer>) =>
    points.flatMap((x) => {
      const oxygen = law(x);
      return oxygen.ok ? [{ x, y: oxygen.value.value, low: oxygen.value.band.low }] : [];
    });
  const ventilated = curve(at);
  const sealed = curve((x) => oxygenSealed(inflow, x * MINUTES_PER_HOUR));
  const least = Math.min(18, ...ventilated.map(({ low }) => low), ...sealed.map(({ y }) => y));
  return {
    title: `Oxygen in the room over time: ${formatFigure(now.value, { digits: { decimals: 1 }, rounding: 'down' })} per cent after ${hours.toFixed(1)} hours`,
    x: { label: 'Time', unit: 'h', min: 0, max: to, decimals: 1 },
    y: { label: 'Oxygen', unit: '%', min: Math.max(0, least - 0.5), max: 21.5, decimals: 1 },
    band: {
      points: ventilated.map(({ x, low, y }) => ({ x, low, high: y })),
      above: 'well mixed',
      below: 'less than this',
    },
    law: ventilated.map(({ x, y }) => ({ x, y })),
    curves: [{ label: 'sealed', points: sealed.map(({ x, y }) => ({ x, y })), weight: 'thin' }],
    limit: { y: OXYGEN_LIMIT, label: 'leave under 19.5\u2009%' },
    point: { x: hours, low: now.band.low, high: now.band.high, y: now.value },
  };
}
