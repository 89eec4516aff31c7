import { describe, expect, it } from 'vitest';
import { bodyText, sealEntry, type SealedEntry } from '../book/entry';
import { KINDS } from '../book/kinds';
import { entryFields, entrySubstance, kindWords, KIND_WORDS } from './entry-words';

const id = (last: number): string => `00000000-0000-4000-8000-00000000000${last}`;

function entry(kind: string, body: Readonly<Record<string, unknown>>): SealedEntry {
  return sealEntry(
    {
      lab: id(1),
      id: id(2),
      device: id(3),
      seq: 1,
      kind,
      version: 1,
      subject: id(4),
      author: id(5),
      witness: null,
      base: { epoch: id(6), revision: 0, hash: '0'.repeat(64) },
      stamp: {
        wall_ms: 0,
        offset_min: 0,
        zone: 'Europe/London',
        page_life: id(7),
        monotonic_ms: 0,
        time_uncertain: false,
      },
    },
    bodyText(body, 'ab'.repeat(16)),
  );
}

const reading = {
  voltage_kV: 18.9,
  how: 'self-break',
  pressure_bar_g: -0.05,
  gas: 'N2',
  flow_L_min: null,
  rate_Hz: 2,
  shots: 1240,
  looked: 'arc-a-end',
  output_uJ: null,
  ambient_bar_abs: 0.966,
  temperature_C: 21,
  humidity_pct: null,
  note: '',
  carried_over: [],
};

describe('words for an entry', () => {
  it('names every kind that the Book knows, and leaves a newer one its own name', () => {
    for (const kind of KINDS) expect(KIND_WORDS[kind]).not.toBe('');
    expect(kindWords('kit.melted')).toBe('kit.melted');
  });

  it('gives a reading by its figures, with true minus and gauge', () => {
    expect(entrySubstance(entry('firing.reading', reading), 'UTC')).toBe(
      '18.9\u2009kV, \u22120.05\u2009bar(g), 1,240 shots, arc, A end',
    );
  });

  it('gives the words that were written', () => {
    expect(entrySubstance(entry('rig.stood-down', { why: 'Smell of ozone' }), 'UTC')).toBe('Smell of ozone');
    expect(entrySubstance(entry('check.closed', {}), 'UTC')).toBe('');
  });

  it('says so when the text cannot be read, and never throws', () => {
    expect(entrySubstance(entry('firing.reading', { voltage_kV: 'much' }), 'UTC')).toContain('voltage_kV');
    expect(entrySubstance(entry('kit.melted', {}), 'UTC')).toContain('kit.melted');
  });

  it('lists the fields as they were written, without the salt', () => {
    expect(
      entryFields(
        entry('permit.granted', {
          rig_revision: id(8),
          envelope: { max_kV: 14, max_bar_g: 0.6, max_rate_Hz: 4 },
          words: '',
          proof: null,
        }),
      ),
    ).toEqual([
      { field: 'rig_revision', value: id(8) },
      { field: 'envelope.max_kV', value: '14' },
      { field: 'envelope.max_bar_g', value: '0.6' },
      { field: 'envelope.max_rate_Hz', value: '4' },
      { field: 'words', value: '' },
      { field: 'proof', value: 'none' },
    ]);
    expect(entryFields({ ...entry('check.closed', {}), body: 'not json' })).toEqual([
      { field: 'text', value: 'not json' },
    ]);
  });
});
