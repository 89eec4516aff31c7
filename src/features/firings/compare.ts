import type { FiringDoc } from '../../domain/book/documents/firing';
import type { RigSpec } from '../../domain/book/rig-spec';
import { looksCounted, overShots, summaryFigures, type FiringPoint } from './firing-summary';
import { expectedByLaw, isSelfBreak, type StandingRow } from './reading-fit';

export interface ComparedRow {
  readonly key: string;
  readonly label: string;
  readonly a: string;
  readonly b: string;
}

interface Side {
  readonly firing: FiringDoc;
  readonly rows: readonly StandingRow[];
}

/** The figures of both, line by line, with the looks last. */
export function comparedRows(a: Side, b: Side): readonly ComparedRow[] {
  const right = summaryFigures(b.firing, b.rows);
  const figures = summaryFigures(a.firing, a.rows).map(({ key, label, words }, i) => ({
    key,
    label,
    a: words,
    b: right[i]?.words ?? '–',
  }));
  const looksOf = new Map(
    [...looksCounted(a.rows), ...looksCounted(b.rows)].map(({ looked }) => [looked, looked]),
  );
  const times = (rows: readonly StandingRow[], looked: string) =>
    String(looksCounted(rows).find((one) => one.looked === looked)?.times ?? 0);
  const looks = [...looksOf.keys()].map((looked) => ({
    key: `looked ${looked}`,
    label: `Looked ${looked}`,
    a: times(a.rows, looked),
    b: times(b.rows, looked),
  }));
  return [...figures, ...looks];
}

/** Self-breaks over the shots of their firing, each in percent above the law at its own setting. */
export function sharesOfExpected(spec: RigSpec, rows: readonly StandingRow[]): readonly FiringPoint[] {
  const expected = expectedByLaw(spec, rows);
  return overShots(rows, ({ reading, values }) => {
    const law_kV = expected.get(reading.id);
    return law_kV === undefined || !isSelfBreak(values) ? null : 100 * (values.voltage_kV / law_kV - 1);
  });
}
