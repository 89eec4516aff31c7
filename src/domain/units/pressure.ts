import { checkNumber, type NumberRule } from './check-number';
import { andThen, ok, refused, type Result } from './result';

declare const absolute: unique symbol;
declare const gauge: unique symbol;

/** Pressure above vacuum, bar. Only `pressureAbsBar` makes one. */
export type PressureAbsBar = number & { readonly [absolute]: true };

/** Pressure above the surrounding air, bar. Only `pressureGaugeBar` makes one. */
export type PressureGaugeBar = number & { readonly [gauge]: true };

export const TORR_PER_BAR = 750.0616827;
export const KPA_PER_BAR = 100;
export const BAR_PER_ATM = 1.01325;
const PSI_PER_BAR = 14.503773773;

const ABS_RULE: NumberRule = {
  field: 'pressure',
  name: 'Pressure',
  unit: 'bar(abs)',
  min: 0,
  max: 1000,
  minReason: 'absolute vacuum',
};
const GAUGE_RULE: NumberRule = { field: 'pressure', name: 'Pressure', unit: 'bar(g)', min: -1.1, max: 1000 };

// Sea level in a deep low to a bench at 5,000 m; outside it somebody typed kPa or a gauge reading.
const AMBIENT_RULE: NumberRule = {
  field: 'ambient',
  name: 'Ambient pressure',
  unit: 'bar(abs)',
  min: 0.5,
  max: 1.1,
};

/** An absolute pressure from 0 to 1,000 bar; refused with a typed reason otherwise. */
export function pressureAbsBar(value: unknown, field = 'pressure'): Result<PressureAbsBar> {
  return andThen(checkNumber(value, { ...ABS_RULE, field }), (bar) => ok(bar as PressureAbsBar));
}

/** A gauge pressure; whether it lies below vacuum shows only once the ambient pressure is known. */
export function pressureGaugeBar(value: unknown, field = 'pressure'): Result<PressureGaugeBar> {
  return andThen(checkNumber(value, { ...GAUGE_RULE, field }), (bar) => ok(bar as PressureGaugeBar));
}

/** The surrounding air, 0.5 to 1.1 bar(abs). There is no default: altitude changes it by a fifth. */
export function ambientBar(value: unknown, field = 'ambient'): Result<PressureAbsBar> {
  return andThen(checkNumber(value, { ...AMBIENT_RULE, field }), (bar) => ok(bar as PressureAbsBar));
}

/** bar(g) to bar(abs) with the ambient pressure; refused below absolute vacuum. */
export function gaugeToAbs(reading: PressureGaugeBar, ambient: PressureAbsBar): Result<PressureAbsBar> {
  const bar = reading + ambient;
  if (bar < 0) {
    return refused({
      type: 'below-vacuum',
      field: 'pressure',
      words: `Pressure: below absolute vacuum; with this ambient pressure it must be at least \u2212${String(ambient)}\u2009bar(g).`,
    });
  }
  return ok(bar as PressureAbsBar);
}

export function absToGauge(pressure: PressureAbsBar, ambient: PressureAbsBar): PressureGaugeBar {
  return (pressure - ambient) as PressureGaugeBar;
}

export function barToTorr(bar: number): number {
  return bar * TORR_PER_BAR;
}

export function torrToBar(torr: number): number {
  return torr / TORR_PER_BAR;
}

export function barToKilopascal(bar: number): number {
  return bar * KPA_PER_BAR;
}

export function kilopascalToBar(kilopascal: number): number {
  return kilopascal / KPA_PER_BAR;
}

export function barToAtm(bar: number): number {
  return bar / BAR_PER_ATM;
}

export function atmToBar(atm: number): number {
  return atm * BAR_PER_ATM;
}

export function barToPsi(bar: number): number {
  return bar * PSI_PER_BAR;
}

export function psiToBar(psi: number): number {
  return psi / PSI_PER_BAR;
}
