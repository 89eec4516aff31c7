import * as z from 'zod/mini';
import { MAX_BODY_CHARS } from '../../src/domain/book/entry';
import { sha256Hex } from '../../src/domain/book/ids';
import {
  helloAnswerSchema,
  helloRequestSchema,
  knownAnswerSchema,
  knownRequestSchema,
  pullAnswerSchema,
  PUSH_MAX_BYTES,
  pushAnswerSchema,
  pushRequestSchema,
} from '../../src/domain/handover/wire';
import { TooLarge } from '../http/problems';
import { wholeNumber } from '../http/query-fields';
import { declareRoute, TABLET, type Route, type StreamBody } from '../http/route';
import type { BookStore } from './book-store';
import type { HandoverService } from './handover-service';
import { writeSnapshot } from './snapshot-lines';

const pullQuerySchema = z.object({
  since: wholeNumber({ lowest: 0, highest: Number.MAX_SAFE_INTEGER }),
  hash: sha256Hex,
  limit: z._default(wholeNumber({ lowest: 1, highest: 1000 }), 500),
  wait: z._default(wholeNumber({ lowest: 0, highest: 25 }), 0),
});

export function handoverRoutes(service: HandoverService, store: BookStore): readonly Route[] {
  return [
    declareRoute({
      method: 'POST',
      path: '/api/handover/hello',
      summary: 'What a tablet holds, and whether its mirror is of this Book',
      permission: TABLET,
      body: helloRequestSchema,
      answers: { 200: helloAnswerSchema },
      handler: async ({ caller, body }) => ({
        body: await service.hello({ lab: caller.lab, device: caller.device.id }, body),
      }),
    }),
    declareRoute({
      method: 'POST',
      path: '/api/handover/push',
      summary: 'Hand over sealed entries in the order of their numbers; each gets a verdict',
      permission: TABLET,
      body: pushRequestSchema,
      maxBytes: PUSH_MAX_BYTES,
      beforeReading: refuseLongBodies,
      answers: { 200: pushAnswerSchema },
      handler: async ({ caller, body }) => ({
        body: await service.push({
          lab: caller.lab,
          device: caller.device.id,
          session: caller.person,
          entries: body.entries,
        }),
      }),
    }),
    declareRoute({
      method: 'GET',
      path: '/api/handover/pull',
      summary: 'Entries after a revision, with their verdicts; waits for the next one when asked to',
      permission: TABLET,
      query: pullQuerySchema,
      answers: { 200: pullAnswerSchema },
      handler: async ({ caller, query, http }) => ({
        body: await service.pull({
          lab: caller.lab,
          device: caller.device.id,
          since: query.since,
          hash: query.hash,
          limit: query.limit,
          wait_ms: query.wait * 1000,
          signal: http.signal,
        }),
      }),
    }),
    declareRoute({
      method: 'GET',
      path: '/api/handover/snapshot',
      summary: 'Every document of the lab as it stands at one revision, as gzipped JSON lines',
      permission: TABLET,
      answers: { 200: { stream: 'application/jsonl' } },
      handler: ({ caller }) => {
        const body: StreamBody = (to) => writeSnapshot(store, caller.lab, to);
        return Promise.resolve({ body });
      },
    }),
    declareRoute({
      method: 'POST',
      path: '/api/handover/known',
      summary: 'Which of these entries are in the Book already',
      permission: TABLET,
      body: knownRequestSchema,
      maxBytes: PUSH_MAX_BYTES,
      answers: { 200: knownAnswerSchema },
      handler: async ({ caller, body }) => {
        const found = await service.known(caller.lab, body.ids);
        return {
          body: {
            known: found.map(({ id, revision, verdict, reason }) => ({
              id,
              revision,
              outcome: verdict,
              reason,
            })),
          },
        };
      },
    }),
  ];
}

/** A text that is too long would come again for ever; the tablet has to be told to send a stub (protocol 3.7). */
function refuseLongBodies(json: unknown): void {
  const read = z.object({ entries: z.array(z.unknown()) }).safeParse(json);
  if (!read.success) return;
  const long = read.data.entries.findIndex((entry) => bodyLength(entry) > MAX_BODY_CHARS);
  if (long < 0) return;
  throw new TooLarge(`Entry ${long} of the batch has a text of more than ${MAX_BODY_CHARS} characters.`, {
    fields: { [`body.entries.${long}.body`]: `must have at most ${MAX_BODY_CHARS} characters` },
  });
}

function bodyLength(entry: unknown): number {
  const read = z.object({ body: z.string() }).safeParse(entry);
  return read.success ? read.data.body.length : 0;
}
