import * as z from 'zod/mini';
import { uuid } from '../ids';
import { atLeastZero, optionalWords, positive, shortText } from './fields';

const place_mm = z.number().check(z.gte(-10_000), z.lte(10_000));
const gap_mm = z.number().check(z.gt(0), z.lte(500));

/** Where arcs sat along the channel. */
export const ARC_PLACES = ['even', 'a-end', 'mid', 'b-end', 'both-ends'] as const;

/** Turns of one screw, in eighths, clockwise above 0 as seen from the head. */
export const screwTurnSchema = z.object({
  screw: shortText,
  eighths_clockwise: z.int().check(z.gte(-800), z.lte(800)),
});
export type ScrewTurn = z.infer<typeof screwTurnSchema>;

/** Subject of all: the rig. Places count from the A end of the active length. */
export const alignmentBodies = {
  'alignment.measured': z.object({
    rig_revision: uuid,
    gap_a_mm: gap_mm,
    gap_b_mm: gap_mm,
    place_a_mm: place_mm,
    place_b_mm: place_mm,
    feeler_error_mm: atLeastZero,
    note: optionalWords,
  }),
  'alignment.adjusted': z.object({
    rig_revision: uuid,
    /** The measurement that the turns were worked out from; null where somebody turned by feel. */
    based_on: z.nullable(uuid),
    target_mm: positive,
    turns: z.array(screwTurnSchema).check(z.minLength(1), z.maxLength(2)),
    /** What the turns were to give at the two measured places; null where nothing was worked out. */
    predicted: z.nullable(z.object({ gap_a_mm: gap_mm, gap_b_mm: gap_mm })),
    note: optionalWords,
  }),
  'alignment.arc-seen': z.object({
    rig_revision: uuid,
    where: z.enum(ARC_PLACES),
    /** Shots that the judgement rests on; null where nobody counted. */
    shots: z.nullable(z.int().check(z.gte(1), z.lte(10_000_000))),
    firing: z.nullable(uuid),
    note: optionalWords,
  }),
} as const;
