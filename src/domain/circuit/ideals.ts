import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { firstRefusal, ok, refused, type Result } from '../units/result';
import { CAPACITANCE_RULE, CHARGE_RULE, INDUCTANCE_RULE } from './circuit-rules';

/** What a lossless transfer needs: a dump capacitor switched onto a peaking capacitor. */
export interface TransferPair {
  readonly dump_F: number;
  readonly peaking_F: number;
}

const LOSSLESS: Omit<Parameters<typeof answer>[0], 'value' | 'unit' | 'relative'> = {
  model: 'Lossless ring',
  valid:
    'a ceiling: real gaps take 11 to 80\u2009% of the energy, and real peaks are 46 to 96\u2009% of this',
};

/** Highest voltage on the peaking capacitor, V: 2 V0 CD/(CD + CP). */
export function transferPeak(pair: TransferPair, charge_V: number): Result<Answer> {
  const bad = firstRefusal([badPair(pair), checkNumber(charge_V, CHARGE_RULE)]);
  if (bad !== undefined) return refused(bad);
  const value = (2 * charge_V * pair.dump_F) / (pair.dump_F + pair.peaking_F);
  return ok(answer({ ...LOSSLESS, value, unit: 'V', relative: { below: 0.54, above: 0 } }));
}

/** Share of the energy that reaches the peaking capacitor: 4 CD CP/(CD + CP)^2. One for equal capacitors. */
export function transferEfficiency(pair: TransferPair): Result<Answer> {
  const bad = badPair(pair);
  if (!bad.ok) return bad;
  const value = (4 * pair.dump_F * pair.peaking_F) / (pair.dump_F + pair.peaking_F) ** 2;
  return ok(answer({ ...LOSSLESS, value, unit: '1', relative: { below: 0.8, above: 0 } }));
}

/** Time of the peak, s: pi sqrt(L CD CP/(CD + CP)). */
export function transferHalfPeriod(pair: TransferPair, inductance_H: number): Result<Answer> {
  const bad = firstRefusal([badPair(pair), checkNumber(inductance_H, INDUCTANCE_RULE)]);
  if (bad !== undefined) return refused(bad);
  const value = Math.PI * Math.sqrt(inductance_H * seriesCapacitance_F(pair));
  return ok(answer({ ...LOSSLESS, value, unit: 's', relative: { below: 0.05, above: 0.5 } }));
}

/** Highest voltage between the free ends of an LC inversion, V: twice the charge, whatever the second capacitor. */
export function inversionPeak(charge_V: number): Result<Answer> {
  const checked = checkNumber(charge_V, CHARGE_RULE);
  if (!checked.ok) return checked;
  return ok(answer({ ...LOSSLESS, value: 2 * charge_V, unit: 'V', relative: { below: 0.54, above: 0 } }));
}

/** Time of that peak, s: pi sqrt(Lg C1), until the channel breaks down. */
export function inversionHalfPeriod(first_F: number, inductance_H: number): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(first_F, { ...CAPACITANCE_RULE, field: 'first_F', name: 'First capacitor' }),
    checkNumber(inductance_H, INDUCTANCE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const value = Math.PI * Math.sqrt(inductance_H * first_F);
  return ok(answer({ ...LOSSLESS, value, unit: 's', relative: { below: 0.05, above: 0.5 } }));
}

/** Highest current of a lossless ring, A: V0 sqrt(C/L), C all that lies in series. */
export function idealPeakCurrent(ring: {
  readonly charge_V: number;
  readonly series_F: number;
  readonly inductance_H: number;
}): Result<Answer> {
  const bad = firstRefusal([
    checkNumber(ring.charge_V, CHARGE_RULE),
    checkNumber(ring.series_F, { ...CAPACITANCE_RULE, field: 'series_F', name: 'Capacitance in series' }),
    checkNumber(ring.inductance_H, INDUCTANCE_RULE),
  ]);
  if (bad !== undefined) return refused(bad);
  const value = ring.charge_V * Math.sqrt(ring.series_F / ring.inductance_H);
  return ok(answer({ ...LOSSLESS, value, unit: 'A', relative: { below: 0.8, above: 0 } }));
}

export function seriesCapacitance_F({ dump_F, peaking_F }: TransferPair): number {
  return (dump_F * peaking_F) / (dump_F + peaking_F);
}

function badPair({ dump_F, peaking_F }: TransferPair): Result<number> {
  const dump = checkNumber(dump_F, { ...CAPACITANCE_RULE, field: 'dump_F', name: 'Dump capacitor' });
  if (!dump.ok) return dump;
  return checkNumber(peaking_F, { ...CAPACITANCE_RULE, field: 'peaking_F', name: 'Peaking capacitor' });
}
