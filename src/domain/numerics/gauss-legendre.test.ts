import { describe, expect, it } from 'vitest';
import { gaussLegendre, integrateWith } from './gauss-legendre';

describe('gaussLegendre', () => {
  // Abramowitz and Stegun table 25.4, from memory; both have closed forms.
  it('gives the published three-point rule', () => {
    const { nodes, weights } = gaussLegendre(3);
    [-Math.sqrt(0.6), 0, Math.sqrt(0.6)].forEach((node, index) => {
      expect(nodes[index]).toBeCloseTo(node, 14);
    });
    [5 / 9, 8 / 9, 5 / 9].forEach((weight, index) => {
      expect(weights[index]).toBeCloseTo(weight, 14);
    });
  });

  it.each([1, 2, 5, 20, 128])('has weights that add up to 2 with %i points', (points) => {
    const sum = gaussLegendre(points).weights.reduce((total, weight) => total + weight, 0);
    expect(sum).toBeCloseTo(2, 12);
  });

  it('is exact up to degree 2n - 1 and not beyond', () => {
    const rule = gaussLegendre(4);
    const power = (n: number) => integrateWith(rule, (x) => x ** n, { low: -1, high: 1 });
    expect(power(6)).toBeCloseTo(2 / 7, 14);
    expect(power(7)).toBeCloseTo(0, 14);
    expect(Math.abs(power(8) - 2 / 9)).toBeGreaterThan(1e-3);
  });

  it('integrates over any range', () => {
    expect(integrateWith(gaussLegendre(20), Math.sin, { low: 0, high: Math.PI })).toBeCloseTo(2, 13);
    expect(integrateWith(gaussLegendre(20), Math.exp, { low: 1, high: 3 })).toBeCloseTo(
      Math.exp(3) - Math.E,
      12,
    );
  });
});
