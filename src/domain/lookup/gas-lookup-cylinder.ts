import { orderPressure, usableGas, wholeGas, type Stock } from '../gas/cylinder-stock';
import { freeVolumeIdeal } from '../gas/cylinder';
import { roomForDump } from '../gas/room-oxygen';
import type { Answer, Warning } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { ok, type Result } from '../units/result';
import type { Entered } from './entered';
import { allOf, figureOf, spread } from './figures';
import type { Figure, LookupAnswer, Plot } from './lookup';

/** A flowmeter is rarely better than this share; common practice. */
const FLOW_ERROR = 0.05;
const MINUTES_PER_HOUR = 60;
const CURVE_PIECES = 20;

interface Use {
  readonly flow_L_min: number;
  readonly hours_day: number;
  readonly delivery_days: number;
  readonly ambient: number;
}

/** Litres and hours left, counted with the least gas and the largest flow that the band allows. */
export function cylinderAnswer(input: Entered): Result<LookupAnswer> {
  const ambient = input.number('ambient_bar_abs');
  const stock: Stock = {
    gas: input.choice('gas'),
    volume_L: input.number('cylinder_L'),
    pressure_bar_abs: input.number('cylinder_bar_g') + ambient,
    temperature_C: input.number('temperature_C'),
    rest_bar_abs: input.number('rest_bar_g') + ambient,
  };
  const use: Use = {
    flow_L_min: input.number('flow_L_min'),
    hours_day: input.number('hours_day'),
    delivery_days: input.number('delivery_days'),
    ambient,
  };
  const needed_L = use.flow_L_min * MINUTES_PER_HOUR * use.hours_day * use.delivery_days;
  const parts = allOf({
    left: usableGas(stock),
    whole: wholeGas(stock),
    ideal: freeVolumeIdeal(stock),
    order_bar_abs: orderPressure(stock, needed_L * (1 + FLOW_ERROR)),
  });
  if (!parts.ok) return parts;
  const { left, whole, ideal, order_bar_abs } = parts.value;
  const hours = hoursOf(left, use.flow_L_min);
  const due = order_bar_abs === null || stock.pressure_bar_abs <= order_bar_abs;
  return ok({
    figures: [
      figureOf(['left', 'gas that may still be drawn'], left, { rounding: 'down', weight: 'answer' }),
      {
        ...hours,
        key: 'hours',
        label: 'it lasts',
        unit: 'h',
        rounding: 'down',
        digits: 3,
        weight: 'answer',
        note: `plan with ${formatFigure(hours.low, { digits: { significant: 3 }, rounding: 'down' })}\u2009h in use`,
      },
      daysFigure(['days', 'working days left'], hours, use.hours_day, 0),
      daysFigure(['order_in', 'working days until an order is due'], hours, use.hours_day, use.delivery_days),
      orderFigure(order_bar_abs, ambient),
      figureOf(['whole', 'gas if all of it escapes, at 15\u00a0\u00b0C and 1 atm'], whole, {
        rounding: 'up',
        times: 1e-3,
        unit: 'm\u00b3',
      }),
      ...roomFigures(stock.gas, whole),
      figureOf(['ideal', 'the same by the ideal gas'], ideal, {
        rounding: 'nearest',
        times: 1e-3,
        unit: 'm\u00b3',
        weight: 'side',
      }),
    ],
    says: due
      ? 'Order now: what is left lasts no longer than a delivery takes.'
      : `Enough until a delivery, if ordered within ${daysText(daysUntil(hours.value, use))}.`,
    model: left.model,
    valid: `${left.valid}; no leak; the flow within 5\u2009%`,
    warnings: [...left.warnings, ...leakWarnings(stock.gas)],
    cautions: [
      CYLINDER_CAUTIONS[stock.gas] ??
        'A room that fills with this gas gives no warning: see the room lookup.',
      'Cylinders stand chained, capped when not in use, and away from the discharge. Local rules go before this.',
    ],
    plot: plotOf(stock, { left, order_bar_abs, ambient }),
  });
}

const CYLINDER_CAUTIONS: Readonly<Record<string, string>> = {
  O2: 'Oxygen makes clothes, grease and film burn like tinder: never near oil, and never beside a spark.',
  H2: 'Hydrogen burns from 4 % in air with a flame that is not seen, and a spark lights it.',
};

function hoursOf(left: Answer, flow_L_min: number) {
  const at = (litres: number, share: number) => litres / (flow_L_min * share) / MINUTES_PER_HOUR;
  return {
    value: at(left.value, 1),
    low: Math.max(0, at(left.band.low, 1 + FLOW_ERROR)),
    high: at(left.band.high, 1 - FLOW_ERROR),
  };
}

function daysFigure(
  [key, label]: readonly [string, string],
  hours: { readonly value: number; readonly low: number; readonly high: number },
  ...[hours_day, less]: readonly [number, number]
): Figure {
  const days = (h: number) => Math.max(0, h / hours_day - less);
  return {
    key,
    label,
    value: days(hours.value),
    low: days(hours.low),
    high: days(hours.high),
    unit: 'days',
    rounding: 'down',
    digits: 3,
    decimals: 1,
    weight: 'main',
  };
}

function daysUntil(hours: number, { hours_day, delivery_days }: Use): number {
  return Math.max(0, hours / hours_day - delivery_days);
}

function daysText(days: number): string {
  const whole = formatFigure(days, { digits: { decimals: 0 }, rounding: 'down' });
  return whole === '1' ? '1 working day' : `${whole} working days`;
}

function orderFigure(order_bar_abs: number | null, ambient: number): Figure {
  const shape = {
    key: 'order_at',
    label: 'order at, by the contents gauge',
    unit: 'bar(g)',
    rounding: 'up',
    digits: 3,
    decimals: 0,
    weight: 'main',
  } as const;
  return order_bar_abs === null
    ? { ...shape, value: 0, words: 'more than a full cylinder: hold a second one' }
    : { ...shape, value: Math.max(0, order_bar_abs - ambient) };
}

function roomFigures(gas: string, whole: Answer): readonly Figure[] {
  if (gas === 'air' || gas === 'O2') return [];
  const room = roomForDump(whole.band.high / 1000);
  if (!room.ok) return [];
  return [
    figureOf(['room', 'room that keeps 19.5 % of oxygen if all of it escapes'], room.value, {
      rounding: 'up',
      note: 'less room than this: leave at once',
    }),
  ];
}

function leakWarnings(gas: string): readonly Warning[] {
  return gas === 'N2' || gas === 'air' || gas === 'O2'
    ? []
    : [
        {
          type: 'flow-for-gas',
          words: `Read the flow on a scale for ${gas}: one for air or nitrogen is off.`,
        },
      ];
}

function plotOf(
  stock: Stock,
  of: { readonly left: Answer; readonly order_bar_abs: number | null; readonly ambient: number },
): Plot {
  const { left, order_bar_abs, ambient } = of;
  const now = stock.pressure_bar_abs - ambient;
  const from = stock.rest_bar_abs - ambient;
  const top = Math.max(200, now, from + 10);
  const points = spread({ from, to: top }, CURVE_PIECES).flatMap((x) => {
    const at = usableGas({ ...stock, pressure_bar_abs: x + ambient });
    if (!at.ok) return [];
    return [{ x, y: at.value.value, low: Math.max(0, at.value.band.low), high: at.value.band.high }];
  });
  const order = order_bar_abs === null ? undefined : usableGas({ ...stock, pressure_bar_abs: order_bar_abs });
  const most = Math.max(left.band.high, ...points.map(({ high }) => high), 1);
  return {
    title: `Gas that may still be drawn at ${now.toFixed(0)} bar gauge: ${formatFigure(left.value, { digits: { significant: 3 }, rounding: 'down' })} L`,
    x: { label: 'Cylinder pressure', unit: 'bar(g)', min: 0, max: top, decimals: 0 },
    y: { label: 'Left', unit: 'L', min: 0, max: most * 1.1, decimals: 0 },
    band: {
      points: points.map(({ x, low, high }) => ({ x, low, high })),
      above: 'more than is there',
      below: 'can be drawn',
    },
    law: points.map(({ x, y }) => ({ x, y })),
    point: { x: now, low: Math.max(0, left.band.low), high: left.band.high, y: left.value },
    ...(order?.ok === true ? { limit: { y: order.value.value, label: 'order here' } } : {}),
  };
}
