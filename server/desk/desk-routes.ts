import * as z from 'zod/mini';
import { judgedEntrySchema } from '../../src/domain/book/entry';
import { uuid } from '../../src/domain/book/ids';
import {
  entriesAnswerSchema,
  firingAnswerSchema,
  firingListSchema,
  heldBackAnswerSchema,
  rigReportSchema,
  waitingAnswerSchema,
} from '../../src/domain/report/desk-shapes';
import type { Database } from '../db/database';
import { wholeNumber } from '../http/query-fields';
import { declareRoute, EVERY_ROLE, type Route } from '../http/route';
import { createDeskService } from './desk-service';
import { createDeskStore } from './desk-store';

const revision = wholeNumber({ lowest: 0, highest: Number.MAX_SAFE_INTEGER });
const idSchema = z.object({ id: uuid });

export function createDesk({
  database,
  now,
}: {
  readonly database: Database;
  readonly now: () => number;
}): readonly Route[] {
  const desk = createDeskService(createDeskStore(database), now);
  return [
    declareRoute({
      method: 'GET',
      path: '/api/desk/waiting',
      summary: 'What waits for a reviewer: firings, permits asked, incidents, partings, held back',
      permission: EVERY_ROLE,
      answers: { 200: waitingAnswerSchema },
      handler: async ({ caller }) => ({ body: await desk.waiting(caller.lab) }),
    }),
    declareRoute({
      method: 'GET',
      path: '/api/desk/firings',
      summary: 'Firings, newest first; go on with `before` the revision that the last one was made at',
      permission: EVERY_ROLE,
      query: z.object({
        rig: z.optional(uuid),
        state: z.optional(z.enum(['open', 'closed', 'reviewed', 'sent-back'])),
        limit: z._default(wholeNumber({ lowest: 1, highest: 200 }), 50),
        before: z.optional(revision),
      }),
      answers: { 200: firingListSchema },
      handler: async ({ caller, query }) => ({ body: await desk.firings(caller.lab, query) }),
    }),
    declareRoute({
      method: 'GET',
      path: '/api/desk/firings/:id',
      summary: 'A firing with its rig, check, readings and where each of its entries stands in the Book',
      permission: EVERY_ROLE,
      params: idSchema,
      answers: { 200: firingAnswerSchema },
      handler: async ({ caller, params }) => ({ body: await desk.firing(caller.lab, params.id) }),
    }),
    declareRoute({
      method: 'GET',
      path: '/api/desk/rigs/:id/report',
      summary: 'The newest revision of a rig with its derived figures, as they stand on its papers',
      permission: EVERY_ROLE,
      params: idSchema,
      answers: { 200: rigReportSchema },
      handler: async ({ caller, params }) => ({ body: await desk.rigReport(caller.lab, params.id) }),
    }),
    declareRoute({
      method: 'GET',
      path: '/api/desk/entries',
      summary: 'Entries after a revision, newest first',
      permission: EVERY_ROLE,
      query: z.object({
        since: z._default(revision, 0),
        limit: z._default(wholeNumber({ lowest: 1, highest: 500 }), 100),
      }),
      answers: { 200: entriesAnswerSchema },
      handler: async ({ caller, query }) => ({ body: await desk.entries(caller.lab, query) }),
    }),
    declareRoute({
      method: 'GET',
      path: '/api/desk/entries/:id',
      summary: 'An entry with its verdict, revision and hash',
      permission: EVERY_ROLE,
      params: idSchema,
      answers: { 200: judgedEntrySchema },
      handler: async ({ caller, params }) => ({ body: await desk.entry(caller.lab, params.id) }),
    }),
    declareRoute({
      method: 'GET',
      path: '/api/desk/held-back',
      summary: 'Entries that were held back and neither adopted nor dismissed, with text and reason',
      permission: EVERY_ROLE,
      answers: { 200: heldBackAnswerSchema },
      handler: async ({ caller }) => ({ body: await desk.heldBack(caller.lab) }),
    }),
  ];
}
