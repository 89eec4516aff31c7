import { allowedMismatch, breakdownSpread, gapAlong, wedge, type MeasuredGap } from '../alignment/gap-line';
import { planScrews, type Screw, type ScrewPlan } from '../alignment/screws';
import type { Answer } from '../units/answer';
import { andThen, mapResult, ok, refused, type Result } from '../units/result';
import { ALIGNMENT_FIELDS } from './alignment-lookup-fields';
import { alignmentPlot } from './alignment-lookup-plot';
import { alignmentStart } from './alignment-lookup-start';
import { beside, entered, type Entered } from './entered';
import { textAt } from './fields';
import { allOf, figureOf, warningsOf } from './figures';
import type { Figure, Lookup, LookupAnswer, Values } from './lookup';

/** Two bars brought parallel by two screws (physics F). */
export const ALIGNMENT_LOOKUP: Lookup = {
  key: 'alignment',
  title: 'Alignment',
  decides: 'Which screw of the channel, which way and how far, and how even it will be then.',
  fields: ALIGNMENT_FIELDS,
  start: alignmentStart,
  answer: (values) =>
    andThen(entered(ALIGNMENT_FIELDS, values), (input) =>
      beside(answer(input, values), ALIGNMENT_FIELDS, FIELD_NAMES),
    ),
  solvable: [
    { field: 'gap_b_mm', figure: 'spread', rounding: 'nearest' },
    { field: 'gap_a_mm', figure: 'spread', rounding: 'nearest' },
    { field: 'allowed_percent', figure: 'allowed', rounding: 'down', purpose: 'allow at most' },
  ],
};

const FIELD_NAMES: Readonly<Record<string, string>> = {
  left_mm: 'gap_a_mm',
  right_mm: 'gap_b_mm',
  leftPlace_mm: 'place_a_mm',
  rightPlace_mm: 'place_b_mm',
  feeler_um: 'feeler_mm',
  gap_mm: 'target_mm',
  pressure: 'channel_bar_g',
  screws: 'screw2_place_mm',
  spread: 'allowed_percent',
};

interface Setting {
  readonly gap: MeasuredGap;
  readonly length_mm: number;
  readonly feeler_um: number;
  readonly pressure_bar_abs: number;
}

function answer(input: Entered, values: Values): Result<LookupAnswer> {
  const setting: Setting = {
    gap: {
      left_mm: input.number('gap_a_mm'),
      right_mm: input.number('gap_b_mm'),
      leftPlace_mm: input.number('place_a_mm'),
      rightPlace_mm: input.number('place_b_mm'),
    },
    length_mm: input.number('length_mm'),
    feeler_um: 1000 * input.number('feeler_mm'),
    pressure_bar_abs: input.number('ambient_bar_abs') + input.number('channel_bar_g'),
  };
  const target_mm = input.number('target_mm');
  const screws = [screwAt(input, '1'), screwAt(input, '2')] as const;
  const plan = planScrews({ gap: setting.gap, target_mm, screws }, setting.feeler_um);
  if (!plan.ok) return plan;
  const { left_mm, right_mm } = plan.value.predicted;
  const parts = allOf({
    angle: wedge(setting.gap, setting.feeler_um),
    now: spreadOf(setting),
    then: spreadOf({ ...setting, gap: { ...setting.gap, left_mm, right_mm } }),
    allowed: allowedMismatch(target_mm, setting.pressure_bar_abs, input.number('allowed_percent') / 100),
  });
  if (!parts.ok) return parts;
  const { angle, now, then, allowed } = parts.value;
  const names = [nameOf(values, '1'), nameOf(values, '2')] as const;
  return ok({
    figures: [
      ...screwFigures(plan.value, screws, names),
      ...endFigures(plan.value, setting.feeler_um),
      spreadFigure('spread', 'end-to-end breakdown spread now, B over A', now),
      spreadFigure('spread_then', 'spread after these turns', then),
      mismatchFigure(setting, allowed),
      figureOf(['allowed', 'mismatch of the ends that the allowed spread stands for'], allowed, {
        rounding: 'down',
      }),
      figureOf(['wedge', 'wedge, above 0 where B is wider'], angle, { rounding: 'nearest', weight: 'side' }),
    ],
    says: wordsOf(plan.value, screws, names),
    model: `${plan.value.model}; ${now.model.toLowerCase()}`,
    valid: `straight bars, play taken up first; ${now.valid}`,
    warnings: [...spreadWarnings(now, input.number('allowed_percent')), ...warningsOf([plan.value, angle])],
    cautions: [
      'Hands go in only after make-safe: shorted, proved, and the shorts left on. The bars are part of the charged circuit.',
      'Turn a little and measure again: a screw that closes where it should open brings the bars together.',
    ],
    plot: alignmentPlot({ ...setting, target_mm, plan: plan.value }),
  });
}

function screwAt(input: Entered, number: string): Screw {
  return {
    place_mm: input.number(`screw${number}_place_mm`),
    pitch_mm: input.number(`screw${number}_pitch_mm`),
    lever: input.number(`screw${number}_lever`),
    // Turns count above 0 clockwise.
    sense: input.choice(`screw${number}_closes`) === 'clockwise' ? -1 : 1,
  };
}

function nameOf(values: Values, number: string): string {
  const name = textAt(values, `screw${number}_name`)?.trim() ?? '';
  return name === '' ? `screw ${number}` : name;
}

/** Both ends of the active length; the feeler\u2019s error may lie against each other at the two places. */
function spreadOf({ gap, length_mm, feeler_um, pressure_bar_abs }: Setting): Result<Answer> {
  const u = feeler_um / 1000;
  const between = (left: number, right: number): Result<Answer> => {
    const line = { ...gap, left_mm: gap.left_mm + left, right_mm: gap.right_mm + right };
    const ends = allOf({ a: gapAlong(line, 0, 0), b: gapAlong(line, length_mm, 0) });
    if (!ends.ok) return ends;
    const { a, b } = ends.value;
    if (a.value < LEAST_GAP_MM) return refused(meets('gap_a_mm', 'A'));
    if (b.value < LEAST_GAP_MM) return refused(meets('gap_b_mm', 'B'));
    return breakdownSpread(a.value, b.value, pressure_bar_abs);
  };
  const [a_wider, b_wider] = gap.leftPlace_mm < gap.rightPlace_mm ? [u, -u] : [-u, u];
  const middle = between(0, 0);
  if (!middle.ok) return middle;
  return mapResult(
    allOf({ low: between(a_wider, b_wider), high: between(-a_wider, -b_wider) }),
    ({ low, high }) => ({
      ...middle.value,
      band: {
        low: Math.min(low.band.low, middle.value.band.low),
        high: Math.max(high.band.high, middle.value.band.high),
      },
    }),
  );
}

const LEAST_GAP_MM = 0.01;

function meets(field: string, end: string) {
  return {
    type: 'bars-meet',
    field,
    words: `Gap at ${end}: by this line, and within the feeler\u2019s error, the bars may touch at the ${end} end.`,
  };
}

function spreadFigure(key: string, label: string, of: Answer): Figure {
  // A spread is as bad below 0 as above: its size never rounds away to nothing.
  return figureOf([key, label], of, {
    rounding: of.value < 0 ? 'down' : 'up',
    times: 100,
    unit: '%',
    digits: 2,
  });
}

function mismatchFigure({ gap, feeler_um }: Setting, allowed: Answer): Figure {
  const value = 1000 * Math.abs(gap.right_mm - gap.left_mm);
  const error = Math.SQRT2 * feeler_um;
  return {
    key: 'mismatch',
    label: 'mismatch of the two readings',
    value,
    low: Math.max(0, value - error),
    high: value + error,
    unit: '\u00b5m',
    rounding: 'up',
    digits: 3,
    weight: 'main',
    note: value > allowed.value ? 'more than allowed' : 'within what is allowed',
  };
}

function endFigures({ predicted, feeler_mm }: ScrewPlan, feeler_um: number): readonly Figure[] {
  const end = (key: string, label: string, value: number): Figure => ({
    key,
    label,
    value,
    low: Math.max(0, value - feeler_mm),
    high: value + feeler_mm,
    unit: 'mm',
    rounding: 'nearest',
    digits: 3,
    decimals: feeler_um < 10 ? 3 : 2,
    weight: 'main',
  });
  return [
    end('gap_a_then', 'gap at A after these turns', predicted.left_mm),
    end('gap_b_then', 'gap at B after these turns', predicted.right_mm),
  ];
}

type Pair<T> = readonly [T, T];

function screwFigures(plan: ScrewPlan, screws: Pair<Screw>, names: Pair<string>): readonly Figure[] {
  return ([0, 1] as const).map((which) => {
    const turns = plan.rounded_turns[which];
    return {
      key: `screw${which + 1}`,
      label: turns === 0 ? `${names[which]}: leave it` : `${names[which]}, ${wayOf(turns)}`,
      value: Math.abs(turns),
      unit: Math.abs(turns) > 1 ? 'turns' : 'turn',
      rounding: 'nearest',
      digits: 3,
      decimals: 3,
      weight: 'answer',
      note: turns === 0 ? 'within an eighth of a turn' : doesOf(turns, screws[which]),
    };
  });
}

function wayOf(turns: number): string {
  return turns > 0 ? 'clockwise' : 'anticlockwise';
}

function doesOf(turns: number, screw: Screw): string {
  return turns * (screw.sense ?? 1) > 0 ? 'opens the gap' : 'closes the gap';
}

function wordsOf(plan: ScrewPlan, screws: Pair<Screw>, names: Pair<string>): string {
  const moves = ([0, 1] as const)
    .filter((which) => plan.rounded_turns[which] !== 0)
    .map((which) => {
      const turns = plan.rounded_turns[which];
      return `${names[which]} by ${eighthsOf(turns)} ${wayOf(turns)} (${doesOf(turns, screws[which])})`;
    });
  if (moves.length === 0) return 'Leave both screws: what is left is under an eighth of a turn.';
  return `Turn ${moves.join(', then ')}. Then measure again.`;
}

const FRACTIONS = ['', '1/8', '1/4', '3/8', '1/2', '5/8', '3/4', '7/8'];

function eighthsOf(turns: number): string {
  const eighths = Math.round(8 * Math.abs(turns));
  const [whole, part] = [Math.floor(eighths / 8), FRACTIONS[eighths % 8] ?? ''];
  const number = [whole === 0 ? '' : String(whole), part].filter((text) => text !== '').join(' ');
  return `${number} ${eighths > 8 ? 'turns' : 'turn'}`;
}

function spreadWarnings(now: Answer, allowed_percent: number) {
  const { low, high } = now.band;
  const over = 100 * Math.abs(now.value) > allowed_percent;
  if (low < 0 && high > 0 && 100 * Math.max(-low, high) > allowed_percent) {
    return [
      {
        type: 'within-feeler',
        words:
          'The feeler cannot tell which end is tight. Let the arcs decide: at least ten shots to a judgement.',
      },
    ];
  }
  if (!over) return [];
  const tight = now.value < 0 ? 'B' : 'A';
  return [{ type: 'uneven', words: `The ${tight} end is the tight one: arcs will sit there.` }];
}
