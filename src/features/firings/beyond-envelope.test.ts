import { describe, expect, it } from 'vitest';
import { FIRING, RIG } from './firing.fixture';
import { beyondEnvelope, firingEnvelope } from './beyond-envelope';

describe('beyond the envelope', () => {
  it('holds readings against the permit of the firing', () => {
    const envelope = firingEnvelope(FIRING, RIG);
    expect(beyondEnvelope({ voltage_kV: 22, pressure_bar_g: 1.2, rate_Hz: 3 }, envelope)).toEqual({});
    expect(beyondEnvelope({ voltage_kV: 22.1, pressure_bar_g: 1.25, rate_Hz: 3.5 }, envelope)).toEqual({
      voltage_kV: 'Beyond the permit’s 22\u2009kV: it will be logged as irregular.',
      pressure_bar_g: 'Beyond the permit’s 1.2\u2009bar(g): it will be logged as irregular.',
      rate_Hz: 'Beyond the permit’s 3\u2009Hz: it will be logged as irregular.',
    });
  });

  it('falls back on the rig’s own limits where a firing has no permit', () => {
    const envelope = firingEnvelope({ ...FIRING, permit: null }, RIG);
    expect(envelope.max_kV).toBe(23);
    const said = beyondEnvelope({ voltage_kV: 23.1, pressure_bar_g: null, rate_Hz: null }, envelope);
    expect(said.voltage_kV).toMatch(/^Beyond the rig’s 23/);
  });
});
