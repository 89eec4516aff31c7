import { useCallback, useEffect, useRef, useState } from 'react';
import { browserTraceRunner } from '../../data/ports/browser-trace-runner';
import type { Envelope } from '../../domain/oscillogram/extremes';
import type { TraceSurvey } from '../../domain/oscillogram/survey';
import { zoomed, type Window, type ZoomStep } from './zoom';

/** Columns of the plot: as many as a tablet's chart has device pixels or so; each holds its extremes. */
const SLICES = 800;

export interface TraceFile {
  readonly name: string;
  readonly blob: Blob;
  readonly survey: TraceSurvey;
  readonly window: Window;
  /** By channel, of the window. */
  readonly envelopes: readonly Envelope[];
}

export type TraceState =
  | { readonly type: 'none' }
  | { readonly type: 'reading'; readonly name: string }
  | { readonly type: 'refused'; readonly words: string }
  | { readonly type: 'open'; readonly file: TraceFile };

const NONE: TraceState = { type: 'none' };

/** A file of an oscilloscope, read in a worker; its points stay there. */
export function useTraceFile() {
  const [runner] = useState(browserTraceRunner);
  const [state, setState] = useState<TraceState>(NONE);
  const opened = useRef(0);
  useEffect(() => () => runner.close(), [runner]);

  const open = useCallback(
    async (blob: Blob, name: string): Promise<void> => {
      opened.current += 1;
      const no = opened.current;
      setState({ type: 'reading', name });
      const asked = runner.ask({ key: String(no), file: blob, ask: { kind: 'survey', slices: SLICES } });
      const result = await asked.answer;
      if (no !== opened.current) return;
      if (!result.ok) setState({ type: 'refused', words: result.refusal.words });
      else if (result.value.kind === 'survey') {
        const { survey } = result.value;
        const { from_s, to_s } = survey.time;
        const file = { name, blob, survey, window: { from_s, to_s }, envelopes: survey.whole };
        setState({ type: 'open', file });
      }
    },
    [runner],
  );
  const look = useCallback(
    async (file: TraceFile, step: ZoomStep | Window): Promise<void> => {
      const no = opened.current;
      const window = typeof step === 'string' ? zoomed(file.survey.time, file.window, step) : step;
      const asked = runner.ask({
        key: String(no),
        file: file.blob,
        ask: { kind: 'window', ...slim(window), slices: SLICES },
      });
      const result = await asked.answer;
      // Overtaken by a later look: that one answers.
      if (no !== opened.current || (!result.ok && result.refusal.type === 'stopped')) return;
      if (!result.ok) setState({ type: 'refused', words: result.refusal.words });
      else if (result.value.kind === 'window')
        setState({
          type: 'open',
          file: { ...file, window: slim(window), envelopes: result.value.envelopes },
        });
    },
    [runner],
  );
  const close = useCallback(() => {
    opened.current += 1;
    runner.close();
    setState(NONE);
  }, [runner]);
  return { state, open, look, close };
}

function slim({ from_s, to_s }: Window): Window {
  return { from_s, to_s };
}
