import { describe, expect, it } from 'vitest';
import type { Step } from '../book/sheet-spec';
import { BEFORE_FIRING } from '../rules/ready-sheets/before-firing';
import { limitWords, sheetDifference, stepWords } from './sheet-words';

const names = { rigName: (id: string) => id.toUpperCase() };
const vessel = BEFORE_FIRING.steps.find((step) => step.key === 'vessel-pressure') as Extract<
  Step,
  { type: 'reading' }
>;

describe('a step in words', () => {
  it('says its kind, its limits and who may waive it', () => {
    expect(stepWords(vessel)).toBe(
      'reading, Gauge pressure: 0 to the rig’s highest gauge pressure\u2009bar(g), waived by a reviewer',
    );
    expect(limitWords({ ...vessel, lowest: -0.05, highest: 2, highest_from_rig: null })).toBe(
      '\u22120.05 to 2\u2009bar(g)',
    );
    expect(limitWords({ ...vessel, lowest: null, highest_from_rig: null })).toBe('bar(g), no limits');
  });
});

describe('the difference to the published sheet', () => {
  it('is nothing between a sheet and itself', () => {
    expect(sheetDifference(BEFORE_FIRING, BEFORE_FIRING, names)).toEqual([]);
  });

  it('names what moved alone, and not what made room for it', () => {
    const [first, ...rest] = BEFORE_FIRING.steps;
    const after = { ...BEFORE_FIRING, steps: [...rest, first!] };
    expect(sheetDifference(BEFORE_FIRING, after, names)).toEqual([
      { what: 'Step 16, Hands and tags out: place', before: '1', after: '16' },
    ]);
  });

  it('says what was added, taken out, reworded and limited anew', () => {
    const steps = BEFORE_FIRING.steps.filter((step) => step.key !== 'flow');
    const after = {
      ...BEFORE_FIRING,
      rigs: ['kettle'],
      steps: [
        ...steps.map((step) => (step.key === 'vessel-pressure' ? { ...vessel, highest: 1 } : step)),
        { type: 'photo', key: 'door', title: 'Photo of the door', detail: '', waive: 'operator' } as const,
      ],
    };
    expect(sheetDifference(BEFORE_FIRING, after, names).map(({ what }) => what)).toEqual([
      'Rigs',
      'Step 8, Vessel pressure: kind',
      'Step 16, Photo of the door',
      'Step 10 before, Flow through the channel',
    ]);
    expect(sheetDifference(BEFORE_FIRING, after, names)[0]).toEqual({
      what: 'Rigs',
      before: 'every rig of its circuits',
      after: 'KETTLE',
    });
  });
});
