import { hash, verify } from '@node-rs/argon2';

/** Argon2id is the package's own choice. Cost: 19 MiB, two passes, one lane (OWASP password storage, from memory). */
const cost = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

export interface Passwords {
  readonly hash: (password: string) => Promise<string>;
  /** Takes as long for an unknown person (`stored` undefined) as for a known one. */
  readonly matches: (stored: string | undefined, password: string) => Promise<boolean>;
}

export function createPasswords(): Passwords {
  let nobody: Promise<string> | undefined;
  return {
    hash: (password) => hash(password, cost),
    async matches(stored, password) {
      nobody ??= hash('nobody has this password', cost);
      const matched = await verify(stored ?? (await nobody), password);
      return stored !== undefined && matched;
    },
  };
}
