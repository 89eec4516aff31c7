import type { Field, Lookup, LookupAnswer, Values } from './lookup';

/** Values as a thumb, a Keypad or a broken entry could leave them: mostly in range, some not a number at all. */
export function anyValues(
  lookup: Pick<Lookup, 'fields'>,
  draw: { readonly seed: number; readonly count: number },
): readonly Values[] {
  const dice = createDice(draw.seed);
  return Array.from({ length: draw.count }, () =>
    Object.fromEntries(lookup.fields.map((field) => [field.key, anyOf(field, dice)])),
  );
}

type Dice = () => number;

const STRANGE = [Number.NaN, Infinity, -Infinity, -1, 0, 1e300, -1e300, 5e-324] as const;

function anyOf(field: Field, dice: Dice): number | string | null {
  if (field.kind === 'text') return pick(['', '0', '\u0000', 'C6H12O6', 'H2(SO4'.repeat(3)], dice);
  if (field.kind === 'choice') {
    if (dice() < 0.01) return pick(['nonsense', null], dice);
    return pick(
      field.options.map(({ value }) => value),
      dice,
    );
  }
  const { slide, min, max, whole } = field;
  const chance = dice();
  if (chance < 0.004) return pick(STRANGE, dice);
  if (chance < 0.01) return pick([min, max], dice);
  if (chance < (field.optional === true ? 0.2 : 0.014)) return null;
  const value = chance < 0.4 ? overDecades(Math.max(min, max * 1e-9), max, dice) : between(slide, dice);
  return whole === true ? Math.round(value) : value;
}

function between({ from, to }: { readonly from: number; readonly to: number }, dice: Dice): number {
  return from + (to - from) * dice();
}

function overDecades(from: number, to: number, dice: Dice): number {
  return Math.min(to, Math.exp(between({ from: Math.log(from), to: Math.log(to) }, dice)));
}

function pick<T>(options: readonly T[], dice: Dice): T {
  const found = options[Math.floor(dice() * options.length)];
  if (found === undefined) throw new Error('a list of options is empty');
  return found;
}

/** Even numbers from 0 to 1, the same for a seed; Marsaglia's xorshift with a multiplied start. */
function createDice(seed: number): Dice {
  let state = Math.imul(seed + 1, 0x9e3779b1) | 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    return (state >>> 0) / 4_294_967_296;
  };
}

/** Everything of an answer that no screen may show, by where it stands; empty for one that can be shown. */
export function notShowable(of: LookupAnswer): readonly string[] {
  const found: string[] = [];
  const walk = (value: unknown, path: string): void => {
    if (typeof value === 'number' && !Number.isFinite(value)) found.push(path);
    if (typeof value === 'string' && /NaN|Infinity|undefined/.test(value)) found.push(`${path}: ${value}`);
    if (typeof value !== 'object' || value === null) return;
    for (const [key, inner] of Object.entries(value)) walk(inner, `${path}.${key}`);
  };
  walk(of, 'answer');
  return found;
}
