import * as z from 'zod/mini';
import { uuid } from '../ids';
import {
  ambient_bar_abs,
  bar_g,
  celsius,
  gasName,
  hertz,
  kV,
  optionalWords,
  percent,
  positive,
  shortText,
  shots,
  words,
} from './fields';

export const LOOKS = [
  'even',
  'arc-a-end',
  'arc-mid',
  'arc-b-end',
  'arc-both-ends',
  'surface-flashover',
  'gap-dark',
  'gap-fired-channel-dark',
  'discharge-no-beam',
  'early-break',
  'gap-stays-lit',
  'puncture',
] as const;

export const HOW_MEASURED = ['set', 'held', 'self-break'] as const;

/** Fields that a reading may carry over from the one before, untouched. */
export const CARRIABLE = [
  'how',
  'voltage_kV',
  'pressure_bar_g',
  'gas',
  'flow_L_min',
  'rate_Hz',
  'ambient_bar_abs',
  'temperature_C',
  'humidity_pct',
  'output_uJ',
  'looked',
  'output_attenuators',
  'output_eye',
  'beam_x_mm',
  'beam_y_mm',
  'trigger_delay_ns',
  'trigger_jitter_ns',
  'channel_gas',
  'dye_batch',
] as const;

/** Gases that a laser channel of this kind runs on. */
export const CHANNEL_GASES = ['air', 'N2'] as const;

const beam_mm = z.number().check(z.gte(-200), z.lte(200));

/** What version 2 added: each may be left out, so that a reading of version 1 reads as one of version 2. */
const addedInVersion2 = {
  /** Attenuators through which the spot is still seen. A count by eye: it never becomes an energy. */
  output_attenuators: z.optional(z.int().check(z.gte(0), z.lte(100))),
  /** Brightness by eye, 0 for nothing to 5. It never becomes an energy either. */
  output_eye: z.optional(z.int().check(z.gte(0), z.lte(5))),
  /** Where the spot sits on the millimetre grid, from its centre: right and up are positive. */
  beam_x_mm: z.optional(beam_mm),
  beam_y_mm: z.optional(beam_mm),
  trigger_delay_ns: z.optional(z.number().check(z.gte(0), z.lte(1e7))),
  trigger_jitter_ns: z.optional(z.number().check(z.gte(0), z.lte(1e6))),
  /** Triggers of this burst that nothing followed. */
  trigger_misses: z.optional(shots),
  /** Gas in the laser channel; `flow_L_min` is its flow, `gas` stands in the spark gap. */
  channel_gas: z.optional(z.enum(CHANNEL_GASES)),
  dye_batch: z.optional(shortText),
} as const;

export const readingSchema = z.object({
  voltage_kV: kV,
  /** Set on the supply, held without breaking, or measured at self-break. */
  how: z.enum(HOW_MEASURED),
  pressure_bar_g: bar_g,
  gas: gasName,
  flow_L_min: z.nullable(z.number().check(z.gte(0), z.lte(500))),
  rate_Hz: z.nullable(hertz),
  shots: shots,
  looked: z.enum(LOOKS),
  output_uJ: z.nullable(z.number().check(z.gte(0), z.lte(1e9))),
  ambient_bar_abs,
  temperature_C: celsius,
  humidity_pct: z.nullable(percent),
  ...addedInVersion2,
  note: optionalWords,
  /** Names of the fields that nobody touched since the reading before. */
  carried_over: z.array(z.enum(CARRIABLE)),
});
export type ReadingValues = z.infer<typeof readingSchema>;

const missingSchema = z.object({ code: shortText, words });

/** Subject: the firing, whose id is that of its `firing.opened`. */
export const firingBodies = {
  'firing.opened': z.object({
    number: shortText,
    rig: uuid,
    rig_revision: uuid,
    /** The closed before-firing check, and the permit, that it stands on; null only when recorded as unready. */
    check: z.nullable(uuid),
    permit: z.nullable(uuid),
    unready: z.nullable(z.object({ missing: z.array(missingSchema).check(z.minLength(1)), why: words })),
  }),
  'firing.reading': readingSchema,
  'firing.shots-counted': z.object({ shots, rate_Hz: z.nullable(positive) }),
  'firing.closed': z.object({ summary: optionalWords }),
  'firing.reviewed': z.object({
    words: optionalWords,
    /** Readings that stay out of the calibration. */
    left_out: z.array(uuid),
    /** Revision of the Book and its hash that the reviewer looked at. */
    seen_revision: z.int().check(z.gte(0)),
    seen_hash: z.string(),
  }),
  'firing.sent-back': z.object({ words }),
} as const;
