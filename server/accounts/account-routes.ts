import type { Database } from '../db/database';
import { NotThere } from '../http/problems';
import { ANYONE, declareRoute, EVERY_ROLE, type Route } from '../http/route';
import {
  deviceTokenAnswerSchema,
  deviceTokenRequestSchema,
  emptySchema,
  meAnswerSchema,
  nonceAnswerSchema,
  refreshAnswerSchema,
  refreshRequestSchema,
  signInAnswerSchema,
  signInRequestSchema,
} from './account-shapes';
import type { Nonces } from './nonces';
import { readMe } from './me-store';
import { refreshCookie, refreshCookieName } from './refresh-cookie';
import type { createSessions } from './session-service';
import type { createSignIn } from './sign-in-service';

export interface AccountRouteParts {
  readonly database: Database;
  readonly signIn: ReturnType<typeof createSignIn>;
  readonly sessions: ReturnType<typeof createSessions>;
  readonly nonces: Nonces;
}

export function accountRoutes({ database, signIn, sessions, nonces }: AccountRouteParts): readonly Route[] {
  return [
    declareRoute({
      method: 'POST',
      path: '/api/accounts/sign-in',
      summary: 'Sign in by e-mail address and password; enrols the tablet by its key',
      permission: ANYONE,
      body: signInRequestSchema,
      answers: { 200: signInAnswerSchema },
      handler: async ({ body, http }) => {
        const { answer, refreshToken } = await signIn(body, http.ip);
        const whose = { origin: http.origin, lab: answer.lab.id, person: answer.person.id };
        return { body: answer, cookies: [refreshCookie(whose, refreshToken)] };
      },
    }),
    declareRoute({
      method: 'POST',
      path: '/api/accounts/nonce',
      summary: 'A nonce for the tablet to sign, good for a minute',
      permission: ANYONE,
      body: emptySchema,
      answers: { 200: nonceAnswerSchema },
      handler: () => Promise.resolve({ body: nonces.make() }),
    }),
    declareRoute({
      method: 'POST',
      path: '/api/accounts/refresh',
      summary: "A person's next access token, for the refresh cookie under the signature of its tablet",
      permission: ANYONE,
      body: refreshRequestSchema,
      answers: { 200: refreshAnswerSchema },
      handler: async ({ body, http }) => {
        const name = refreshCookieName({ origin: http.origin, lab: body.lab, person: body.person });
        return { body: await sessions.refresh(body, http.cookies.get(name)) };
      },
    }),
    declareRoute({
      method: 'POST',
      path: '/api/accounts/device-token',
      summary: "The tablet's own access token: for the handover, and for no act",
      permission: ANYONE,
      body: deviceTokenRequestSchema,
      answers: { 200: deviceTokenAnswerSchema },
      handler: async ({ body }) => ({ body: await sessions.deviceToken(body) }),
    }),
    declareRoute({
      method: 'POST',
      path: '/api/accounts/sign-out',
      summary: 'End this session; the grant on the tablet stays',
      permission: EVERY_ROLE,
      body: emptySchema,
      answers: { 204: null },
      handler: async ({ caller, http }) => {
        const { lab, person } = caller;
        const whose = { origin: http.origin, lab, person };
        await sessions.signOut(
          { lab, person, device: caller.device.id },
          http.cookies.get(refreshCookieName(whose)),
        );
        return { body: null, cookies: [refreshCookie(whose, null)] };
      },
    }),
    declareRoute({
      method: 'GET',
      path: '/api/accounts/me',
      summary: 'Who is signed in, in which role, on which tablet',
      permission: EVERY_ROLE,
      answers: { 200: meAnswerSchema },
      handler: async ({ caller }) => {
        const found = await readMe(database, caller.lab, caller.person);
        if (found === undefined) throw new NotThere('There is no such person.');
        return { body: { ...found, role: caller.role, device: caller.device } };
      },
    }),
  ];
}
