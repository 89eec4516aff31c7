import { describe, expect, it } from 'vitest';
import { gridHalf_mm, placeOnGrid } from './beam-place';
import { READING } from './firing.fixture';
import { nextBase } from './reading-form';
import { beamWords, groupWords, READING_GROUPS } from './reading-group';

const { values } = nextBase(READING);

describe('folded groups', () => {
  it('say nothing while nothing is entered', () => {
    expect(READING_GROUPS.map(({ key }) => groupWords(values, key))).toEqual(['', '', '']);
  });

  it('say what they hold in one line', () => {
    const seen = { ...values, output_attenuators: 1, beam_x_mm: 2, beam_y_mm: -1.5, trigger_misses: 3 };
    expect(groupWords(seen, 'beam')).toBe('1 attenuator, at +2, \u22121.5\u2009mm');
    expect(groupWords(seen, 'trigger')).toBe('3 missed');
    expect(groupWords({ ...values, channel_gas: 'air', dye_batch: 'R6G' }, 'channel')).toBe(
      'air in the channel, dye R6G',
    );
  });

  it('has no place for a spot with one coordinate', () => {
    expect(beamWords({ beam_x_mm: 2, beam_y_mm: null })).toBe('');
  });
});

describe('the millimetre grid', () => {
  const box = { left: 100, top: 50, width: 200, height: 200 };

  it('puts a touch on whole millimetres, right and up positive', () => {
    expect(placeOnGrid({ clientX: 200, clientY: 150 }, box, 10)).toEqual({ x_mm: 0, y_mm: 0 });
    expect(placeOnGrid({ clientX: 241, clientY: 139 }, box, 10)).toEqual({ x_mm: 4, y_mm: 1 });
    expect(placeOnGrid({ clientX: 301, clientY: 49 }, box, 10)).toEqual({ x_mm: 10, y_mm: 10 });
  });

  it('grows before a step leaves it', () => {
    expect(gridHalf_mm(null, null)).toBe(10);
    expect(gridHalf_mm(11, 0)).toBe(50);
    expect(gridHalf_mm(0, -60)).toBe(200);
  });
});
