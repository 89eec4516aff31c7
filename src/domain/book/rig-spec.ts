import * as z from 'zod/mini';
import {
  ambient_bar_abs,
  atLeastZero,
  bar_g,
  gasName,
  hertz,
  positive,
  positive_kV,
  shortText,
} from './bodies/fields';

const known = z.enum(['measured', 'assumed']);
const signed_mm = z.number().check(z.gte(-10_000), z.lte(10_000));

const sheetCapacitor = z.object({
  kind: z.literal('sheet'),
  dielectric: shortText,
  eps_r: z.number().check(z.gte(1), z.lte(100)),
  /** Thickness of one ply of film. */
  ply_um: positive,
  /** Plies lying on each other between two foils: they add up to the thickness. */
  plies: z.int().check(z.gte(1), z.lte(100)),
  /** Pairs of facing foils in parallel: they multiply the capacitance. */
  plate_pairs: z.int().check(z.gte(1), z.lte(1000)),
  length_mm: positive,
  width_mm: positive,
  /** Short-term strength that the film's data sheet promises at this thickness. */
  strength_kV_mm: positive,
});

const bankCapacitor = z.object({
  kind: z.literal('bank'),
  part: shortText,
  /** Of the whole bank. */
  capacitance_nF: positive,
  rated_kV: positive_kV,
  /** How many of the part stand in parallel; left out where the rig only says the sum. */
  parts: z.optional(z.int().check(z.gte(1), z.lte(1000))),
  /** Row of the part table (`capacitor/parts.ts`); left out for a part that is not in it. */
  catalogue: z.optional(shortText),
});

export const capacitorSchema = z.discriminatedUnion('kind', [sheetCapacitor, bankCapacitor]);
export type CapacitorSpec = z.infer<typeof capacitorSchema>;

export const nodeSchema = z.object({
  /** As it is labelled on the rig: "dump capacitor". */
  name: shortText,
  holds: z.enum(['first', 'second']),
  /** Resistance that bleeds this node alone; null where it is not known. */
  bleed_Mohm: z.nullable(positive),
});

/** A screw that moves one end of an electrode. Positions count from the A end of the active length. */
export const screwSchema = z.object({
  name: shortText,
  position_mm: signed_mm,
  pitch_mm: positive,
  /** Millimetres at the electrode for one of the screw; 1 where it pushes the bar itself. */
  lever: positive,
  /** Which way of turning makes the gap smaller, seen from the head. */
  closes: z.enum(['clockwise', 'anticlockwise']),
});
export type ScrewSpec = z.infer<typeof screwSchema>;

/** Resistance of the closed spark gap, by the names of physics D; inductances stand beside it. */
export const gapLawSchema = z.object({
  law: z.enum(['exponential', 'rompe-weizel']),
  end_ohm: positive,
  start_ohm: positive,
  /** Of the exponential law. */
  fall_ns: z.nullable(positive),
  /** Of Rompe and Weizel's law. */
  constant_cm2_atm_V2s: z.nullable(positive),
  known,
});

/** What the laser channel does once it breaks down. */
export const channelLawSchema = z.object({
  /** Breakdown of the channel over its static one, 1.3 for a third more. */
  over_static: positive,
  end_ohm: positive,
  start_ohm: positive,
  fall_ns: positive,
  known,
});

/**
 * A rig is a circuit with numbers (PRODUCT: Rig). Stored as entered, never converted. What may be left out came with
 * version 2 of the rig's entries; `rules/rig-circuit.ts` fills what a computation needs and says that it is assumed.
 */
export const rigSpecSchema = z.object({
  topology: z.enum(['lc-inversion', 'charge-transfer']),
  gap: z.object({
    gas: gasName,
    electrodes: z.enum(['domed', 'cylinder', 'plane', 'capped-rods', 'hex-bars']),
    /** Of the face, the cylinder or the rod; null for plane electrodes and hexagonal bars. */
    radius_mm: z.nullable(positive),
    radius_known: known,
    gap_mm: positive,
    gap_error_mm: atLeastZero,
    /** Capped rods: length of the straight part. */
    rod_length_mm: z.optional(positive),
    /** Hexagonal bars: across the flats, radius of the rounded edges, and what faces the gap. */
    flats_mm: z.optional(positive),
    corner_mm: z.optional(positive),
    facing: z.optional(z.enum(['flats', 'edges'])),
    /** UV from the gap's own corona or a lamp reaches the electrodes. */
    irradiated: z.boolean(),
    lowest_bar_g: bar_g,
    highest_bar_g: bar_g,
    vessel: z.nullable(
      z.object({
        material: shortText,
        rated_bar_g: bar_g,
        relief_bar_g: bar_g,
        regulator_max_bar_g: bar_g,
        proof_date: z.nullable(z.string()),
      }),
    ),
  }),
  /** Dump capacitor, or C1 of an LC inversion. */
  first: capacitorSchema,
  /** Peaking capacitor, or C2 of an LC inversion. */
  second: capacitorSchema,
  channel: z.object({
    length_mm: positive,
    spacing_a_mm: positive,
    spacing_b_mm: positive,
    gas: gasName,
    across_kohm: z.nullable(positive),
    /** Shape of the electrodes' faces, in words, and the radius of their edge. */
    profile: z.optional(shortText),
    edge_mm: z.optional(positive),
    width_mm: z.optional(positive),
    flow_L_min: z.optional(atLeastZero),
    screws: z.optional(z.array(screwSchema).check(z.maxLength(2))),
    /** Where the feeler gauge goes in, from the A end; the ends themselves where they are left out. */
    feeler_a_mm: z.optional(signed_mm),
    feeler_b_mm: z.optional(signed_mm),
    feeler_error_mm: z.optional(atLeastZero),
  }),
  charging: z.object({
    supply_kV: positive_kV,
    supply_mA: positive,
    ballast_Mohm: positive,
    /** Charging inductor across the channel of an LC inversion, and its resistance. */
    inductor_uH: z.optional(positive),
    inductor_ohm: z.optional(positive),
  }),
  nodes: z.array(nodeSchema).check(z.minLength(1), z.maxLength(12)),
  shorting_points: z.array(shortText).check(z.minLength(1), z.maxLength(20)),
  beam: z.object({
    pulse_energy_uJ: positive,
    wavelength_nm: positive,
    pulse_ns: z.optional(positive),
    width_mm: z.optional(positive),
    height_mm: z.optional(positive),
    /** Whole angles along the width and the height. */
    divergence_width_mrad: z.optional(positive),
    divergence_height_mrad: z.optional(positive),
    stop: z.optional(shortText),
  }),
  model: z.object({
    gap_nH: positive,
    channel_nH: positive,
    known,
    gap_law: z.optional(gapLawSchema),
    channel_law: z.optional(channelLawSchema),
  }),
  envelope: z.object({ max_kV: positive_kV, max_bar_g: bar_g, max_rate_Hz: hertz }),
});
export type RigSpec = z.infer<typeof rigSpecSchema>;

/** Where the lab stands; there is no silent default anywhere. */
export const labSettingsSchema = z.object({
  name: shortText,
  zone: z.string().check(z.minLength(1), z.maxLength(64)),
  ambient_bar_abs,
  ambient_C: z.number().check(z.gte(-40), z.lte(60)),
  /** A node below this counts as discharged for the computed wait. */
  discharged_below_V: positive,
  working_alone: z.enum(['allowed', 'forbidden']),
  emergency: z.object({
    isolator: z.string().check(z.maxLength(500)),
    ring: z.array(z.object({ who: shortText, number: shortText })).check(z.maxLength(8)),
    first_aid: z.string().check(z.maxLength(500)),
  }),
});
export type LabSettings = z.infer<typeof labSettingsSchema>;
