/** What stands against an entry. `since` is the revision that raised it; null when it stands in no revision. */
export interface Objection {
  readonly code: string;
  readonly words: string;
  readonly since: number | null;
  /** Set when the entry names one that is itself held back (protocol 3.4). */
  readonly follows?: string;
}

export function objection(code: string, words: string, since: number | null = null): Objection {
  return { code, words, since };
}
