import { describe, expect, it } from 'vitest';
import { testSpec } from '../../../tests/support/test-lab';
import type { RigSpec } from '../book/rig-spec';
import { isLoosening, specChanges } from './loosening';

const vessel = {
  material: 'PMMA',
  rated_bar_g: 2,
  relief_bar_g: 1.6,
  regulator_max_bar_g: 1.5,
  proof_date: '2026-01-10',
};
const spec: RigSpec = { ...testSpec, gap: { ...testSpec.gap, vessel } };
const withGap = (gap: Partial<RigSpec['gap']>): RigSpec => ({ ...spec, gap: { ...spec.gap, ...gap } });

describe('what a revision loosens', () => {
  it.each<[string, RigSpec]>([
    ['voltage limit', { ...spec, envelope: { ...spec.envelope, max_kV: 22.1 } }],
    ['pressure limit', { ...spec, envelope: { ...spec.envelope, max_bar_g: 1.3 } }],
    ['rate limit', { ...spec, envelope: { ...spec.envelope, max_rate_Hz: 6 } }],
    ['highest gap pressure', withGap({ highest_bar_g: 1.3 })],
    ['rating of the vessel', withGap({ vessel: { ...vessel, rated_bar_g: 2.5 } })],
    ['relief setting', withGap({ vessel: { ...vessel, relief_bar_g: 1.7 } })],
    ['vessel taken out', withGap({ vessel: null })],
    ['supply voltage', { ...spec, charging: { ...spec.charging, supply_kV: 26 } }],
    ['supply current', { ...spec, charging: { ...spec.charging, supply_mA: 2 } }],
    ['capacitor rating', { ...spec, first: { kind: 'bank', part: 'C1', capacitance_nF: 5, rated_kV: 31 } }],
    [
      'a bleed that is not known any more',
      { ...spec, nodes: [{ name: 'dump capacitor', holds: 'first', bleed_Mohm: null }] },
    ],
    ['a node less', { ...spec, nodes: [] }],
    ['a shorting point less', { ...spec, shorting_points: [] }],
  ])('finds that it is the %s', (_what, after) => {
    expect(isLoosening(spec, after)).toBe(true);
  });

  it('is none where a limit falls, a part changes, or nothing does', () => {
    expect(isLoosening(spec, spec)).toBe(false);
    expect(isLoosening(spec, { ...spec, envelope: { max_kV: 10, max_bar_g: 1, max_rate_Hz: 1 } })).toBe(
      false,
    );
    expect(isLoosening(spec, withGap({ gap_mm: 3.2 }))).toBe(false);
    expect(isLoosening(spec, { ...spec, shorting_points: ['dump capacitor', 'gap node'] })).toBe(false);
  });

  it('lists each field with both values, and whether the permit was granted on it', () => {
    const after = {
      ...withGap({ gap_mm: 3.2, irradiated: true }),
      beam: { ...spec.beam, pulse_energy_uJ: 200 },
    };
    expect(specChanges(spec, after)).toEqual([
      { field: 'gap.gap_mm', before: 3, after: 3.2, safety: true, loosens: false },
      { field: 'gap.irradiated', before: 'no', after: 'yes', safety: true, loosens: false },
      // The eyewear is asked for by it.
      { field: 'beam.pulse_energy_uJ', before: 150, after: 200, safety: true, loosens: false },
    ]);
  });

  it('knows what no permit leans on', () => {
    const screw = { name: 'A', position_mm: 0, pitch_mm: 0.5, lever: 1, closes: 'clockwise' } as const;
    const with_screw: RigSpec = { ...spec, channel: { ...spec.channel, screws: [screw] } };
    const turned = { ...screw, closes: 'anticlockwise' } as const;
    const after: RigSpec = {
      ...with_screw,
      gap: { ...spec.gap, radius_known: 'assumed' },
      channel: { ...spec.channel, screws: [turned], profile: 'half round', feeler_a_mm: 10 },
      beam: { ...spec.beam, stop: 'Brick' },
    };
    expect(specChanges(with_screw, after).map(({ field, safety }) => [field, safety])).toEqual([
      ['gap.radius_known', false],
      ['channel.screws.0.closes', false],
      ['channel.profile', false],
      ['channel.feeler_a_mm', false],
      ['beam.stop', true],
    ]);
    expect(isLoosening(after, with_screw)).toBe(true);
  });

  it('holds a list against the names before it: taking the first out is one change', () => {
    const three: RigSpec = { ...spec, shorting_points: ['dump', 'peaking', 'gap node'] };
    const two: RigSpec = { ...spec, shorting_points: ['peaking', 'gap node'] };
    expect(specChanges(three, two)).toEqual([
      { field: 'shorting_points.0', before: 'dump', after: null, safety: true, loosens: true },
    ]);
    expect(specChanges(three, { ...spec, shorting_points: ['gap node', 'dump', 'peaking'] })).toEqual([]);
    expect(specChanges(two, three)).toEqual([
      { field: 'shorting_points.2', before: null, after: 'dump', safety: true, loosens: false },
    ]);
  });

  it('never hides a bleed that went behind a new name', () => {
    const renamed: RigSpec = { ...spec, nodes: [{ name: 'C1', holds: 'first', bleed_Mohm: null }] };
    expect(specChanges(spec, renamed)).toEqual([
      { field: 'nodes.0.name', before: 'dump capacitor', after: 'C1', safety: true, loosens: false },
      { field: 'nodes.0.bleed_Mohm', before: 400, after: null, safety: true, loosens: true },
    ]);
  });
});
