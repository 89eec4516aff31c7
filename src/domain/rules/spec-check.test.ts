import { describe, expect, it } from 'vitest';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { KETTLE_SPEC } from '../../../seeds/rigs/kettle';
import { WREN_SPEC } from '../../../seeds/rigs/wren';
import type { RigSpec } from '../book/rig-spec';
import { specCheck } from './spec-check';

const { vessel } = HERON_SPEC.gap;
if (vessel === null) throw new Error('Heron has a vessel');
const gap = (change: Partial<RigSpec['gap']>): RigSpec => ({
  ...HERON_SPEC,
  gap: { ...HERON_SPEC.gap, ...change },
});
const channel = (change: Partial<RigSpec['channel']>): RigSpec => ({
  ...HERON_SPEC,
  channel: { ...HERON_SPEC.channel, ...change },
});
const screw = {
  name: 'A',
  position_mm: 20,
  pitch_mm: 0.5,
  lever: 1,
  closes: 'clockwise',
} as const;

describe('the numbers of a rig taken together', () => {
  it.each([
    ['Heron', HERON_SPEC],
    ['Kettle', KETTLE_SPEC],
    ['Wren', WREN_SPEC],
  ])('have nothing against %s', (_name, spec) => {
    expect(specCheck(spec, { ambient_bar_abs: 0.966 })).toEqual({ refusals: [], cautions: [] });
  });

  it.each<[string, string, RigSpec]>([
    ['a gap within its setting error', 'gap.gap_mm', gap({ gap_mm: 0.05 })],
    ['a highest pressure below the lowest', 'gap.highest_bar_g', gap({ highest_bar_g: 0.1 })],
    ['a pressure below vacuum', 'gap.lowest_bar_g', gap({ lowest_bar_g: -1 })],
    ['a pressure above the relief valve', 'gap.highest_bar_g', gap({ highest_bar_g: 1.2 })],
    [
      'an envelope above the vessel',
      'envelope.max_bar_g',
      { ...HERON_SPEC, envelope: { ...HERON_SPEC.envelope, max_bar_g: 2.5 } },
    ],
    [
      'a relief above the rating',
      'gap.vessel.relief_bar_g',
      gap({ vessel: { ...vessel, relief_bar_g: 2.1 } }),
    ],
    ['a pressure without a vessel', 'gap.vessel', gap({ vessel: null })],
    [
      'an envelope above the supply',
      'envelope.max_kV',
      { ...HERON_SPEC, envelope: { ...HERON_SPEC.envelope, max_kV: 16.5 } },
    ],
    [
      'an LC inversion with nothing across the channel',
      'channel.across_kohm',
      channel({ across_kohm: null }),
    ],
    [
      'a capacitor that no node holds',
      'nodes',
      { ...HERON_SPEC, nodes: [{ name: 'C1', holds: 'first', bleed_Mohm: 500 }] },
    ],
    [
      'two nodes of one name',
      'nodes.1.name',
      { ...HERON_SPEC, nodes: HERON_SPEC.nodes.map((node) => ({ ...node, name: 'C' })) },
    ],
    ['fewer shorting points than nodes', 'shorting_points', { ...HERON_SPEC, shorting_points: ['C1'] }],
    [
      'a shorting point named twice',
      'shorting_points.2',
      { ...HERON_SPEC, shorting_points: ['C1', 'C2', 'C1', 'Channel', 'Gap'] },
    ],
    [
      'two screws in one place',
      'channel.screws.1.position_mm',
      channel({ screws: [screw, { ...screw, name: 'B' }] }),
    ],
    [
      'two screws of one name',
      'channel.screws.1.name',
      channel({ screws: [screw, { ...screw, position_mm: 200 }] }),
    ],
    ['feelers the wrong way round', 'channel.feeler_b_mm', channel({ feeler_a_mm: 200, feeler_b_mm: 40 })],
  ])('refuse %s, beside the field that has to give way', (_what, field, spec) => {
    const { refusals } = specCheck(spec, { ambient_bar_abs: 0.966 });
    expect(refusals.map((one) => one.field)).toContain(field);
    for (const { words } of refusals) expect(words).toMatch(/^[A-Z].*\.$/s);
  });

  it.each<[string, string, RigSpec]>([
    ['bars of unknown shape', 'gap.flats_mm', gap({ electrodes: 'hex-bars', radius_mm: null })],
    [
      'a regulator above the rating',
      'gap.vessel.regulator_max_bar_g',
      gap({ vessel: { ...vessel, regulator_max_bar_g: 3 } }),
    ],
    [
      'a bank rated below the supply',
      'first.rated_kV',
      { ...KETTLE_SPEC, first: { kind: 'bank', part: 'Ceramic', capacitance_nF: 5, rated_kV: 20 } },
    ],
    [
      'a sheet stressed past its test',
      'first.plies',
      { ...HERON_SPEC, first: { ...HERON_SPEC.first, plies: 1, ply_um: 100 } as RigSpec['first'] },
    ],
    [
      'a bleed that is not known',
      'nodes.0.bleed_Mohm',
      {
        ...KETTLE_SPEC,
        nodes: KETTLE_SPEC.nodes.map((node, i) => (i === 0 ? { ...node, bleed_Mohm: null } : node)),
      },
    ],
    [
      'an LC inversion with few shorting points',
      'shorting_points',
      { ...HERON_SPEC, shorting_points: ['C1', 'C2'] },
    ],
    [
      'an envelope past the working pressures',
      'envelope.max_bar_g',
      { ...HERON_SPEC, envelope: { ...HERON_SPEC.envelope, max_bar_g: 0.9 } },
    ],
  ])('caution against %s without refusing it', (_what, field, spec) => {
    const { refusals, cautions } = specCheck(spec, { ambient_bar_abs: 0.966 });
    expect(refusals).toEqual([]);
    expect(cautions.map((one) => one.field)).toEqual([field]);
  });

  it('gives the stress from the supply’s limit, rounded up', () => {
    const first = { ...HERON_SPEC.first, plies: 1, ply_um: 130 } as RigSpec['first'];
    // 16 kV over 130 µm are 123.08 kV/mm.
    expect(specCheck({ ...HERON_SPEC, first }).cautions[0]?.words).toContain('124\u2009kV/mm');
  });
});
