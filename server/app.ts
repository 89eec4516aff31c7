import express, { type Express } from 'express';
import * as z from 'zod/mini';
import { serveClient } from './http/client-files';
import type { Context } from './context';
import { guardHost } from './http/guards';
import { mountRoutes } from './http/mount-routes';
import { openApiOf } from './http/openapi';
import { pagePolicy } from './http/page-policy';
import { logRequests } from './http/request-log';
import { ANYONE, declareRoute, type Route } from './http/route';
import { answerProblem } from './http/translate-error';

const apiVersion = '1';

/** Assembles the application; the order is the behaviour. */
export function createApp(context: Context): Express {
  const { config, log, accounts } = context;
  const app = express();
  app.set('trust proxy', config.http.trustedProxies);
  app.set('query parser', 'simple');
  app.disable('x-powered-by');
  app.disable('etag');
  const router = express.Router();
  router.use(logRequests(log), guardHost(config.http), pagePolicy(config.http));
  const routes = [...context.routes, ...statusRoutes(context)];
  const described: readonly Route[] = [...routes, openApiRoute(() => openApiOf(described, apiVersion))];
  mountRoutes(router, described, { http: config.http, authenticate: accounts.authenticate, log });
  if (config.folders.client !== undefined) serveClient(router, config.folders.client);
  // Whatever any of them throws ends here, so that no other words than ours ever go out.
  app.use((request, response, next) =>
    router(request, response, (error?: unknown) => {
      if (error === undefined) next();
      else answerProblem(log, { request, response, error });
    }),
  );
  return app;
}

const stateSchema = z.object({ state: z.literal('ok') });

function statusRoutes({ database }: Context): readonly Route[] {
  return [
    declareRoute({
      method: 'GET',
      path: '/api/health',
      summary: 'The server runs',
      permission: ANYONE,
      answers: { 200: stateSchema },
      handler: () => Promise.resolve({ body: { state: 'ok' } }),
    }),
    declareRoute({
      method: 'GET',
      path: '/api/ready',
      summary: 'The database answers too',
      permission: ANYONE,
      answers: { 200: stateSchema },
      handler: async () => {
        await database.raw('SELECT 1');
        return { body: { state: 'ok' } };
      },
    }),
  ];
}

function openApiRoute(describe: () => Readonly<Record<string, unknown>>): Route {
  return declareRoute({
    method: 'GET',
    path: '/api/openapi.json',
    summary: 'This description',
    permission: ANYONE,
    answers: { 200: z.record(z.string(), z.unknown()) },
    handler: () => Promise.resolve({ body: { ...describe() } }),
  });
}
