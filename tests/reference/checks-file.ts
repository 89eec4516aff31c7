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

const circuitSchema = z.record(z.string(), z.unknown());

const fileSchema = z.object({
  circuits: z.record(z.string(), circuitSchema).optional(),
  checks: z.array(checkSchema),
});

export type ReferenceCheck = z.infer<typeof checkSchema>;

/**
 * The checks of a file's text, or what is wrong with it, naming the first place. A circuit that a check names is put in
 * its place.
 */
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
  if (parsed.success) return ok(withCircuits(parsed.data));
  const issue = parsed.error.issues[0];
  const place =
    issue === undefined || issue.path.length === 0 ? 'the file' : issue.path.map(String).join('.');
  return refused({ type: 'malformed', words: `${place}: ${issue?.message ?? 'not as expected'}` });
}

function withCircuits({ circuits, checks }: z.infer<typeof fileSchema>): readonly ReferenceCheck[] {
  const byId = new Map(Object.entries(circuits ?? {}));
  // A file may also give the parts once, in the first check of a circuit.
  for (const { inputs } of checks) {
    const { circuit, ...parts } = inputs;
    if (typeof circuit === 'string' && 'top' in parts && !byId.has(circuit)) byId.set(circuit, parts);
  }
  return checks.map((check) => {
    const { circuit } = check.inputs;
    const found = typeof circuit === 'string' ? byId.get(circuit) : undefined;
    return found === undefined ? check : { ...check, inputs: { ...check.inputs, circuit: found } };
  });
}
