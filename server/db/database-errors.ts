/** Deadlock, lock wait timeout, and "record has changed since last read": the whole transaction may be tried again. */
const retryable: ReadonlySet<number> = new Set([1213, 1205, 1020]);

const lostConnection: ReadonlySet<string> = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'EPIPE',
  'ETIMEDOUT',
  'PROTOCOL_CONNECTION_LOST',
  'PROTOCOL_SEQUENCE_TIMEOUT',
]);

export function isRetryable(error: unknown): boolean {
  return error instanceof Error && 'errno' in error && retryable.has(Number(error.errno));
}

/** True for anything that the database, its driver or the pool threw: the request may be tried again later. */
export function isDatabaseError(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  if (error.name === 'KnexTimeoutError') return true;
  if ('sqlState' in error || 'sqlMessage' in error) return true;
  // The driver's own word for a connection that is lost; some of these carry no code.
  if ('fatal' in error && error.fatal === true) return true;
  return 'code' in error && typeof error.code === 'string' && lostConnection.has(error.code);
}

export function isDuplicateKey(error: unknown): boolean {
  return error instanceof Error && 'errno' in error && error.errno === 1062;
}

/**
 * What may be logged of an error. Those of the database carry the statement with its values in text and fields, and
 * values are people's words, addresses and password hashes.
 */
export function withoutValues(error: unknown): unknown {
  if (!(error instanceof Error) || !isDatabaseError(error)) return error;
  const { name, stack } = error;
  const fact = (key: string): string | number | undefined => {
    const value: unknown = key in error ? Object.getOwnPropertyDescriptor(error, key)?.value : undefined;
    return typeof value === 'string' || typeof value === 'number' ? value : undefined;
  };
  return {
    type: name,
    message: `the database answered ${fact('code') ?? fact('errno') ?? name}`,
    errno: fact('errno'),
    sqlState: fact('sqlState'),
    stack: (stack ?? '').split('\n').filter((line) => /^\s+at /.test(line)),
  };
}
