import * as z from 'zod';
import { ok, refused, type Result } from '../../src/domain/units/result';

const checkSchema = z.object({
  id: z.string(),
  fn: z.string(),
  inputs: z.record(z.string(), z.unknown()),
  expected: z.union([z.number(), z.boolean()]),
  tolerance_rel: z.number().min(0),
  unit: z.string().optional(),
  area: z.string().optional(),
});

const fileSchema = z.object({ checks: z.array(checkSchema) });

export type ReferenceCheck = z.infer<typeof checkSchema>;

/** The checks of a file's text, or what is wrong with it, naming the first place. */
export function readChecks(text: string): Result<readonly ReferenceCheck[]> {
  let raw: unknown;
  try {
    raw = JSON.parse(text);
  } catch (error) {
    return refused({
      type: 'not-json',
      words: `not JSON: ${error instanceof Error ? error.message : 'unreadable'}`,
    });
  }
  const parsed = fileSchema.safeParse(raw);
  if (parsed.success) return ok(parsed.data.checks);
  const issue = parsed.error.issues[0];
  const place =
    issue === undefined || issue.path.length === 0 ? 'the file' : issue.path.map(String).join('.');
  return refused({ type: 'malformed', words: `${place}: ${issue?.message ?? 'not as expected'}` });
}
