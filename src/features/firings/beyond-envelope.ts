import { rulingEnvelope, type Permit, type RigDoc } from '../../domain/book/documents/rig';
import type { FiringDoc } from '../../domain/book/documents/firing';
import type { FormValues } from './reading-form';

export interface FiringEnvelope {
  readonly permit: Permit | null;
  readonly max_kV: number;
  readonly max_bar_g: number;
  readonly max_rate_Hz: number;
}

/** The limits that readings of this firing are held against: its permit's, else the rig's own. */
export function firingEnvelope(firing: FiringDoc, rig: RigDoc): FiringEnvelope {
  const permit = rig.permits.find((one) => one.entry === firing.permit) ?? null;
  return { permit, ...(permit?.envelope ?? rulingEnvelope(rig)) };
}

/** Said beside the field before logging. The reading can be logged all the same: it was what it was. */
export function beyondEnvelope(
  values: Pick<FormValues, 'voltage_kV' | 'pressure_bar_g' | 'rate_Hz'>,
  envelope: FiringEnvelope,
): Partial<Record<'voltage_kV' | 'pressure_bar_g' | 'rate_Hz', string>> {
  const whose = envelope.permit === null ? 'the rig’s' : 'the permit’s';
  const found: Partial<Record<'voltage_kV' | 'pressure_bar_g' | 'rate_Hz', string>> = {};
  const say = (key: keyof typeof found, limit: number, unit: string) => {
    const value = values[key];
    if (value !== null && value > limit)
      found[key] = `Beyond ${whose} ${limit}\u2009${unit}: it will be logged as irregular.`;
  };
  say('voltage_kV', envelope.max_kV, 'kV');
  say('pressure_bar_g', envelope.max_bar_g, 'bar(g)');
  say('rate_Hz', envelope.max_rate_Hz, 'Hz');
  return found;
}
