import { circuitAnswer } from '../../domain/circuit/circuit-answer';
import type { CircuitReply, CircuitRequest } from './circuit-protocol';

/** What the solver says to a request. Throws only for a bug, which the page then hears of as a crash. */
export function replyTo({ no, circuit, options }: CircuitRequest): CircuitReply {
  return { no, result: circuitAnswer(circuit, options) };
}

addEventListener('message', (event: MessageEvent<CircuitRequest>) => {
  postMessage(replyTo(event.data));
});
