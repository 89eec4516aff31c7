import type { Permit } from '../book/documents/rig';
import type { RigSpec } from '../book/rig-spec';
import { formatQuantity } from '../units/format-quantity';
import { dayWords } from './time-words';

const AT_MOST = { digits: { significant: 3 }, rounding: 'down' } as const;

/** Limits in one line, rounded down: "14 kV, 0.6 bar(g), 4 Hz". */
export function envelopeWords(envelope: RigSpec['envelope']): string {
  return [
    limit(envelope.max_kV, 'kV'),
    limit(envelope.max_bar_g, 'bar(g)'),
    limit(envelope.max_rate_Hz, 'Hz'),
  ].join(', ');
}

/** "Permit to 18 Dec", in the lab's zone. */
export function permitWords(permit: Pick<Permit, 'until_ms'>, zone: string): string {
  return `Permit to ${dayWords(permit.until_ms, zone)}`;
}

/** What keeps a permit from ruling now; null while it rules. */
export function permitOver(
  permit: Permit,
  rig: { readonly heads: readonly string[] },
  now_ms: number,
): string | null {
  if (permit.withdrawn !== null) return 'withdrawn';
  if (!rig.heads.includes(permit.rig_revision)) return 'for an earlier revision';
  return permit.until_ms > now_ms ? null : 'lapsed';
}

function limit(value: number, unit: string): string {
  return formatQuantity(value, unit, AT_MOST)
    .replace(/(\.\d*?)0+(?=\u2009)/, '$1')
    .replace(/\.(?=\u2009)/, '');
}
