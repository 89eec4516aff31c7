import { describe, expect, it } from 'vitest';
import type { Circuit } from '../../domain/circuit/circuit-input';
import { refused } from '../../domain/units/result';
import { FakeCircuitWorker } from '../fakes/circuit-workers';
import { virtualTime } from '../fakes/virtual-time';
import type { CircuitReply, CircuitRequest } from './circuit-protocol';
import { PATIENCE_MS } from '../worker/latest-runner';
import { createCircuitRunner } from './circuit-runner';

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
const charged = (charge_V: number): Circuit => ({ ...CIRCUIT, charge_V });

/** Says which circuit it was asked for, so that a test sees whose answer came. */
const echo = ({ no, circuit }: CircuitRequest): CircuitReply => ({
  no,
  result: refused({ type: 'echo', words: String(circuit.charge_V) }),
});
const echoed = (charge_V: number) => refused({ type: 'echo', words: String(charge_V) });
const stopped = { ok: false, refusal: { type: 'stopped' } };
const failed = { ok: false, refusal: { type: 'worker-failed' } };

function bench() {
  const time = virtualTime();
  const workers: FakeCircuitWorker[] = [];
  const runner = createCircuitRunner({
    after: time.timers.after,
    startWorker: () => {
      const worker = new FakeCircuitWorker();
      workers.push(worker);
      return worker;
    },
  });
  const worker = (index: number): FakeCircuitWorker => {
    const found = workers[index];
    if (found === undefined) throw new Error(`worker ${String(index)} was never started`);
    return found;
  };
  return { runner, time, workers, worker };
}

describe('circuit runner', () => {
  it('starts a worker when first asked and keeps it for the next circuit', async () => {
    const { runner, workers, worker } = bench();
    expect(workers).toHaveLength(0);
    const first = runner.solve(charged(1), { samples: 0 });
    worker(0).reply(echo);
    expect(await first.answer).toEqual(echoed(1));
    const second = runner.solve(charged(2));
    worker(0).reply(echo);
    expect(await second.answer).toEqual(echoed(2));
    expect(workers).toHaveLength(1);
    expect(worker(0).requests.map(({ options }) => options)).toEqual([{ samples: 0 }, {}]);
  });

  it('lets the latest of three win, by the same worker, and drops the one between', async () => {
    const { runner, workers, worker } = bench();
    const [first, second, third] = [1, 2, 3].map((charge_V) => runner.solve(charged(charge_V)));
    expect(await first?.answer).toMatchObject(stopped);
    expect(await second?.answer).toMatchObject(stopped);
    worker(0).reply(echo);
    expect(worker(0).requests.map(({ circuit }) => circuit.charge_V)).toEqual([1, 3]);
    worker(0).reply(echo);
    expect(await third?.answer).toEqual(echoed(3));
    expect(workers).toHaveLength(1);
  });

  it('ends a worker that keeps the latest circuit waiting too long', async () => {
    const { runner, time, workers, worker } = bench();
    runner.solve(charged(1));
    const latest = runner.solve(charged(2));
    await time.pass(PATIENCE_MS - 1);
    expect(workers).toHaveLength(1);
    await time.pass(1);
    expect(worker(0).ended).toBe(true);
    worker(1).reply(echo);
    expect(await latest.answer).toEqual(echoed(2));
  });

  it('does not hold the patience for one circuit against the next', async () => {
    const { runner, time, worker } = bench();
    runner.solve(charged(1));
    const latest = runner.solve(charged(2));
    worker(0).reply(echo);
    await time.pass(2 * PATIENCE_MS);
    expect(worker(0).ended).toBe(false);
    worker(0).reply(echo);
    expect(await latest.answer).toEqual(echoed(2));
  });

  it('ends a busy worker on cancel, takes no late reply of it, and starts another', async () => {
    const { runner, worker } = bench();
    const first = runner.solve(charged(1));
    first.cancel();
    expect(await first.answer).toMatchObject(stopped);
    expect(worker(0).ended).toBe(true);
    const second = runner.solve(charged(2));
    worker(0).reply(({ circuit }) => echo({ no: 2, circuit, options: {} }));
    worker(1).reply(echo);
    expect(await second.answer).toEqual(echoed(2));
  });

  it('leaves the worker alone when an answered or an overtaken circuit is cancelled', async () => {
    const { runner, worker } = bench();
    const answered = runner.solve(charged(1));
    worker(0).reply(echo);
    answered.cancel();
    expect(await answered.answer).toEqual(echoed(1));
    const overtaken = runner.solve(charged(2));
    const latest = runner.solve(charged(3));
    overtaken.cancel();
    expect(worker(0).ended).toBe(false);
    worker(0).reply(echo);
    worker(0).reply(echo);
    expect(await latest.answer).toEqual(echoed(3));
  });

  it('ends the worker when the circuit that waits for it is cancelled', async () => {
    const { runner, workers, worker } = bench();
    runner.solve(charged(1));
    const latest = runner.solve(charged(2));
    latest.cancel();
    expect(await latest.answer).toMatchObject(stopped);
    expect(worker(0).ended).toBe(true);
    expect(workers).toHaveLength(1);
  });

  it.each(['error', 'messageerror'] as const)(
    'answers in words after %s and solves the next with a new worker',
    async (event) => {
      const { runner, worker } = bench();
      const first = runner.solve(charged(1));
      worker(0).crash(event);
      expect(await first.answer).toMatchObject(failed);
      expect(worker(0).ended).toBe(true);
      const second = runner.solve(charged(2));
      worker(1).reply(echo);
      expect(await second.answer).toEqual(echoed(2));
    },
  );

  it('goes on with the circuit that waited when the worker crashes', async () => {
    const { runner, worker } = bench();
    runner.solve(charged(1));
    const latest = runner.solve(charged(2));
    worker(0).crash();
    worker(1).reply(echo);
    expect(await latest.answer).toEqual(echoed(2));
  });

  it('answers in words where no worker can be started', async () => {
    const runner = createCircuitRunner({
      after: virtualTime().timers.after,
      startWorker: () => {
        throw new Error('forbidden here');
      },
    });
    expect(await runner.solve(CIRCUIT).answer).toMatchObject(failed);
    expect(await runner.solve(CIRCUIT).answer).toMatchObject(failed);
  });

  it('stops everything when closed', async () => {
    const { runner, worker } = bench();
    const [first, second] = [runner.solve(charged(1)), runner.solve(charged(2))];
    runner.close();
    expect(await first.answer).toMatchObject(stopped);
    expect(await second.answer).toMatchObject(stopped);
    expect(worker(0).ended).toBe(true);
  });
});
