import { describe, expect, it } from 'vitest';
import { borderOf } from './bisect';

describe('borderOf', () => {
  it.each([
    {
      name: 'rising condition',
      holds: (x: number) => x * x >= 2,
      end: { fails: 0, holds: 2 },
      border: Math.SQRT2,
    },
    {
      name: 'falling condition',
      holds: (x: number) => x * x <= 2,
      end: { fails: 2, holds: 0 },
      border: Math.SQRT2,
    },
    { name: 'border at the far end', holds: (x: number) => x >= 5, end: { fails: 0, holds: 5 }, border: 5 },
  ])('finds the border of a $name', ({ holds, end, border }) => {
    expect(borderOf(holds, end)).toBeCloseTo(border, 14);
  });

  it('gives back a point where the condition holds, also at a jump', () => {
    const jump = (x: number) => (x < 1 ? x : x + 0.5);
    const found = borderOf((x) => jump(x) >= 1.2, { fails: 0, holds: 3 });
    expect(jump(found)).toBeGreaterThanOrEqual(1.2);
    expect(found).toBeCloseTo(1, 14);
  });

  it('ends also when the ends are neighbours', () => {
    expect(borderOf((x) => x > 1, { fails: 1, holds: 1 + Number.EPSILON })).toBe(1 + Number.EPSILON);
  });
});
