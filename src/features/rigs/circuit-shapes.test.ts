import { describe, expect, it } from 'vitest';
import type { RigSpec } from '../../domain/book/rig-spec';
import { circuitPlan } from './circuit-plan';
import { coilPath, facesOf, ringPlaces } from './circuit-shapes';
import { HERON } from './rigs.fixture';

const plan = circuitPlan('lc-inversion', 900);
const nodes = (...holds: readonly ('first' | 'second')[]): RigSpec['nodes'] =>
  holds.map((one, i) => ({ name: `node ${i}`, holds: one, bleed_Mohm: null }));

describe('shapes of the circuit', () => {
  it('draw each kind of electrode differently, and none with NaN', () => {
    const shapes = ['domed', 'cylinder', 'plane', 'capped-rods', 'hex-bars'] as const;
    const paths = shapes.map((shape) => facesOf(plan.gap, shape));
    expect(new Set(paths).size).toBe(shapes.length);
    for (const path of paths) expect(path).not.toMatch(/NaN|undefined/);
    expect(coilPath(100, 50, 80).match(/a/g)).toHaveLength(4);
  });

  it('give every node a ring of its own, on the net of its capacitor', () => {
    const [first, second] = ringPlaces(plan, HERON.nodes);
    expect(first?.x).not.toBe(second?.x);
    const three = ringPlaces(plan, nodes('first', 'first', 'second'));
    expect(three[1]).toMatchObject({ x: three[0]?.x });
    expect(three[1]?.y).toBeLessThan(three[0]?.y ?? 0);
    expect(three[1]?.stem).toBeGreaterThan(0);
  });

  it('leave out what has no place, and keep the rest', () => {
    const many = ringPlaces(plan, nodes('first', 'first', 'first', 'first', 'first', 'second'));
    expect(many.at(-1)).not.toBeNull();
    expect(many).toContain(null);
  });
});
