import { readFileSync, readdirSync, readlinkSync } from 'node:fs';

/**
 * The argument list of a process, or undefined when there is none (any more).
 * @param {number} pid
 * @returns {string[] | undefined}
 */
export function commandLine(pid) {
  try {
    const args = readFileSync(`/proc/${pid}/cmdline`, 'utf8').split('\0').slice(0, -1);
    return args.length === 0 ? undefined : args;
  } catch {
    return undefined;
  }
}

/**
 * When a process began, in the kernel's own ticks: with its number it names one process for good, since
 * numbers are given out again.
 * @param {number} pid
 * @returns {string | undefined}
 */
export function startedAt(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    const state = fields[0];
    return state === 'Z' || state === 'X' ? undefined : fields[19];
  } catch {
    return undefined;
  }
}

/** @returns {number[]} */
export function allProcesses() {
  try {
    return readdirSync('/proc')
      .filter((name) => /^\d+$/.test(name))
      .map(Number);
  } catch {
    return [];
  }
}

/**
 * Who listens on a TCP port of this machine, as far as this account may see it.
 * @param {number} port
 * @returns {{pid: number, command: string} | undefined}
 */
export function listenerOn(port) {
  const inodes = new Set(['/proc/net/tcp', '/proc/net/tcp6'].flatMap((file) => listeningInodes(file, port)));
  if (inodes.size === 0) return undefined;
  for (const pid of allProcesses()) {
    if (openSockets(pid).some((inode) => inodes.has(inode))) {
      return { pid, command: (commandLine(pid) ?? []).join(' ').slice(0, 120) };
    }
  }
  return undefined;
}

/** @param {string} file @param {number} port */
function listeningInodes(file, port) {
  const listening = '0A';
  const suffix = `:${port.toString(16).toUpperCase().padStart(4, '0')}`;
  try {
    return readFileSync(file, 'utf8')
      .split('\n')
      .slice(1)
      .map((line) => line.trim().split(/\s+/))
      .filter((fields) => fields[1]?.endsWith(suffix) === true && fields[3] === listening)
      .flatMap((fields) => (fields[9] === undefined ? [] : [fields[9]]));
  } catch {
    return [];
  }
}

/** @param {number} pid */
function openSockets(pid) {
  try {
    return readdirSync(`/proc/${pid}/fd`).flatMap((name) => {
      try {
        const inode = /^socket:\[(\d+)\]$/.exec(readlinkSync(`/proc/${pid}/fd/${name}`))?.[1];
        return inode === undefined ? [] : [inode];
      } catch {
        return [];
      }
    });
  } catch {
    return [];
  }
}
