import { answer, withBand, type Answer, type Basis, type Warning } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { firstRefusal, ok, refused, type Refusal, type Result } from '../units/result';
import { BAR_GAP_RULE, gapRefusal, lineAt, PLACE_RULE, type MeasuredGap } from './gap-line';

/** An adjusting screw that moves one bar at its own place. */
export interface Screw {
  readonly place_mm: number;
  readonly pitch_mm: number;
  /** Travel of the bar at the screw over travel of the screw; 1 where it acts directly. */
  readonly lever?: number;
  /** 1 where turning in the positive sense opens the gap, -1 where it closes it. */
  readonly sense?: 1 | -1;
}

export interface TwoScrews {
  readonly gap: MeasuredGap;
  readonly target_mm: number;
  readonly screws: readonly [Screw, Screw];
}

/** Turns of both screws, and what the gap will be once they are rounded to what a hand can turn. */
export interface ScrewPlan extends Basis {
  readonly exact_turns: readonly [number, number];
  /** In eighths of a turn. */
  readonly rounded_turns: readonly [number, number];
  readonly predicted: { readonly left_mm: number; readonly right_mm: number };
  /** Error of each predicted end from the feeler alone, mm. */
  readonly feeler_mm: number;
  /** Exact turns of both screws with what the feeler leaves open of each. */
  readonly turns: readonly [Answer, Answer];
  /** Gaps that the rounded turns will give, with the feeler's error and half an eighth of a turn as their band. */
  readonly ends: { readonly left: Answer; readonly right: Answer };
}

const MODEL = 'Two screws, straight bar';
const VALID = 'the bar turns about nothing but the two screws; take up the play first';

const EIGHTHS = 8;

/** Exact turns of one screw of the two; the other end's error counts as well. */
export function screwTurns(setting: TwoScrews, which: 0 | 1): Result<Answer> {
  const bad = settingRefusal(setting);
  if (bad !== undefined) return refused(bad);
  return computed([], () => ({
    value: turnsOf(setting)[which],
    unit: 'turns',
    model: MODEL,
    valid: VALID,
    relative: 0.05,
  }));
}

/**
 * Turns of both screws to bring a bar to a target gap at both measured places, rounded to an eighth of a turn, with the
 * gaps that this will give. Refused where the screws stand at one place, or where rounding would close the gap.
 */
export function planScrews(setting: TwoScrews, feeler_um: number): Result<ScrewPlan> {
  const bad =
    settingRefusal(setting) ??
    firstRefusal([
      checkNumber(feeler_um, {
        field: 'feeler_um',
        name: 'Feeler error',
        unit: '\u00b5m',
        min: 0,
        max: 1000,
      }),
    ]);
  if (bad !== undefined) return refused(bad);
  const exact = turnsOf(setting);
  const rounded = [toEighth(exact[0]), toEighth(exact[1])] as const;
  const predicted = {
    left_mm: gapAfter(setting, rounded, setting.gap.leftPlace_mm),
    right_mm: gapAfter(setting, rounded, setting.gap.rightPlace_mm),
  };
  if (!(predicted.left_mm > 0 && predicted.right_mm > 0)) {
    return refused({
      type: 'bars-meet',
      field: 'target_mm',
      words: 'Target: these turns would bring the bars together.',
    });
  }
  const feeler_mm = feeler_um / 1000;
  return ok({
    exact_turns: exact,
    rounded_turns: rounded,
    predicted,
    feeler_mm,
    turns: [turnsAnswer(setting, 0, feeler_mm), turnsAnswer(setting, 1, feeler_mm)],
    ends: {
      left: endAnswer(setting, predicted.left_mm, feeler_mm),
      right: endAnswer(setting, predicted.right_mm, feeler_mm),
    },
    model: MODEL,
    valid: VALID,
    warnings: warningsOf(setting, rounded, feeler_mm),
  });
}

/** The feeler's error of both measured gaps, carried to the place of the screw; 5 % of pitch and lever with it. */
function turnsAnswer(setting: TwoScrews, which: 0 | 1, feeler_mm: number): Answer {
  const value = turnsOf(setting)[which];
  const screw = setting.screws[which];
  const { leftPlace_mm, rightPlace_mm } = setting.gap;
  const t = (screw.place_mm - leftPlace_mm) / (rightPlace_mm - leftPlace_mm);
  const open = (feeler_mm * Math.hypot(1 - t, t)) / Math.abs(travelPerTurn(screw));
  const error = Math.hypot(open, 0.05 * value);
  const exact = answer({ value, unit: 'turns', model: MODEL, valid: VALID, relative: 0 });
  return withBand(exact, { low: value - error, high: value + error });
}

function endAnswer({ screws }: TwoScrews, value: number, feeler_mm: number): Answer {
  const turned_mm = Math.hypot(...screws.map((screw) => travelPerTurn(screw) / (2 * EIGHTHS)));
  const error = Math.hypot(feeler_mm, turned_mm);
  const end = answer({ value, unit: 'mm', model: MODEL, valid: VALID, relative: 0 });
  return withBand(end, { low: Math.max(0, value - error), high: value + error });
}

function warningsOf(
  setting: TwoScrews,
  rounded: readonly [number, number],
  feeler_mm: number,
): readonly Warning[] {
  const { gap, target_mm } = setting;
  const warnings: Warning[] = [];
  const ends = [gap.leftPlace_mm, gap.rightPlace_mm];
  const off = Math.max(...ends.map((place) => Math.abs(gapAfter(setting, rounded, place) - target_mm)));
  if (off > Math.max(0.02 * target_mm, feeler_mm)) {
    warnings.push({
      type: 'coarse-screw',
      words: 'An eighth of a turn is coarse here: the ends stay off by more than the feeler tells.',
    });
  }
  // One screw first, the other after: on the way the bars may meet.
  const closes = [[rounded[0], 0] as const, [0, rounded[1]] as const].every((turns) =>
    ends.some((place) => gapAfter(setting, turns, place) <= 0),
  );
  if (closes) {
    warnings.push({
      type: 'meet-on-the-way',
      words: 'Turn both screws by turns: either one alone brings the bars together.',
    });
  }
  if (rounded.every((turns) => turns === 0)) {
    warnings.push({ type: 'nothing-to-turn', words: 'Within an eighth of a turn: leave it.' });
  }
  return warnings;
}

function settingRefusal({ gap, target_mm, screws }: TwoScrews): Refusal | undefined {
  const [first, second] = screws;
  return (
    gapRefusal(gap) ??
    firstRefusal([
      checkNumber(target_mm, { ...BAR_GAP_RULE, field: 'target_mm', name: 'Target' }),
      ...screws.flatMap((screw, index) => screwChecks(screw, String(index + 1))),
    ]) ??
    (Math.abs(first.place_mm - second.place_mm) < 1e-3
      ? {
          type: 'same-place',
          field: 'screws',
          words: 'Screws: both stand at one place, so they cannot turn the bar.',
        }
      : undefined) ??
    (screws.some(({ sense }) => sense !== undefined && Math.abs(sense) !== 1)
      ? {
          type: 'unknown-choice',
          field: 'screws',
          words: 'Screws: say for each whether turning in opens or closes.',
        }
      : undefined)
  );
}

function screwChecks(screw: Screw, number: string) {
  return [
    checkNumber(screw.place_mm, {
      ...PLACE_RULE,
      field: `screw${number}_place_mm`,
      name: `Place of screw ${number}`,
    }),
    checkNumber(screw.pitch_mm, {
      field: `screw${number}_pitch_mm`,
      name: `Pitch of screw ${number}`,
      unit: 'mm',
      min: 0.05,
      max: 20,
    }),
    checkNumber(screw.lever ?? 1, {
      field: `screw${number}_lever`,
      name: `Lever ratio of screw ${number}`,
      unit: '',
      min: 0.01,
      max: 100,
    }),
  ];
}

function travelPerTurn({ pitch_mm, lever = 1, sense = 1 }: Screw): number {
  return pitch_mm * lever * sense;
}

function turnsOf({ gap, target_mm, screws }: TwoScrews): readonly [number, number] {
  const turns = (screw: Screw) => (target_mm - lineAt(gap, screw.place_mm)) / travelPerTurn(screw);
  return [turns(screws[0]), turns(screws[1])];
}

function gapAfter({ gap, screws }: TwoScrews, turns: readonly [number, number], place_mm: number): number {
  const [first, second] = screws;
  const t = (place_mm - first.place_mm) / (second.place_mm - first.place_mm);
  const moved = turns[0] * travelPerTurn(first) * (1 - t) + turns[1] * travelPerTurn(second) * t;
  return lineAt(gap, place_mm) + moved;
}

function toEighth(turns: number): number {
  const eighths = Math.round(turns * EIGHTHS);
  return eighths === 0 ? 0 : eighths / EIGHTHS;
}
