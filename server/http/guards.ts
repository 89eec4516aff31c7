import type { Request, RequestHandler } from 'express';
import type { Config } from '../config';
import { ForeignOrigin, NotJson, WrongHost } from './problems';

/** Named so that no form and no other site can send it without being asked first. */
export const PROTOCOL_HEADER = 'holdoff-protocol';

/** A name that we were not given could be somebody else's, pointed at us to borrow a session. */
export function guardHost(http: Config['http']): RequestHandler {
  return (request, _response, next) => {
    const host = request.headers.host?.toLowerCase();
    if (host !== undefined && http.hosts.some((known) => known.toLowerCase() === host)) next();
    else next(new WrongHost(`Set HOLDOFF_HOSTS so that it names ${host ?? 'the address used'}.`));
  };
}

/** Every request that changes something comes from our own pages, as JSON, with our own header (protocol 4.5). */
export function guardOrigin(request: Request, http: Config['http']): void {
  const site = request.headers['sec-fetch-site'];
  const { origin } = request.headers;
  const ours =
    site === undefined ? origin !== undefined && http.origins.includes(origin) : site === 'same-origin';
  if (!ours) {
    throw new ForeignOrigin(
      site === undefined
        ? 'The header Origin has to name an address of this server.'
        : 'The header Sec-Fetch-Site has to be same-origin.',
    );
  }
  if (request.headers[PROTOCOL_HEADER] === undefined)
    throw new ForeignOrigin(`The header ${PROTOCOL_HEADER} is missing.`);
  if (request.is('application/json') !== 'application/json')
    throw new NotJson('The header content-type has to be application/json.');
}

/** The configured address that the caller used; the first one when the name alone does not tell. */
export function originOf(request: Request, http: Config['http']): string {
  const host = request.headers.host?.toLowerCase();
  return http.origins.find((origin) => new URL(origin).host === host) ?? http.origins[0];
}
