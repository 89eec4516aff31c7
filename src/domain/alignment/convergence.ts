/** Gaps at the two places where the feeler goes in, and its error. */
export interface GapPair {
  readonly a_mm: number;
  readonly b_mm: number;
  readonly feeler_mm: number;
}

export interface ScrewMoved {
  readonly name: string;
  /** Place along the bar, mm from the A end. */
  readonly place_mm: number;
  /** What the turns were to give at the screw, mm; above 0 opens. */
  readonly expected_mm: number;
}

export type ArcPlace = 'even' | 'a-end' | 'mid' | 'b-end' | 'both-ends';

/** One line of the history, oldest first. */
export type AlignmentStep =
  | { readonly type: 'measured'; readonly gaps: GapPair }
  | { readonly type: 'turned'; readonly screws: readonly ScrewMoved[] }
  | { readonly type: 'arcs'; readonly where: ArcPlace };

export interface AlignmentGoal {
  readonly target_mm: number;
  /** Difference of the two ends that the discharge still bears, mm. */
  readonly allowed_mm: number;
  readonly place_a_mm: number;
  readonly place_b_mm: number;
}

export type ConvergenceReason =
  | 'screw-reversed'
  | 'screw-stuck'
  | 'moved-otherwise'
  | 'moved-untouched'
  | 'not-repeated'
  | 'turned-away'
  | 'feeler-coarse'
  | 'arcs-contradict'
  | 'bowed'
  | 'swings';

export interface Convergence {
  readonly state: 'nothing-measured' | 'first' | 'converging' | 'stuck' | 'even';
  readonly lead: string;
  readonly reasons: readonly { readonly type: ConvergenceReason; readonly words: string }[];
  /** The farther end's distance from the target after each measurement, mm. */
  readonly errors_mm: readonly number[];
}

/** Two readings of one feeler differ by so much without anything having moved, in errors of one (about 95 %). */
const SAME_WITHIN = 2 * Math.SQRT2;

/** A step that leaves more than this share of the error is no progress. */
const PROGRESS = 0.9;

/**
 * Whether the alignment converges, or what keeps it from it. What each screw did is read back from the two measurements
 * round the last turning: straight bars, so the movement is a line along them. Two gaps cannot tell a bowed bar; arcs
 * in the middle or at both ends can.
 */
export function judgeConvergence(steps: readonly AlignmentStep[], goal: AlignmentGoal): Convergence {
  const measured = steps.filter((step) => step.type === 'measured');
  const last = measured.at(-1);
  const errors_mm = measured.map(({ gaps }) => farthest(gaps, goal));
  if (last === undefined) {
    return { state: 'nothing-measured', lead: 'Measure both ends first.', reasons: [], errors_mm };
  }
  const reasons = [
    ...repeatReasons(steps),
    ...screwReasons(steps, goal),
    ...arcReasons(steps, last.gaps),
    ...feelerReasons(last.gaps, goal),
    ...swingReasons(measured.map(({ gaps }) => gaps)),
  ];
  const said = verdict(last.gaps, { errors_mm, goal, reasons });
  // Every screw did as turned, and yet it is no better: then the turns were the wrong ones.
  const why = said.state === 'stuck' && reasons.length === 0 ? [TURNED_AWAY] : reasons;
  return { ...said, reasons: why, errors_mm };
}

const TURNED_AWAY = {
  type: 'turned-away',
  words: 'No nearer to the target: turn as recommended from the last gaps, and measure again.',
} as const;

function verdict(
  gaps: GapPair,
  known: {
    readonly errors_mm: readonly number[];
    readonly goal: AlignmentGoal;
    readonly reasons: Convergence['reasons'];
  },
): Pick<Convergence, 'state' | 'lead'> {
  const { errors_mm, goal, reasons } = known;
  const now = errors_mm.at(-1) ?? 0;
  const before = errors_mm.at(-2);
  const noise = SAME_WITHIN * gaps.feeler_mm;
  const apart = Math.abs(gaps.a_mm - gaps.b_mm);
  if (apart <= Math.max(goal.allowed_mm, noise) && now <= Math.max(goal.allowed_mm, noise)) {
    return reasons.some(({ type }) => type === 'arcs-contradict' || type === 'bowed')
      ? { state: 'stuck', lead: 'The gaps are even, the discharge is not.' }
      : { state: 'even', lead: 'Even, as far as the feeler tells.' };
  }
  if (before === undefined) return { state: 'first', lead: 'Measured once; turn, and measure again.' };
  return now < before * PROGRESS
    ? { state: 'converging', lead: 'It converges.' }
    : { state: 'stuck', lead: 'It does not converge.' };
}

function farthest(gaps: GapPair, { target_mm }: AlignmentGoal): number {
  return Math.max(Math.abs(gaps.a_mm - target_mm), Math.abs(gaps.b_mm - target_mm));
}

/** The last turning with a measurement before and after it. */
function lastTurning(steps: readonly AlignmentStep[]) {
  const after = steps.findLastIndex((step) => step.type === 'measured');
  const from = steps.slice(0, Math.max(0, after)).findLastIndex((step) => step.type === 'measured');
  const before = steps[from];
  const now = steps[after];
  if (before?.type !== 'measured' || now?.type !== 'measured') return null;
  const turned = steps.slice(from + 1, after).filter((step) => step.type === 'turned');
  return turned.length === 0 ? null : { before: before.gaps, now: now.gaps, turned };
}

/** Two measurements with no screw turned between them should agree. */
function repeatReasons(steps: readonly AlignmentStep[]): Convergence['reasons'] {
  const relevant = steps.filter((step) => step.type !== 'arcs');
  const [before, now] = relevant.slice(-2);
  if (before?.type !== 'measured' || now?.type !== 'measured') return [];
  const noise = 2 * Math.hypot(before.gaps.feeler_mm, now.gaps.feeler_mm);
  const apart = Math.max(
    Math.abs(now.gaps.a_mm - before.gaps.a_mm),
    Math.abs(now.gaps.b_mm - before.gaps.b_mm),
  );
  if (apart <= noise) return [];
  return [
    {
      type: 'not-repeated',
      words:
        'No screw was turned between the last two measurements, yet they differ: measure again with the same drag on the feeler, and look for play.',
    },
  ];
}

function screwReasons(steps: readonly AlignmentStep[], goal: AlignmentGoal): Convergence['reasons'] {
  const found = lastTurning(steps);
  if (found === null) return [];
  const screws = summed(found.turned.flatMap((step) => step.screws));
  return screws.flatMap((screw) => {
    const { moved_mm, error_mm } = movement(found, screw.place_mm, goal);
    return screwReason(screw, moved_mm, error_mm);
  });
}

function summed(screws: readonly ScrewMoved[]): readonly ScrewMoved[] {
  const byName = new Map<string, ScrewMoved>();
  for (const screw of screws) {
    const expected_mm = screw.expected_mm + (byName.get(screw.name)?.expected_mm ?? 0);
    byName.set(screw.name, { ...screw, expected_mm });
  }
  return [...byName.values()];
}

function movement(
  { before, now }: { readonly before: GapPair; readonly now: GapPair },
  place_mm: number,
  { place_a_mm, place_b_mm }: AlignmentGoal,
) {
  const t = (place_mm - place_a_mm) / (place_b_mm - place_a_mm);
  const a = now.a_mm - before.a_mm;
  const b = now.b_mm - before.b_mm;
  const feeler = Math.hypot(before.feeler_mm, now.feeler_mm);
  return { moved_mm: a + (b - a) * t, error_mm: 2 * feeler * Math.hypot(1 - t, t) };
}

function screwReason(
  { name, expected_mm }: ScrewMoved,
  moved_mm: number,
  error_mm: number,
): Convergence['reasons'] {
  const asked = Math.abs(expected_mm) > error_mm;
  const moved = Math.abs(moved_mm) > error_mm;
  if (Math.abs(moved_mm - expected_mm) <= error_mm || (!asked && !moved)) return [];
  if (!asked) {
    return [
      {
        type: 'moved-untouched',
        words: `${name} was not turned, yet the bar moved there: look for a loose clamp or a bar that turns about something else.`,
      },
    ];
  }
  if (!moved) {
    return [
      {
        type: 'screw-stuck',
        words: `${name} was turned, but the bar did not follow: take up the play, look for a locked clamp.`,
      },
    ];
  }
  if (Math.sign(moved_mm) !== Math.sign(expected_mm)) {
    return [
      {
        type: 'screw-reversed',
        words: `${name} moved the bar the other way: which way of turning closes is entered wrongly, or it was turned the wrong way.`,
      },
    ];
  }
  const share = Math.round((100 * moved_mm) / expected_mm);
  return [
    {
      type: 'moved-otherwise',
      words: `${name} moved the bar by ${share} % of what its pitch and lever say: count the turns, take up the play, look at both numbers.`,
    },
  ];
}

/** Arcs seen since the last turning say where the gap is tight; they are held against the last measurement. */
function arcReasons(steps: readonly AlignmentStep[], gaps: GapPair): Convergence['reasons'] {
  const since = steps.slice(steps.findLastIndex((step) => step.type === 'turned') + 1);
  const seen = since.findLast((step) => step.type === 'arcs');
  if (seen === undefined || seen.where === 'even') return [];
  if (seen.where === 'mid' || seen.where === 'both-ends') {
    const words =
      seen.where === 'mid'
        ? 'Arcs sit in the middle: two gaps cannot tell a bowed bar or dirt there. Measure the middle as well.'
        : 'Arcs sit at both ends: sharp bar ends or a bowed bar, which no screw can mend.';
    return [{ type: 'bowed', words }];
  }
  const tight_mm = seen.where === 'a-end' ? gaps.b_mm - gaps.a_mm : gaps.a_mm - gaps.b_mm;
  const end = seen.where === 'a-end' ? 'A' : 'B';
  if (tight_mm >= -SAME_WITHIN * gaps.feeler_mm) return [];
  return [
    {
      type: 'arcs-contradict',
      words: `Arcs sit at the ${end} end, where the feeler finds the wider gap: look there for an edge, dirt or the gas flow, and measure again.`,
    },
  ];
}

function feelerReasons(gaps: GapPair, { allowed_mm }: AlignmentGoal): Convergence['reasons'] {
  if (
    gaps.feeler_mm * SAME_WITHIN <= allowed_mm ||
    Math.abs(gaps.a_mm - gaps.b_mm) > SAME_WITHIN * gaps.feeler_mm
  )
    return [];
  return [
    {
      type: 'feeler-coarse',
      words:
        'What is left is less than the feeler can tell: go on by where the arcs sit, an eighth of a turn at a time.',
    },
  ];
}

/** The wedge changes its side and does not shrink: somebody overshoots again and again. */
function swingReasons(pairs: readonly GapPair[]): Convergence['reasons'] {
  const wedges = pairs.slice(-3).map((gaps) => gaps.a_mm - gaps.b_mm);
  const [first, second, third] = wedges;
  if (first === undefined || second === undefined || third === undefined) return [];
  const swings = first * second < 0 && second * third < 0;
  const grows = Math.abs(third) >= PROGRESS * Math.abs(first);
  return swings && grows
    ? [
        {
          type: 'swings',
          words:
            'The wedge goes to and fro without getting smaller: turn half as far as is said, always from the same side.',
        },
      ]
    : [];
}
