import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { readConfig } from './config';

const least = { HOLDOFF_DB_PASSWORD: 'a-password' };

function problemsOf(environment: Record<string, string | undefined>): readonly string[] {
  const read = readConfig(environment);
  return read.type === 'config-problems' ? read.problems : [];
}

describe('reading the settings', () => {
  it('needs nothing but the password of the database', () => {
    const read = readConfig(least);
    expect(read).toEqual({
      type: 'config',
      config: {
        http: {
          host: '127.0.0.1',
          port: 8320,
          origins: ['http://127.0.0.1:8320', 'http://localhost:8320'],
          hosts: ['127.0.0.1:8320', 'localhost:8320'],
          trustedProxies: 0,
        },
        database: {
          host: '127.0.0.1',
          port: 13317,
          user: 'holdoff',
          password: 'a-password',
          name: 'holdoff',
        },
        folders: {
          data: path.resolve('.holdoff'),
          secrets: path.resolve('.holdoff/secrets'),
          client: path.resolve('dist'),
        },
        logLevel: 'info',
      },
    });
  });

  it('lists everything that is wrong at once, each with its variable', () => {
    const problems = problemsOf({
      HOLDOFF_PORT: 'eighty',
      HOLDOFF_DB_PORT: '70000',
      HOLDOFF_LOG_LEVEL: 'chatty',
      HOLDOFF_TRUST_PROXY: '-1',
      HOLDOFF_DB_NAME: 'a`b',
    });
    expect(problems.map((problem) => problem.split(':')[0])).toEqual([
      'HOLDOFF_PORT',
      'HOLDOFF_TRUST_PROXY',
      'HOLDOFF_DB_PORT',
      'HOLDOFF_DB_PASSWORD',
      'HOLDOFF_DB_NAME',
      'HOLDOFF_LOG_LEVEL',
    ]);
  });

  it('takes the answered hosts from the origins', () => {
    const read = readConfig({
      ...least,
      HOLDOFF_ORIGINS: 'https://book.lab.example, https://book.lab.example:8443',
    });
    expect(read.type === 'config' && read.config.http.hosts).toEqual([
      'book.lab.example',
      'book.lab.example:8443',
    ]);
  });

  it.each([
    ['a path', 'https://book.lab.example/bench'],
    ['no scheme', 'book.lab.example'],
    ['plain http off this machine', 'http://192.168.1.20:8320'],
  ])('refuses an origin with %s', (_what, origin) => {
    expect(problemsOf({ ...least, HOLDOFF_ORIGINS: origin })[0]).toMatch(/^HOLDOFF_ORIGINS/);
  });

  it('wants to be told its address when it listens beyond this machine', () => {
    expect(problemsOf({ ...least, HOLDOFF_HOST: '0.0.0.0' })).toHaveLength(1);
    expect(
      problemsOf({ ...least, HOLDOFF_HOST: '0.0.0.0', HOLDOFF_ORIGINS: 'https://book.lab.example' }),
    ).toEqual([]);
  });

  it('serves no client when told so', () => {
    const read = readConfig({ ...least, HOLDOFF_CLIENT: '' });
    expect(read.type === 'config' && read.config.folders.client).toBe(undefined);
  });
});
