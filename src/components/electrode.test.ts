import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { electrodeMask, electrodePath, electrodeRim, type Facing } from './electrode';
import { facesCss } from './theme/faces';

const numbers = (path: string): number[] => (path.match(/-?\d+(\.\d+)?/g) ?? []).map(Number);
const points = (path: string): [number, number][] => {
  const flat = numbers(path);
  return flat.flatMap((x, i) => (i % 2 === 0 ? [[x, flat[i + 1] ?? Number.NaN] as [number, number]] : []));
};

describe('electrode profile', () => {
  it('has its peak on the side it faces, at a sagitta of a twentieth of the face', () => {
    const [, , , start, control] = points(
      electrodePath({ x: 0, y: 0, width: 240, height: 160, facing: 'up' }),
    );
    const dome = start?.[1] ?? Number.NaN;
    const peak = (dome + (control?.[1] ?? Number.NaN)) / 2;
    expect(dome).toBeCloseTo(12, 2);
    expect(peak).toBeCloseTo(0, 2);
  });

  it('runs smoothly from edge to dome: the edge control lies on the dome tangent', () => {
    const [, , control, start, mid] = points(
      electrodePath({ x: 10, y: 20, width: 200, height: 100, facing: 'up' }),
    );
    if (!control || !start || !mid) throw new Error('path too short');
    const edgeSlope = (start[1] - control[1]) / (start[0] - control[0]);
    const domeSlope = (mid[1] - start[1]) / (mid[0] - start[0]);
    expect(edgeSlope).toBeCloseTo(domeSlope, 2);
  });

  it('is mirror symmetric about the gap', () => {
    const right = points(electrodePath({ x: 0, y: 0, width: 30, height: 80, facing: 'right' }));
    const left = points(electrodePath({ x: 50, y: 0, width: 30, height: 80, facing: 'left' }));
    right.forEach(([x, y], i) => {
      expect(left[i]?.[0]).toBeCloseTo(80 - x, 2);
      expect(left[i]?.[1]).toBeCloseTo(y, 2);
    });
  });

  it.each<Facing>(['up', 'down', 'left', 'right'])('stays finite and inside its box, facing %s', (facing) => {
    for (const [width, height] of [
      [0, 0],
      [1, 400],
      [400, 1],
      [14, 70],
    ] as const) {
      const path = electrodePath({ x: 5, y: 7, width, height, facing });
      expect(path).not.toMatch(/NaN|Infinity/);
      const onOutline = path
        .replace(/Q\S+ \S+ /g, 'L')
        .split(/[MLQZ]/)
        .filter(Boolean);
      for (const at of onOutline) {
        const [x = Number.NaN, y = Number.NaN] = numbers(at);
        expect(x).toBeGreaterThanOrEqual(4.99);
        expect(x).toBeLessThanOrEqual(5.01 + width);
        expect(y).toBeGreaterThanOrEqual(6.99);
        expect(y).toBeLessThanOrEqual(7.01 + height);
      }
    }
  });

  it('draws rim and body from the same points', () => {
    const shape = { x: 0, y: 0, width: 256, height: 166, facing: 'up', edge: 22 } as const;
    expect(electrodePath(shape)).toContain(electrodeRim(shape).replace(/^M/, 'L'));
  });
});

describe('electrode mask', () => {
  it('escapes the markup and stretches', () => {
    const mask = electrodeMask({ width: 14, height: 70, facing: 'right' });
    expect(mask).toMatch(/^url\("data:image\/svg\+xml,%3Csvg/);
    expect(mask).toContain("preserveAspectRatio='none'");
  });

  it('is what the style sheet carries, so that css and svg cannot drift apart', () => {
    const sheet = readFileSync(new URL('./theme/faces.css', import.meta.url), 'utf8');
    const oneLine = (css: string): string => css.replace(/\s+/g, ' ');
    expect(oneLine(sheet)).toBe(oneLine(facesCss()));
  });
});
