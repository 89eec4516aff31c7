import {
  createPrivateKey,
  createPublicKey,
  generateKeyPairSync,
  randomBytes,
  type KeyObject,
} from 'node:crypto';
import { readFileSync } from 'node:fs';
import path from 'node:path';
import * as z from 'zod/mini';
import { listSecrets, readOrMakeSecret } from './secret-files';

export interface SigningKey {
  readonly kid: string;
  readonly made_ms: number;
  readonly privateKey: KeyObject;
  readonly publicKey: KeyObject;
}

export interface SigningKeys {
  /** The newest key. */
  readonly newest: () => SigningKey;
  readonly byId: (kid: string) => SigningKey | undefined;
}

const ending = '.signing.json';
const firstName = `first${ending}`;
const rereadAfterMs = 10_000;
const fileSchema = z.object({
  kid: z.string().check(z.regex(/^[\w-]{1,64}$/)),
  made_ms: z.int(),
  private_pem: z.string(),
});

/**
 * Keys of access tokens, one file each in the secrets folder. To rotate, lay a newer one beside the old and take the
 * old one away after ten minutes; servers that run notice by themselves.
 */
export function createSigningKeys(folder: string, now: () => number): SigningKeys {
  readOrMakeSecret(folder, firstName, () => makeSigningKeyFile(now()));
  let keys = readAll(folder);
  let readAt = now();

  function refresh(): void {
    if (now() - readAt < rereadAfterMs) return;
    readAt = now();
    keys = readAll(folder);
  }

  return {
    newest() {
      refresh();
      const [first] = keys;
      if (first === undefined) throw new Error(`no signing key in ${folder}`);
      return first;
    },
    byId(kid) {
      const known = keys.find((key) => key.kid === kid);
      if (known === undefined) refresh();
      return known ?? keys.find((key) => key.kid === kid);
    },
  };
}

/** Text of a new key file. */
export function makeSigningKeyFile(made_ms: number): string {
  const { privateKey } = generateKeyPairSync('ec', { namedCurve: 'P-256' });
  const kid = randomBytes(9).toString('base64url');
  const private_pem = privateKey.export({ type: 'pkcs8', format: 'pem' });
  return `${JSON.stringify({ kid, made_ms, private_pem })}\n`;
}

function readAll(folder: string): readonly SigningKey[] {
  return listSecrets(folder, ending)
    .map((name) => readKey(path.join(folder, name)))
    .toSorted((one, other) => other.made_ms - one.made_ms);
}

function readKey(file: string): SigningKey {
  const { kid, made_ms, private_pem } = fileSchema.parse(JSON.parse(readFileSync(file, 'utf8')));
  const privateKey = createPrivateKey(private_pem);
  return { kid, made_ms, privateKey, publicKey: createPublicKey(privateKey) };
}
