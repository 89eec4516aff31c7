import { randomInt } from 'node:crypto';
import { createServer } from 'node:net';
import { listenerOn } from './process-table.mjs';
import { Refusal } from './refusal.mjs';

/**
 * @param {number} port
 * @param {string} [host]
 * @returns {Promise<'free' | 'taken' | 'not-permitted' | 'no-such-address'>}
 */
export function probePort(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', (/** @type {NodeJS.ErrnoException} */ error) => {
      if (error.code === 'EACCES') resolve('not-permitted');
      else resolve(error.code === 'EADDRINUSE' ? 'taken' : 'no-such-address');
    });
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve('free')));
  });
}

/**
 * Refuses in words when an address cannot be listened on.
 * @param {{port: number, host: string, purpose: string, setting: string}} wanted
 */
export async function requirePort({ port, host, purpose, setting }) {
  const found = await probePort(port, host);
  if (found === 'free') return;
  const advice = `Set another one with ${setting}=..., then start again.`;
  if (found === 'not-permitted') {
    throw new Refusal(`This account may not listen on port ${port} (${purpose}). ${advice}`);
  }
  if (found === 'no-such-address') {
    throw new Refusal(`${host}:${port} (${purpose}) is not an address of this machine. ${advice}`);
  }
  const holder = listenerOn(port);
  const by =
    holder === undefined
      ? 'by a process that this account cannot see'
      : `by process ${holder.pid} (${holder.command})`;
  throw new Refusal(`Port ${port}, wanted for ${purpose}, is taken ${by}.\nStop that, or: ${advice}`);
}

// Below the range from which systems hand out ports by themselves, so that none is taken by chance.
const firstFree = 20_000;
const lastFree = 29_999;

/** A port on loopback that was free a moment ago, for tests. @returns {Promise<number>} */
export async function freePort() {
  for (let attempt = 0; attempt < 50; attempt += 1) {
    const port = randomInt(firstFree, lastFree + 1);
    if ((await probePort(port)) === 'free') return port;
  }
  throw new Error(`no free port between ${firstFree} and ${lastFree}`);
}
