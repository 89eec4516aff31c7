import * as z from 'zod/mini';

/** Bounds that no bench of this kind leaves; they catch slips of the keypad, not bad practice. */
export const kV = z.number().check(z.gte(0), z.lte(200));
export const positive_kV = z.number().check(z.gt(0), z.lte(200));
/** Gauge pressure; the lowest is a full vacuum on the highest sea-level barometer. */
export const bar_g = z.number().check(z.gte(-1.1), z.lte(20));
export const ambient_bar_abs = z.number().check(z.gte(0.3), z.lte(1.1));
export const celsius = z.number().check(z.gte(-40), z.lte(150));
export const percent = z.number().check(z.gte(0), z.lte(100));
export const hertz = z.number().check(z.gt(0), z.lte(1000));
export const positive = z.number().check(z.gt(0), z.lte(1e9));
export const atLeastZero = z.number().check(z.gte(0), z.lte(1e9));
export const shots = z.int().check(z.gte(0), z.lte(10_000_000));

export const shortText = z.string().check(z.minLength(1), z.maxLength(120));
export const words = z.string().check(z.minLength(1), z.maxLength(2000));
export const optionalWords = z.string().check(z.maxLength(2000));
export const unixMs = z.int().check(z.gte(0), z.lte(253_402_300_799_000));
/** A value that a person leaves out is null, never a made-up figure. */
export const gasName = z.enum(['air', 'N2', 'CO2', 'SF6', 'H2', 'O2', 'Ar', 'Ne', 'He']);
