import { gapAlong, type MeasuredGap } from '../alignment/gap-line';
import type { ScrewPlan } from '../alignment/screws';
import { formatFigure } from '../units/format-quantity';
import { spread } from './figures';
import type { Plot } from './lookup';

interface Parts {
  readonly gap: MeasuredGap;
  readonly length_mm: number;
  readonly feeler_um: number;
  readonly target_mm: number;
  readonly plan: ScrewPlan;
}

const PIECES = 24;

/** Gap along the bars with what the feeler leaves open, the line after the turns, and the target. */
export function alignmentPlot({ gap, length_mm, feeler_um, target_mm, plan }: Parts): Plot {
  const { left_mm, right_mm } = plan.predicted;
  const places = spread({ from: 0, to: length_mm }, PIECES);
  const along = (line: MeasuredGap, error_um: number) =>
    places.flatMap((x) => {
      const at = gapAlong(line, x, error_um);
      return at.ok ? [{ x, y: at.value.value, low: at.value.band.low, high: at.value.band.high }] : [];
    });
  const now = along(gap, feeler_um);
  const then = along({ ...gap, left_mm, right_mm }, 0);
  const all = [...now.flatMap(({ low, high }) => [low, high]), ...then.map(({ y }) => y), target_mm];
  const [least, most] = [Math.min(...all), Math.max(...all)];
  const room = Math.max(0.15 * (most - least), 0.02);
  const mm = (value: number) => formatFigure(value, { digits: { decimals: 2 }, rounding: 'nearest' });
  return {
    title: `Gap along the bars: ${mm(gap.left_mm)} mm near A, ${mm(gap.right_mm)} mm near B, target ${mm(target_mm)} mm; after the turns ${mm(left_mm)} and ${mm(right_mm)} mm`,
    x: { label: 'From the A end', unit: 'mm', min: 0, max: length_mm, decimals: 0 },
    y: { label: 'Gap', unit: 'mm', min: Math.max(0, least - room), max: most + room, decimals: 2 },
    band: {
      points: now.map(({ x, low, high }) => ({ x, low: Math.max(0, low), high })),
      above: 'wider',
      below: 'tighter',
    },
    law: now.map(({ x, y }) => ({ x, y })),
    curves: [{ label: 'after the turns', points: then.map(({ x, y }) => ({ x, y })), weight: 'thin' }],
    own: {
      points: [
        { x: gap.leftPlace_mm, y: gap.left_mm },
        { x: gap.rightPlace_mm, y: gap.right_mm },
      ],
      label: 'measured',
    },
    limit: { y: target_mm, label: `target ${mm(target_mm)}\u2009mm` },
  };
}
