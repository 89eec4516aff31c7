import * as z from 'zod/mini';
import { sha256Hex, uuid } from '../ids';
import { atLeastZero, optionalWords, positive, shortText, words } from './fields';

/** What a note, photo or trace is about. */
export const aboutSchema = z.object({
  type: z.enum(['rig', 'firing', 'part', 'check', 'kit', 'incident']),
  id: uuid,
});
export type About = z.infer<typeof aboutSchema>;

/** The bytes stand apart, under their hash (protocol 3.10). */
const attached = {
  about: aboutSchema,
  sha256: sha256Hex,
  bytes: z.int().check(z.gte(1), z.lte(1_000_000_000)),
  name: shortText,
  media_type: shortText,
};

const column = z.int().check(z.gte(0), z.lte(255));

/** How the columns of an oscilloscope's file are to be read. */
export const traceReadingSchema = z.object({
  time_column: column,
  /** Seconds for one of the file's time column. */
  time_unit_s: positive,
  channels: z
    .array(
      z.object({
        column,
        name: shortText,
        shows: z.enum(['gap-voltage', 'channel-voltage', 'current', 'light', 'trigger', 'other']),
        /** Volts (amperes for a current) for one of the file's column, the probe left out. */
        unit_V_or_A: positive,
        /** 1,000 for a probe that divides by 1,000; amperes for a volt of a current probe. */
        probe_ratio: positive,
        inverted: z.boolean(),
      }),
    )
    .check(z.maxLength(16)),
});
export type TraceReading = z.infer<typeof traceReadingSchema>;

/** What was measured on a trace when it was attached; null where it could not be told. */
export const traceFiguresSchema = z.object({
  channel: column,
  peak: z.nullable(z.number().check(z.gte(-1e9), z.lte(1e9))),
  peak_unit: z.enum(['kV', 'A', 'V']),
  rise_10_90_ns: z.nullable(atLeastZero),
  delay_ns: z.nullable(z.number().check(z.gte(-1e9), z.lte(1e9))),
  ring_MHz: z.nullable(positive),
  inductance_nH: z.nullable(positive),
});

/** Each is its own subject, except `note.amended`, whose subject is the note. */
export const noteBodies = {
  'note.written': z.object({ about: aboutSchema, words }),
  /** Names the version that it changes: `note.written` or an earlier amendment (protocol 1.6). */
  'note.amended': z.object({ based_on: uuid, words }),
  'photo.attached': z.object({
    ...attached,
    caption: optionalWords,
    width_px: z.nullable(z.int().check(z.gte(1), z.lte(100_000))),
    height_px: z.nullable(z.int().check(z.gte(1), z.lte(100_000))),
  }),
  'trace.attached': z.object({
    ...attached,
    /** The reading that it was taken at; null for the firing as a whole. */
    reading: z.nullable(uuid),
    points: z.nullable(z.int().check(z.gte(0), z.lte(1_000_000_000))),
    reading_as: z.nullable(traceReadingSchema),
    figures: z.array(traceFiguresSchema).check(z.maxLength(16)),
    note: optionalWords,
  }),
} as const;
