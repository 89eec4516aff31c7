/** The tablet's own key: P-256, not extractable, so that a copied cookie is worth nothing elsewhere (protocol 4.1). */
export async function generateDeviceKeys(subtle: SubtleCrypto): Promise<CryptoKeyPair> {
  return await subtle.generateKey({ name: 'ECDSA', namedCurve: 'P-256' }, false, ['sign', 'verify']);
}

export async function publicJwk(subtle: SubtleCrypto, keys: CryptoKeyPair): Promise<JsonWebKey> {
  const { kty, crv, x, y } = await subtle.exportKey('jwk', keys.publicKey);
  return { kty, crv, x, y } as JsonWebKey;
}

export interface SignedNonce {
  readonly purpose: 'refresh' | 'device';
  readonly lab: string;
  readonly device: string;
  /** Null for the tablet's own token. */
  readonly person: string | null;
  readonly nonce: string;
}

/** ECDSA with SHA-256 over the lines that the server rebuilds, as raw r and s in base64url. */
export async function signNonce(
  subtle: SubtleCrypto,
  keys: CryptoKeyPair,
  signed: SignedNonce,
): Promise<string> {
  const { purpose, lab, device, person, nonce } = signed;
  const text = [`holdoff ${purpose}`, lab, device, person ?? '-', nonce].join('\n');
  const signature = await subtle.sign(
    { name: 'ECDSA', hash: 'SHA-256' },
    keys.privateKey,
    new TextEncoder().encode(text),
  );
  return base64url(new Uint8Array(signature));
}

function base64url(bytes: Uint8Array): string {
  return btoa(String.fromCharCode(...bytes))
    .replaceAll('+', '-')
    .replaceAll('/', '_')
    .replaceAll('=', '');
}
