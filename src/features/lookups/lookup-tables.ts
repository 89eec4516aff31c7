import { answerLookup } from '../../data/lookup/answer-lookup';
import type { LookupAsk, LookupReply } from '../../data/lookup/lookup-protocol';
import { browserLookupRunner } from '../../data/ports/browser-lookup-runner';
import type { Lookup } from '../../domain/lookup/lookup';
import { answerTable, sweepTable, WALL_ROWS, type TextTable } from '../../domain/lookup/table';
import { roundXs } from '../../domain/lookup/sweep';
import type { Result } from '../../domain/units/result';
import { aboutWords } from './lookup-words';
import { planSweep, type SweepPlan } from './sweep-plan';
import type { LookupView } from './use-lookup';

/** What the screen shows as a table, for the clipboard: the answer, or the sweep. Null where there is no answer. */
export async function shownTable(view: LookupView): Promise<TextTable | null> {
  const { lookup, form, values, answer, refusal } = view;
  if (answer === null || refusal !== null) return null;
  if (form.view === 'answer')
    return answerTable({ lookup, values, known: form.known, answer, about: aboutWords(view) });
  const plan = planSweep({ lookup, form, values, answer });
  if (plan === null) return null;
  const table = await tableOf(view, plan, plan.xs);
  return table === null ? null : { ...table, title: `${table.title}, ${aboutWords(view)}` };
}

const MOST_FIGURES = 5;

/** A bench table for the wall: one input in round steps against the chosen figures, or the large and main ones. */
export async function wallTableOf(
  view: LookupView,
): Promise<{ readonly table: TextTable; readonly plan: SweepPlan } | null> {
  const { lookup, form, values, answer, refusal } = view;
  if (answer === null || refusal !== null) return null;
  const plan = planSweep({ lookup, form, values, answer });
  if (plan === null) return null;
  const weighty = plan.candidates.filter((figure) => figure.weight !== 'side').slice(0, MOST_FIGURES);
  const figures = form.sweep.figures === null && weighty.length > 0 ? weighty : plan.figures;
  const wall = { ...plan, figures };
  const table = await tableOf(view, wall, roundXs(plan.field, plan.range, WALL_ROWS));
  return table === null ? null : { table, plan: wall };
}

async function tableOf(view: LookupView, plan: SweepPlan, xs: readonly number[]): Promise<TextTable | null> {
  const { lookup, values } = view;
  const figures = plan.figures.map((figure) => figure.key);
  const reply = await askOnce(lookup, { kind: 'sweep', values, field: plan.field.key, figures, xs });
  if (!reply.ok || reply.value.kind !== 'sweep') return null;
  return sweepTable(lookup, reply.value.rows, { field: plan.field.key, figures: plan.figures });
}

/** One question on its own, so that it overtakes nothing that a slider asked. */
async function askOnce(lookup: Lookup, ask: LookupAsk): Promise<Result<LookupReply>> {
  if (lookup.slow !== true) return answerLookup(lookup, ask);
  const runner = browserLookupRunner();
  const reply = await runner.ask({ lookup: lookup.key, ask }).answer;
  runner.close();
  return reply;
}
