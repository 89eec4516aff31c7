import { FOLD_VERSION } from '../../src/domain/book/fold';
import {
  createPrivateKey,
  generateKeyPairSync,
  randomBytes,
  randomUUID,
  sign,
  type KeyObject,
} from 'node:crypto';
import { gunzipSync } from 'node:zlib';
import { bodyText, sealEntry, type SealedEntry } from '../../src/domain/book/entry';
import { GENESIS_HASH } from '../../src/domain/book/ids';
import type { BodyOf, Kind } from '../../src/domain/book/kinds';
import type { Problem } from '../../src/domain/handover/problem';
import type { HelloAnswer, PullAnswer, PushAnswer } from '../../src/domain/handover/wire';
import type { SignInAnswer } from '../../server/accounts/account-shapes';
import type { Document } from '../../src/domain/book/documents/document';

export interface ApiAnswer<T> {
  readonly status: number;
  readonly body: T;
  readonly headers: Headers;
}

export interface Ask {
  readonly method?: 'GET' | 'POST' | 'PUT';
  readonly token?: string | undefined;
  readonly body?: unknown;
  readonly cookie?: string | undefined;
  readonly headers?: Readonly<Record<string, string>>;
  readonly signal?: AbortSignal;
}

/** Asks as our own pages do. */
export async function ask<T>(url: string, path: string, request: Ask = {}): Promise<ApiAnswer<T>> {
  const { token, body, cookie, headers = {}, signal } = request;
  const method = request.method ?? (body === undefined ? 'GET' : 'POST');
  const answer = await fetch(`${url}${path}`, {
    method,
    headers: {
      ...(token === undefined ? {} : { authorization: `Bearer ${token}` }),
      ...(cookie === undefined ? {} : { cookie }),
      ...(method === 'GET'
        ? {}
        : { origin: url, 'holdoff-protocol': '1', 'content-type': 'application/json' }),
      ...headers,
    },
    ...(body === undefined ? {} : { body: typeof body === 'string' ? body : JSON.stringify(body) }),
    ...(signal === undefined ? {} : { signal }),
  });
  const text = await answer.text();
  return { status: answer.status, body: readText(text) as T, headers: answer.headers };
}

function readText(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return text;
  }
}

export type ProblemAnswer = ApiAnswer<Problem>;

export interface SealOptions {
  readonly author?: string | null;
  readonly witness?: string | null;
  readonly id?: string;
  readonly seq?: number;
  readonly base?: SealedEntry['base'];
  readonly stamp?: Partial<SealedEntry['stamp']>;
  readonly version?: number;
}

/** A tablet with a key of its own, one person signed in at a time, and a count of its own. */
export class TestTablet {
  readonly key: KeyObject;
  readonly publicKey: { kty: 'EC'; crv: 'P-256'; x: string; y: string };
  readonly pageLife = randomUUID();
  readonly cookies = new Map<string, string>();
  lab = '';
  epoch = '';
  device = '';
  letter = '';
  person = '';
  token = '';
  seq = 0;
  /** The mirror that entries are said to stand on. */
  base: { revision: number; hash: string } = { revision: 0, hash: GENESIS_HASH };
  readonly began_ms = Date.now();

  constructor(readonly url: string) {
    const { privateKey } = generateKeyPairSync('ec', { namedCurve: 'P-256' });
    this.key = createPrivateKey(privateKey.export({ type: 'pkcs8', format: 'pem' }));
    const { x, y } = privateKey.export({ format: 'jwk' });
    this.publicKey = { kty: 'EC', crv: 'P-256', x: x ?? '', y: y ?? '' };
  }

  async signIn(
    email: string,
    password: string,
    more: Record<string, unknown> = {},
  ): Promise<ApiAnswer<SignInAnswer>> {
    const answer = await ask<SignInAnswer>(this.url, '/api/accounts/sign-in', {
      body: { email, password, public_key: this.publicKey, device_name: 'Test tablet', ...more },
    });
    if (answer.status !== 200) return answer;
    const { lab, device, person, access_token } = answer.body;
    this.lab = lab.id;
    this.epoch = lab.epoch;
    this.device = device.id;
    this.letter = device.letter;
    this.person = person.id;
    this.token = access_token;
    this.keepCookies(answer.headers);
    return answer;
  }

  keepCookies(headers: Headers): void {
    for (const line of headers.getSetCookie()) {
      const [pair = ''] = line.split(';');
      const at = pair.indexOf('=');
      this.cookies.set(pair.slice(0, at), pair.slice(at + 1));
    }
  }

  cookieHeader(): string {
    return [...this.cookies].map(([name, value]) => `${name}=${value}`).join('; ');
  }

  async nonce(): Promise<string> {
    const answer = await ask<{ nonce: string }>(this.url, '/api/accounts/nonce', { body: {} });
    return answer.body.nonce;
  }

  signWords(words: string): string {
    return sign('sha256', Buffer.from(words), { key: this.key, dsaEncoding: 'ieee-p1363' }).toString(
      'base64url',
    );
  }

  async refresh(): Promise<ApiAnswer<{ access_token: string; role: string }>> {
    const { lab, person, device } = this;
    const nonce = await this.nonce();
    const signature = this.signWords(`holdoff refresh\n${lab}\n${device}\n${person}\n${nonce}`);
    return ask(this.url, '/api/accounts/refresh', {
      body: { lab, person, device, nonce, signature },
      cookie: this.cookieHeader(),
    });
  }

  async deviceToken(): Promise<string> {
    const { lab, device } = this;
    const nonce = await this.nonce();
    const signature = this.signWords(`holdoff device\n${lab}\n${device}\n-\n${nonce}`);
    const answer = await ask<{ access_token: string }>(this.url, '/api/accounts/device-token', {
      body: { lab, device, nonce, signature },
    });
    return answer.body.access_token;
  }

  /** Seals the next entry of this tablet, in the name of whoever is signed in. */
  seal<K extends Kind>(
    kind: K,
    subject: string | null,
    body: BodyOf<K>,
    options: SealOptions = {},
  ): SealedEntry {
    return this.sealRaw({ kind, subject, body, options });
  }

  sealRaw(what: {
    kind: string;
    subject: string | null;
    body: Readonly<Record<string, unknown>>;
    options?: SealOptions;
  }): SealedEntry {
    const { kind, subject, body, options = {} } = what;
    const id = options.id ?? randomUUID();
    if (options.seq === undefined) this.seq += 1;
    const wall_ms = Date.now();
    return sealEntry(
      {
        lab: this.lab,
        id,
        device: this.device,
        seq: options.seq ?? this.seq,
        kind,
        version: options.version ?? 1,
        subject: subject ?? id,
        author: options.author === undefined ? this.person : options.author,
        witness: options.witness ?? null,
        base: options.base ?? { epoch: this.epoch, ...this.base },
        stamp: {
          wall_ms,
          offset_min: 0,
          zone: 'Etc/UTC',
          page_life: this.pageLife,
          monotonic_ms: performance.now(),
          time_uncertain: false,
          ...options.stamp,
        },
      },
      bodyText(body, randomBytes(16).toString('hex')),
    );
  }

  push(entries: readonly unknown[], token = this.token): Promise<ApiAnswer<PushAnswer>> {
    return ask(this.url, '/api/handover/push', { token, body: { entries } });
  }

  /** Seals and pushes one entry; answers it and what became of it. */
  async write<K extends Kind>(kind: K, subject: string | null, body: BodyOf<K>, options: SealOptions = {}) {
    const entry = this.seal(kind, subject, body, options);
    const answer = await this.push([entry]);
    const result = (answer.body as Partial<PushAnswer>).results?.[0];
    if (result === undefined)
      throw new Error(`the push of ${kind} was refused: ${JSON.stringify(answer.body)}`);
    return { entry, result };
  }

  hello(more: Record<string, unknown> = {}): Promise<ApiAnswer<HelloAnswer>> {
    return ask(this.url, '/api/handover/hello', {
      token: this.token,
      body: {
        protocol: 1,
        app_version: 'test',
        fold_version: FOLD_VERSION,
        cursor: { epoch: this.epoch, ...this.base },
        acked_seq: 0,
        pending: { count: 0, oldest_wall_ms: null },
        ...more,
      },
    });
  }

  pull(query: {
    since: number;
    hash: string;
    limit?: number;
    wait?: number;
  }): Promise<ApiAnswer<PullAnswer>> {
    const text = new URLSearchParams(Object.entries(query).map(([key, value]) => [key, String(value)]));
    return ask(this.url, `/api/handover/pull?${text.toString()}`, { token: this.token });
  }

  /** Everything from zero to the head. */
  async pullAll(limit = 200): Promise<PullAnswer['entries']> {
    const all: PullAnswer['entries'] = [];
    for (;;) {
      const last = all.at(-1);
      const answer = await this.pull({
        since: last?.revision ?? 0,
        hash: last?.chain_hash ?? GENESIS_HASH,
        limit,
      });
      if (answer.status !== 200) throw new Error(JSON.stringify(answer.body));
      all.push(...answer.body.entries);
      if (!answer.body.more) return all;
    }
  }

  /** Lines of the snapshot, parsed. */
  async snapshot(): Promise<{ header: Record<string, unknown>; documents: Document[]; trailer: unknown }> {
    const answer = await fetch(`${this.url}/api/handover/snapshot`, {
      headers: { authorization: `Bearer ${this.token}` },
    });
    const lines = (await answer.text()).trimEnd().split('\n');
    const parsed = lines.map((line) => JSON.parse(line) as Record<string, unknown>);
    return {
      header: parsed[0] ?? {},
      documents: parsed.slice(1, -1).map((line) => line['doc'] as Document),
      trailer: parsed.at(-1),
    };
  }
}

export function unpack(bytes: Uint8Array): string {
  return gunzipSync(bytes).toString('utf8');
}
