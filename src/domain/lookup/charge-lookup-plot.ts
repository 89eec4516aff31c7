import type { Charging } from '../charging/supply-reach';
import { formatFigure } from '../units/format-quantity';
import type { ChargeSides } from './charge-lookup';
import { spread } from './figures';
import type { Plot } from './lookup';

const PIECES = 60;
/** Where the gap never fires: five time constants show where it settles. */
const SETTLES = 5;

interface Parts {
  readonly charging: Charging;
  readonly capacitance_F: number;
  readonly sides: ChargeSides;
  readonly reachable_kV: number;
}

/** Charging curve from empty, with both sides of the self-break across it and what the supply reaches. */
export function chargePlot({ charging, capacitance_F, sides, reachable_kV }: Parts): Plot {
  const constant_s = timeConstant_s(charging, capacitance_F, reachable_kV);
  const timeTo = (kV: number) =>
    kV < reachable_kV ? -constant_s * Math.log1p(-kV / reachable_kV) : SETTLES * constant_s;
  const to = Math.min(SETTLES * constant_s, 1.25 * timeTo(sides.high_kV));
  const points = spread({ from: 0, to }, PIECES).map((x) => ({
    x,
    y: -reachable_kV * Math.expm1(-x / constant_s),
  }));
  const fires = sides.law_kV < reachable_kV;
  const at = timeTo(sides.law_kV);
  const shown = (value: number, rounding: 'nearest' | 'down') =>
    formatFigure(value, { digits: { significant: 3 }, rounding });
  const highest = Math.max(reachable_kV, sides.high_kV);
  return {
    title: fires
      ? `Charging curve: self-break ${shown(sides.law_kV, 'nearest')} kV after ${shown(at, 'nearest')} s`
      : `Charging curve: it settles at ${shown(reachable_kV, 'down')} kV and never reaches the self-break`,
    x: { label: 'Time', unit: 's', min: 0, max: to },
    y: { label: 'Voltage', unit: 'kV', min: 0, max: 1.1 * highest, decimals: 1 },
    band: {
      points: [0, to].map((x) => ({ x, low: sides.low_kV, high: sides.high_kV })),
      above: 'breaks',
      below: 'holds',
    },
    law: [0, to].map((x) => ({ x, y: sides.law_kV })),
    curves: [{ label: 'charging', points, weight: 'curve' }],
    limit: { y: reachable_kV, label: `reaches ${shown(reachable_kV, 'down')}\u2009kV` },
    ...(fires && at <= to
      ? { point: { x: at, y: sides.law_kV, low: sides.low_kV, high: sides.high_kV } }
      : {}),
  };
}

/** Ballast and bleed side by side, as the capacitor sees them. */
function timeConstant_s(
  { ballast_Mohm, supply_kV }: Charging,
  capacitance_F: number,
  reachable_kV: number,
): number {
  return ballast_Mohm * 1e6 * (reachable_kV / supply_kV) * capacitance_F;
}
