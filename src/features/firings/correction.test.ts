import { describe, expect, it } from 'vitest';
import { READING } from './firing.fixture';
import { correctionBase, correctionRefusal, strikeRefusal } from './correction';
import { EMPTY_DRAFT, enter } from './reading-form';

describe('correcting and striking', () => {
  it('asks for a change first and for a reason then', () => {
    expect(correctionRefusal(EMPTY_DRAFT, READING, 'typo')).toMatch(/^Nothing is changed yet/);
    const changed = enter(EMPTY_DRAFT, 'voltage_kV', 19);
    expect(correctionRefusal(changed, READING, ' ')).toMatch(/^Reason:/);
    expect(correctionRefusal(changed, READING, 'read off wrongly')).toBeNull();
  });

  it('takes a note alone for a correction', () => {
    expect(correctionRefusal({ ...EMPTY_DRAFT, note: 'loud' }, READING, 'forgotten')).toBeNull();
  });

  it('strikes nothing without words', () => {
    expect(strikeRefusal('')).toMatch(/^Reason:/);
    expect(strikeRefusal('typed twice')).toBeNull();
  });

  it('says of untouched fields how they came into the reading', () => {
    const { source } = correctionBase({ ...READING, carried_over: ['flow_L_min'] });
    expect(source.flow_L_min).toBe('carried over then');
    expect(source.voltage_kV).toBe('as logged');
  });
});
