import { FOLD_VERSION } from '../../domain/book/fold';
import { GENESIS_HASH, uuidFromBytes } from '../../domain/book/ids';
import { PROBLEM_PREFIX } from '../../domain/handover/problem';
import { PUSH_MAX_BYTES, pushRequestSchema, type HelloRequest } from '../../domain/handover/wire';
import type { Http, HttpRequest, RandomBytes } from '../ports/ports';
import { brokenIn, headHash, modelBook, pushToBook, type ModelBook } from './model-book';

export interface ModelPerson {
  readonly id: string;
  readonly name: string;
  readonly email: string;
  readonly password: string;
}

/** What goes wrong with a request: nobody hears it, nobody hears the answer, or somebody else answers. */
export type NetFault = 'none' | 'lose-request' | 'lose-answer' | 'portal' | 'foreign-413';

export interface ModelServer {
  readonly http: Http;
  readonly book: ModelBook;
  readonly lab: { readonly id: string; readonly name: string };
  readonly people: ModelPerson[];
  /** Persons whose session was ended on the server. */
  readonly ended: Set<string>;
  /** Asked at each request, in order. */
  fault: (path: string) => NetFault;
  readonly paths: string[];
  backup_revision: number;
}

interface Claims {
  readonly device: string;
  readonly person: string | null;
}

interface Answer {
  readonly status: number;
  readonly body: unknown;
}

class ModelProblem extends Error {
  constructor(
    readonly status: number,
    readonly code: string,
    detail: string = code,
  ) {
    super(detail);
  }
}

export function modelServer(random: RandomBytes, now_ms: () => number): ModelServer {
  const lab = { id: uuidFromBytes(random(16)), name: 'Thornwick Pulse Bench' };
  const book = modelBook(uuidFromBytes(random(16)));
  const tokens = new Map<string, Claims>();
  let letters = 0;

  const issue = (claims: Claims): string => {
    const token = uuidFromBytes(random(16));
    tokens.set(token, claims);
    return token;
  };
  const claimsOf = (request: HttpRequest): Claims => {
    const claims = tokens.get((request.headers['authorization'] ?? '').slice('Bearer '.length));
    if (claims === undefined) throw new ModelProblem(401, 'not-signed-in');
    if (book.devices.get(claims.device)?.revoked === true) throw new ModelProblem(403, 'revoked');
    return claims;
  };
  const isSigned = async (device: string, text: string, signature: string): Promise<boolean> => {
    const known = book.devices.get(device);
    if (known === undefined) return false;
    if (known.revoked) throw new ModelProblem(403, 'revoked');
    const algorithm = { name: 'ECDSA', namedCurve: 'P-256' };
    const key = await crypto.subtle.importKey('jwk', known.key, algorithm, false, ['verify']);
    const bytes = Uint8Array.from(atob(signature.replaceAll('-', '+').replaceAll('_', '/')), (c) =>
      c.charCodeAt(0),
    );
    return await crypto.subtle.verify(
      { name: 'ECDSA', hash: 'SHA-256' },
      key,
      bytes,
      new TextEncoder().encode(text),
    );
  };

  const signIn = (body: Record<string, unknown>): unknown => {
    const person = server.people.find(
      (one) => one.email === body['email'] && one.password === body['password'],
    );
    if (person === undefined) throw new ModelProblem(401, 'sign-in-refused', 'They do not belong together.');
    const key = body['public_key'] as JsonWebKey;
    const known = [...book.devices.values()].find((device) => device.key.x === key.x);
    if (known?.revoked === true) throw new ModelProblem(403, 'revoked');
    const device = known ?? {
      id: uuidFromBytes(random(16)),
      letter: String.fromCharCode(65 + letters),
      key,
      last_seq: 0,
      revoked: false,
    };
    if (known === undefined) letters += 1;
    book.devices.set(device.id, device);
    book.grants.set(device.id, (book.grants.get(device.id) ?? new Set()).add(person.id));
    server.ended.delete(person.id);
    const { id, name } = person;
    return {
      access_token: issue({ device: device.id, person: id }),
      expires_ms: now_ms() + 600_000,
      person: { id, name },
      labs: [{ ...lab, role: 'operator' }],
      lab: { ...lab, epoch: book.epoch },
      device: { id: device.id, letter: device.letter, name: String(body['device_name']) },
    };
  };
  const token = async (body: Record<string, string>, person: string | null): Promise<unknown> => {
    const { lab: asked = '', device = '', nonce = '', signature = '' } = body;
    const deed = person === null ? 'device' : 'refresh';
    const signed = await isSigned(
      device,
      `holdoff ${deed}\n${asked}\n${device}\n${person ?? '-'}\n${nonce}`,
      signature,
    );
    const granted =
      person === null || (book.grants.get(device)?.has(person) === true && !server.ended.has(person));
    if (!signed || !granted) throw new ModelProblem(401, 'refresh-refused', 'The session is over.');
    return { access_token: issue({ device, person }), expires_ms: now_ms() + 600_000 };
  };
  const hello = (claims: Claims, body: HelloRequest): unknown => {
    const last_seq = book.devices.get(claims.device)?.last_seq ?? 0;
    const lost = body.acked_seq > last_seq || !isOfThisBook(book, body.cursor);
    return {
      state: lost ? 'reset' : 'ok',
      epoch: book.epoch,
      head: book.entries.length,
      head_hash: headHash(book) ?? GENESIS_HASH,
      last_seq,
      backup_revision: server.backup_revision,
      server_ms: now_ms(),
    };
  };
  const push = (claims: Claims, text: string): unknown => {
    if (new TextEncoder().encode(text).length > PUSH_MAX_BYTES) throw new ModelProblem(413, 'too-large');
    const parsed = pushRequestSchema.safeParse(JSON.parse(text));
    if (!parsed.success) {
      const where = parsed.error.issues[0]?.path.join('.') ?? '';
      throw new ModelProblem(400, 'unreadable', `body.${where} does not fit.`);
    }
    const { entries } = parsed.data;
    if (entries.some((entry) => entry.device !== claims.device)) throw new ModelProblem(403, 'not-yours');
    const broken = brokenIn(entries);
    if (broken !== undefined)
      throw new ModelProblem(400, 'broken-entry', `The hashes of entry ${broken.id} do not fit.`);
    const results = pushToBook(book, entries, {
      device: claims.device,
      session: claims.person,
      now_ms: now_ms(),
    });
    const last_seq = book.devices.get(claims.device)?.last_seq ?? 0;
    return { results, last_seq, head: book.entries.length, server_ms: now_ms() };
  };
  const pull = (query: URLSearchParams): unknown => {
    const since = Number(query.get('since'));
    if (headHash(book, since) !== query.get('hash')) throw new ModelProblem(409, 'reset');
    const entries = book.entries.slice(since, since + Number(query.get('limit')));
    const to = since + entries.length;
    const head = book.entries.length;
    return { epoch: book.epoch, since, to, head, more: to < head, entries };
  };
  const snapshot = (): Response => {
    const revision = book.entries.length;
    const header = {
      snapshot: 1,
      epoch: book.epoch,
      revision,
      hash: headHash(book),
      fold_version: FOLD_VERSION,
    };
    const documents = [...book.documents.values()].map((doc) => ({ doc }));
    const lines = [header, ...documents, { end: true, documents: documents.length }];
    return new Response(lines.map((line) => `${JSON.stringify(line)}\n`).join(''));
  };
  const known = (ids: readonly string[]): unknown => ({
    known: book.entries
      .filter((one) => ids.includes(one.entry.id))
      .map(({ entry, revision, verdict, reason }) => ({ id: entry.id, revision, outcome: verdict, reason })),
  });

  const route = async (path: string, request: HttpRequest): Promise<Answer | Response> => {
    const { pathname, searchParams } = new URL(path, 'http://model');
    const text = request.body ?? '{}';
    const body = JSON.parse(text) as Record<string, string>;
    const good = (answer: unknown): Answer => ({ status: 200, body: answer });
    switch (pathname) {
      case '/api/accounts/sign-in':
        return good(signIn(body));
      case '/api/accounts/nonce':
        return good({ nonce: uuidFromBytes(random(16)), expires_ms: now_ms() + 60_000 });
      case '/api/accounts/device-token':
        return good(await token(body, null));
      case '/api/accounts/refresh':
        return good(await token(body, body['person'] ?? null));
      case '/api/accounts/sign-out': {
        const { person } = claimsOf(request);
        if (person !== null) server.ended.add(person);
        return { status: 204, body: null };
      }
      case '/api/handover/hello':
        return good(hello(claimsOf(request), JSON.parse(text) as HelloRequest));
      case '/api/handover/push':
        return good(push(claimsOf(request), text));
      case '/api/handover/pull':
        claimsOf(request);
        return good(pull(searchParams));
      case '/api/handover/snapshot':
        claimsOf(request);
        return snapshot();
      case '/api/handover/known':
        claimsOf(request);
        return good(known((JSON.parse(text) as { ids: string[] }).ids));
      default:
        throw new ModelProblem(404, 'no-such-route');
    }
  };

  const server: ModelServer = {
    lab,
    book,
    people: [],
    ended: new Set(),
    fault: () => 'none',
    paths: [],
    backup_revision: 0,
    http: async (path, request) => {
      server.paths.push(path);
      const fault = server.fault(path);
      if (request.signal.aborted || fault === 'lose-request') throw new TypeError('Failed to fetch');
      if (fault === 'portal') return new Response('<html>Please accept the terms</html>', { status: 200 });
      if (fault === 'foreign-413') return new Response('<h1>413</h1>', { status: 413 });
      const answer = await answered(() => route(path, request));
      if (fault === 'lose-answer') throw new TypeError('Failed to fetch');
      return answer;
    },
  };
  return server;
}

async function answered(work: () => Promise<Answer | Response>): Promise<Response> {
  try {
    const answer = await work();
    if (answer instanceof Response) return answer;
    return answer.status === 204 ? new Response(null, { status: 204 }) : Response.json(answer.body);
  } catch (error) {
    if (!(error instanceof ModelProblem)) throw error;
    const { status, code, message } = error;
    const problem = {
      type: PROBLEM_PREFIX + code,
      title: code,
      status,
      detail: message,
      request_id: 'model',
    };
    return Response.json(problem, { status, headers: { 'content-type': 'application/problem+json' } });
  }
}

function isOfThisBook(book: ModelBook, { epoch, revision, hash }: HelloRequest['cursor']): boolean {
  if (epoch === null) return revision === 0;
  return epoch === book.epoch && headHash(book, revision) === hash;
}
