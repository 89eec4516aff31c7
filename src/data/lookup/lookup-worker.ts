import { lookupOf } from '../../domain/lookup/lookups';
import { refused } from '../../domain/units/result';
import type { Reply } from '../worker/latest-runner';
import { answerLookup } from './answer-lookup';
import type { LookupReply, LookupRequest } from './lookup-protocol';

/** What the registry says to a request. Throws only for a bug, which the page then hears of as a crash. */
export function replyTo({ no, lookup: key, ask }: LookupRequest): Reply<LookupReply> {
  const lookup = lookupOf(key);
  const result =
    lookup === undefined
      ? refused({ type: 'no-such-lookup', words: 'There is no such lookup.' })
      : answerLookup(lookup, ask);
  return { no, result };
}

addEventListener('message', (event: MessageEvent<LookupRequest>) => {
  postMessage(replyTo(event.data));
});
