import * as z from 'zod/mini';
import { uuid, sha256Hex } from '../ids';
import { sheetSpecSchema } from '../sheet-spec';
import { optionalWords, words } from './fields';

const stepKey = z.string().check(z.regex(/^[a-z0-9-]{1,40}$/));

export const stepResultSchema = z.discriminatedUnion('type', [
  z.object({ type: z.literal('confirm') }),
  z.object({
    type: z.literal('reading'),
    value: z.number().check(z.gte(-1e9), z.lte(1e9)),
    unit: z.string().check(z.maxLength(40)),
  }),
  z.object({
    type: z.literal('wait'),
    /** What the rig's nodes ask for, s; null where a bleed is unknown. */
    required_s: z.nullable(z.number().check(z.gte(0))),
    /** Monotonic seconds of running page lives that were waited. */
    waited_s: z.number().check(z.gte(0)),
  }),
  z.object({ type: z.literal('photo'), sha256: sha256Hex, bytes: z.int().check(z.gte(1)) }),
  /** The entry's witness is the second person. */
  z.object({ type: z.literal('second-person') }),
  z.object({ type: z.literal('computed'), shown: z.string().check(z.maxLength(300)) }),
]);
export type StepResult = z.infer<typeof stepResultSchema>;

/** Sheets: subject is the sheet. Checks: subject is the check, whose id is that of its `check.opened`. */
export const checkBodies = {
  'sheet.published': z.object({ spec: sheetSpecSchema, replaces: z.nullable(uuid) }),
  'sheet.retired': z.object({ why: words }),
  /** Pins the sheet and the rig revision that it was opened on (protocol 1.5). */
  'check.opened': z.object({ rig: uuid, rig_revision: uuid, sheet: uuid }),
  'check.step-done': z.object({
    step: stepKey,
    result: stepResultSchema,
    note: optionalWords,
    /** Pieces of the register that the step was done with: eyewear put on, the stick, the meter. */
    kit: z.optional(z.array(uuid).check(z.maxLength(20))),
  }),
  'check.step-waived': z.object({ step: stepKey, why: words }),
  'check.closed': z.object({}),
  'check.abandoned': z.object({ why: words }),
} as const;
