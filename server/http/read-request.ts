import type * as z from 'zod/mini';
import { Unreadable } from './problems';

/** Reads one part of a request by its schema; `where` begins the names of the fields in the problem. */
export function readPart(schema: z.ZodMiniType | undefined, value: unknown, where: string): unknown {
  if (schema === undefined) return undefined;
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const fields = Object.fromEntries(parsed.error.issues.flatMap((issue) => fieldsOf(issue, where)));
  const [first] = Object.entries(fields);
  throw new Unreadable(first === undefined ? `The ${where} does not fit.` : `${first[0]}: ${first[1]}`, {
    fields,
  });
}

type Issue = z.core.$ZodIssue;

/** Of a union the branch that came nearest is reported, because "fits none of these" helps nobody. */
function fieldsOf(issue: Issue, where: string): [string, string][] {
  const path = [where, ...issue.path.map(String)].join('.');
  if (issue.code !== 'invalid_union') return [[path, issue.message]];
  const nearest = issue.errors.reduce<Issue[] | undefined>(
    (best, branch) => (best === undefined || branch.length < best.length ? branch : best),
    undefined,
  );
  if (nearest === undefined || nearest.length === 0) return [[path, issue.message]];
  return nearest.flatMap((inner) => fieldsOf(inner, path));
}
