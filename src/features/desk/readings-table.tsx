import { SigmaScale } from '../../components/sigma-scale';
import { Table, type Column } from '../../components/table';
import type { FiringAnswer } from '../../domain/report/desk-shapes';
import type { FiringRow } from '../../domain/report/firing-rows';
import { clockWords } from '../../domain/report/time-words';
import { HOW_WORDS, LOOK_WORDS } from '../../domain/report/words';
import { reasonWords } from '../../domain/report/reason-words';
import { asEntered, entriesById, originalWords, sigmaWords } from './firing-words';

interface Props {
  readonly answer: FiringAnswer;
  readonly rows: readonly FiringRow[];
  readonly zone: string;
  readonly left_out: readonly string[];
  readonly onCount: (reading: string) => void;
}

/** Every reading, newest first: struck, corrected and irregular ones stay in it and say so. */
export function ReadingsTable({ answer, rows, zone, left_out, onCount }: Props) {
  const entries = entriesById(answer.entries);
  const worst = rows
    .filter((row) => !row.fits)
    .toSorted((a, b) => Math.abs(b.sigma ?? 0) - Math.abs(a.sigma ?? 0))[0];
  const columns: readonly Column<FiringRow>[] = [
    { key: 'no', head: 'No.', cell: (row) => row.no },
    { key: 'time', head: 'time', cell: (row) => clockWords(row.reading.logged.stamp.wall_ms, zone) },
    figure('kv', 'kV', (row) => asEntered(row.values.voltage_kV, 1)),
    { key: 'how', head: 'how', cell: (row) => HOW_WORDS[row.values.how] },
    figure('bar', 'bar(g)', (row) => asEntered(row.values.pressure_bar_g, 2)),
    figure('flow', 'L/min', (row) => asEntered(row.values.flow_L_min, 1)),
    figure('rate', 'Hz', (row) => asEntered(row.values.rate_Hz, 1)),
    figure('shots', 'shots', (row) => asEntered(row.values.shots)),
    figure('output', 'µJ', (row) => asEntered(row.values.output_uJ)),
    { key: 'sigma', head: 'σ', cell: (row) => sigmaWords(row.sigma) },
    {
      key: 'scale',
      head: <span className="heard-only">deviation</span>,
      cell: (row) =>
        row.sigma === null ? null : (
          <SigmaScale compact sigma={row.sigma} label={`${sigmaWords(row.sigma)} σ`} />
        ),
    },
    {
      key: 'looked',
      head: 'looked',
      align: 'start',
      cell: (row) => (
        <>
          {LOOK_WORDS[row.values.looked]}
          {row.values.note === '' ? '' : <span className="muted">, {row.values.note}</span>}
          <Marks row={row} reason={reasonWords(entries.get(row.reading.id)?.reason ?? null)} />
          {row.fits ? null : (
            <button type="button" className="desk-count" onClick={() => onCount(row.reading.id)}>
              {left_out.includes(row.reading.id)
                ? 'left out of the calibration: let it count'
                : 'counts for the calibration: leave it out'}
            </button>
          )}
        </>
      ),
    },
    { key: 'rev', head: 'rev.', cell: (row) => entries.get(row.reading.id)?.revision ?? '\u2013' },
  ];
  return (
    <section className="desk-scroll">
      <Table
        caption="Readings, newest first"
        columns={columns}
        rows={rows.toReversed()}
        rowKey={(row) => row.reading.id}
        {...(worst === undefined ? {} : { picked: worst.reading.id })}
        foot={footWords(rows, left_out)}
      />
    </section>
  );
}

/** Struck values stay readable and read as struck; the words beside say so too. */
function figure(key: string, head: string, text: (row: FiringRow) => string): Column<FiringRow> {
  return { key, head, cell: (row) => (row.state === 'struck' ? <s>{text(row)}</s> : text(row)) };
}

function Marks({ row, reason }: { readonly row: FiringRow; readonly reason: string }) {
  const { reading } = row;
  const said = [
    ...(row.state === 'corrected' ? [`corrected, was ${originalWords(row)}`] : []),
    ...(row.state === 'struck' ? [`struck: ${reading.struck?.why ?? ''}`] : []),
    ...(row.state === 'parted' ? ['two corrections stand against each other: left out until settled'] : []),
    ...(row.irregular ? [`irregular: ${reason}`] : []),
    ...(row.fits ? [] : [row.words, ...row.causes.slice(0, 3).map((words, i) => `${i + 1}. ${words}`)]),
  ].filter((words) => words !== '');
  return said.map((words) => (
    <span key={words} className="desk-mark">
      {words}
    </span>
  ));
}

function footWords(rows: readonly FiringRow[], left_out: readonly string[]): string {
  const count = `${rows.length} ${rows.length === 1 ? 'reading' : 'readings'}`;
  const out = rows.filter((row) => left_out.includes(row.reading.id)).map((row) => row.no);
  if (out.length === 0) return count;
  return `${count}. Reading ${out.join(', ')} left out of the calibration once you accept.`;
}
