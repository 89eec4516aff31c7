import type { RigSpec } from '../book/rig-spec';

const DAY_MS = 24 * 3_600_000;
/** How long a proof test of a home-made vessel is leant on; common practice, no source. Local rules decide. */
export const PROOF_FOR_MS = 365 * DAY_MS;
const PROOF_NOTICE_MS = 30 * DAY_MS;

export interface ProofDue {
  readonly why: string;
  /** Null when it is due now. */
  readonly left_ms: number | null;
}

/**
 * Whether the vessel of the spark gap is due for a proof test at `now_ms`; null while it is not, and for a gap that is
 * never above ambient pressure. A date that cannot be read counts as not known.
 */
export function vesselProof({ gap }: RigSpec, now_ms: number): ProofDue | null {
  if (gap.highest_bar_g <= 0) return null;
  if (gap.vessel === null)
    return { why: 'The gap is pressurised and no vessel is described.', left_ms: null };
  const tested_ms = dayStart(gap.vessel.proof_date);
  if (tested_ms === null) return { why: 'No proof test of it is known.', left_ms: null };
  const left_ms = tested_ms + PROOF_FOR_MS - now_ms;
  const why = `Last proved on ${gap.vessel.proof_date ?? ''}; local rules decide how long that counts.`;
  if (left_ms <= 0) return { why, left_ms: null };
  return left_ms <= PROOF_NOTICE_MS ? { why, left_ms } : null;
}

function dayStart(day: string | null): number | null {
  if (day === null || !/^\d{4}-\d{2}-\d{2}$/.test(day)) return null;
  const at = Date.parse(`${day}T00:00:00Z`);
  return Number.isNaN(at) ? null : at;
}
