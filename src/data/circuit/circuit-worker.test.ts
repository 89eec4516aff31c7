import { afterEach, describe, expect, it, vi } from 'vitest';
import type { Circuit } from '../../domain/circuit/circuit-input';
import type { CircuitReply, CircuitRequest } from './circuit-protocol';

/** "Transfer, channel dark" of the reference tables: 20.314 kV after 13.1 ns, by ngspice and a Radau solver. */
const CIRCUIT: Circuit = {
  topology: 'charge-transfer',
  charge_V: 15_000,
  dump_F: 2e-9,
  peaking_F: 6e-10,
  bleed_ohm: 10_000,
  gap_H: 2e-8,
  gap: { law: 'exponential', end_ohm: 0.2, start_ohm: 500, fall_s: 1e-9 },
  channel: { inductance_H: 3e-9, break_V: null, end_ohm: 0.3, start_ohm: 500, fall_s: 8e-10 },
  window_s: 6e-8,
};

/** Loads the worker's module into a scope of its own and gives what it does with a message. */
async function loadedWorker(): Promise<(request: CircuitRequest) => CircuitReply | undefined> {
  const scope = new EventTarget();
  const replies: CircuitReply[] = [];
  vi.stubGlobal('addEventListener', scope.addEventListener.bind(scope));
  vi.stubGlobal('postMessage', (reply: CircuitReply) => replies.push(structuredClone(reply)));
  vi.resetModules();
  await import('./circuit-worker');
  return (request) => {
    scope.dispatchEvent(new MessageEvent('message', { data: structuredClone(request) }));
    return replies.at(-1);
  };
}

afterEach(() => {
  vi.unstubAllGlobals();
});

describe('circuit worker', () => {
  it('answers a reference circuit with bands and a waveform', async () => {
    const ask = await loadedWorker();
    const reply = ask({ no: 7, circuit: CIRCUIT, options: { samples: 50 } });
    expect(reply?.no).toBe(7);
    if (reply?.result.ok !== true) throw new Error('the worker has no answer');
    const { peakVoltage, timeToPeak, transient } = reply.result.value;
    expect(Math.abs(peakVoltage.value / 20_314 - 1)).toBeLessThan(1e-4);
    expect(Math.abs(timeToPeak.value / 13.1e-9 - 1)).toBeLessThan(1e-3);
    expect(peakVoltage.band.low).toBeLessThan(peakVoltage.value);
    expect(transient.waveform.time_s.length).toBeGreaterThanOrEqual(50);
  });

  it('passes on what the solver refuses', async () => {
    const ask = await loadedWorker();
    const reply = ask({ no: 1, circuit: { ...CIRCUIT, dump_F: -1 }, options: {} });
    expect(reply?.result).toMatchObject({ ok: false, refusal: { field: 'dump_F' } });
  });
});
