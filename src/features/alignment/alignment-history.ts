import type { AlignmentStep } from '../../domain/alignment/convergence';
import type { AlignmentDoc, AlignmentValues } from '../../domain/book/documents/alignment';
import { revisionById, type RigDoc } from '../../domain/book/documents/rig';
import { standingValues } from '../../domain/book/documents/versions';
import type { BodyOf } from '../../domain/book/kinds';
import { screwTravel_mm } from './alignment-setting';

/** A line of the history as it stands now. */
export interface HistoryLine {
  readonly doc: AlignmentDoc;
  /** Null where two corrections stand against each other, or it was struck. */
  readonly values: AlignmentValues | null;
  readonly corrected: boolean;
}

export interface Measurement {
  readonly id: string;
  readonly body: BodyOf<'alignment.measured'>;
}

export function historyLines(docs: readonly AlignmentDoc[]): readonly HistoryLine[] {
  return docs.map((doc) => {
    const now = standingValues(doc);
    return now.type === 'stands'
      ? { doc, values: now.values, corrected: now.corrected }
      : { doc, values: null, corrected: false };
  });
}

/** What the judge of convergence reads: lines that stand, with the screws of the revision that they were turned on. */
export function alignmentSteps(lines: readonly HistoryLine[], rig: RigDoc): readonly AlignmentStep[] {
  return lines.flatMap(({ values }) => (values === null ? [] : [stepOf(values, rig)]));
}

function stepOf(values: AlignmentValues, rig: RigDoc): AlignmentStep {
  switch (values.kind) {
    case 'alignment.measured': {
      const { gap_a_mm, gap_b_mm, feeler_error_mm } = values.body;
      return {
        type: 'measured',
        gaps: { a_mm: gap_a_mm, b_mm: gap_b_mm, feeler_mm: feeler_error_mm },
      };
    }
    case 'alignment.adjusted':
      return { type: 'turned', screws: movedBy(values.body, rig) };
    case 'alignment.arc-seen':
      return { type: 'arcs', where: values.body.where };
  }
}

function movedBy(body: BodyOf<'alignment.adjusted'>, rig: RigDoc) {
  const screws = revisionById(rig, body.rig_revision)?.spec.channel.screws ?? [];
  return body.turns.flatMap((turn) => {
    const screw = screws.find((one) => one.name === turn.screw);
    return screw === undefined
      ? []
      : [
          {
            name: screw.name,
            place_mm: screw.position_mm,
            expected_mm: screwTravel_mm(screw, turn.eighths_clockwise),
          },
        ];
  });
}

/** The last measurement, and whether a screw was turned since: then it says no more what is. */
export function lastMeasurement(
  lines: readonly HistoryLine[],
): { readonly measured: Measurement; readonly stands: boolean } | null {
  const at = lines.findLastIndex(({ values }) => values?.kind === 'alignment.measured');
  const line = lines[at];
  if (line?.values?.kind !== 'alignment.measured') return null;
  const stands = !lines.slice(at + 1).some(({ values }) => values?.kind === 'alignment.adjusted');
  return { measured: { id: line.doc.id, body: line.values.body }, stands };
}
