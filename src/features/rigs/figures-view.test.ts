import { describe, expect, it } from 'vitest';
import type { RigSpec } from '../../domain/book/rig-spec';
import { rigView } from './figures-view';
import { HERON, KETTLE } from './rigs.fixture';

const lab = { discharged_below_V: 50, ambient_bar_abs: 0.966, ambient_C: 21 };

const rows = (spec: RigSpec) =>
  Object.fromEntries(
    rigView(spec, lab).rows.map((row) => [row.key, row.value === null ? null : `${row.value} ${row.unit}`]),
  );

describe('figures of a rig (the demo lab computes the same: 0.90 J, 22.9 kV/mm, 20 s, 1.56 J, 12.4 s)', () => {
  it('gives an LC inversion its energy at the supply limit rounded up, stress, reach and wait', () => {
    expect(rows(HERON)).toMatchObject({
      stored: '0.91 J',
      stress: '22.9 kV/mm',
      reach: '14.8 kV',
      wait: '60 s',
    });
    const view = rigView(HERON, lab);
    expect(view.first_nF).toBe('3.89');
    expect(view.second_nF).toBe('3.16');
    expect(view.hazard).toContain('16\u2009kV and 1\u2009mA');
  });

  it('shows a rate no higher than the envelope allows', () => {
    const view = rigView({ ...HERON, envelope: { ...HERON.envelope, max_rate_Hz: 1.5 } }, lab);
    expect(view.rows.find((row) => row.key === 'rate')).toMatchObject({
      value: '1.5',
      source: 'by the envelope',
    });
  });

  it('says that the gap may stay shut where the supply does not reach past the high side', () => {
    expect(rigView(HERON, lab).may_sit_charged).toContain('sits charged');
    const strong = { ...HERON, charging: { ...HERON.charging, supply_kV: 40 } };
    expect(rigView(strong, lab).may_sit_charged).toBeNull();
  });

  it('gives a bank no stress, since its part carries a rating instead', () => {
    expect(rows(KETTLE)).toMatchObject({ stored: '1.6 J', wait: '60 s' });
    expect(rows(KETTLE)).not.toHaveProperty('stress');
  });

  it('has both sides at the highest working pressure, the low one rounded down and the high one up', () => {
    const { sides } = rigView(KETTLE, lab);
    if (!sides.ok) throw new Error(sides.words);
    expect(Number(sides.value.low)).toBeLessThan(Number(sides.value.law));
    expect(sides.value.law).toBe('20.4');
    expect(Number(sides.value.high)).toBeGreaterThan(Number(sides.value.law));
  });

  it('gives every node of an inversion by itself, and both on one bleed', () => {
    expect(rigView(HERON, lab).nodes.map((node) => node.name)).toEqual([
      'C1, gap side',
      'C2, channel side',
      'C1, gap side and C2, channel side on one bleed',
    ]);
  });

  it('has no number at all where a bleed is unknown', () => {
    const [first, second] = HERON.nodes;
    if (first === undefined || second === undefined) throw new Error('Heron has two nodes');
    const view = rigView({ ...HERON, nodes: [first, { ...second, bleed_Mohm: null }] }, lab);
    expect(view.rows.find((row) => row.key === 'wait')).toMatchObject({ value: null });
    expect(view.no_wait).toContain('C2, channel side');
    expect(view.nodes.every((node) => node.computed === null)).toBe(true);
  });

  it('refuses in words and never shows NaN when the gap is outside the law', () => {
    const view = rigView({ ...HERON, gap: { ...HERON.gap, gas: 'He' } }, lab);
    expect(view.sides.ok).toBe(false);
    expect(view.rows.find((row) => row.key === 'rate')).toMatchObject({ value: null });
    expect(JSON.stringify(view)).not.toMatch(/NaN|Infinity/);
  });
});
