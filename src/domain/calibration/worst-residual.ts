/** A voltage is hardly read better than this, so nothing within it is an outlier. */
const LEAST_SIGMA = 0.005;

/** The residual farthest from their median, in robust sigmas (1.4826 times the median deviation). */
export function worstOf(residuals: readonly number[]): { readonly index: number; readonly sigmas: number } {
  const middle = medianOf(residuals);
  const sigma = Math.max(LEAST_SIGMA, 1.4826 * medianOf(residuals.map((one) => Math.abs(one - middle))));
  let index = 0;
  residuals.forEach((one, at) => {
    if (Math.abs(one - middle) > Math.abs((residuals[index] ?? 0) - middle)) index = at;
  });
  return { index, sigmas: Math.abs((residuals[index] ?? 0) - middle) / sigma };
}

function medianOf(list: readonly number[]): number {
  const sorted = list.toSorted((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  const upper = sorted[middle] ?? 0;
  return sorted.length % 2 === 1 ? upper : 0.5 * (upper + (sorted[middle - 1] ?? upper));
}
