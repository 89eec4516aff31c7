import type { Figure, Lookup, LookupAnswer, StartFrom, Values } from './lookup';

/** A lookup filled in from somewhere, to be asked with some values of the test's own. */
export function createAsked(lookup: Lookup, from: StartFrom) {
  const start = lookup.start(from).values;
  const values = (change: Values = {}): Values => ({ ...start, ...change });
  const asked = (change: Values = {}): LookupAnswer => {
    const result = lookup.answer(values(change));
    if (!result.ok) throw new Error(result.refusal.words);
    return result.value;
  };
  const figure = (key: string, change: Values = {}): Figure => {
    const found = asked(change).figures.find((each) => each.key === key);
    if (found === undefined) throw new Error(`${lookup.key} gives no figure ${key}`);
    return found;
  };
  const refusal = (change: Values) => {
    const result = lookup.answer(values(change));
    if (result.ok) throw new Error(`${lookup.key} answers ${JSON.stringify(change)}`);
    return result.refusal;
  };
  return { values, asked, figure, refusal };
}
