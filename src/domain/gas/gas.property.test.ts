import fc from 'fast-check';
import { describe, it } from 'vitest';
import { describeSoundness, type Draw, type Probes } from '../../../tests/support/sound-results';
import type { Answer } from '../units/answer';
import type { Result } from '../units/result';
import * as cylinder from './cylinder';
import * as stock from './cylinder-stock';
import * as state from './nitrogen-state';
import * as purge from './purge';
import * as oxygen from './room-oxygen';
import * as vessel from './vessel';

const cylinderOf = ([a, b, c]: Draw): cylinder.Cylinder => ({
  volume_L: a,
  pressure_bar_abs: b,
  temperature_C: c,
});
const stockOf = (draw: Draw) => ({
  ...cylinderOf(draw),
  rest_bar_abs: draw[3],
  gas: ['N2', 'air', 'CO2', 'nothing'][Math.abs(Math.trunc(draw[4]) || 0) % 4] ?? 'N2',
});
const pressedOf = ([a, b]: Draw): vessel.PressedGas => ({
  pressure_bar_abs: 1 + a,
  ambient_bar_abs: 1,
  volume_L: b,
});

const PROBES: Probes = {
  freeVolumeIdeal: (draw) => cylinder.freeVolumeIdeal(cylinderOf(draw)),
  freeVolumeReal: (draw) => cylinder.freeVolumeReal(cylinderOf(draw)),
  flowTime: (draw) => cylinder.flowTime(cylinderOf(draw), { flow_L_min: draw[3], rest_bar_abs: draw[4] }),
  usableGas: (draw) => stock.usableGas(stockOf(draw)),
  wholeGas: (draw) => stock.wholeGas(stockOf(draw)),
  orderPressure: (draw) => stock.orderPressure(stockOf(draw), draw[5]),
  nitrogenCompressibility: ([a, b]) => state.nitrogenCompressibility(a, b),
  compressibilityOf: ([a, b]) => state.compressibilityOf(a, b),
  purgeResidual: ([a]) => purge.purgeResidual(a),
  purgeVolumes: ([a]) => purge.purgeVolumes(a / 10),
  oxygenSealed: ([a, b, c]) => oxygen.oxygenSealed({ flow_L_min: a, room_m3: b }, c),
  oxygenVentilated: ([a, b, c]) => oxygen.oxygenVentilated({ flow_L_min: a, room_m3: b }, c),
  oxygenTransient: ([a, b, c, d]) => oxygen.oxygenTransient({ flow_L_min: a, room_m3: b }, c, d),
  timeToOxygenLimit: ([a, b]) => oxygen.timeToOxygenLimit({ flow_L_min: a, room_m3: b }),
  oxygenAfterDumpMixed: ([a, b]) => oxygen.oxygenAfterDumpMixed(a, b),
  oxygenAfterDumpDisplaced: ([a, b]) => oxygen.oxygenAfterDumpDisplaced(a, b),
  roomForDump: ([a]) => oxygen.roomForDump(a),
  oxygenWords: ([a]) => oxygen.oxygenWords(a),
  hoopStress: ([a, b, c]) => vessel.hoopStress({ pressure_bar_g: a, inner_mm: b, outer_mm: b + c }),
  storedEnergyBrode: (draw) => vessel.storedEnergyBrode(pressedOf(draw)),
  storedEnergyIsothermal: (draw) => vessel.storedEnergyIsothermal(pressedOf(draw)),
  storedGasEnergy: (draw) => vessel.storedGasEnergy(pressedOf(draw)),
};

describeSoundness('gas', PROBES, [cylinder, stock, state, purge, oxygen, vessel]);

const value = (result: Result<Answer>) => (result.ok ? result.value.value : Number.NaN);
const bar = fc.double({ min: 1, max: 300, noNaN: true });
const celsius = fc.double({ min: -20, max: 50, noNaN: true });
const more = fc.double({ min: 1.001, max: 1.15, noNaN: true });
const flow = fc.double({ min: 0.1, max: 100, noNaN: true });
const room = fc.double({ min: 5, max: 500, noNaN: true });

describe('a cylinder', () => {
  it('holds more at more pressure and less when warmer', () => {
    fc.assert(
      fc.property(bar, celsius, more, (p, C, by) => {
        const at = (pressure_bar_abs: number, temperature_C: number) =>
          value(cylinder.freeVolumeReal({ volume_L: 50, pressure_bar_abs, temperature_C }));
        return at(by * p, C) > at(p, C) && at(p, C + 5) < at(p, C);
      }),
    );
  });

  it('lasts as long as what it loses: the inverse of drawing', () => {
    fc.assert(
      fc.property(bar, flow, (p, flow_L_min) => {
        const full = { volume_L: 50, pressure_bar_abs: p, temperature_C: 20 };
        const minutes = value(cylinder.flowTime(full, { flow_L_min, rest_bar_abs: 1 }));
        const rest = value(cylinder.freeVolumeReal({ ...full, pressure_bar_abs: 1 }));
        return Math.abs((minutes * flow_L_min + rest) / value(cylinder.freeVolumeReal(full)) - 1) < 1e-6;
      }),
    );
  });

  it('tends to the ideal gas as the pressure falls', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.001, max: 0.1, noNaN: true }),
        celsius,
        (p, C) => Math.abs(value(state.nitrogenCompressibility(p, C)) - 1) < 1e-4,
      ),
    );
  });
});

describe('a purge', () => {
  it('needs the volumes that leave the share that was asked for', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1e-8, max: 0.99, noNaN: true }),
        (share) => Math.abs(value(purge.purgeResidual(value(purge.purgeVolumes(share)))) / share - 1) < 1e-6,
      ),
    );
  });
});

describe('oxygen in a room', () => {
  it('falls with flow and time, rises with room and air, and never leaves 0 to plain air', () => {
    fc.assert(
      fc.property(
        flow,
        room,
        fc.double({ min: 0, max: 10, noNaN: true }),
        fc.double({ min: 1, max: 1e4, noNaN: true }),
        (...[q, V, ach, min]) => {
          const at = (flow_L_min: number, room_m3: number, changes: number) =>
            value(oxygen.oxygenTransient({ flow_L_min, room_m3 }, changes, min));
          const here = at(q, V, ach);
          return (
            here >= 0 &&
            here <= oxygen.AIR_OXYGEN &&
            at(1.2 * q, V, ach) <= here + 1e-12 &&
            at(q, 1.2 * V, ach) >= here - 1e-12 &&
            at(q, V, ach + 1) >= here - 1e-12
          );
        },
      ),
    );
  });

  it('with ventilation lies between the sealed room and the long run', () => {
    fc.assert(
      fc.property(
        flow,
        room,
        fc.double({ min: 0.1, max: 10, noNaN: true }),
        fc.double({ min: 1, max: 1e4, noNaN: true }),
        (...[flow_L_min, room_m3, ach, min]) => {
          const inflow = { flow_L_min, room_m3 };
          const now = value(oxygen.oxygenTransient(inflow, ach, min));
          return (
            now >= value(oxygen.oxygenSealed(inflow, min)) - 1e-9 &&
            now >= value(oxygen.oxygenVentilated(inflow, ach)) - 1e-9
          );
        },
      ),
    );
  });

  it('is at the limit at the time given for it', () => {
    fc.assert(
      fc.property(flow, room, (flow_L_min, room_m3) => {
        const inflow = { flow_L_min, room_m3 };
        const at = value(oxygen.oxygenSealed(inflow, value(oxygen.timeToOxygenLimit(inflow))));
        return Math.abs(at / oxygen.OXYGEN_LIMIT - 1) < 1e-6;
      }),
    );
  });

  it('after a dump is lower where the air is pushed out first', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.1, max: 50, noNaN: true }), room, (gas_m3, room_m3) => {
        return (
          value(oxygen.oxygenAfterDumpDisplaced(gas_m3, room_m3)) <=
          value(oxygen.oxygenAfterDumpMixed(gas_m3, room_m3)) + 1e-12
        );
      }),
    );
  });
});

describe('a vessel', () => {
  it('is stressed more by pressure and less with wall, and never under the thin tube', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 20, noNaN: true }),
        fc.double({ min: 1.05, max: 3, noNaN: true }),
        (pressure_bar_g, wall) => {
          const at = (p: number, w: number) =>
            value(vessel.hoopStress({ pressure_bar_g: p, inner_mm: 20, outer_mm: 20 * w }));
          const thin = (0.1 * pressure_bar_g) / (wall - 1);
          return (
            at(1.1 * pressure_bar_g, wall) > at(pressure_bar_g, wall) &&
            at(pressure_bar_g, 1.1 * wall) < at(pressure_bar_g, wall) &&
            at(pressure_bar_g, wall) > thin
          );
        },
      ),
    );
  });

  it('shows the larger of both energies', () => {
    fc.assert(
      fc.property(fc.double({ min: 1.01, max: 300, noNaN: true }), (pressure_bar_abs) => {
        const gas = { pressure_bar_abs, ambient_bar_abs: 1, volume_L: 0.1 };
        const shown = value(vessel.storedGasEnergy(gas));
        return (
          shown === Math.max(value(vessel.storedEnergyBrode(gas)), value(vessel.storedEnergyIsothermal(gas)))
        );
      }),
    );
  });
});
