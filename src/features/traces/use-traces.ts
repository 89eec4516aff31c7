import { useState } from 'react';
import type { HoldOutcome } from '../../components/hold';
import { readFigure } from '../../components/figure-form';
import { useFigureForm } from '../../components/use-figure-form';
import { useLabClient } from '../../data/client-context';
import { useAppend } from '../../data/use-append';
import { useDraft } from '../../data/use-draft';
import { useResume } from '../../data/use-resume';
import type { TraceDoc } from '../../domain/book/documents/note';
import { loopCapacitance_F } from './simulated';
import { keptDraft } from './kept-draft';
import { EMPTY_TRACE, readingAs, traceSpecs, type TraceDraft } from './trace-draft';
import { keptFigures, measured } from './trace-figures';
import { readingByNo, valuesOf, type TraceFacts } from './use-trace-facts';
import { useSimulated } from './use-simulated';
import { useTraceFile, type TraceFile } from './use-trace-file';
import type { Window, ZoomStep } from './zoom';

/** A kept trace that is looked at; what is tried on it is nobody's draft. */
interface Kept {
  readonly trace: TraceDoc;
  /** Null until somebody changes how it is looked at. */
  readonly draft: TraceDraft | null;
}

/** The one file on the screen: a new one, whose draft is kept, or one that hangs on the firing already. */
export function useTraces(facts: TraceFacts) {
  const { firing, readings, revision } = facts;
  const { photos } = useLabClient();
  const append = useAppend();
  const resume = useResume();
  const own = useDraft<TraceDraft>(`trace/${firing.id}`, EMPTY_TRACE);
  const { state, open, look, close } = useTraceFile();
  const [kept, setKept] = useState<Kept | null>(null);
  const [said, setSaid] = useState<string | null>(null);

  const file = state.type === 'open' ? state.file : null;
  const fresh =
    kept === null || file === null ? EMPTY_TRACE : keptDraft(kept.trace.original, file.survey, readings);
  const draft = kept === null ? { ...EMPTY_TRACE, ...own.value } : (kept.draft ?? fresh);
  const update = (next: (now: TraceDraft) => TraceDraft): void => {
    if (kept === null) own.set((now) => next({ ...EMPTY_TRACE, ...now }));
    else setKept({ ...kept, draft: next(draft) });
  };
  const specs = file === null ? [] : traceSpecs(file.survey, draft, { last: readings.at(-1)?.no ?? 0 });
  const figures = useFigureForm({
    specs,
    texts: draft.texts,
    setTexts: (changed) => update((now) => ({ ...now, texts: changed(now.texts) })),
    resumed: resume.place.field,
    onChoose: (key) => resume.field(key, null),
  });
  const readingSpec = specs.find(({ key }) => key === 'reading');
  const readNo = readingSpec === undefined ? null : readFigure(readingSpec, draft.texts);
  const reading = readingByNo(readings, readNo?.type === 'value' ? readNo.value : null);
  const rig = useSimulated(revision.spec, valuesOf(reading));

  const keep = async (): Promise<HoldOutcome> => {
    if (file === null) return { type: 'failed', words: 'Choose a file first.' };
    const refusal = specs
      .map((spec) => readFigure(spec, draft.texts))
      .find((read) => read.type === 'refused');
    if (refusal?.type === 'refused') return { type: 'failed', words: refusal.words };
    const bytes = await file.blob.arrayBuffer().catch(() => null);
    if (bytes === null)
      return { type: 'failed', words: 'The tablet can no longer read this file. Choose it again.' };
    const put = await photos.put(bytes);
    if (put.type !== 'kept') return { type: 'failed', words: put.words };
    const outcome = await append({
      kind: 'trace.attached',
      body: {
        about: { type: 'firing', id: firing.id },
        sha256: put.sha256,
        bytes: put.bytes,
        name: file.name.slice(0, 120) || 'trace',
        media_type: 'text/csv',
        reading: reading?.id ?? null,
        points: file.survey.points,
        reading_as: readingAs(file.survey, draft),
        figures: figuresOf(file, draft, loopCapacitance_F(revision.spec, draft.loop)),
        note: draft.note,
      },
    });
    if (outcome.type !== 'logged') return { type: 'failed', words: outcome.words };
    own.clear();
    close();
    setSaid(`${file.name}: ${outcome.words}.`);
    return { type: 'settled' };
  };
  return {
    state,
    draft,
    kept: kept?.trace ?? null,
    said,
    figures,
    rig,
    keep,
    change: (part: Partial<TraceDraft>) => update((now) => ({ ...now, ...part })),
    look: (step: ZoomStep | Window) => {
      if (file !== null) void look(file, step);
    },
    openFile: (chosen: File) => {
      setKept(null);
      setSaid(null);
      void open(chosen, chosen.name);
    },
    openKept: (trace: TraceDoc, bytes: ArrayBuffer) => {
      setKept({ trace, draft: null });
      setSaid(null);
      void open(new Blob([bytes]), trace.original.name);
    },
    close: () => {
      setKept(null);
      close();
    },
  };
}

export type Traces = ReturnType<typeof useTraces>;

function figuresOf({ survey }: TraceFile, draft: TraceDraft, loop_F: number | null) {
  const reading = readingAs(survey, draft);
  return reading.channels.flatMap(({ column }, index) => {
    const one = measured(survey, reading, { index, loop_F });
    return one === null ? [] : [keptFigures(one, column)];
  });
}
