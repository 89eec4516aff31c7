import { describe, expect, it } from 'vitest';
import type { PartDoc } from '../../domain/book/documents/part';
import { FIRING, IDS, readingDoc, RIG, trace } from './firing.fixture';
import { looksCounted, outputOverShots, summaryFigures, wearLines } from './firing-summary';
import { standingRows } from './reading-fit';

const rows = standingRows([
  readingDoc(1, { voltage_kV: 18, output_uJ: 140, output_attenuators: 3, trigger_misses: 1 }),
  readingDoc(2, { voltage_kV: 19, output_uJ: null, looked: 'arc-mid', output_attenuators: 4 }),
  readingDoc(3, { how: 'set', voltage_kV: 15, output_uJ: 160, pressure_bar_g: 1.1 }),
  { ...readingDoc(4), struck: { ...trace('s'), why: 'twice' } },
]);
const firing = { ...FIRING, shots: 200 };

describe('the summary of a firing', () => {
  it('holds what was measured, without the struck reading, and never turns a count into energy', () => {
    const said = Object.fromEntries(summaryFigures(firing, rows).map(({ key, words }) => [key, words]));
    expect(said).toEqual({
      shots: '200',
      counted: '80',
      readings: '3',
      breaks: '2',
      kV: '18.50\u2009kV',
      pressure: '1.02 to 1.10\u2009bar(g)',
      rate: '2.0\u2009Hz',
      output: '150\u2009µJ',
      attenuators: '3 to 4',
      misses: '1',
    });
  });

  it('has a dash for what nobody measured', () => {
    const said = summaryFigures(FIRING, []).map(({ words }) => words);
    expect(said).toEqual(['0', '0', '0', '0', '–', '–', '–', '–', '–', '–']);
  });

  it('counts the looks, the most frequent first', () => {
    expect(looksCounted(rows)).toEqual([
      { looked: 'even', times: 2 },
      { looked: 'arc, mid', times: 1 },
    ]);
  });

  it('puts output over the shots up to the reading, and skips what was not measured', () => {
    expect(outputOverShots(rows)).toEqual([
      { x: 40, y: 140 },
      { x: 120, y: 160 },
    ]);
  });
});

describe('wear by a firing', () => {
  const part = (minute: number): PartDoc => ({
    kind: 'part',
    id: 'p',
    parent: IDS.rig,
    fitted: {
      what: 'Ceramic bank',
      place: 'first',
      where: '',
      serial: '',
      catalogue: null,
      fitted_on: '2026-11-20',
      shots_before: 1000,
      replaces: null,
      note: '',
    },
    trace: { ...trace('p', minute), at: minute },
    irregular: null,
    retired: null,
  });
  const opened = { ...firing, opened: { ...trace(IDS.firing, 30), at: 30 } };

  it('is said for each part that was fitted when it was opened', () => {
    const at = { parts: [part(10)], firings: [opened] };
    expect(wearLines(opened, RIG, at)).toEqual([
      { part: 'Ceramic bank', words: '200 shots added, 1,200 in all' },
    ]);
    expect(wearLines(opened, RIG, { ...at, parts: [part(50)] })).toEqual([]);
  });
});
