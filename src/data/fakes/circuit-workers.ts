import type { CircuitReply, CircuitRequest } from '../circuit/circuit-protocol';
import type { CircuitWorker } from '../circuit/circuit-runner';

/** A worker that answers when the test says so. */
export class FakeCircuitWorker extends EventTarget implements CircuitWorker {
  readonly requests: CircuitRequest[] = [];
  ended = false;

  readonly postMessage = (request: CircuitRequest): void => {
    this.requests.push(structuredClone(request));
  };
  readonly terminate = (): void => {
    this.ended = true;
  };

  /** Answers its latest request. An ended worker may still have a reply on its way. */
  reply(by: (request: CircuitRequest) => CircuitReply): void {
    const request = this.requests.at(-1);
    if (request === undefined) throw new Error('nothing was asked of this worker');
    this.dispatchEvent(new MessageEvent('message', { data: structuredClone(by(request)) }));
  }
  crash(event: 'error' | 'messageerror' = 'error'): void {
    this.dispatchEvent(new Event(event));
  }
}
