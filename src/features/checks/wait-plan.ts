import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import { SHORTEST_WAIT_S } from '../../domain/rules/check-progress';
import { rigWait } from '../../domain/rules/rig-figures';
import { formatQuantity } from '../../domain/units/format-quantity';

export type WaitPlan =
  | {
      readonly type: 'known';
      readonly required_s: number;
      readonly nodes: readonly { readonly name: string; readonly words: string }[];
    }
  /** No number at all: a figure for the other nodes would be read as one for all. */
  | { readonly type: 'unknown'; readonly required_s: null; readonly words: string };

/** The wait of this rig before the stick, from the supply's limit, every node by itself. */
export function waitPlan(spec: RigSpec, settings: LabSettings | undefined): WaitPlan {
  if (settings === undefined)
    return { type: 'unknown', required_s: null, words: 'The lab’s settings are not on this tablet yet.' };
  const wait = rigWait(spec, settings);
  if (!wait.ok) return { type: 'unknown', required_s: null, words: wait.refusal.words };
  if (wait.value.type === 'unknown') return { type: 'unknown', required_s: null, words: wait.value.words };
  return {
    type: 'known',
    required_s: wait.value.wait_s,
    nodes: wait.value.nodes.map(({ name, computed_s }) => ({ name, words: computedWords(computed_s) })),
  };
}

/** Whole seconds still to wait, rounded up, never below none. */
export function secondsLeft(plan: WaitPlan, waited_s: number): number {
  return Math.max(0, Math.ceil((plan.required_s ?? SHORTEST_WAIT_S) - waited_s));
}

/** Share of the wait that is over, 0 to 1. */
export function waitShare(plan: WaitPlan, waited_s: number): number {
  return Math.min(1, Math.max(0, waited_s / (plan.required_s ?? SHORTEST_WAIT_S)));
}

/** Waits round up; a millisecond is not shown as one. */
function computedWords(computed_s: number): string {
  if (computed_s < 0.1) return '< 0.1\u2009s';
  const decimals = computed_s < 100 ? 1 : 0;
  return formatQuantity(computed_s, 's', { digits: { decimals }, rounding: 'up' });
}
