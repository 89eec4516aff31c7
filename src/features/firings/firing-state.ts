import { standingReview, type FiringDoc } from '../../domain/book/documents/firing';

/** What a firing has come to. "Unready" is said beside it, since it never goes away. */
export type FiringState = 'open' | 'closed' | 'reviewed' | 'sent-back';

export function firingState(firing: FiringDoc): FiringState {
  if (firing.closed === null) return 'open';
  return standingReview(firing)?.verdict ?? 'closed';
}

/** "reviewed by Milo Venn", "sent back by Milo Venn", "closed, waits for review". */
export function firingStateWords(firing: FiringDoc, nameOf: (person: string | null) => string): string {
  const state = firingState(firing);
  const by = nameOf(standingReview(firing)?.by ?? null);
  switch (state) {
    case 'open':
      return 'open';
    case 'closed':
      return 'closed, waits for review';
    case 'reviewed':
      return `reviewed by ${by}`;
    case 'sent-back':
      return `sent back by ${by}`;
  }
}

/** What is out of the ordinary with it, for a list; empty when nothing is. */
export function firingFlags(firing: FiringDoc): readonly string[] {
  const flags: string[] = [];
  if (firing.unready !== null) flags.push('recorded as unready');
  if (firing.opened_irregular !== null) flags.push('opened irregular');
  if (firing.irregular_readings > 0) {
    const count = firing.irregular_readings;
    flags.push(`${count} ${count === 1 ? 'reading' : 'readings'} irregular`);
  }
  return flags;
}

export function nameIn(people: readonly { readonly id: string; readonly name: string }[]) {
  return (person: string | null): string =>
    person === null
      ? 'author open'
      : (people.find((one) => one.id === person)?.name ?? 'somebody not in this Book');
}
