import { hoopStress, storedEnergyBrode, storedEnergyIsothermal, storedGasEnergy } from '../gas/vessel';
import type { Answer, Warning } from '../units/answer';
import { ok, type Result } from '../units/result';
import type { Entered } from './entered';
import { allOf, figureOf, spread, warningsOf } from './figures';
import type { Figure, LookupAnswer, Plot } from './lookup';

const CURVE_PIECES = 30;

interface Body {
  readonly pressure_bar_g: number;
  readonly inner_mm: number;
  readonly wall_mm: number;
}

/** What the body of a pressed gap carries, and the energy of its gas: the larger of two sums. */
export function vesselAnswer(input: Entered): Result<LookupAnswer> {
  const ambient_bar_abs = input.number('ambient_bar_abs');
  const body: Body = {
    pressure_bar_g: input.number('vessel_bar_g'),
    inner_mm: input.number('inner_mm'),
    wall_mm: input.number('wall_mm'),
  };
  const gas = {
    ambient_bar_abs,
    pressure_bar_abs: body.pressure_bar_g + ambient_bar_abs,
    volume_L: input.number('volume_cm3') / 1000,
  };
  const parts = allOf({
    hoop: stressOf(body),
    larger: storedGasEnergy(gas),
    brode: storedEnergyBrode(gas),
    isothermal: storedEnergyIsothermal(gas),
  });
  if (!parts.ok) return parts;
  const { hoop, larger, brode, isothermal } = parts.value;
  const strength_MPa = input.maybe('strength_MPa');
  return ok({
    figures: [
      figureOf(['hoop', 'hoop stress at the inside'], hoop, {
        rounding: 'up',
        weight: 'answer',
        note: 'plain tube; holes and threads carry several times more',
      }),
      figureOf(['energy', 'energy of the pressed gas'], larger, {
        rounding: 'up',
        weight: 'answer',
        note: 'a burst throws fragments: stand behind a shield',
      }),
      ...marginFigures(hoop, strength_MPa),
      figureOf(['brode', 'energy by Brode'], brode, { rounding: 'up', weight: 'side' }),
      figureOf(['isothermal', 'energy at one temperature'], isothermal, { rounding: 'up', weight: 'side' }),
    ],
    says: reliefWords({
      pressure: body.pressure_bar_g,
      relief: input.maybe('relief_bar_g'),
      rated: input.maybe('rated_bar_g'),
    }),
    model: `${hoop.model} (Lam\u00e9); ${larger.model}`,
    valid: hoop.valid,
    warnings: warningsOf([hoop, { warnings: marginWarnings(hoop, strength_MPa) }]),
    cautions: [
      'Proof-test with water, never with gas. Acrylic, polycarbonate and PVC age under UV and ozone and break without warning.',
      'This is a sum over a plain tube and no permission to press it: local rules and a qualified person decide.',
    ],
    plot: plotOf(body, hoop, strength_MPa),
  });
}

function stressOf({ pressure_bar_g, inner_mm, wall_mm }: Body): Result<Answer> {
  const radius_mm = inner_mm / 2;
  return hoopStress({ pressure_bar_g, inner_mm: radius_mm, outer_mm: radius_mm + wall_mm });
}

function marginFigures(hoop: Answer, strength_MPa: number | null): readonly Figure[] {
  const shape = {
    key: 'margin',
    label: 'strength over stress',
    unit: '',
    rounding: 'down',
    digits: 2,
    weight: 'main',
  } as const;
  if (strength_MPa === null) return [{ ...shape, value: 0, words: 'enter the strength of the wall' }];
  // A pressure that no gauge shows leaves no ratio to give.
  if (hoop.value < 1e-6) return [{ ...shape, value: 0, words: 'no pressure' }];
  return [
    {
      ...shape,
      value: strength_MPa / hoop.value,
      low: strength_MPa / hoop.band.high,
      high: strength_MPa / hoop.band.low,
    },
  ];
}

/** Holes, threads and ends carry up to three times the plain tube. */
function marginWarnings(hoop: Answer, strength_MPa: number | null): readonly Warning[] {
  if (strength_MPa === null || strength_MPa >= hoop.band.high) return [];
  return [
    {
      type: 'over-strength',
      words: 'At a hole or a thread this wall may carry more than its strength: it must not be pressed.',
    },
  ];
}

function reliefWords(of: {
  readonly pressure: number;
  readonly relief: number | null;
  readonly rated: number | null;
}): string {
  const { pressure, relief, rated } = of;
  if (rated === null) return 'No rating entered: nothing here says that this body may be pressed.';
  if (relief === null)
    return 'No relief valve entered: the regulator alone stands between cylinder and body.';
  if (relief > rated) return 'The relief valve opens above the rating: it protects nothing.';
  if (pressure > rated) {
    return 'The regulator can give more than the rating: all of it must leave through the relief valve.';
  }
  return 'Relief and regulator stay within the rating. Whether the valve passes the full flow is not worked out here.';
}

function plotOf(body: Body, hoop: Answer, strength_MPa: number | null): Plot {
  const to = Math.max(2 * body.pressure_bar_g, 1);
  const points = spread({ from: 0, to }, CURVE_PIECES).flatMap((x) => {
    const at = stressOf({ ...body, pressure_bar_g: x });
    return at.ok ? [{ x, y: at.value.value, low: at.value.band.low, high: at.value.band.high }] : [];
  });
  const most = Math.max(...points.map(({ high }) => high), 0.1);
  return {
    title: `Hoop stress at ${body.pressure_bar_g.toFixed(2)} bar gauge: ${hoop.value.toPrecision(3)} megapascal in a plain tube, up to three times that at holes`,
    x: { label: 'Pressure', unit: 'bar(g)', min: 0, max: to, decimals: 1 },
    y: { label: 'Stress', unit: 'MPa', min: 0, max: most, decimals: 1 },
    band: {
      points: points.map(({ x, low, high }) => ({ x, low, high })),
      above: 'more than it carries',
      below: 'plain tube',
    },
    law: points.map(({ x, y }) => ({ x, y })),
    point: { x: body.pressure_bar_g, low: hoop.band.low, high: hoop.band.high, y: hoop.value },
    ...(strength_MPa !== null && strength_MPa <= most
      ? { limit: { y: strength_MPa, label: `strength ${strength_MPa.toPrecision(3)}\u2009MPa` } }
      : {}),
  };
}
