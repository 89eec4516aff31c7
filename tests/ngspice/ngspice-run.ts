import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

/** Curves as ngspice gives them, at its own points in time. */
export interface SpiceCurves {
  readonly time_s: Float64Array;
  readonly channel_V: Float64Array;
  readonly gap_A: Float64Array;
  readonly channel_A: Float64Array;
  /** ngspice's own figure for one analysis alone, without its start and its files: time on the clock. */
  readonly analysis_s: number;
}

/** Runs a deck in ngspice's batch mode, `runs` times over: its clock counts whole milliseconds, of all runs together. */
export function runNgspice(deck: readonly string[], runs = 1): SpiceCurves {
  const folder = mkdtempSync(join(tmpdir(), 'holdoff-ngspice-'));
  try {
    const raw = join(folder, 'out.raw');
    const control = [
      '.control',
      ...Array.from({ length: runs }, () => 'run'),
      'rusage trantime',
      `write ${raw} v(hot) v(cold) i(vg) i(vch)`,
    ];
    writeFileSync(join(folder, 'deck.cir'), [...deck, ...control, 'quit', '.endc', '.end', ''].join('\n'));
    const result = spawnSync('ngspice', ['-n', '-b', join(folder, 'deck.cir')], { encoding: 'utf8' });
    if (result.error !== undefined) throw result.error;
    const said = `${result.stdout}\n${result.stderr}`;
    const analysis = /Transient analysis time = ([\d.e+-]+)/.exec(said)?.[1];
    if (analysis === undefined) throw new Error(`ngspice gave no result:\n${said}\n${deck.join('\n')}`);
    // It writes what it has when it gives up half-way.
    if (/timestep too small|aborted/i.test(said))
      throw new Error(`ngspice gave up:\n${said}\n${deck.join('\n')}`);
    return readRaw(readFileSync(raw), Number(analysis) / runs);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

function readRaw(bytes: Buffer, analysis_s: number): SpiceCurves {
  const mark = Buffer.from('Binary:\n');
  const start = bytes.indexOf(mark);
  const head = bytes.subarray(0, start).toString('latin1');
  const points = Number(/No\. Points:\s*(\d+)/.exec(head)?.[1]);
  const variables = Number(/No\. Variables:\s*(\d+)/.exec(head)?.[1]);
  if (start < 0 || variables !== 5 || !(points > 0))
    throw new Error(`unexpected output of ngspice:\n${head}`);
  const body = start + mark.length;
  const read = (point: number, variable: number) =>
    bytes.readDoubleLE(body + 8 * (point * variables + variable));
  const curve = (value: (point: number) => number) =>
    Float64Array.from({ length: points }, (_, point) => value(point));
  return {
    time_s: curve((point) => read(point, 0)),
    channel_V: curve((point) => read(point, 1) - read(point, 2)),
    gap_A: curve((point) => read(point, 3)),
    channel_A: curve((point) => read(point, 4)),
    analysis_s,
  };
}
