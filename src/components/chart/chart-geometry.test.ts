import { describe, expect, it } from 'vitest';
import { chartLayout, sliceFaces, sliceHeights, standsBeside } from './chart-layout';
import { bandPaths, cursorStops, linePath, nearest, valuesAt, type Plot } from './chart-paths';
import { scaleOf } from './scale';
import type { ChartData } from './types';

const plot: Plot = {
  x: scaleOf({ min: 0, max: 10, unit: '' }, 100, 200),
  y: scaleOf({ min: 0, max: 100, unit: '' }, 300, 200),
  left: 100,
  right: 200,
  top: 200,
  bottom: 300,
};

const data: ChartData = {
  x: { min: 0, max: 10, unit: 'bar(g)' },
  y: { min: 0, max: 100, unit: 'kV' },
  band: {
    above: '',
    below: '',
    points: [
      { x: 0, low: 10, high: 30 },
      { x: 4, low: 20, high: 50 },
    ],
  },
  law: [
    { x: 0, y: 20 },
    { x: 8, y: 60 },
    { x: 12, y: 80 },
  ],
};

describe('bodies', () => {
  it('close against the plot and end square where the points end', () => {
    const { above, below } = bandPaths(data.band?.points ?? [], plot);
    expect(above).toBe('M100 270L140 250L140 200H100Z');
    expect(below).toBe('M100 290L140 280L140 300H100Z');
  });

  it('do not cross the void when the high side leaves through the top', () => {
    const { above } = bandPaths(
      [
        { x: 0, low: 1, high: 50 },
        { x: 10, low: 2, high: 180 },
      ],
      plot,
    );
    expect(above).toBe('M100 250L200 120L200 120H100Z');
  });

  it('are empty without points', () => {
    expect(bandPaths([], plot)).toEqual({ above: '', below: '', highLine: '', lowLine: '' });
  });

  it('leave out what is not finite', () => {
    expect(
      linePath(
        [
          { x: 0, y: Number.NaN },
          { x: 10, y: 100 },
        ],
        plot,
      ),
    ).toBe('M200 200');
  });
});

describe('reading off', () => {
  it('stops once at every computed x inside the axis, in order', () => {
    expect(cursorStops(data)).toEqual([0, 4, 8]);
    expect(nearest([0, 4, 8], 5.9)).toBe(4);
    expect(nearest([], 1)).toBeUndefined();
  });

  it('reads between points by a straight line and nothing outside their range', () => {
    expect(valuesAt(data, 2)).toEqual({ x: 2, low: 15, high: 40, law: 30 });
    expect(valuesAt(data, 8)).toEqual({ x: 8, law: 60 });
    expect(valuesAt(data, 13)).toEqual({ x: 13 });
  });
});

describe('layout', () => {
  const needs = { width: 842, height: 540, font: 22, lead: 28, slice: 19, wall: true, topLabel: true };

  it('gives the tablet the drawn places', () => {
    const layout = chartLayout(needs);
    expect(layout.slice?.left).toBeCloseTo(12, 0);
    expect(layout.slice?.right).toBeCloseTo(336, -0.5);
    expect(layout.left).toBeCloseTo(404, -0.5);
    expect(layout.right).toBeCloseTo(790, 0);
  });

  it('stacks the slice when letters are large', () => {
    expect(standsBeside(needs)).toBe(true);
    expect(standsBeside({ width: 390, font: 18, lead: 21, slice: 19 })).toBe(true);
    expect(standsBeside({ ...needs, font: 26.4, lead: 33.6 })).toBe(false);
    expect(standsBeside({ ...needs, slice: 30 })).toBe(false);
    expect(chartLayout({ ...needs, font: 44, lead: 56 }).slice).toBeNull();
  });

  const least = sliceHeights({
    fonts: { body: 22, lead: 28, high: 106, low: 88, read: 44 },
    highNote: true,
    lowNote: true,
    middle: true,
    width: 324,
  });

  it('puts the faces on the scale where the words leave room', () => {
    expect(sliceFaces({ top: 32, bottom: 532 }, { high_px: 190, low_px: 330 }, least)).toEqual({
      high: 190,
      low: 330,
    });
  });

  it('keeps room for the words when the interval is narrow or at an end', () => {
    for (const [high_px, low_px] of [
      [40, 45],
      [500, 520],
      [250, 255],
    ] as const) {
      const { high, low } = sliceFaces({ top: 32, bottom: 532 }, { high_px, low_px }, least);
      expect(high - 32).toBeGreaterThanOrEqual(least.high - 0.01);
      expect(532 - low).toBeGreaterThanOrEqual(least.low - 0.01);
      expect(low - high).toBeGreaterThanOrEqual(least.void - 0.01);
    }
  });
});
