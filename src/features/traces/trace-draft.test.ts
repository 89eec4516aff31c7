import { describe, expect, it } from 'vitest';
import { readOscillogram } from '../../domain/oscillogram/read-oscillogram';
import { surveyOf, type TraceSurvey } from '../../domain/oscillogram/survey';
import { foundWords } from './found-words';
import { keptDraft } from './kept-draft';
import { choiceOf, EMPTY_TRACE, probeKey, readingAs, traceSpecs } from './trace-draft';

function survey(text: string): TraceSurvey {
  const read = readOscillogram(new TextEncoder().encode(text));
  if (!read.ok) throw new Error(read.refusal.words);
  return surveyOf(read.value, 10);
}

const TWO = survey(
  [
    'Scope 7',
    'saved;yes',
    'Time (ns);CH1 (V);CH2 (mA)',
    '0,0;1,5;2',
    '1,0;9,5;3',
    'lost line',
    '2,0;1,5;4',
    '3,0;1,5;4',
  ].join('\n'),
);
const NO_TIME = survey('CH1 (V)\n5\n1\n5\n2\n');

describe('words about what was found', () => {
  it('says how the file is written, its time and what was left out', () => {
    expect(foundWords(TWO)).toEqual([
      '4 points in 2 channels; separated by semicolons, decimal commas, 3 header lines.',
      'Time in column 1, 3.00\u2009ns in all.',
      'Line 6 holds no figures and was left out.',
    ]);
    expect(foundWords(NO_TIME)[1]).toBe('No time column.');
  });
});

describe('how a channel is read', () => {
  it('takes units from the file and the first voltage for the channel until somebody says otherwise', () => {
    expect(choiceOf(TWO, 0, EMPTY_TRACE)).toEqual({ shows: 'channel-voltage', unit: 'V', inverted: false });
    expect(choiceOf(TWO, 1, EMPTY_TRACE)).toEqual({ shows: 'current', unit: 'mA', inverted: false });
    const said = { ...EMPTY_TRACE, choices: { '2': { shows: 'trigger', inverted: true } as const } };
    expect(choiceOf(TWO, 1, said)).toEqual({ shows: 'trigger', unit: 'mA', inverted: true });
  });

  it('reads figures that are refused as if they were untouched', () => {
    const draft = { ...EMPTY_TRACE, texts: { [probeKey(1)]: '0', [probeKey(2)]: '10' } };
    const { channels, time_column, time_unit_s } = readingAs(TWO, draft);
    expect(channels.map(({ probe_ratio, unit_V_or_A }) => [probe_ratio, unit_V_or_A])).toEqual([
      [1, 1],
      [10, 1e-3],
    ]);
    expect([time_column, time_unit_s]).toEqual([0, 1e-9]);
  });

  it('asks for the time between points where the file has no time, and counts them in a column after the last', () => {
    expect(traceSpecs(NO_TIME, EMPTY_TRACE, { last: 0 }).map(({ key }) => key)).toContain('interval');
    expect(traceSpecs(TWO, EMPTY_TRACE, { last: 0 }).map(({ key }) => key)).not.toContain('interval');
    const read = readingAs(NO_TIME, { ...EMPTY_TRACE, texts: { interval: '0.4' } });
    expect(read.time_column).toBe(1);
    expect(read.time_unit_s).toBeCloseTo(4e-10, 20);
  });

  it('opens a kept trace as it was kept', () => {
    for (const file of [TWO, NO_TIME]) {
      const draft = {
        ...EMPTY_TRACE,
        choices: { '0': { inverted: true }, '1': { inverted: true, unit: 'kV' as const } },
        texts: { [probeKey(0)]: '100', [probeKey(1)]: '1000', interval: '2.5' },
        note: 'on the channel',
      };
      const reading_as = readingAs(file, draft);
      const again = keptDraft({ reading_as, reading: null, note: draft.note }, file, []);
      expect(readingAs(file, again)).toEqual(reading_as);
      expect(again.note).toBe(draft.note);
      expect(again.texts['reading']).toBe('');
    }
  });
});
