import { describe, expect, it } from 'vitest';
import { FUNCTIONS, type Evaluated, type Skipped } from './fn-table';
import { Inputs } from './inputs';
import { ALIGNMENT_AND_CHARGING } from './tables/alignment-and-charging';
import { BEAM_AND_DYE } from './tables/beam-and-dye';
import { CAPACITOR } from './tables/capacitor';
import { CHANNEL } from './tables/channel';
import { GAP } from './tables/gap';
import { GAS_AND_ROOM } from './tables/gas-and-room';
import { SPARK_AND_LINE } from './tables/spark-and-line';
import { isPublished, type Row, type Table } from './tables/table';
import { UNIFORM_GAP } from './tables/uniform-gap';

const TABLES: readonly Table[] = [
  ...UNIFORM_GAP,
  ...GAP,
  ...SPARK_AND_LINE,
  ...CAPACITOR,
  ...ALIGNMENT_AND_CHARGING,
  ...CHANNEL,
  ...GAS_AND_ROOM,
  ...BEAM_AND_DYE,
];

/** Families whose tables need more than one line a value: where they stand. */
const ELSEWHERE: Readonly<Record<string, string>> = {
  'circuit.channelFires': 'circuits.test.ts',
  'circuit.peakChannelCurrent': 'circuits.test.ts',
  'circuit.peakChannelVoltage': 'circuits.test.ts',
  'circuit.peakGapCurrent': 'circuits.test.ts',
  'circuit.riseTime': 'circuits.test.ts',
  'circuit.timeToPeak': 'circuits.test.ts',
  'gap.breakdown.hexBars': 'bars-and-rods.test.ts',
  'gap.fieldFactorHex': 'bars-and-rods.test.ts',
};

function answerTo(table: Table, row: Row): Evaluated | Skipped {
  const inputs = new Inputs({
    ...table.given,
    ...Object.fromEntries(table.columns.map((name, index) => [name, row[index]])),
  });
  const ask = table.ask ?? FUNCTIONS[table.family];
  return ask === undefined ? { skip: 'function not known' } : ask(inputs);
}

describe.each(TABLES)('$family: $source.name ($source.seen)', (table) => {
  it.each(table.rows.map((row) => [row.join(', '), row] as const))('%s', (_words, row) => {
    const expected = row.at(-1);
    const got = answerTo(table, row);
    if ('skip' in got || !got.ok) throw new Error('skip' in got ? got.skip : got.refusal.words);
    const { value } = got;
    if (typeof expected === 'boolean') {
      expect(value).toBe(expected);
      return;
    }
    const figure = typeof value === 'object' ? value.value : Number(value);
    const wanted = Number(expected);
    const slack = table.within * Math.abs(wanted) + (table.rounded ?? 0) + 1e-12 * Math.abs(wanted);
    const low = typeof value === 'object' && table.holds === 'in band' ? value.band.low : figure;
    const high = typeof value === 'object' && table.holds === 'in band' ? value.band.high : figure;
    if (table.holds !== 'at least') expect(low).toBeLessThanOrEqual(wanted + slack);
    if (table.holds !== 'at most') expect(high).toBeGreaterThanOrEqual(wanted - slack);
  });
});

describe('the tables', () => {
  const rows = (chosen: readonly Table[]) => chosen.reduce((sum, table) => sum + table.rows.length, 0);

  it('hold every family of the check format, or say where it stands', () => {
    const held = new Set([...TABLES.map(({ family }) => family), ...Object.keys(ELSEWHERE)]);
    expect(Object.keys(FUNCTIONS).filter((family) => !held.has(family))).toEqual([]);
    expect(TABLES.filter(({ family }) => !Object.hasOwn(FUNCTIONS, family))).toEqual([]);
  });

  it('hold at least sixty values of our own from other published places', () => {
    expect(rows(TABLES.filter((table) => table.own === true && isPublished(table)))).toBeGreaterThanOrEqual(
      60,
    );
  });

  it('have as many figures in a row as columns, and one that is expected', () => {
    const odd = TABLES.filter(({ rows: all, columns }) =>
      all.some((row) => row.length !== columns.length + 1),
    );
    expect(odd.map(({ family }) => family)).toEqual([]);
  });

  it('call nothing published that was not printed somewhere, and no practice read', () => {
    for (const { source } of TABLES) {
      const worked = source.seen === 'worked out';
      const unprinted = ['closed form', 'independent program', 'common practice'].includes(source.kind);
      expect([source.name, worked]).toEqual([source.name, unprinted]);
    }
  });
});
