import { withBand, type Answer } from '../units/answer';
import { checkNumber } from '../units/check-number';
import { computed } from '../units/computed';
import { andThen, mapResult, type Result } from '../units/result';

const BAR_TO_MPA = 0.1;
/** Acrylic carries at most this, shock included; from memory. */
const ACRYLIC_MPA = 5;
/** Ratio of specific heats of air and nitrogen at room temperature. */
const GAMMA = 1.4;

/**
 * Hoop stress at the inside of a thick tube, MPa: p (ro^2 + ri^2)/(ro^2 - ri^2), Lame. Holes, threads and end caps carry
 * several times more.
 */
export function hoopStress(tube: {
  readonly pressure_bar_g: number;
  readonly inner_mm: number;
  readonly outer_mm: number;
}): Result<Answer> {
  const { pressure_bar_g, inner_mm, outer_mm } = tube;
  return computed(
    [
      checkNumber(pressure_bar_g, {
        field: 'pressure_bar_g',
        name: 'Pressure',
        unit: 'bar(g)',
        min: 0,
        max: 350,
      }),
      checkNumber(inner_mm, { field: 'inner_mm', name: 'Inner radius', unit: 'mm', min: 0.1, max: 1000 }),
      checkNumber(outer_mm, {
        field: 'outer_mm',
        name: 'Outer radius',
        unit: 'mm',
        min: 1.001 * inner_mm,
        minReason: 'the inner radius and a wall',
        max: 2000,
      }),
    ],
    () => {
      const value =
        (BAR_TO_MPA * pressure_bar_g * (outer_mm ** 2 + inner_mm ** 2)) / (outer_mm ** 2 - inner_mm ** 2);
      return {
        value,
        unit: 'MPa',
        model: 'Thick tube, inner fibre',
        valid: 'plain tube; holes, threads and end caps carry several times more. Proof-test with water',
        relative: { below: 0, above: 2 },
        warnings:
          value > ACRYLIC_MPA
            ? [
                {
                  type: 'stress-high',
                  words: 'Over 5\u2009MPa: too much for acrylic, which breaks without warning.',
                },
              ]
            : [],
      };
    },
  );
}

/** Gas under pressure in a closed body. */
export interface PressedGas {
  readonly pressure_bar_abs: number;
  readonly ambient_bar_abs: number;
  readonly volume_L: number;
}

/** Energy of the gas by Brode, J: (p - p0) V/(gamma - 1). The larger of the two and the one to show. */
export function storedEnergyBrode(gas: PressedGas): Result<Answer> {
  return computed(pressedChecks(gas), () => ({
    // bar times litre is 100 J.
    value: (100 * (gas.pressure_bar_abs - gas.ambient_bar_abs) * gas.volume_L) / (GAMMA - 1),
    unit: 'J',
    model: 'Brode',
    valid: 'air or nitrogen; fragments carry part of it',
    relative: { below: 0.5, above: 0 },
  }));
}

/** Energy of the gas when it expands at one temperature, J: p V ln(p/p0). */
export function storedEnergyIsothermal(gas: PressedGas): Result<Answer> {
  return computed(pressedChecks(gas), () => ({
    value: 100 * gas.pressure_bar_abs * gas.volume_L * Math.log(gas.pressure_bar_abs / gas.ambient_bar_abs),
    unit: 'J',
    model: 'Isothermal expansion',
    valid: 'ideal gas; the work down to the ambient is less',
    relative: { below: 0.5, above: 0 },
  }));
}

/** Energy of the gas to show, J: the larger of Brode's and the isothermal one, with the smaller as the low end of its band. */
export function storedGasEnergy(gas: PressedGas): Result<Answer> {
  return andThen(storedEnergyBrode(gas), (brode) =>
    mapResult(storedEnergyIsothermal(gas), (isothermal) => {
      const [larger, smaller] = brode.value >= isothermal.value ? [brode, isothermal] : [isothermal, brode];
      return withBand(larger, { low: Math.min(smaller.value, larger.band.low), high: larger.value });
    }),
  );
}

function pressedChecks({ pressure_bar_abs, ambient_bar_abs, volume_L }: PressedGas) {
  return [
    checkNumber(ambient_bar_abs, {
      field: 'ambient',
      name: 'Ambient pressure',
      unit: 'bar(abs)',
      min: 0.3,
      max: 1.1,
    }),
    checkNumber(pressure_bar_abs, {
      field: 'pressure',
      name: 'Pressure',
      unit: 'bar(abs)',
      min: ambient_bar_abs,
      minReason: 'the ambient pressure',
      max: 350,
    }),
    checkNumber(volume_L, { field: 'volume_L', name: 'Volume', unit: 'L', min: 0, max: 1e4 }),
  ];
}
