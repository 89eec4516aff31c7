import { useState } from 'react';
import { ChannelDrawing } from '../../src/components/channel-drawing';
import { Chart } from '../../src/components/chart/chart';
import { Choice } from '../../src/components/choice';
import { FieldColumn } from '../../src/components/field-column';
import { FieldRow } from '../../src/components/field-row';
import { QuantityField } from '../../src/components/quantity-field';
import { Reading } from '../../src/components/reading';
import { SaysBlock } from '../../src/components/says-block';
import { SigmaScale } from '../../src/components/sigma-scale';
import { Table } from '../../src/components/table';
import { ThumbDome } from '../../src/components/thumb-dome';
import { ThumbZone } from '../../src/components/thumb-zone';
import { calibrationChart, chartWords } from './figures';
import { Frame, later } from './frame';

const ROWS = [
  ['31', '18.9', '1.02', '40', 'even'],
  ['30', '19.2', '1.02', '40', 'even'],
  ['29', '18.6', '1.00', '40', 'arc, A end'],
  ['28', '19.0', '1.00', '40', 'even'],
  ['27', '18.1', '0.90', '20', 'even'],
] as const;

export function FiringPage() {
  const [arcs, setArcs] = useState<readonly string[]>(
    new URLSearchParams(window.location.search).has('arc') ? ['a'] : [],
  );
  const [looked, setLooked] = useState<'even' | 'surface' | 'none'>('even');
  return (
    <Frame
      place="firings"
      strip={{
        mark: 'jagged',
        ground: 'solid',
        title: 'Kettle',
        state: 'Firing',
        detail: 'open 38 min',
        person: 'Ada Brook',
        count: '61 to hand over',
        age_h: 38 / 60,
      }}
      fields={<Fields />}
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label={'Hold\nto log'}
              hold="half-second"
              holdLabel="Hold: log reading"
              onComplete={() => later(700)}
            />
          }
          others={[
            <ThumbDome
              key="close"
              critical
              label="Close firing"
              hold="second"
              holdLabel="Hold: close firing"
              onComplete={() => later(900)}
            />,
          ]}
        />
      }
    >
      <div className="px-5 h-full flex flex-col gap-2">
        <div className="flex items-center gap-6 flex-wrap">
          <Reading value="1,240" unit="shots" size="answer" />
          <SaysBlock>
            burst 40 at 2.0 Hz, foot key
            <br />
            <span className="muted">rate carried over; permit to 18 Dec</span>
          </SaysBlock>
        </div>
        <ChannelDrawing
          label="How it looked"
          parts={[
            { key: 'a', label: 'A end' },
            { key: 'mid', label: 'mid' },
            { key: 'b', label: 'B end' },
          ]}
          arcs={arcs}
          even={looked === 'even'}
          length_mm={280}
          onToggle={(key) =>
            setArcs(arcs.includes(key) ? arcs.filter((each) => each !== key) : [...arcs, key])
          }
        />
        <Choice
          label="Looked"
          value={looked}
          onChange={setLooked}
          options={[
            { value: 'even', label: 'even' },
            { value: 'surface', label: 'surface flashover' },
            { value: 'none', label: 'no beam, dark or failed' },
          ]}
        />
        <div className="flex gap-4 items-center flex-wrap">
          <SigmaScale sigma={-0.4} label="0.4 σ below" />
          <SaysBlock lead="Fits:">
            0.4 σ below this rig's own curve.
            <br />
            <span className="muted">Speaks at 3 σ, or at two of three past 2 σ.</span>
          </SaysBlock>
        </div>
        <div className="flex gap-2 flex-1 min-h-0 max-sm:flex-col">
          <div className="overflow-auto">
            <Table
              caption="Readings"
              columns={['No.', 'kV', 'bar(g)', 'shots', 'looked'].map((head, i) => ({
                key: head,
                head,
                align: head === 'looked' ? ('start' as const) : ('end' as const),
                cell: (row: readonly string[]) => row[i],
              }))}
              rows={ROWS}
              rowKey={(row) => row[0]}
            />
          </div>
          <div className="flex-1 max-sm:h-60">
            <Chart title="46 self-breaks" data={calibrationChart} words={chartWords} />
          </div>
        </div>
      </div>
    </Frame>
  );
}

function Fields() {
  const nothing = (): void => undefined;
  return (
    <FieldColumn label="Reading">
      <QuantityField
        label="Voltage"
        source="self-break"
        stepWords="by 0.1"
        value="18.9"
        unit="kV"
        onStep={nothing}
        onOpen={nothing}
        lessLabel="Less"
        moreLabel="More"
      />
      <FieldRow label="Pressure" source="gauge" value="1.02" unit="bar(g)" onPress={nothing} />
      <FieldRow label="Flow" source="carried over" value="3.0" unit="L/min" carried onPress={nothing} />
      <FieldRow label="Output" source="meter" value="150" unit="µJ" onPress={nothing} />
    </FieldColumn>
  );
}
