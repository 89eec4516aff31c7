import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import type { Figure, Lookup, LookupAnswer, Values } from './lookup';

/** A lookup as it starts from Heron in the demo lab, with some values of its own. */
export function heronValues(lookup: Lookup, change: Values = {}): Values {
  return { ...lookup.start({ spec: HERON_SPEC, settings: DEMO_LAB_SETTINGS }).values, ...change };
}

/** Its answer, or an error with the refusal's words. */
export function asked(lookup: Lookup, change: Values = {}): LookupAnswer {
  const result = lookup.answer(heronValues(lookup, change));
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
}

/** One figure of the answer. */
export function figure(lookup: Lookup, key: string, change: Values = {}): Figure {
  const found = asked(lookup, change).figures.find((each) => each.key === key);
  if (found === undefined) throw new Error(`${lookup.key} gives no figure ${key}`);
  return found;
}

/** Its refusal, or an error where it answers. */
export function refusal(lookup: Lookup, change: Values) {
  const result = lookup.answer(heronValues(lookup, change));
  if (result.ok) throw new Error(`${lookup.key} answers ${JSON.stringify(change)}`);
  return result.refusal;
}
