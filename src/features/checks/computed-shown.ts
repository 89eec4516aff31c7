import { latestRevision, type RigDoc, type RigRevision } from '../../domain/book/documents/rig';
import type { LabSettings } from '../../domain/book/rig-spec';
import type { Step } from '../../domain/book/sheet-spec';
import { breakText } from '../../domain/rules/break-text';
import { selfBreak } from '../../domain/gap/self-break';
import { dayWords } from '../../domain/report/time-words';
import { standingPermit } from '../../domain/rules/readiness';
import { rigFigures } from '../../domain/rules/rig-figures';
import { gapInputOf } from '../../domain/rules/rig-gap';
import { ok, refused, type Result } from '../../domain/units/result';

export type ComputedStep = Extract<Step, { type: 'computed' }>;

/** What a computed step shows; the same lines are kept in the Book as they were shown. */
export interface Shown {
  readonly lines: readonly string[];
}

export interface ComputedFacts {
  readonly rig: RigDoc;
  readonly revision: RigRevision;
  readonly settings: LabSettings | undefined;
  readonly now_ms: number;
}

/** Pulled from the rig; refused in words where the rig or the lab does not give it, and then nobody can confirm it. */
export function computedShown(step: ComputedStep, facts: ComputedFacts): Result<Shown> {
  switch (step.shows) {
    case 'stored-energy':
      return storedEnergy(facts);
    case 'self-break':
      return selfBreakSides(facts);
    case 'permit':
      return permitOf(facts);
  }
}

/** The lines as one text for the Book. */
export function shownText({ lines }: Shown): string {
  return lines.join(' · ').slice(0, 300);
}

/** Always at the supply's limit, and never without the supply beside it. */
function storedEnergy({ revision, settings }: ComputedFacts): Result<Shown> {
  if (settings === undefined) return noSettings();
  const figures = rigFigures(revision.spec, settings);
  return figures.ok ? ok({ lines: [figures.value.hazard.words] }) : figures;
}

/** Both sides at both ends of the pressures that the rig allows. */
function selfBreakSides({ revision, settings }: ComputedFacts): Result<Shown> {
  if (settings === undefined) return noSettings();
  const { lowest_bar_g, highest_bar_g } = revision.spec.gap;
  const pressures = lowest_bar_g === highest_bar_g ? [lowest_bar_g] : [lowest_bar_g, highest_bar_g];
  const lines: string[] = [];
  for (const pressure_bar_g of pressures) {
    const answer = selfBreak(
      gapInputOf(revision.spec, {
        pressure_bar_g,
        ambient_bar_abs: settings.ambient_bar_abs,
        temperature_C: settings.ambient_C,
      }),
    );
    if (!answer.ok) return answer;
    const low = breakText(answer.value.low_kV, 'down');
    const high = breakText(answer.value.high_kV, 'up');
    lines.push(
      `At ${pressure_bar_g}\u2009bar(g): nothing fires below ${low}\u2009kV, may hold up to ${high}\u2009kV.`,
    );
  }
  lines.push(
    `Ambient ${settings.ambient_bar_abs}\u2009bar(abs), ${settings.ambient_C}\u2009°C, lab setting.`,
  );
  return ok({ lines });
}

function permitOf({ rig, revision, settings, now_ms }: ComputedFacts): Result<Shown> {
  const permit = standingPermit(rig, now_ms);
  if (permit === null || permit.rig_revision !== revision.entry) {
    const { number } = latestRevision(rig);
    return refused({
      type: 'no-permit',
      words: `No firing permit covers revision ${number} now: a reviewer can grant one.`,
    });
  }
  const { max_kV, max_bar_g, max_rate_Hz } = permit.envelope;
  const until = dayWords(permit.until_ms, settings?.zone ?? 'Etc/UTC');
  return ok({
    lines: [
      `Revision ${revision.number}, permit until ${until}.`,
      `At most ${max_kV}\u2009kV, ${max_bar_g}\u2009bar(g), ${max_rate_Hz}\u2009Hz.`,
    ],
  });
}

function noSettings(): Result<Shown> {
  return refused({ type: 'no-settings', words: 'The lab’s settings are not on this tablet yet.' });
}
