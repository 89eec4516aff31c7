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

/** A rig is a circuit with numbers (PRODUCT: Rig). Stored as entered, never converted. */
export const rigSpecSchema = z.object({
  topology: z.enum(['lc-inversion', 'charge-transfer']),
  gap: z.object({
    gas: gasName,
    electrodes: z.enum(['domed', 'cylinder', 'plane']),
    /** Null for plane electrodes. */
    radius_mm: z.nullable(positive),
    radius_known: z.enum(['measured', 'assumed']),
    gap_mm: positive,
    gap_error_mm: atLeastZero,
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
  }),
  charging: z.object({ supply_kV: positive_kV, supply_mA: positive, ballast_Mohm: positive }),
  nodes: z.array(nodeSchema).check(z.minLength(1), z.maxLength(12)),
  shorting_points: z.array(shortText).check(z.minLength(1), z.maxLength(20)),
  beam: z.object({ pulse_energy_uJ: positive, wavelength_nm: positive }),
  model: z.object({ gap_nH: positive, channel_nH: positive, known: z.enum(['measured', 'assumed']) }),
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
