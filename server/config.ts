import path from 'node:path';
import { z } from 'zod';

export interface Config {
  readonly http: {
    readonly host: string;
    readonly port: number;
    /** Addresses under which a browser may reach this server, without a path, the one to print first. */
    readonly origins: readonly [string, ...string[]];
    /** Values of the `Host` header that are answered. */
    readonly hosts: readonly string[];
    /** How many reverse proxies stand before this server and may be believed about the caller's address. */
    readonly trustedProxies: number;
  };
  readonly database: {
    readonly host: string;
    readonly port: number;
    readonly user: string;
    readonly password: string;
    readonly name: string;
  };
  readonly folders: {
    readonly data: string;
    /** Signing keys; readable by this account only. */
    readonly secrets: string;
    /** The built client, or undefined when something else serves it. */
    readonly client: string | undefined;
  };
  readonly logLevel: LogLevel;
}

export type LogLevel = (typeof logLevels)[number];

export type ReadConfig =
  | { readonly type: 'config'; readonly config: Config }
  | { readonly type: 'config-problems'; readonly problems: readonly string[] };

const logLevels = ['trace', 'debug', 'info', 'warn', 'error', 'fatal', 'silent'] as const;
const mostProxies = 8;

/**
 * Reads the settings of the server from an environment, all at once: either every one is usable, or the
 * answer lists all that is wrong, one sentence for each, naming the variable.
 */
export function readConfig(environment: Readonly<Record<string, string | undefined>>): ReadConfig {
  const given = Object.fromEntries(Object.entries(environment).filter(([, value]) => value !== undefined));
  const parsed = environmentSchema.safeParse(given);
  if (!parsed.success) {
    const problems = parsed.error.issues.map(
      (issue) => `${issue.path.map(String).join('.')}: ${issue.message}`,
    );
    return { type: 'config-problems', problems };
  }
  return assemble(parsed.data);
}

const port = (fallback: number) =>
  z
    .string()
    .regex(/^\d{1,5}$/, 'a port is a whole number')
    .transform(Number)
    .refine((value) => value >= 1 && value <= 65_535, 'a port lies between 1 and 65535')
    .default(fallback);

const word = z.string().trim().min(1, 'must not be empty');
const list = z.string().transform((text) =>
  text
    .split(',')
    .map((part) => part.trim())
    .filter((part) => part !== ''),
);

const environmentSchema = z.object({
  HOLDOFF_HOST: word.default('127.0.0.1'),
  HOLDOFF_PORT: port(8320),
  HOLDOFF_ORIGINS: list
    .pipe(z.array(z.string().refine(isOrigin, 'write each as https://name or https://name:port')))
    .optional(),
  HOLDOFF_HOSTS: list
    .pipe(z.array(z.string().regex(/^[\w.\-[\]:]+$/, 'write each as name or name:port')))
    .optional(),
  HOLDOFF_TRUST_PROXY: z
    .string()
    .regex(/^\d+$/, 'the number of reverse proxies in front, 0 for none')
    .transform(Number)
    .refine((count) => count <= mostProxies, `at most ${mostProxies} proxies`)
    .default(0),
  HOLDOFF_DATA: word.default('.holdoff'),
  HOLDOFF_SECRETS: word.optional(),
  HOLDOFF_CLIENT: z.string().default('dist'),
  HOLDOFF_DB_HOST: word.default('127.0.0.1'),
  HOLDOFF_DB_PORT: port(13_317),
  HOLDOFF_DB_USER: word.default('holdoff'),
  HOLDOFF_DB_PASSWORD: z.string({ error: 'is missing' }).min(1, 'must not be empty'),
  HOLDOFF_DB_NAME: word.regex(/^\w{1,64}$/, 'letters, digits and _ only').default('holdoff'),
  HOLDOFF_LOG_LEVEL: z.enum(logLevels, { error: `one of ${logLevels.join(', ')}` }).default('info'),
});

function assemble(settings: z.infer<typeof environmentSchema>): ReadConfig {
  const httpPort = settings.HOLDOFF_PORT;
  const [firstOrigin, ...otherOrigins] = settings.HOLDOFF_ORIGINS ?? [];
  const problems: string[] = [];
  if (firstOrigin === undefined && !isLoopback(settings.HOLDOFF_HOST)) {
    problems.push(
      'HOLDOFF_ORIGINS: is needed when HOLDOFF_HOST is not this machine alone, for example https://holdoff.lab.example',
    );
  }
  const origins: [string, ...string[]] =
    firstOrigin === undefined
      ? [`http://127.0.0.1:${httpPort}`, `http://localhost:${httpPort}`]
      : [firstOrigin, ...otherOrigins];
  for (const origin of origins) {
    const url = new URL(origin);
    if (url.protocol === 'http:' && !isLoopback(url.hostname)) {
      // Without a secure context a browser offers no service worker and no keys, hence no Book.
      problems.push(`HOLDOFF_ORIGINS: ${origin} has to be https; plain http works on this machine alone`);
    }
  }
  if (problems.length > 0) return { type: 'config-problems', problems };
  const data = path.resolve(settings.HOLDOFF_DATA);
  return {
    type: 'config',
    config: {
      http: {
        host: settings.HOLDOFF_HOST,
        port: httpPort,
        origins,
        hosts: settings.HOLDOFF_HOSTS ?? origins.map((origin) => new URL(origin).host),
        trustedProxies: settings.HOLDOFF_TRUST_PROXY,
      },
      database: {
        host: settings.HOLDOFF_DB_HOST,
        port: settings.HOLDOFF_DB_PORT,
        user: settings.HOLDOFF_DB_USER,
        password: settings.HOLDOFF_DB_PASSWORD,
        name: settings.HOLDOFF_DB_NAME,
      },
      folders: {
        data,
        secrets:
          settings.HOLDOFF_SECRETS === undefined
            ? path.join(data, 'secrets')
            : path.resolve(settings.HOLDOFF_SECRETS),
        client: settings.HOLDOFF_CLIENT === '' ? undefined : path.resolve(settings.HOLDOFF_CLIENT),
      },
      logLevel: settings.HOLDOFF_LOG_LEVEL,
    },
  };
}

function isOrigin(text: string): boolean {
  if (!URL.canParse(text)) return false;
  const url = new URL(text);
  return ['http:', 'https:'].includes(url.protocol) && url.origin === text;
}

function isLoopback(host: string): boolean {
  return ['127.0.0.1', 'localhost', '::1', '[::1]'].includes(host);
}
