import type { ReferenceCheck } from './checks-file';
import { evaluate, type Verdict } from './evaluate';

export interface ReferenceReport {
  readonly lines: readonly string[];
  readonly passed: number;
  readonly failed: number;
  readonly skipped: number;
}

type Judged = readonly { readonly check: ReferenceCheck; readonly verdict: Verdict }[];

/** Evaluates every check: a line per failure, what was skipped and why, a table per area, the count. */
export function reportOn(checks: readonly ReferenceCheck[]): ReferenceReport {
  const judged = checks.map((check) => ({ check, verdict: evaluate(check) }));
  const counts = countOf(judged);
  return {
    ...counts,
    lines: [
      ...failureLines(judged),
      ...skipLines(judged),
      ...areaLines(judged),
      `${String(counts.passed)} passed, ${String(counts.failed)} failed, ${String(counts.skipped)} skipped`,
    ],
  };
}

function failureLines(judged: Judged): readonly string[] {
  return judged.flatMap(({ check, verdict }) =>
    verdict.type === 'failed' ? [`FAILED ${check.id} ${check.fn}: ${verdict.why}`] : [],
  );
}

function skipLines(judged: Judged): readonly string[] {
  const counts = new Map<string, number>();
  for (const { check, verdict } of judged) {
    if (verdict.type !== 'skipped') continue;
    const line = `${check.fn}: ${verdict.why}`;
    counts.set(line, (counts.get(line) ?? 0) + 1);
  }
  return [...counts].map(([line, count]) => `skipped ${String(count)} x ${line}`);
}

function areaLines(judged: Judged): readonly string[] {
  const byArea = new Map<string, Judged>();
  for (const one of judged) {
    const area = one.check.area ?? 'no area';
    byArea.set(area, [...(byArea.get(area) ?? []), one]);
  }
  const width = Math.max(4, ...[...byArea.keys()].map((area) => area.length));
  const row = (area: string, cells: readonly (string | number)[]) =>
    `${area.padEnd(width)}${cells.map((cell) => String(cell).padStart(9)).join('')}`;
  const rows = [...byArea].map(([area, of]) => {
    const { passed, failed, skipped } = countOf(of);
    return row(area, [passed, failed, skipped]);
  });
  return ['', row('area', ['passed', 'failed', 'skipped']), ...rows, ''];
}

function countOf(judged: Judged) {
  const of = (type: Verdict['type']) => judged.filter(({ verdict }) => verdict.type === type).length;
  return { passed: of('passed'), failed: of('failed'), skipped: of('skipped') };
}
