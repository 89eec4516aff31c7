import { describe, expect, it } from 'vitest';
import type { Permit } from '../book/documents/rig';
import { envelopeWords, permitOver, permitWords } from './permit-words';

const DAY_MS = 86_400_000;
const stamp = {
  wall_ms: 0,
  offset_min: 0,
  zone: 'Europe/London',
  page_life: '00000000-0000-4000-8000-000000000001',
  monotonic_ms: 0,
  time_uncertain: false,
};
const trace = { entry: 'granted', by: 'milo', device: 'desk', stamp, at: 4 };
const permit: Permit = {
  ...trace,
  rig_revision: 'rev-2',
  envelope: { max_kV: 14, max_bar_g: 0.6, max_rate_Hz: 4 },
  until_ms: 10 * DAY_MS,
  withdrawn: null,
};

describe('words for a permit', () => {
  it('sets its limits in one line, gauge beside the pressure', () => {
    expect(envelopeWords(permit.envelope)).toBe('14\u2009kV, 0.6\u2009bar(g), 4\u2009Hz');
  });

  it('rounds a limit down, so that nobody reads more than was granted', () => {
    expect(envelopeWords({ max_kV: 14.999, max_bar_g: 0, max_rate_Hz: 100 })).toBe(
      '14.9\u2009kV, 0\u2009bar(g), 100\u2009Hz',
    );
  });

  it('names its last day in the zone of the lab', () => {
    expect(permitWords({ until_ms: Date.UTC(2026, 5, 30, 23, 30) }, 'Europe/London')).toBe('Permit to 1 Jul');
  });

  it('says why it does not rule', () => {
    const rig = { heads: ['rev-2'] };
    expect(permitOver(permit, rig, 0)).toBeNull();
    expect(permitOver(permit, rig, 10 * DAY_MS)).toBe('lapsed');
    expect(permitOver(permit, { heads: ['rev-3'] }, 0)).toBe('for an earlier revision');
    expect(permitOver({ ...permit, withdrawn: trace }, rig, 0)).toBe('withdrawn');
  });
});
