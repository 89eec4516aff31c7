import { hermite, isRising, type HermitePiece } from '../numerics/hermite';
import { answer, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { barToTorr, torrToBar } from '../units/pressure';
import { ok, refused, type Result } from '../units/result';
import { lawOrIndication, uniformByLaw_kV, type GasLaw } from './gas-law';
import { PASCHEN_MINIMA, type PaschenMinimum } from './gas-table';

/** Where the cubic piece hands over to the high-pd law, Torr cm. */
const JOIN_TORR_CM = { air: 10, N2: 10, CO2: 10, SF6: 7.5, H2: 20 } as const;
type StitchedGas = keyof typeof JOIN_TORR_CM;

const MONOTONE_UP_TO_BAR_CM = 100;
const MONOTONE_STEPS = 4000;

// At the pole the form runs off to any number; so close to it, the number means nothing.
const POLE_MARGIN = 1e-3;

/** Published minimum of a gas's Paschen curve: its voltage, V. */
export function paschenMinimumVoltage(gas: string): Result<Answer> {
  return fromMinimum(gas, ({ voltage_V }) => ({ value: voltage_V, unit: 'V' }));
}

/** Published minimum of a gas's Paschen curve: where it lies, Torr cm. */
export function paschenMinimumPd(gas: string): Result<Answer> {
  return fromMinimum(gas, ({ pd_Torr_cm }) => ({ value: pd_Torr_cm, unit: 'Torr cm' }));
}

/** V/V_min = y/(1 + ln y), y = pd/pd_min: the form forced through the minimum. No value at y = 1/e and below. */
export function universalPaschen(y: number): Result<number> {
  const checked = checkNumber(y, {
    field: 'pd_Torr_cm',
    name: 'Pressure times gap over the minimum\u2019s',
    unit: '',
    min: 0,
    max: 1e6,
  });
  if (!checked.ok) return checked;
  const divisor = 1 + Math.log(y);
  if (!(divisor > POLE_MARGIN)) {
    return refused({
      type: 'no-breakdown-by-this-form',
      field: 'pd_Torr_cm',
      words:
        'Pressure times gap: so far left of the minimum this form predicts no breakdown. That says nothing about the gap itself.',
    });
  }
  return ok(y / divisor);
}

/**
 * Breakdown of a uniform gap at low pd and 20 C, V: the universal form left of the minimum, one cubic in
 * (ln pd, ln V) up to the join, the high-pd law beyond it. Within 10 % from 1 to 10 Torr cm; the cathode decides.
 */
export function lowPdVoltage(gas: string, pd_Torr_cm: number): Result<Answer> {
  const stitched = stitchFor(gas);
  if (!stitched.ok) return stitched;
  const pd = checkNumber(pd_Torr_cm, {
    field: 'pd_Torr_cm',
    name: 'Pressure times gap',
    unit: 'Torr cm',
    min: 0.001,
    max: 75_006,
  });
  if (!pd.ok) return pd;
  const { minimum, join_Torr_cm } = stitched.value;
  const left = pd.value < minimum.pd_Torr_cm;
  const value = stitchedVoltage_V(stitched.value, pd.value);
  if (!value.ok) return value;
  return ok(
    answer({
      value: value.value,
      unit: 'V',
      relative: pd.value < join_Torr_cm ? Math.max(0.1, minimum.relative) : stitched.value.law.relative,
      model: left
        ? 'Universal form left of the minimum'
        : 'Published minimum joined to the high-pressure law',
      valid: left ? 'not for design' : 'uniform field at 20 \u00b0C; depends on the cathode below 10 Torr cm',
      warnings: left
        ? [{ type: 'left-of-minimum', words: 'Left of the minimum: for the picture, not for design.' }]
        : [],
    }),
  );
}

/** Whether the stitched curve of a gas rises everywhere from its minimum to 100 bar cm. */
export function isMonotone(gas: string): Result<boolean> {
  const stitched = stitchFor(gas);
  if (!stitched.ok) return stitched;
  if (!isRising(stitched.value.piece)) return ok(false);
  const from = stitched.value.minimum.pd_Torr_cm;
  const ratio = barToTorr(MONOTONE_UP_TO_BAR_CM) / from;
  let before = -Infinity;
  for (let step = 0; step <= MONOTONE_STEPS; step += 1) {
    const voltage = stitchedVoltage_V(stitched.value, from * ratio ** (step / MONOTONE_STEPS));
    if (!voltage.ok || voltage.value <= before) return ok(false);
    before = voltage.value;
  }
  return ok(true);
}

interface Stitch {
  readonly law: GasLaw;
  readonly minimum: PaschenMinimum;
  readonly join_Torr_cm: number;
  /** In natural logarithms of Torr cm and of V. */
  readonly piece: HermitePiece;
}

function stitchFor(gas: string): Result<Stitch> {
  if (!isStitched(gas)) {
    return refused({
      type: 'gas-without-law',
      field: 'gas',
      words:
        'Gas: there is no low-pressure curve for this gas, since it lacks either a published minimum or a law to join to.',
    });
  }
  const law = lawOrIndication(gas);
  if (!law.ok) return law;
  const minimum = PASCHEN_MINIMA[gas];
  const join_Torr_cm = JOIN_TORR_CM[gas];
  const high_V = (pd_Torr_cm: number) => 1000 * uniformByLaw_kV(law.value, torrToBar(pd_Torr_cm));
  const step = 1e-5;
  const slope1 =
    Math.log(high_V(join_Torr_cm * Math.exp(step)) / high_V(join_Torr_cm * Math.exp(-step))) / (2 * step);
  const piece = {
    x0: Math.log(minimum.pd_Torr_cm),
    x1: Math.log(join_Torr_cm),
    y0: Math.log(minimum.voltage_V),
    y1: Math.log(high_V(join_Torr_cm)),
    slope0: 0,
    slope1,
  };
  return ok({ law: law.value, minimum, join_Torr_cm, piece });
}

function stitchedVoltage_V(
  { law, minimum, join_Torr_cm, piece }: Stitch,
  pd_Torr_cm: number,
): Result<number> {
  if (pd_Torr_cm >= join_Torr_cm) return ok(1000 * uniformByLaw_kV(law, torrToBar(pd_Torr_cm)));
  if (pd_Torr_cm >= minimum.pd_Torr_cm) return ok(Math.exp(hermite(piece, Math.log(pd_Torr_cm))));
  const share = universalPaschen(pd_Torr_cm / minimum.pd_Torr_cm);
  return share.ok ? ok(minimum.voltage_V * share.value) : share;
}

function isStitched(gas: string): gas is StitchedGas {
  return Object.hasOwn(JOIN_TORR_CM, gas);
}

function fromMinimum(
  gas: string,
  pick: (minimum: PaschenMinimum) => { readonly value: number; readonly unit: string },
): Result<Answer> {
  const minima: Readonly<Record<string, PaschenMinimum>> = PASCHEN_MINIMA;
  const minimum = Object.hasOwn(minima, gas) ? minima[gas] : undefined;
  if (minimum === undefined) {
    return refused({
      type: 'gas-without-minimum',
      field: 'gas',
      words: 'Gas: no published minimum is good enough for this gas.',
    });
  }
  return ok(
    answer({
      ...pick(minimum),
      relative: minimum.relative,
      model: `Published minimum: ${minimum.source}`,
      valid: 'depends on the cathode by tens of per cent',
    }),
  );
}
