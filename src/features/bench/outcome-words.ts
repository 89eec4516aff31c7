import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import { standingReview, type FiringDoc } from '../../domain/book/documents/firing';
import { LOOK_WORDS } from '../../domain/report/words';
import { formatQuantity } from '../../domain/units/format-quantity';

/** What came of a firing: how it looked last, and at what. */
export function outcomeWords(last: ReadingValues | null): string {
  if (last === null) return 'no reading';
  const { looked, voltage_kV, output_uJ } = last;
  const figures = [
    formatQuantity(voltage_kV, 'kV', { digits: { decimals: 1 }, rounding: 'nearest' }),
    ...(output_uJ === null
      ? []
      : [formatQuantity(output_uJ, '\u00b5J', { digits: { significant: 3 }, rounding: 'nearest' })]),
  ];
  return `${LOOK_WORDS[looked]}, ${figures.join(', ')}`;
}

/** Where it stands on its way to being reviewed; never hides that it was recorded as unready. */
export function firingStateWords(firing: FiringDoc): string {
  if (firing.closed === null) return 'still open';
  const unready = firing.unready === null ? '' : 'recorded as unready, ';
  const review = standingReview(firing);
  if (review === null) return `${unready}waits for review`;
  return `${unready}${review.verdict === 'reviewed' ? 'reviewed' : 'sent back'}`;
}
