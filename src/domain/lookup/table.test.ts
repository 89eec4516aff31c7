import { describe, expect, it } from 'vitest';
import { GAP_LOOKUP } from './gap-lookup';
import type { LookupAnswer } from './lookup';
import { kettleLikeSpec, labSettings } from './rig.fixture';
import { sweepAt } from './sweep';
import { answerTable, heldStill, sweepTable, tabText, wallTable } from './table';

const { values, known } = GAP_LOOKUP.start({ spec: kettleLikeSpec, settings: labSettings });
const answer = ((): LookupAnswer => {
  const answered = GAP_LOOKUP.answer(values);
  if (!answered.ok) throw new Error(answered.refusal.words);
  return answered.value;
})();
const figures = answer.figures.filter(({ key }) => key === 'low' || key === 'high');

describe('an answer as a table', () => {
  const table = answerTable({ lookup: GAP_LOOKUP, values, known, answer, about: 'Kettle, revision 7' });

  it('holds inputs with where they came from, then figures with their band', () => {
    expect(table.head).toEqual(['Quantity', 'Value', 'Unit', 'Low', 'High', 'Source']);
    expect(table.rows).toContainEqual(['Gap', '3.00', 'mm', '', '', 'from the rig']);
    expect(table.rows).toContainEqual(['Ambient', '0.966', 'bar(abs)', '', '', 'from the lab']);
    expect(table.rows).toContainEqual(['law', '18.8', 'kV', '16.7', '24.3', 'computed']);
    expect(table.rows.at(-1)?.[0]).toBe('Valid');
  });

  it('leaves out fields that have no meaning for these values', () => {
    expect(table.rows.some(([label]) => label === 'Condition')).toBe(false);
  });

  it('says what a printed table holds still', () => {
    const lines = heldStill({ lookup: GAP_LOOKUP, values, known }, 'pressure');
    expect(lines).toContain('Gap 3.00\u2009mm (from the rig)');
    expect(lines.some((line) => line.startsWith('Pressure'))).toBe(false);
  });
});

describe('a sweep as a table', () => {
  it('has the units in its head and empty cells where there is no answer', () => {
    const rows = sweepAt(GAP_LOOKUP, values, { field: 'pressure', figures: ['low', 'high'], xs: [1, 19] });
    const table = sweepTable(GAP_LOOKUP, rows, { field: 'pressure', figures });
    expect(table.head).toEqual(['Pressure, bar(g)', 'nothing fires below, kV', 'may hold up to, kV']);
    expect(table.rows).toEqual([
      ['1.00', '16.7', '24.3'],
      ['19.00', '', ''],
    ]);
  });

  it('steps roundly for the wall', () => {
    const range = { field: 'pressure', from: 0, to: 2, scale: 'linear' as const };
    const table = wallTable(GAP_LOOKUP, values, { range, figures });
    expect(table.rows.map(([x]) => x).slice(0, 3)).toEqual(['0.00', '0.10', '0.20']);
    expect(table.rows).toContainEqual(['1.00', '16.7', '24.3']);
  });
});

describe('a table for the clipboard', () => {
  const text = (...cells: string[]) => tabText({ title: 'T', head: ['H'], rows: [cells] }).split('\n')[2];

  it('writes numbers plainly, so that a spreadsheet reads them', () => {
    expect(text('\u221212.5', '1,240', '12,345,678.9', '1.20e\u22129')).toBe(
      '-12.5\t1240\t12345678.9\t1.20e-9',
    );
  });

  it.each(['=1+1', '+cmd', '-2+3', '@sum', '\t=1', '\r=1', ' =1'])('takes the sting out of %j', (cell) => {
    expect(text(cell)).toMatch(/^'/);
  });

  it('keeps a row a row whatever a text holds', () => {
    expect(text('a\tb\nc', 'd')).toBe('a b c\td');
  });
});
