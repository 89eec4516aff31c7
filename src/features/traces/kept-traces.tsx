import { useState } from 'react';
import { useLabClient } from '../../data/client-context';
import { useBookState, useNotes } from '../../data/use-book';
import { useNames } from '../../data/use-names';
import type { TraceDoc } from '../../domain/book/documents/note';
import { standingValues } from '../../domain/book/documents/versions';
import { momentWords } from '../../domain/report/time-words';
import { formatFigure } from '../../domain/units/format-quantity';

interface Props {
  readonly firing: string;
  readonly zone: string;
  readonly onOpen: (trace: TraceDoc, bytes: ArrayBuffer) => void;
}

/** Traces that hang on the firing, opened from this tablet's own bytes. */
export function KeptTraces({ firing, zone, onOpen }: Props) {
  const { traces, state } = useNotes(firing);
  const { photos } = useLabClient();
  const { device } = useBookState();
  const nameOf = useNames();
  const [missing, setMissing] = useState<string | null>(null);
  const open = async (trace: TraceDoc): Promise<void> => {
    const bytes = await photos.get(trace.original.sha256);
    setMissing(bytes === null ? trace.id : null);
    if (bytes !== null) onOpen(trace, bytes);
  };
  const standing = traces.filter((trace) => trace.struck === null);
  return (
    <section className="trace-kept" aria-label="Kept traces">
      <h2>Kept traces</h2>
      {standing.length === 0 && state === 'ready' ? <p className="muted">None yet.</p> : null}
      <ul>
        {standing.map((trace) => (
          <li key={trace.id}>
            <div>
              <p>
                <b>{trace.original.name}</b>
              </p>
              <p>{figuresWords(trace)}</p>
              <p className="muted">
                {nameOf(trace.attached.by)}, {momentWords(trace.attached.stamp.wall_ms, zone)}
                {trace.original.note === '' ? '' : `; ${trace.original.note}`}
              </p>
              {missing === trace.id ? (
                <p role="alert">
                  {trace.attached.device === device
                    ? 'Its file is no longer on this tablet.'
                    : 'Its file is not here yet: it is on the tablet that it was read on.'}
                </p>
              ) : null}
            </div>
            <button type="button" aria-label={`Open ${trace.original.name}`} onClick={() => void open(trace)}>
              Open
            </button>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** "CH1 16.8 kV, rise 4.2 ns; CH2 510 A" */
export function figuresWords(trace: TraceDoc): string {
  const now = standingValues(trace);
  const { figures, reading_as } = now.type === 'stands' ? now.values : trace.original;
  return figures
    .flatMap(({ channel, peak, peak_unit, rise_10_90_ns }) => {
      if (peak === null) return [];
      const name = reading_as?.channels.find(({ column }) => column === channel)?.name ?? 'channel';
      const rise = rise_10_90_ns === null ? '' : `, rise ${three(rise_10_90_ns)}\u2009ns`;
      return [`${name} ${three(peak)}\u2009${peak_unit}${rise}`];
    })
    .join('; ');
}

function three(value: number): string {
  return formatFigure(value, { digits: { significant: 3 }, rounding: 'nearest' });
}
