import * as z from 'zod/mini';
import { uuid } from '../../src/domain/book/ids';
import { crewAnswerSchema, type CrewAnswer } from '../../src/domain/report/desk-shapes';
import { writeAudit } from '../db/audit';
import type { Database } from '../db/database';
import { inTransaction } from '../db/transaction';
import { NotThere } from '../http/problems';
import { declareRoute, EVERY_ROLE, LEAD_ONLY, type Route } from '../http/route';
import { findTablet, listPeople, listTablets, revokeTablet, type Revocation } from './crew-store';

export interface CrewParts {
  readonly database: Database;
  readonly now: () => number;
  /** Told after a revocation, so that what the tablet holds open ends. */
  readonly onRevoked: (lab: string) => void;
}

export function createCrew({ database, now, onRevoked }: CrewParts): readonly Route[] {
  const crewOf = async (lab: string): Promise<CrewAnswer> => ({
    people: await listPeople(database, lab),
    tablets: await listTablets(database, lab),
  });

  const revoke = (revocation: Revocation) =>
    inTransaction(database, async (transaction) => {
      if (!(await revokeTablet(transaction, revocation))) return;
      const { lab, device, by, at_ms } = revocation;
      await writeAudit(transaction, { lab, at_ms, what: 'tablet-revoked', device, person: by });
    });

  return [
    declareRoute({
      method: 'GET',
      path: '/api/crew',
      summary: 'People with their roles, and tablets with what they last said',
      permission: EVERY_ROLE,
      answers: { 200: crewAnswerSchema },
      handler: async ({ caller }) => ({
        body: await crewOf(caller.lab),
      }),
    }),
    declareRoute({
      method: 'POST',
      path: '/api/crew/tablets/:id/revoke',
      summary: 'Revoke a tablet: from now on it applies nothing, and loses nothing',
      permission: LEAD_ONLY,
      params: z.object({ id: uuid }),
      body: z.object({}),
      answers: { 200: crewAnswerSchema },
      handler: async ({ caller, params }) => {
        const { lab, person } = caller;
        if ((await findTablet(database, lab, params.id)) === undefined)
          throw new NotThere('There is no such tablet in this lab.');
        await revoke({ lab, device: params.id, by: person, at_ms: now() });
        onRevoked(lab);
        return { body: await crewOf(lab) };
      },
    }),
  ];
}
