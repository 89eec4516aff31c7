import { describe, expect, it } from 'vitest';
import { HERON } from '../rigs.fixture';
import { sheetPlan, sheetWords } from './sheet-plan';

const sheet = HERON.first;
if (sheet.kind !== 'sheet') throw new Error('Heron is built of sheets');

describe('cross-section of a sheet', () => {
  it('puts plies between two foils, and a foil more for each pair', () => {
    const plain = sheetPlan(4, 1);
    expect(plain.foils).toHaveLength(2);
    expect(plain.pairs.map((pair) => pair.plies.length)).toEqual([4]);
    const stacked = sheetPlan(4, 3);
    expect(stacked.foils.map((foil) => foil.side)).toEqual(['left', 'right', 'left', 'right']);
    expect(stacked.pairs.map((pair) => pair.plies.length)).toEqual([4, 4, 4]);
    expect(stacked.height).toBeGreaterThan(plain.height);
  });

  it('says what it leaves out', () => {
    const many = sheetPlan(20, 40);
    expect(many.pairs[0]).toMatchObject({ more: 14 });
    expect(many.more_pairs).toBe(37);
  });

  it('tells plies and pairs apart by what one more of each does', () => {
    // 3.89 nF at 22.9 kV/mm as the demo computes it; C goes with pairs over plies, stress with one over plies.
    expect(sheetWords(sheet, 16)).toEqual({
      thickness: '4 plies of 175\u2009µm make 0.700\u2009mm between two foils',
      foils: '1 pair of facing foils: 2 foils',
      capacitance: '3.89\u2009nF',
      one_ply_more: '3.11\u2009nF, 18.3\u2009kV/mm',
      one_pair_more: '7.77\u2009nF, 22.9\u2009kV/mm',
    });
  });
});
