import { answer, type Answer, type Basis } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { firstRefusal, ok, refused, type Refusal, type Result } from '../units/result';

/** Where the arcs of a run of shots sat: the left is tight, or the right, or both alike. */
export type ArcSide = 'L' | 'R' | 'B';

/** Shots that one judgement of a side should rest on; common practice, no source. */
export const SHOTS_PER_JUDGEMENT = 10;

/** How far a search by arcs has come. Turns above 0 open the left end. */
export interface ArcSearch extends Basis {
  readonly turned_turns: number;
  readonly next_turns: number;
  readonly done: boolean;
  readonly words: string;
  /** Where the left screw stands after these turns, as far as the evidence tells: within a step either side. */
  readonly turned: Answer;
}

const MODEL = 'Step halving on arc evidence';
const VALID = 'straight bars, ten shots or more to a judgement, no arcs counted at the bar ends';

/**
 * Turns of the left screw after a run of judgements: open by the step while arcs sit left, halve it and go the other way
 * at each change of side. "B" is a streak on both sides alike, which ends the search. Arcs follow a sharp bar end too:
 * count none at the ends.
 */
export function bisectionTurns(firstStep_turns: number, sides: string): Result<Answer> {
  const bad = searchRefusal(firstStep_turns, sides);
  if (bad !== undefined) return refused(bad);
  return computed([], () => ({
    value: walk(firstStep_turns, sides).turned_turns,
    unit: 'turns',
    model: MODEL,
    valid: VALID,
    relative: 0,
  }));
}

/** The next step of the search; done once a step moves the bar by less than the feeler can tell. */
export function searchByArcs(
  search: { readonly firstStep_turns: number; readonly sides: string },
  screw: { readonly pitch_mm: number; readonly feeler_um: number },
): Result<ArcSearch> {
  const bad =
    searchRefusal(search.firstStep_turns, search.sides) ??
    firstRefusal([
      checkNumber(screw.pitch_mm, { field: 'pitch_mm', name: 'Pitch', unit: 'mm', min: 0.05, max: 20 }),
      checkNumber(screw.feeler_um, {
        field: 'feeler_um',
        name: 'Feeler error',
        unit: '\u00b5m',
        min: 1,
        max: 1000,
      }),
    ]);
  if (bad !== undefined) return refused(bad);
  const { turned_turns, step_turns } = walk(search.firstStep_turns, search.sides);
  const last = search.sides.at(-1);
  const done = last === 'B' || step_turns * screw.pitch_mm * 1000 < screw.feeler_um;
  const next_turns = done || last === undefined ? 0 : last === 'L' ? step_turns : -step_turns;
  return ok({
    turned_turns,
    next_turns,
    done,
    turned: turnedAnswer(turned_turns, step_turns),
    model: MODEL,
    valid: VALID,
    warnings: [],
    words: done
      ? last === 'B'
        ? 'Done: arcs sit on both sides alike.'
        : 'Done: a further step is less than the feeler can tell.'
      : `Fire at least ${String(SHOTS_PER_JUDGEMENT)} shots and judge the side again; leave arcs at the bar ends out.`,
  });
}

function turnedAnswer(value: number, step_turns: number): Answer {
  const one = answer({ value, unit: 'turns', model: MODEL, valid: VALID, relative: 0 });
  return { ...one, band: { low: value - step_turns, high: value + step_turns } };
}

function walk(firstStep_turns: number, sides: string) {
  let step_turns = firstStep_turns;
  let turned_turns = 0;
  let before: string | undefined;
  for (const side of sides) {
    if (side === 'B') continue;
    if (before !== undefined && side !== before) step_turns /= 2;
    turned_turns += side === 'L' ? step_turns : -step_turns;
    before = side;
  }
  return { turned_turns, step_turns };
}

function searchRefusal(firstStep_turns: number, sides: string): Refusal | undefined {
  const step = checkNumber(firstStep_turns, {
    field: 'firstStep_turns',
    name: 'First step',
    unit: 'turns',
    min: 0,
    minExcluded: true,
    max: 10,
  });
  if (!step.ok) return step.refusal;
  return typeof sides === 'string' && sides.length <= 200 && /^[LRB]*$/.test(sides)
    ? undefined
    : {
        type: 'unknown-choice',
        field: 'sides',
        words: 'Sides: give L, R or B for each judgement, at most 200.',
      };
}
