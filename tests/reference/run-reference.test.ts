import { spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';
import { readChecks, type ReferenceCheck } from './checks-file';
import { evaluate } from './evaluate';
import { reportOn } from './report';

const check = (change: Partial<ReferenceCheck>): ReferenceCheck => ({
  id: 'one',
  fn: 'gap.uniform.air',
  inputs: { p_bar_abs: 1, d_cm: 1, T_C: 20 },
  expected: 31.08,
  tolerance_rel: 0.001,
  area: 'A',
  ...change,
});

describe('evaluate', () => {
  it.each<[string, Partial<ReferenceCheck>, string]>([
    ['a true figure', {}, 'passed'],
    ['a figure at the edge of its tolerance', { expected: 31.11, tolerance_rel: 0.001 }, 'passed'],
    ['a wrong figure', { expected: 40 }, 'failed'],
    ['a negative expectation', { expected: -31.08 }, 'failed'],
    ['a missing temperature, which is 20 C', { inputs: { p_bar_abs: 1, d_cm: 1 } }, 'passed'],
    ['a missing input', { inputs: { d_cm: 1 } }, 'failed'],
    ['an input of the wrong kind', { inputs: { p_bar_abs: '1', d_cm: 1 } }, 'failed'],
    ['an input that the domain refuses', { inputs: { p_bar_abs: -1, d_cm: 1 } }, 'failed'],
    ['a truth', { fn: 'gap.uniform.isMonotone', inputs: { gas: 'air' }, expected: true }, 'passed'],
    ['a truth against a figure', { expected: true }, 'failed'],
    ['an unknown function', { fn: 'gap.noSuchThing' }, 'skipped'],
    ['a name that every object has', { fn: 'toString' }, 'skipped'],
    [
      'hexagonal bars without a size',
      { fn: 'gap.breakdown.hexBars', inputs: { orientation: 'flat' } },
      'failed',
    ],
    [
      'capped rods',
      {
        fn: 'gap.fieldFactor',
        inputs: { geometry: 'capped_rods', d_over_R: 2, L_over_R: 20 },
        expected: 1.749,
      },
      'passed',
    ],
    ['an unknown geometry', { fn: 'gap.fieldFactor', inputs: { geometry: 'cubes', d_over_R: 1 } }, 'failed'],
    [
      'spheres without a pressure, which is 101.3 kPa',
      { fn: 'gap.breakdown.spheres', inputs: { D_cm: 2, d_cm: 0.1 }, expected: 4.7, tolerance_rel: 0.035 },
      'passed',
    ],
    ['spheres without a diameter', { fn: 'gap.breakdown.spheres', inputs: { d_cm: 0.1 } }, 'failed'],
    [
      'a two-sided gap of spheres',
      {
        fn: 'gap.holdOff.low',
        inputs: {
          gas: 'N2',
          geometry: 'spheres',
          R_cm: 1.2,
          d_cm: 0.3,
          u_d_cm: 0.005,
          p_bar_abs: 1.966,
          u_p_bar: 0.02,
          T_C: 21,
          u_T_C: 3,
        },
        expected: 16.76,
      },
      'passed',
    ],
    [
      'an expected zero',
      {
        fn: 'gap.townsend.forcedB',
        inputs: { V_min_V: 1e-6, pd_min_Torrcm: 1e6 },
        expected: 0,
        tolerance_rel: 0,
      },
      'passed',
    ],
  ])('judges %s', (_name, change, type) => {
    expect(evaluate(check(change)).type).toBe(type);
  });
});

describe('readChecks', () => {
  it.each([
    ['not JSON', '{', 'not JSON'],
    ['no checks', '{}', 'checks'],
    [
      'a check without a function',
      '{"checks":[{"id":"x","inputs":{},"expected":1,"tolerance_rel":0}]}',
      'checks.0.fn',
    ],
    [
      'an expectation that is a text',
      JSON.stringify({ checks: [{ ...check({}), expected: 'x' }] }),
      'checks.0.expected',
    ],
    [
      'a negative tolerance',
      JSON.stringify({ checks: [{ ...check({}), tolerance_rel: -1 }] }),
      'checks.0.tolerance_rel',
    ],
  ])('refuses %s and names the place', (_name, text, place) => {
    const result = readChecks(text);
    expect(!result.ok && result.refusal.words).toContain(place);
  });

  it('puts circuits in the place of their names', () => {
    const named = { ...check({}), inputs: { circuit: 'T' } };
    const given = JSON.stringify({ circuits: { T: { V0: 1 } }, checks: [named] });
    expect(readChecks(given)).toMatchObject({ ok: true, value: [{ inputs: { circuit: { V0: 1 } } }] });
    const first = { ...check({}), inputs: { circuit: 'T', top: 'transfer', V0: 2 } };
    expect(readChecks(JSON.stringify({ checks: [first, named] }))).toMatchObject({
      value: [{ inputs: { circuit: { V0: 2 } } }, { inputs: { circuit: { V0: 2, top: 'transfer' } } }],
    });
    const missing = evaluate(check({ fn: 'circuit.riseTime', inputs: { circuit: 'gone' } }));
    expect(missing).toEqual({ type: 'failed', why: 'input circuit "gone" is not in the file' });
  });

  it('carries on past fields that it does not know', () => {
    const text = JSON.stringify({ circuits: {}, checks: [{ ...check({}), kind: 'standard', note: 'x' }] });
    expect(readChecks(text)).toMatchObject({ ok: true, value: [{ id: 'one' }] });
  });
});

describe('reportOn', () => {
  it('has a line per failure, a row per area and the count at the end', () => {
    const { lines, ...counts } = reportOn([
      check({}),
      check({ id: 'two', expected: 40, area: 'B' }),
      check({ id: 'three', fn: 'gap.noSuchThing', area: 'B' }),
    ]);
    expect(counts).toEqual({ passed: 1, failed: 1, skipped: 1 });
    expect(lines[0]).toBe('FAILED two gap.uniform.air: got 31.08, expected 40 within 0.001');
    expect(lines).toContain('skipped 1 x gap.noSuchThing: function not known');
    expect(lines.some((line) => /^B\s+0\s+1\s+1$/.test(line))).toBe(true);
    expect(lines.at(-1)).toBe('1 passed, 1 failed, 1 skipped');
  });
});

describe('the command', () => {
  const folder = mkdtempSync(join(tmpdir(), 'holdoff-reference-'));
  afterAll(() => {
    rmSync(folder, { recursive: true });
  });
  const run = (text: string | undefined, ...flags: readonly string[]) => {
    const file = join(folder, 'checks.json');
    if (text !== undefined) writeFileSync(file, text);
    const args = [
      '--import',
      'tsx',
      'tests/reference/run-reference.ts',
      ...flags,
      ...(text === undefined ? [] : [file]),
    ];
    return spawnSync(process.execPath, args, { encoding: 'utf8' });
  };
  const file = (...checks: readonly ReferenceCheck[]) => JSON.stringify({ checks });

  it.each<[string, string | undefined, readonly string[], number]>([
    ['a skip when not strict', file(check({}), check({ fn: 'x' })), [], 0],
    ['a failure', file(check({ expected: 1 })), [], 1],
    ['a skip when strict', file(check({ fn: 'x' })), ['--strict'], 1],
    ['a malformed file', '[]', [], 2],
    ['no file named', undefined, [], 2],
  ])(
    'ends for %s as it should',
    (...[_name, text, flags, status]) => {
      const result = run(text, ...flags);
      expect(result.status).toBe(status);
      expect(status === 2 ? result.stderr : result.stdout).not.toBe('');
    },
    30_000,
  );
});
