import { describe, expect, it } from 'vitest';
import type { RigSpec } from '../book/rig-spec';
import { specChanges } from '../rules/loosening';
import { specChangeWords, specFieldWords } from './spec-words';

const spec: RigSpec = {
  topology: 'lc-inversion',
  gap: {
    gas: 'N2',
    electrodes: 'domed',
    radius_mm: 12,
    radius_known: 'assumed',
    gap_mm: 2.6,
    gap_error_mm: 0.05,
    irradiated: true,
    lowest_bar_g: -0.1,
    highest_bar_g: 0.6,
    vessel: {
      material: 'Polyacetal',
      rated_bar_g: 2,
      relief_bar_g: 1,
      regulator_max_bar_g: 1.5,
      proof_date: null,
    },
  },
  first: { kind: 'bank', part: 'Ceramic', capacitance_nF: 5, rated_kV: 30 },
  second: { kind: 'bank', part: 'Ceramic', capacitance_nF: 1, rated_kV: 30 },
  channel: { length_mm: 240, spacing_a_mm: 2.5, spacing_b_mm: 2.5, gas: 'N2', across_kohm: 5 },
  charging: { supply_kV: 16, supply_mA: 1, ballast_Mohm: 20 },
  nodes: [{ name: 'C1', holds: 'first', bleed_Mohm: 500 }],
  shorting_points: ['C1'],
  beam: { pulse_energy_uJ: 60, wavelength_nm: 337.1 },
  model: { gap_nH: 25, channel_nH: 5, known: 'assumed' },
  envelope: { max_kV: 16, max_bar_g: 0.6, max_rate_Hz: 4 },
};

function changesIn(after: RigSpec): readonly string[] {
  return specChanges(spec, after).map((change) => specChangeWords(change, after.topology));
}

describe('words for a change of a rig', () => {
  it('names the field and says gauge beside a pressure', () => {
    expect(changesIn({ ...spec, gap: { ...spec.gap, highest_bar_g: 0.8, lowest_bar_g: -0.2 } })).toEqual([
      'Lowest working pressure: \u22120.2\u2009bar(g), was \u22120.1\u2009bar(g)',
      'Highest working pressure: 0.8\u2009bar(g), was 0.6\u2009bar(g)',
    ]);
  });

  it('says not known for a bleed that was taken out, never zero', () => {
    const nodes: RigSpec['nodes'] = [{ name: 'C1', holds: 'first', bleed_Mohm: null }];
    expect(changesIn({ ...spec, nodes })).toEqual(['Node 1, bleed: not known, was 500\u2009MΩ']);
  });

  it('calls the capacitors as their circuit does', () => {
    expect(specFieldWords('second.capacitance_nF', 'lc-inversion').label).toBe('C2, capacitance');
    expect(specFieldWords('second.capacitance_nF', 'charge-transfer').label).toBe(
      'Peaking capacitor, capacitance',
    );
  });

  it('has words for every field of a rig, so that none is shown by its key', () => {
    const everything = [
      ...specChanges(spec, { ...spec, topology: 'charge-transfer' }),
      ...specChanges(
        { ...spec, gap: { ...spec.gap, vessel: null }, nodes: [], shorting_points: [] } as unknown as RigSpec,
        spec,
      ),
      ...specChanges(
        {
          ...spec,
          first: {},
          second: {},
          channel: {},
          charging: {},
          beam: {},
          model: {},
          envelope: {},
        } as unknown as RigSpec,
        spec,
      ),
    ];
    expect(everything.length).toBeGreaterThan(25);
    for (const { field } of everything) expect(specFieldWords(field, 'lc-inversion').label).not.toBe(field);
  });

  it('has words for what came with version 2, and for codes', () => {
    const after: RigSpec = {
      ...spec,
      gap: {
        ...spec.gap,
        electrodes: 'hex-bars',
        flats_mm: 12,
        corner_mm: 1,
        facing: 'edges',
        rod_length_mm: 4,
      },
      first: {
        kind: 'bank',
        part: 'Ceramic',
        capacitance_nF: 5,
        rated_kV: 30,
        parts: 5,
        catalogue: 'polypropylene film',
      },
      channel: {
        ...spec.channel,
        profile: 'half round',
        edge_mm: 2,
        width_mm: 3,
        flow_L_min: 4,
        feeler_a_mm: 10,
        feeler_b_mm: 230,
        feeler_error_mm: 0.02,
        screws: [{ name: 'A', position_mm: 20, pitch_mm: 0.5, lever: 1, closes: 'clockwise' }],
      },
      charging: { ...spec.charging, inductor_uH: 10, inductor_ohm: 1 },
      beam: {
        ...spec.beam,
        pulse_ns: 5,
        width_mm: 3,
        height_mm: 20,
        divergence_width_mrad: 2,
        divergence_height_mrad: 10,
        stop: 'Brick',
      },
      model: {
        ...spec.model,
        gap_law: {
          law: 'rompe-weizel',
          end_ohm: 0.1,
          start_ohm: 100,
          fall_ns: null,
          constant_cm2_atm_V2s: 1,
          known: 'assumed',
        },
        channel_law: { over_static: 1.3, end_ohm: 0.2, start_ohm: 100, fall_ns: 2, known: 'assumed' },
      },
    };
    const found = specChanges(spec, after);
    expect(found).toHaveLength(37);
    for (const { field } of found) {
      const { label } = specFieldWords(field, 'lc-inversion');
      expect(label, field).toMatch(/^[A-Z]/);
      expect(label, field).not.toMatch(/[._]/);
    }
    const said = changesIn(after);
    expect(said).toContain('Gap electrodes: hexagonal bars, was domed');
    expect(said).toContain('Beam stop: Brick, was none');
    expect(said).toContain('Gap resistance law: after Rompe and Weizel, was not known');
    expect(said).toContain('Screw 1, pitch: 0.5\u2009mm, was not known');
  });

  it('says none where a thing was taken out', () => {
    expect(changesIn({ ...spec, shorting_points: [] })).toEqual(['Shorting point 1: none, was C1']);
  });

  it('keeps the name of a field that a newer app added', () => {
    expect(specFieldWords('gap.trigger', 'lc-inversion')).toEqual({ label: 'gap.trigger', unit: '' });
  });
});
