import { exposureAt } from '../beam/hazard-distance';
import { formatFigure } from '../units/format-quantity';
import type { BeamInput } from './beam-lookup-input';
import { spread } from './figures';
import type { Plot } from './lookup';

const CURVE_PIECES = 48;
const FARTHEST_M = 1e4;
const LEAST_M = 0.5;

/** Exposure a pulse against distance, with the hot spots as its band and both limits across it. */
export function beamPlot(
  { beam, wavelength_nm }: BeamInput,
  of: { readonly single: number; readonly train: number; readonly distance_m: number },
): Plot {
  const { single, train, distance_m } = of;
  const to = Math.min(FARTHEST_M, Math.max(LEAST_M, 1.5 * distance_m));
  const points = spread({ from: 0, to }, CURVE_PIECES).flatMap((x) => {
    const at = exposureAt(beam, x, wavelength_nm);
    return at.ok ? [{ x, y: at.value.value, low: at.value.band.low, high: at.value.band.high }] : [];
  });
  const heights = points.flatMap(({ low, high }) => [low, high]);
  const metres = formatFigure(distance_m, { digits: { significant: 3 }, rounding: 'up' });
  return {
    title: `Exposure a pulse along the beam: over the limit for the time in the beam within ${metres} metres of each end`,
    x: { label: 'From the aperture', unit: 'm', min: 0, max: to, decimals: to < 5 ? 2 : 0 },
    y: {
      label: 'Exposure a pulse',
      unit: 'J/m\u00b2',
      min: Math.min(...heights, train) / 2,
      max: Math.max(...heights, single) * 2,
      kind: 'log',
    },
    band: {
      points: points.map(({ x, low, high }) => ({ x, low, high })),
      above: 'more than a hot spot gives',
      below: 'less than the beam gives',
    },
    law: points.map(({ x, y }) => ({ x, y })),
    curves: [
      {
        label: 'limit for one pulse',
        points: [
          { x: 0, y: single },
          { x: to, y: single },
        ],
        weight: 'thin',
      },
    ],
    limit: { y: train, label: 'limit for the time in the beam', short: 'limit' },
    ...pointOf({ beam, wavelength_nm, distance_m }, to),
  };
}

function pointOf(
  {
    beam,
    wavelength_nm,
    distance_m,
  }: Pick<BeamInput, 'beam' | 'wavelength_nm'> & { readonly distance_m: number },
  to: number,
): Pick<Plot, 'point'> {
  if (distance_m > to) return {};
  const at = exposureAt(beam, distance_m, wavelength_nm);
  if (!at.ok) return {};
  const { value, band } = at.value;
  return { point: { x: distance_m, low: band.low, high: band.high, y: value } };
}
