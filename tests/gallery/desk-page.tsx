import { Chart } from '../../src/components/chart/chart';
import { FacingPair } from '../../src/components/facing-pair';
import { HoldButton } from '../../src/components/hold-button';
import { Reading } from '../../src/components/reading';
import { SigmaScale } from '../../src/components/sigma-scale';
import { Table } from '../../src/components/table';
import { chartWords, deskChart } from './figures';
import { Frame } from './frame';

const WAITING = [
  ['Firing to review', 'Kettle, reading 22 did not fit: −4.2 σ', 'Ada Brook', '1 h'],
  ['Recorded as unready', 'Wren, no permit for revision 3; reason given', 'Ada Brook', '2 h'],
  ['Permit asked', 'Heron, revision 5: 0.8, was 0.6 bar(g)', 'Ada Brook', '3 h'],
  ['Parting', 'Heron 4a and 4b stand, the stricter limits rule', 'two tablets', '1 d'],
  ['Held back', 'Permit granted for a superseded revision', 'Milo Venn', '1 d'],
  ['Incident', 'Kettle stayed charged at 1.6 bar(g)', 'Ada Brook', '2 d'],
] as const;

const ROWS = [27, 26, 25, 24, 23, 22, 21, 20, 19].map((number) => ({
  number: String(number),
  kv: number === 22 ? '17.6' : '18.9',
  sigma: number === 22 ? -4.2 : ((number * 7) % 5) / 3 - 0.6,
  looked: number === 22 ? 'early break, arc at A end' : 'even',
}));

export function DeskPage() {
  const nothing = (): void => undefined;
  return (
    <Frame
      place="firings"
      strip={{
        mark: 'dashed',
        ground: 'dash',
        title: 'Kettle, Heron, Wren',
        state: 'Not known from here: treat as charged',
        detail: 'last declared: Kettle shorted 16:12, Heron short off 16:20, Wren shorted yesterday',
        person: 'Milo Venn',
      }}
    >
      <div className="pr-6 pt-6 pl-8 flex flex-col gap-6">
        <div className="grid grid-cols-6 gap-3">
          {WAITING.map(([title, what, who, age], i) => (
            <FacingPair key={title} title={title} foot={who} footEnd={age} chosen={i === 0} onPress={nothing}>
              {what}
            </FacingPair>
          ))}
        </div>
        <div className="flex items-start justify-between">
          <div>
            <h2 className="text-lead leading-tight m-0">Kettle, firing of 11 Dec</h2>
            <p className="muted m-0">Ada Brook, 14:42 to 15:20, revision 7, check and permit in order</p>
          </div>
          <div className="flex gap-4">
            <HoldButton label="Export CSV" onComplete={nothing} />
            <HoldButton label="Report as PDF" onComplete={nothing} />
            <HoldButton label="Send back" hold="half-second" onComplete={nothing} />
            <span className="ml-9">
              <HoldButton main label="Accept" hold="second" onComplete={nothing} />
            </span>
          </div>
        </div>
        <div className="grid grid-cols-[420px_1fr] gap-8">
          <div style={{ height: 290 }}>
            <Chart title="Self-breaks" data={deskChart} words={chartWords} />
          </div>
          <div className="grid grid-cols-3 gap-4 content-start">
            {[
              ['1,240', '', 'shots'],
              ['18.9', 'kV', 'mean self-break'],
              ['0.30', 'kV', 'scatter, 1 σ'],
              ['150', 'µJ', 'output, meter'],
            ].map(([value = '', unit = '', label = '']) => (
              <div key={label}>
                <Reading value={value} unit={unit} size="answer" />
                <br />
                <span className="muted">{label}</span>
              </div>
            ))}
          </div>
        </div>
        <Table
          caption="Readings"
          rows={ROWS}
          rowKey={(row) => row.number}
          picked="22"
          columns={[
            { key: 'n', head: 'No.', cell: (row) => row.number },
            { key: 'kv', head: 'kV', cell: (row) => row.kv },
            { key: 's', head: 'σ', cell: (row) => row.sigma.toFixed(1).replace('-', '−') },
            {
              key: 'd',
              head: '',
              cell: (row) => <SigmaScale compact sigma={row.sigma} label={`${row.sigma.toFixed(1)} σ`} />,
            },
            { key: 'l', head: 'looked', cell: (row) => row.looked, align: 'start' },
          ]}
          foot="Readings 19 to 27 of 31"
        />
      </div>
    </Frame>
  );
}
