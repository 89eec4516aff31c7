import { describe, expect, it } from 'vitest';
import { readFigure, readFigures, stepFigure, type FigureSpec } from './figure-form';

const gap: FigureSpec = {
  key: 'gap',
  label: 'Gap',
  unit: 'mm',
  step: 0.1,
  rule: { field: 'gap', name: 'Gap', unit: 'mm', min: 0.01, max: 5 },
  initial: '2.6',
};
const count: FigureSpec = { ...gap, key: 'count', initial: '', whenEmpty: 'not counted' };

describe('reading a figure', () => {
  it('takes what was typed before what stood there, and refuses in words', () => {
    expect(readFigure(gap, {})).toEqual({ type: 'value', value: 2.6 });
    expect(readFigure(gap, { gap: '3' })).toEqual({ type: 'value', value: 3 });
    expect(readFigure(gap, { gap: '9' })).toMatchObject({
      type: 'refused',
      words: expect.stringContaining('Gap'),
    });
    expect(readFigure(gap, { gap: '' }).type).toBe('refused');
  });

  it('may be empty only where that means something', () => {
    expect(readFigure(count, {})).toEqual({ type: 'empty' });
    expect(readFigures([gap, count], { gap: '9' })).toMatchObject({ values: { gap: null, count: null } });
    expect(readFigures([gap, count], { gap: '9' }).refusal).toContain('Gap');
    expect(readFigures([gap, count], {})).toEqual({ values: { gap: 2.6, count: null }, refusal: null });
  });

  it('steps in decimal and stops at its limits', () => {
    expect(stepFigure(gap, {}, 1)).toBe('2.7');
    expect(stepFigure(gap, { gap: '4.95' }, 1)).toBe('5');
    expect(stepFigure(gap, { gap: '' }, -1)).toBe('0.01');
    expect(stepFigure(gap, { gap: 'x' }, 1)).toBe('0.1');
  });
});
