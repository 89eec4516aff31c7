import * as z from 'zod/mini';
import { optionalWords, shortText, words } from './bodies/fields';
import { uuid } from './ids';

const waive = z.enum(['never', 'reviewer', 'operator']);
const stepBase = {
  key: z.string().check(z.regex(/^[a-z0-9-]{1,40}$/)),
  title: shortText,
  detail: optionalWords,
  /** Who may leave this step out, with a reason. Shorting, beam stop and second person: never. */
  waive,
  /** What the step guards, if nobody may ever leave it out; version 1 had no such mark. */
  guards: z.optional(z.enum(['shorting', 'beam-stop'])),
};

export const stepSchema = z.discriminatedUnion('type', [
  z.object({ ...stepBase, type: z.literal('confirm') }),
  z.object({
    ...stepBase,
    type: z.literal('reading'),
    quantity: shortText,
    unit: shortText,
    /** Inclusive limits; null where there is none on that side. */
    lowest: z.nullable(z.number()),
    highest: z.nullable(z.number()),
    /** Null, or a limit pulled from the rig revision that the check was opened on. */
    highest_from_rig: z.nullable(z.enum(['envelope.max_bar_g', 'envelope.max_kV'])),
  }),
  /** Computed from the rig's own nodes, never under 60 s, no number where a bleed is unknown. */
  z.object({ ...stepBase, type: z.literal('wait') }),
  z.object({ ...stepBase, type: z.literal('photo') }),
  z.object({ ...stepBase, type: z.literal('second-person') }),
  z.object({
    ...stepBase,
    type: z.literal('computed'),
    shows: z.enum(['stored-energy', 'self-break', 'permit']),
  }),
]);
export type Step = z.infer<typeof stepSchema>;
export type StepType = Step['type'];
export type StepGuard = NonNullable<Step['guards']>;

/** Version 1 knew the first two alone. */
export const PURPOSES = ['before-firing', 'make-safe', 'gas-change', 'dye-handling', 'weekly-care'] as const;

export const sheetSpecSchema = z.object({
  title: shortText,
  purpose: z.enum(PURPOSES),
  /** Topologies that it is for. */
  topologies: z.array(z.enum(['lc-inversion', 'charge-transfer'])).check(z.minLength(1)),
  /** Rigs that it is for; left out or empty: every rig of its topologies. */
  rigs: z.optional(z.array(uuid).check(z.maxLength(40))),
  caution: words,
  steps: z.array(stepSchema).check(z.minLength(1), z.maxLength(60)),
});
export type SheetSpec = z.infer<typeof sheetSpecSchema>;
export type SheetPurpose = SheetSpec['purpose'];
