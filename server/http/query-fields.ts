import * as z from 'zod/mini';

/** A whole number as it stands in an address, inclusive bounds. */
export function wholeNumber({ lowest, highest }: { readonly lowest: number; readonly highest: number }) {
  return z.pipe(
    z.pipe(z.string().check(z.regex(/^\d{1,16}$/, 'must be a whole number')), z.transform(Number)),
    z.int().check(z.gte(lowest), z.lte(highest)),
  );
}
