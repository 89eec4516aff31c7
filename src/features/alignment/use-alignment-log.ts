import { readFigure, readFigures } from '../../components/figure-form';
import type { HoldOutcome } from '../../components/hold';
import { useAppend, type Draft } from '../../data/use-append';
import { ARC_SPECS, afterLogging, gapSpecs } from './alignment-form';
import { gapsAfter } from './alignment-plan';
import type { AlignmentScreen } from './use-alignment-screen';

type Ready =
  { readonly type: 'ready'; readonly entry: Draft } | { readonly type: 'refused'; readonly words: string };

/** What a hold would log in this mode, or what is missing for it. */
export function useAlignmentLog(screen: AlignmentScreen) {
  const append = useAppend();
  const ready = readyToLog(screen);
  const log = async (): Promise<HoldOutcome> => {
    if (ready.type === 'refused') return { type: 'failed', words: ready.words };
    const outcome = await append(ready.entry);
    if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
    screen.set(afterLogging);
    return { type: 'settled' };
  };
  return { hindrance: ready.type === 'refused' ? ready.words : null, log };
}

function readyToLog(screen: AlignmentScreen): Ready {
  switch (screen.mode) {
    case 'gaps':
      return measured(screen);
    case 'turns':
      return adjusted(screen);
    case 'arcs':
      return arcsSeen(screen);
  }
}

function measured({ setting, typed, feeler_mm, draft, rig, revision }: AlignmentScreen): Ready {
  const { refusal } = readFigures(gapSpecs(setting), draft.texts);
  if (refusal !== null) return refuse(refusal);
  if (typed === null) return refuse('Enter the gap at both ends.');
  return {
    type: 'ready',
    entry: {
      kind: 'alignment.measured',
      subject: rig.id,
      body: {
        rig_revision: revision.entry,
        gap_a_mm: typed.a_mm,
        gap_b_mm: typed.b_mm,
        place_a_mm: setting.place_a_mm,
        place_b_mm: setting.place_b_mm,
        feeler_error_mm: feeler_mm,
        note: '',
      },
    },
  };
}

function adjusted(screen: AlignmentScreen): Ready {
  const { setting, turned, recommended, last, logged, goal, rig, revision } = screen;
  if (setting.screws === null) return refuse(setting.missing ?? 'The rig’s numbers name no screws.');
  if (turned === null || typeof turned === 'string') return refuse(turned ?? 'No screw was turned.');
  const after = logged === null ? null : gapsAfter(logged, setting, turned);
  if (logged !== null && after === null) return refuse('These turns would bring the bars together.');
  const [first, second] = setting.screws;
  return {
    type: 'ready',
    entry: {
      kind: 'alignment.adjusted',
      subject: rig.id,
      body: {
        rig_revision: revision.entry,
        based_on: recommended === null || logged === null ? null : (last?.measured.id ?? null),
        target_mm: goal.target_mm,
        turns: [
          { screw: first.name, eighths_clockwise: turned[0] },
          { screw: second.name, eighths_clockwise: turned[1] },
        ],
        predicted: after === null ? null : { gap_a_mm: microns(after.a_mm), gap_b_mm: microns(after.b_mm) },
        note: '',
      },
    },
  };
}

function arcsSeen({ draft, rig, revision }: AlignmentScreen): Ready {
  if (draft.arcs === null) return refuse('Tap where the arcs sit, or say that it is even.');
  const [spec] = ARC_SPECS;
  const read = spec === undefined ? null : readFigure(spec, draft.texts);
  if (read?.type === 'refused') return refuse(read.words);
  const shots = read?.type === 'value' ? read.value : null;
  if (shots !== null && !Number.isInteger(shots)) return refuse('Shots looked at: a whole number.');
  return {
    type: 'ready',
    entry: {
      kind: 'alignment.arc-seen',
      subject: rig.id,
      body: {
        rig_revision: revision.entry,
        where: draft.arcs,
        shots,
        firing: rig.open_firings.at(-1) ?? null,
        note: '',
      },
    },
  };
}

/** Whole micrometres: nobody turns finer. */
function microns(value_mm: number): number {
  return Number(value_mm.toFixed(3));
}

function refuse(words: string): Ready {
  return { type: 'refused', words };
}
