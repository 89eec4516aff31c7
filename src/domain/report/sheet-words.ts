import type { SheetSpec, Step, StepType } from '../book/sheet-spec';
import { PURPOSE_WORDS, TOPOLOGY_WORDS } from './words';

export const STEP_WORDS: Readonly<Record<StepType, string>> = {
  confirm: 'confirm',
  reading: 'reading',
  wait: 'wait',
  photo: 'photo',
  'second-person': 'second person',
  computed: 'computed',
};

export const SHOWS_WORDS: Readonly<Record<Extract<Step, { type: 'computed' }>['shows'], string>> = {
  'stored-energy': 'stored energy',
  'self-break': 'self-break',
  permit: 'permit',
};

export const GUARD_WORDS: Readonly<Record<NonNullable<Step['guards']>, string>> = {
  shorting: 'shorting',
  'beam-stop': 'beam stop',
};

export const RIG_LIMIT_WORDS = {
  'envelope.max_bar_g': 'the rig’s highest gauge pressure',
  'envelope.max_kV': 'the rig’s highest voltage',
} as const;

const WAIVE_WORDS: Readonly<Record<Step['waive'], string>> = {
  never: 'never waived',
  reviewer: 'waived by a reviewer',
  operator: 'waived by the operator',
};

/** "reading, 0 to the rig’s highest gauge pressure, bar(g), waived by a reviewer". */
export function stepWords(step: Step): string {
  const parts = [STEP_WORDS[step.type]];
  if (step.type === 'reading') parts.push(`${step.quantity}: ${limitWords(step)}`);
  if (step.type === 'computed') parts.push(SHOWS_WORDS[step.shows]);
  if (step.guards !== undefined) parts.push(GUARD_WORDS[step.guards]);
  return [...parts, WAIVE_WORDS[step.waive]].join(', ');
}

export function limitWords(step: Extract<Step, { type: 'reading' }>): string {
  const { lowest, highest, highest_from_rig: fromRig, unit } = step;
  const signed = (value: number) => String(value).replace('-', '\u2212');
  const top = [
    highest === null ? null : signed(highest),
    fromRig === null ? null : RIG_LIMIT_WORDS[fromRig],
  ].filter((one) => one !== null);
  const highestWords = top.join(' or ');
  if (lowest === null && highestWords === '') return `${unit}, no limits`;
  if (lowest === null) return `at most ${highestWords}\u2009${unit}`;
  if (highestWords === '') return `at least ${signed(lowest)}\u2009${unit}`;
  return `${signed(lowest)} to ${highestWords}\u2009${unit}`;
}

/** One line of what a new version changes. */
export interface SheetChange {
  readonly what: string;
  readonly before: string | null;
  readonly after: string | null;
}

export interface SheetNames {
  readonly rigName: (id: string) => string;
}

/** What publishing `after` changes against `before`, in the order in which it stands on the sheet. */
export function sheetDifference(
  before: SheetSpec,
  after: SheetSpec,
  { rigName }: SheetNames,
): readonly SheetChange[] {
  const changes: SheetChange[] = [];
  const compare = (what: string, was: string, is: string): void => {
    if (was !== is) changes.push({ what, before: was, after: is });
  };
  compare('Title', before.title, after.title);
  compare('For', PURPOSE_WORDS[before.purpose], PURPOSE_WORDS[after.purpose]);
  compare('Circuits', circuits(before), circuits(after));
  compare('Rigs', rigs(before, rigName), rigs(after, rigName));
  compare('Caution', before.caution, after.caution);
  const moved = movedKeys(
    before.steps.map((step) => step.key),
    after.steps.map((step) => step.key),
  );
  for (const [at, step] of after.steps.entries()) {
    const wasAt = before.steps.findIndex((one) => one.key === step.key);
    const was = before.steps[wasAt];
    const name = `Step ${at + 1}, ${step.title}`;
    if (was === undefined) {
      changes.push({ what: name, before: null, after: stepWords(step) });
      continue;
    }
    if (moved.has(step.key)) compare(`${name}: place`, String(wasAt + 1), String(at + 1));
    compare(`${name}: title`, was.title, step.title);
    compare(`${name}: what to do`, was.detail, step.detail);
    compare(`${name}: kind`, stepWords(was), stepWords(step));
  }
  for (const [at, step] of before.steps.entries()) {
    if (!after.steps.some((one) => one.key === step.key))
      changes.push({ what: `Step ${at + 1} before, ${step.title}`, before: stepWords(step), after: null });
  }
  return changes;
}

export function circuits({ topologies }: SheetSpec): string {
  return [...topologies]
    .sort()
    .map((one) => TOPOLOGY_WORDS[one])
    .join(', ');
}

export function rigs({ rigs: named = [] }: SheetSpec, rigName: (id: string) => string): string {
  return named.length === 0 ? 'every rig of its circuits' : named.map(rigName).sort().join(', ');
}

/** Steps that left their order: all that are not in the longest run which kept it. */
function movedKeys(before: readonly string[], after: readonly string[]): ReadonlySet<string> {
  const kept = after.filter((key) => before.includes(key));
  const places = kept.map((key) => before.indexOf(key));
  const runs: number[][] = [];
  for (const [i, place] of places.entries()) {
    const longest = runs
      .slice(0, i)
      .filter((run) => (places[run.at(-1) ?? 0] ?? 0) < place)
      .reduce<readonly number[]>((best, run) => (run.length > best.length ? run : best), []);
    runs.push([...longest, i]);
  }
  const stay = new Set(
    runs.reduce<readonly number[]>((best, run) => (run.length > best.length ? run : best), []),
  );
  return new Set(kept.filter((_key, i) => !stay.has(i)));
}
