import { describe, expect, it } from 'vitest';
import { answer } from '../../domain/units/answer';
import { comparison } from './comparison';

const model = { gap_nH: 20, channel_nH: 3, known: 'assumed' } as const;
const given = { model: 'm', valid: 'v', relative: 0.04 };

describe('measured beside simulated', () => {
  it('gives each figure its unit and its band, and a dash where there is none', () => {
    const rows = comparison(
      {
        shows: 'channel-voltage',
        unit: 'kV',
        peak: 16.84,
        rise_s: 8.12e-9,
        start_s: 1e-7,
        delay_s: null,
        after: 'after TRIG',
        ring_Hz: answer({ ...given, value: 12.34e6, unit: 'Hz' }),
        inductance_H: answer({ ...given, value: 23.1e-9, unit: 'H', relative: 0.08 }),
        quiet: false,
      },
      {
        points: [],
        peak: { value: 18.2, band: { low: 16.1, high: 20.3 } },
        rise_s: 7.5e-9,
        start_s: 1e-9,
        label: 'channel',
      },
      { model },
    );
    expect(rows.map(({ measured, simulated }) => [measured, simulated])).toEqual([
      ['16.8\u2009kV', '18.2\u2009kV, 16.1 to 20.3'],
      ['8.12\u2009ns', '7.50\u2009ns'],
      ['\u2013', '\u2013'],
      ['12.3\u2009MHz \u00b14\u2009%', '\u2013'],
      ['23.1\u2009nH \u00b18\u2009%', 'gap 20.0\u2009nH, channel 3.00\u2009nH'],
    ]);
  });
});
