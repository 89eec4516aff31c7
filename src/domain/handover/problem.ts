import * as z from 'zod/mini';

/** The one shape of an error from the API (RFC 9457), with our own members. `type` is `urn:holdoff:problem:<code>`. */
export const problemSchema = z.object({
  type: z.string().check(z.startsWith('urn:holdoff:problem:')),
  title: z.string(),
  status: z.int(),
  detail: z.string(),
  /** A person can read this out to whoever looks after the server. */
  request_id: z.string(),
  /** Per field: what is wrong with it, in words. */
  fields: z.optional(z.record(z.string(), z.string())),
});
export type Problem = z.infer<typeof problemSchema>;

export const PROBLEM_PREFIX = 'urn:holdoff:problem:';
