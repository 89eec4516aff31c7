import { describe, expect, it } from 'vitest';
import type { RigDoc, RigRevision } from '../../domain/book/documents/rig';
import type { RigSpec } from '../../domain/book/rig-spec';
import { partingRows } from './parting-rows';
import { HERON, HERON_RIG } from './rigs.fixture';

const [base] = HERON_RIG.revisions;
if (base === undefined) throw new Error('Heron has a revision');
const revised = (entry: string, spec: RigSpec, based_on: string): RigRevision => ({
  ...base,
  entry,
  number: entry,
  spec,
  based_on,
});

describe('a parting side by side', () => {
  const a: RigSpec = {
    ...HERON,
    gap: { ...HERON.gap, gap_mm: 2.4 },
    envelope: { ...HERON.envelope, max_kV: 15 },
  };
  const b: RigSpec = { ...HERON, envelope: { ...HERON.envelope, max_kV: 14, max_rate_Hz: 5 } };
  const rig: RigDoc = {
    ...HERON_RIG,
    revisions: [base, revised('5A', a, base.entry), revised('5B', b, base.entry)],
    heads: ['5A', '5B'],
  };

  it('holds both against what they go back to, and says whose limit rules', () => {
    expect(partingRows(rig)).toEqual([
      { field: 'gap.gap_mm', before: 2.6, values: [2.4, 2.6], stricter: null },
      { field: 'envelope.max_kV', before: 16, values: [15, 14], stricter: 1 },
      { field: 'envelope.max_rate_Hz', before: 4, values: [4, 5], stricter: 0 },
    ]);
  });

  it('finds the base behind several revisions of one side', () => {
    const longer: RigDoc = {
      ...rig,
      revisions: [...rig.revisions, revised('6A', { ...a, envelope: HERON.envelope }, '5A')],
      heads: ['6A', '5B'],
    };
    // Heads stand in the order of the revisions: 5B before 6A.
    expect(partingRows(longer).map((row) => [row.field, row.values])).toEqual([
      ['envelope.max_kV', [14, 16]],
      ['envelope.max_rate_Hz', [5, 4]],
      ['gap.gap_mm', [2.6, 2.4]],
    ]);
  });

  it('has nothing to show while one revision rules', () => {
    expect(partingRows(HERON_RIG)).toEqual([]);
  });
});
