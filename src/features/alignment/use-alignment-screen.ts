import { useMemo } from 'react';
import { readFigure, readFigures } from '../../components/figure-form';
import { useFigureForm } from '../../components/use-figure-form';
import { useAlignment, useLab } from '../../data/use-book';
import { useDraft } from '../../data/use-draft';
import { useResume } from '../../data/use-resume';
import { judgeConvergence } from '../../domain/alignment/convergence';
import { latestRevision, type RigDoc } from '../../domain/book/documents/rig';
import {
  ARC_SPECS,
  EMPTY_ALIGNMENT,
  feelerSpec,
  gapSpecs,
  readTurns,
  targetSpec,
  turnSpecs,
  type AlignmentDraft,
  type Mode,
} from './alignment-form';
import { alignmentSteps, historyLines, lastMeasurement } from './alignment-history';
import { allowedDifference_mm, planFor, type Gaps } from './alignment-plan';
import { alignmentSetting } from './alignment-setting';

/** Sea-level air, for a tablet whose Book has no lab settings yet; only the spread between the ends leans on it. */
const STANDARD_BAR_ABS = 1.01325;

/** One rig's alignment: what the Book has, what is being entered, and what follows from both. */
export function useAlignmentScreen(rig: RigDoc) {
  const resume = useResume();
  const history = useAlignment(rig.id);
  const ambient_bar_abs = useLab()?.settings.ambient_bar_abs ?? STANDARD_BAR_ABS;
  const { value: draft, set, save } = useDraft<AlignmentDraft>(`alignment/${rig.id}`, EMPTY_ALIGNMENT);
  const revision = latestRevision(rig);
  const setting = useMemo(() => alignmentSetting(revision.spec), [revision]);
  const lines = useMemo(() => historyLines(history.steps), [history.steps]);
  const last = useMemo(() => lastMeasurement(lines), [lines]);

  const target = readFigure(targetSpec(setting), draft.texts);
  const feeler = readFigure(feelerSpec(setting), draft.texts);
  const target_mm = target.type === 'value' ? target.value : setting.target_mm;
  const feeler_mm = feeler.type === 'value' ? feeler.value : setting.feeler_mm;
  const goal = {
    target_mm,
    allowed_mm: allowedDifference_mm(target_mm, ambient_bar_abs),
    place_a_mm: setting.place_a_mm,
    place_b_mm: setting.place_b_mm,
  };
  const convergence = judgeConvergence(alignmentSteps(lines, rig), goal);

  const typed = typedGaps(setting, draft);
  const logged = last?.stands === true ? gapsOf(last.measured.body) : null;
  const planOf = (gaps: Gaps, error_mm: number) => planFor(gaps, setting, { target_mm, feeler_mm: error_mm });
  const plan = logged === null ? undefined : planOf(logged, last?.measured.body.feeler_error_mm ?? feeler_mm);
  const recommended = eighthsOf(plan);
  const typedPlan = typed === null ? undefined : planOf(typed, feeler_mm);
  const mode = draft.mode ?? nextMode({ measured: logged !== null, recommended });
  const specs =
    mode === 'gaps' ? gapSpecs(setting) : mode === 'turns' ? turnSpecs(setting, recommended) : ARC_SPECS;
  const figures = useFigureForm({
    specs,
    texts: draft.texts,
    setTexts: (change) => set((now) => ({ ...now, texts: change(now.texts) })),
    resumed: resume.place.field,
    onChoose: (key) => resume.field(key, null),
  });
  return {
    rig,
    revision,
    setting,
    ambient_bar_abs,
    draft,
    set,
    save,
    state: history.state,
    lines,
    last,
    goal,
    feeler_mm,
    convergence,
    typed,
    /** Gaps to draw: what is being entered, else what was measured last. */
    shown: typed ?? (last === null ? null : gapsOf(last.measured.body)),
    logged,
    /** What the recommendation on the screen is for: gaps being entered go before those logged. */
    advised: typed ?? logged,
    plan: typed === null ? plan : typedPlan,
    advice: typed === null ? recommended : eighthsOf(typedPlan),
    recommended,
    mode,
    figures,
    turned: mode === 'turns' ? readTurns(specs, draft.texts) : null,
  };
}

export type AlignmentScreen = ReturnType<typeof useAlignmentScreen>;

export function gapsOf(body: { readonly gap_a_mm: number; readonly gap_b_mm: number }): Gaps {
  return { a_mm: body.gap_a_mm, b_mm: body.gap_b_mm };
}

function typedGaps(setting: AlignmentScreen['setting'], draft: AlignmentDraft): Gaps | null {
  const { values } = readFigures(gapSpecs(setting), draft.texts);
  const [a_mm, b_mm] = [values['a'], values['b']];
  return typeof a_mm === 'number' && typeof b_mm === 'number' ? { a_mm, b_mm } : null;
}

function nextMode(now: {
  readonly measured: boolean;
  readonly recommended: readonly [number, number] | null;
}): Mode {
  if (!now.measured) return 'gaps';
  return now.recommended !== null && now.recommended.some((turns) => turns !== 0) ? 'turns' : 'arcs';
}

function eighthsOf(plan: ReturnType<typeof planFor>): readonly [number, number] | null {
  if (plan?.ok !== true) return null;
  const [first, second] = plan.value.rounded_turns;
  return [Math.round(first * 8), Math.round(second * 8)];
}
