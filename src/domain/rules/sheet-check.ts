import type { SheetSpec, Step, StepGuard } from '../book/sheet-spec';

/** What is wrong with a sheet, and where: beside which step, or with the sheet as a whole. */
export interface SheetProblem {
  readonly code: string;
  /** Index of the step; null for the sheet. */
  readonly step: number | null;
  readonly words: string;
  /** Advice may be published over; a refusal may not, on the tablet or at the server. */
  readonly weight: 'refusal' | 'advice';
}

/** The rules that a check sheet has to keep (PRODUCT: Checks), in the order of its steps. Empty: none is broken. */
export function sheetProblems(spec: SheetSpec): readonly SheetProblem[] {
  return [...spec.steps.flatMap((step, at) => stepProblems(step, at, spec)), ...wholeProblems(spec)];
}

export function sheetRefusal(spec: SheetSpec): SheetProblem | null {
  return sheetProblems(spec).find((one) => one.weight === 'refusal') ?? null;
}

/**
 * What a step guards: by its mark, or by its title, since sheets of version 1 had no mark and somebody may forget it. Only
 * confirming counts by its title: a photo of the shorts is no short.
 */
export function guardOf(step: Step): StepGuard | null {
  if (step.guards !== undefined) return step.guards;
  if (step.type !== 'confirm') return null;
  if (/\b(short|shorts|shorted|shorting|hard short)\b/i.test(step.title)) return 'shorting';
  return /\bbeam[ -](stop|dump|block)s?\b/i.test(step.title) ? 'beam-stop' : null;
}

/** Nobody may ever waive it, whatever the sheet says. */
export function neverWaived(step: Step): boolean {
  return step.type === 'second-person' || guardOf(step) !== null;
}

const GUARD_REFUSALS: Readonly<Record<StepGuard, { readonly code: string; readonly words: string }>> = {
  shorting: { code: 'shorting-waivable', words: 'A step that shorts may never be waived.' },
  'beam-stop': { code: 'beam-stop-waivable', words: 'The beam stop may never be waived.' },
};

function stepProblems(step: Step, at: number, spec: SheetSpec): SheetProblem[] {
  const problems: SheetProblem[] = [];
  const refuse = (code: string, words: string): void => {
    problems.push({ code, step: at, words, weight: 'refusal' });
  };
  if (spec.steps.findIndex((one) => one.key === step.key) !== at)
    refuse('step-keys', 'Two steps of the sheet have the same key.');
  if (step.waive !== 'never') {
    const guard = guardOf(step);
    if (step.type === 'second-person')
      refuse('second-person-waivable', 'The second person may never be waived.');
    if (guard !== null) refuse(GUARD_REFUSALS[guard].code, GUARD_REFUSALS[guard].words);
  }
  if (step.type === 'reading') {
    const { lowest, highest, highest_from_rig: fromRig, unit } = step;
    if (lowest !== null && highest !== null && lowest > highest)
      refuse('limits-crossed', 'The lowest limit lies above the highest: no reading could pass.');
    if (fromRig !== null && unit !== RIG_LIMIT_UNIT[fromRig]) {
      refuse(
        'rig-limit-unit',
        `The rig’s limit is in ${RIG_LIMIT_UNIT[fromRig]}: the reading has to be as well.`,
      );
    }
    if (lowest === null && highest === null && fromRig === null)
      problems.push({
        code: 'no-limits',
        step: at,
        words: 'Without a limit any reading passes.',
        weight: 'advice',
      });
  }
  return problems;
}

/** Unit of each limit that a reading can take from the rig. */
export const RIG_LIMIT_UNIT = { 'envelope.max_bar_g': 'bar(g)', 'envelope.max_kV': 'kV' } as const;

function wholeProblems({ purpose, steps }: SheetSpec): SheetProblem[] {
  const has = (type: Step['type']) => steps.some((step) => step.type === type);
  const firstShort = steps.findIndex((step) => guardOf(step) === 'shorting');
  const firstWait = steps.findIndex((step) => step.type === 'wait');
  const second = advice('no-second-person', 'No second person looks on.');
  const problems: (SheetProblem | null)[] = [];
  if (purpose === 'make-safe') {
    problems.push(
      firstShort < 0
        ? {
            code: 'no-shorting',
            step: null,
            words: 'No step shorts anything: such a sheet could not declare a rig shorted.',
            weight: 'refusal',
          }
        : null,
      has('wait') ? null : advice('no-wait', 'No wait for the bleeds before the stick.'),
      firstWait > firstShort && firstShort >= 0
        ? advice('wait-after-short', 'The wait for the bleeds comes after the first short.')
        : null,
      has('reading') ? null : advice('no-reading', 'No voltage is measured before hands go in.'),
    );
  }
  if (purpose === 'before-firing') {
    problems.push(
      steps.some((step) => guardOf(step) === 'beam-stop')
        ? null
        : advice('no-beam-stop', 'No step puts the beam stop in.'),
    );
  }
  if (purpose === 'weekly-care' || purpose === 'gas-change') {
    problems.push(
      firstShort < 0
        ? advice('no-shorting', 'Hands go near the rig, and no step looks at the shorts.')
        : null,
    );
  }
  if (purpose !== 'dye-handling' && !has('second-person')) problems.push(second);
  return problems.filter((one) => one !== null);
}

function advice(code: string, words: string): SheetProblem {
  return { code, step: null, words, weight: 'advice' };
}
