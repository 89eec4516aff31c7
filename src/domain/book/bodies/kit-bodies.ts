import * as z from 'zod/mini';
import { uuid } from '../ids';
import {
  bar_g,
  gasName,
  optionalWords,
  percent,
  positive,
  positive_kV,
  shortText,
  unixMs,
  words,
} from './fields';

const pieces = z.int().check(z.gte(0), z.lte(100_000));
const somePieces = z.int().check(z.gte(1), z.lte(100_000));
const nm = z.number().check(z.gte(100), z.lte(20_000));

/** One line of a lens's marking: the density that it promises from one wavelength to another. */
export const densityLineSchema = z.object({
  from_nm: nm,
  to_nm: nm,
  density: z.number().check(z.gte(0), z.lte(12)),
});
export type DensityLine = z.infer<typeof densityLineSchema>;

/** What a piece of kit is, with the figures that matter at the bench. What nobody knows is null. */
export const kitItemSchema = z.discriminatedUnion('type', [
  z.object({
    type: z.literal('eyewear'),
    densities: z.array(densityLineSchema).check(z.minLength(1), z.maxLength(12)),
    visible_transmission_pct: z.nullable(percent),
  }),
  z.object({
    type: z.literal('shorting-stick'),
    resistor_kohm: z.nullable(positive),
    rated_kV: z.nullable(positive_kV),
  }),
  /** A probe or a meter; its due date is that of the calibration. */
  z.object({ type: z.literal('meter'), measures: shortText, rated_kV: z.nullable(positive_kV) }),
  z.object({ type: z.literal('relief-valve'), set_bar_g: bar_g }),
  z.object({ type: z.literal('regulator'), gas: gasName, max_bar_g: bar_g }),
  z.object({
    type: z.literal('cylinder'),
    gas: gasName,
    water_L: positive,
    /** Cylinders stand far above what a vessel of a gap ever sees. */
    pressure_bar_g: z.number().check(z.gte(0), z.lte(400)),
  }),
  z.object({ type: z.literal('key'), opens: shortText }),
  z.object({ type: z.literal('spare'), count: pieces, minimum: pieces, catalogue: z.nullable(shortText) }),
]);
export type KitItem = z.infer<typeof kitItemSchema>;
export type KitType = KitItem['type'];

/** Who has it: a person, or the rig that it stays with. */
export const holderSchema = z.discriminatedUnion('type', [
  z.object({ type: z.literal('person'), id: uuid }),
  z.object({ type: z.literal('rig'), id: uuid }),
]);
export type Holder = z.infer<typeof holderSchema>;

/** Subject: the piece of kit, whose id is that of its `kit.added`. */
export const kitBodies = {
  'kit.added': z.object({
    /** As it is marked on the piece: "E3". */
    number: shortText,
    name: shortText,
    item: kitItemSchema,
    /** Next inspection or calibration; null where none is due. */
    due_ms: z.nullable(unixMs),
    note: optionalWords,
  }),
  'kit.inspected': z.object({
    /** `retired` takes it out of the register: lost, scrapped or sent back. */
    outcome: z.enum(['passed', 'failed', 'retired']),
    due_ms: z.nullable(unixMs),
    /** Spares: how many there are. */
    count: z.nullable(pieces),
    /** Cylinders: what the gauge reads. */
    pressure_bar_g: z.nullable(z.number().check(z.gte(0), z.lte(400))),
    words: optionalWords,
  }),
  'kit.issued': z.object({
    to: holderSchema,
    /** Spares: how many were taken; null for everything else. */
    count: z.nullable(somePieces),
    words: optionalWords,
  }),
  'kit.returned': z.object({
    condition: z.enum(['as-issued', 'damaged']),
    /** Spares: how many came back; null for everything else. */
    count: z.nullable(somePieces),
    words: optionalWords,
  }),
} as const;

/** Parts fitted to a rig. Subject: the rig. A part's id is that of its `part.fitted`. */
export const partBodies = {
  'part.fitted': z.object({
    /** "Ceramic capacitor, 1.0 nF 30 kV". */
    what: shortText,
    /** Where in the circuit it works, so that what it endures can be reckoned. */
    place: z.enum(['spark-gap', 'first', 'second', 'channel', 'charging', 'bleed', 'gas', 'beam', 'other']),
    where: optionalWords,
    serial: optionalWords,
    /** Row of the part table; null for a part that is not in it. */
    catalogue: z.nullable(shortText),
    /** Day on which it was fitted, as people write it down; null where nobody knows. */
    fitted_on: z.nullable(z.string().check(z.regex(/^\d{4}-\d{2}-\d{2}$/))),
    /** Shots that it had endured before it came here; null where nobody knows. */
    shots_before: z.nullable(z.int().check(z.gte(0), z.lte(1e12))),
    /** The part whose place it takes, which is retired by it. */
    replaces: z.nullable(uuid),
    note: optionalWords,
  }),
  'part.retired': z.object({ part: uuid, why: words }),
} as const;
