import type { Evaluated, Skipped } from '../fn-table';
import type { Inputs } from '../inputs';

/** What a figure was taken from. The first four are publications; a closed form needs none, a practice has none. */
export type SourceKind =
  | 'standard'
  | 'handbook'
  | 'paper'
  | 'data sheet'
  | 'public note'
  | 'closed form'
  | 'independent program'
  | 'common practice';

/** How the figure came here: the publication itself, a quotation or abstract of it, recalled, or worked out anew. */
export type Seen = 'read' | 'read in quotation' | 'abstract read' | 'from memory' | 'worked out';

export interface Source {
  readonly kind: SourceKind;
  /** Author or issuer, title, number and year, where there are such. */
  readonly name: string;
  readonly seen: Seen;
}

/** A row: what goes in, in the order of the columns, and what is expected last. */
export type Row = readonly (number | string | boolean)[];

/** Expected values of one family with their published source beside them. */
export interface Table {
  /** As the check format names it. */
  readonly family: string;
  readonly source: Source;
  /** Names of the inputs by the check format, unit included. */
  readonly columns: readonly string[];
  readonly rows: readonly Row[];
  /** Inputs that all rows share. */
  readonly given?: Readonly<Record<string, number | string | boolean>>;
  /** Largest deviation, relative. */
  readonly within: number;
  /** Largest deviation in the unit itself, for figures that are printed rounded to it. */
  readonly rounded?: number;
  /**
   * How the answer is held: near the figure, never above or under it, or with its band about it. Near unless said
   * otherwise.
   */
  readonly holds?: 'near' | 'at most' | 'at least' | 'in band';
  /** Where the source prints something else than the family's own figure, how it is asked. */
  readonly ask?: (inputs: Inputs) => Evaluated | Skipped;
  /** True for values beyond those that were handed to the project: found or recalled from another published place. */
  readonly own?: true;
  /** What a reader has to know of the figure. */
  readonly note?: string;
}

/** Worked out for this project in another language from the closed form. */
export const CLOSED_FORM: Source = {
  kind: 'closed form',
  name: 'worked out in another language from the formula in the docstring',
  seen: 'worked out',
};

export const PRACTICE: Source = { kind: 'common practice', name: 'no source', seen: 'worked out' };

const PUBLICATIONS: readonly SourceKind[] = ['standard', 'handbook', 'paper', 'data sheet'];

export function isPublished({ source }: Table): boolean {
  return PUBLICATIONS.includes(source.kind);
}
