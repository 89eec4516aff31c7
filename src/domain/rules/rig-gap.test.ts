import { describe, expect, it } from 'vitest';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import type { RigSpec } from '../book/rig-spec';
import { selfBreak } from '../gap/self-break';
import { gapInputOf, gapSetupOf } from './rig-gap';

const rig = (change: Partial<RigSpec['gap']>): RigSpec => ({
  ...HERON_SPEC,
  gap: { ...HERON_SPEC.gap, radius_mm: null, ...change },
});
const AT = { pressure_bar_g: 1, ambient_bar_abs: 0.966, temperature_C: 21 };

describe('the electrodes of a rig', () => {
  it('are bars with their flats, corners and what faces what', () => {
    const bars = rig({ electrodes: 'hex-bars', flats_mm: 13, corner_mm: 0.5, facing: 'edges' });
    expect(gapSetupOf(bars, 21).electrodes).toEqual({
      shape: 'hex-bars',
      flats_mm: 13,
      corner_mm: 0.5,
      facing: 'edges',
    });
    const answer = selfBreak(gapInputOf(bars, AT));
    expect(answer.ok && answer.value.model).toContain('hexagonal bars edge to edge');
  });

  it('are rods with their straight part', () => {
    const rods = rig({ electrodes: 'capped-rods', radius_mm: 4, rod_length_mm: 20 });
    expect(gapSetupOf(rods, 21).electrodes).toEqual({
      shape: 'capped-rods',
      radius_mm: 4,
      rod_length_mm: 20,
    });
    const answer = selfBreak(gapInputOf(rods, AT));
    expect(answer.ok && answer.value.model).toContain('round-ended rods of 4');
  });

  it.each([
    [{ electrodes: 'hex-bars' }, 'flats_mm'],
    [{ electrodes: 'hex-bars', flats_mm: 13 }, 'corner_mm'],
    [{ electrodes: 'hex-bars', flats_mm: 13, corner_mm: 0.5 }, 'facing'],
    [{ electrodes: 'capped-rods' }, 'radius_mm'],
    [{ electrodes: 'domed' }, 'radius_mm'],
  ] as const)('that are not all known, %j, are refused beside %s', (change, field) => {
    expect(selfBreak(gapInputOf(rig(change), AT))).toMatchObject({ ok: false, refusal: { field } });
  });
});
