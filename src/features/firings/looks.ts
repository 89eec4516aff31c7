import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import { LOOK_WORDS } from '../../domain/report/words';

type Looked = ReadingValues['looked'];
export type ChannelPartKey = 'a' | 'mid' | 'b';
/** The row under the channel: two looks, and the door to the failures. */
export type LookRow = 'even' | 'surface-flashover' | 'failed';

export const CHANNEL_PARTS: readonly { readonly key: ChannelPartKey; readonly label: string }[] = [
  { key: 'a', label: 'A end' },
  { key: 'mid', label: 'mid' },
  { key: 'b', label: 'B end' },
];

export const LOOK_ROW: readonly { readonly value: LookRow; readonly label: string }[] = [
  { value: 'even', label: 'even' },
  { value: 'surface-flashover', label: 'surface flashover' },
  { value: 'failed', label: 'no beam, dark or failed' },
];

/** Ways to fail, in the order of how often a bench meets them; common practice, no source. */
export const FAILURES = [
  'gap-dark',
  'gap-fired-channel-dark',
  'discharge-no-beam',
  'early-break',
  'gap-stays-lit',
  'puncture',
] as const satisfies readonly Looked[];

const ARCS: Readonly<Partial<Record<Looked, readonly ChannelPartKey[]>>> = {
  'arc-a-end': ['a'],
  'arc-mid': ['mid'],
  'arc-b-end': ['b'],
  'arc-both-ends': ['a', 'b'],
};

export function arcsOf(looked: Looked | null): readonly ChannelPartKey[] {
  return looked === null ? [] : (ARCS[looked] ?? []);
}

/**
 * What the channel looked like after a touch on one of its parts. The ends go together; the middle stands alone, since a
 * reading holds one look. With the last arc taken away it was even.
 */
export function toggleArc(looked: Looked | null, key: ChannelPartKey): Looked {
  const now = arcsOf(looked);
  if (now.includes(key)) {
    const [left] = now.filter((each) => each !== key);
    return left === undefined ? 'even' : arcAt(left);
  }
  const otherEnd = key === 'a' ? 'b' : 'a';
  return key !== 'mid' && now.includes(otherEnd) ? 'arc-both-ends' : arcAt(key);
}

/** Which of the row stands between faces; none while an arc is drawn. */
export function rowOf(looked: Looked | null): LookRow | null {
  if (looked === 'even' || looked === 'surface-flashover') return looked;
  return looked !== null && isFailure(looked) ? 'failed' : null;
}

export function isFailure(looked: Looked): boolean {
  return FAILURES.some((failure) => failure === looked);
}

/** The row with the failure by its own name once one is chosen. */
export function lookRowFor(
  looked: Looked | null,
): readonly { readonly value: LookRow; readonly label: string }[] {
  return LOOK_ROW.map((row) =>
    row.value === 'failed' && looked !== null && isFailure(looked)
      ? { ...row, label: LOOK_WORDS[looked] }
      : row,
  );
}

function arcAt(key: ChannelPartKey): Looked {
  return key === 'a' ? 'arc-a-end' : key === 'mid' ? 'arc-mid' : 'arc-b-end';
}
