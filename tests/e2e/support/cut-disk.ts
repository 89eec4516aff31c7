import { execFile } from 'node:child_process';
import { mkdir, mkdtemp, rename, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';

const run = promisify(execFile);

/**
 * A disk of its own for a browser profile: ext4 in a file, through a loop device. A cut takes the file as it is, which
 * holds what was written through and nothing of what the system still kept in memory, and goes on with that.
 */
export interface CutDisk {
  /** Where it is mounted. */
  readonly folder: string;
  /** Brings everything to the disk, as minutes of use would: the app itself must be installed before a cut. */
  settle(): Promise<void>;
  /** The state that a power cut would leave; the browser must be frozen. Returns what swaps the disk for it. */
  cut(): Promise<{ readonly resume: () => Promise<void> }>;
  close(): Promise<void>;
}

const SIZE = '600M';

/** Throws where the machine gives no loop device or no right to mount: then the test fails, it is not left out. */
export async function openCutDisk(): Promise<CutDisk> {
  const base = await mkdtemp(path.join(tmpdir(), 'holdoff-disk-'));
  const image = path.join(base, 'disk.img');
  const folder = path.join(base, 'mounted');
  await mkdir(folder);
  await run('truncate', ['-s', SIZE, image]);
  await run('mkfs.ext4', ['-q', '-F', image]);
  const mount = () => run('mount', ['-o', 'loop', image, folder]);
  const unmount = () => run('umount', ['-l', folder]);
  await mount();
  return {
    folder,
    settle: async () => {
      await run('sync', ['-f', folder]);
    },
    cut: async () => {
      const taken = path.join(base, 'taken.img');
      await run('cp', ['--sparse=always', image, taken]);
      return {
        resume: async () => {
          await unmount();
          await rename(taken, image);
          await mount();
        },
      };
    },
    close: async () => {
      await unmount();
      await rm(base, { recursive: true, force: true });
    },
  };
}
