import { Caution } from '../../src/components/caution';
import { Chart } from '../../src/components/chart/chart';
import { FieldColumn } from '../../src/components/field-column';
import { FieldRow } from '../../src/components/field-row';
import { QuantityField } from '../../src/components/quantity-field';
import { SaysBlock } from '../../src/components/says-block';
import { ThumbDome } from '../../src/components/thumb-dome';
import { ThumbZone } from '../../src/components/thumb-zone';
import { chartWords, gapChart } from './figures';
import { Frame, later } from './frame';

const asked = new URLSearchParams(window.location.search);

export function GapPage() {
  return (
    <Frame place="lookups" fields={<Fields />} thumbs={<Thumbs />}>
      <div className="gallery-gap">
        <Chart
          title="Self-break voltage of Kettle's gap"
          data={gapChart}
          words={chartWords}
          slice={{
            high: { value: '24.3', unit: 'kV', words: 'may hold up to', note: 'with UV on the gap' },
            low: {
              value: '16.7',
              unit: 'kV',
              words: 'nothing fires below',
              note: 'to hold off: stay below this',
            },
            middle: [
              { label: 'law', value: '18.8' },
              { label: 'own', value: '18.9' },
            ],
            lean: 'high',
          }}
        />
        <div className="gallery-says">
          <SaysBlock muted>
            Law: near-uniform field in nitrogen, −11 to +29 % with UV, valid to 12 bar mm. Own: 46
            self-breaks, ±0.3 kV. Ambient 0.966 bar(abs).
          </SaysBlock>
          <Caution>
            From 0.92 bar(g) the law’s high side is beyond the supply. This rig’s own curve says it fires. If
            it does not, it sits charged.
          </Caution>
        </div>
      </div>
    </Frame>
  );
}

function Fields() {
  const refusal = asked.get('refusal');
  return (
    <FieldColumn label="Inputs">
      <FieldRow
        label="Gas"
        source="rig, rev 7"
        value={
          <>
            N<sub>2</sub>
          </>
        }
        onPress={() => undefined}
      />
      <FieldRow label="Gap" source="rig, rev 7" value="3.0" unit="mm" onPress={() => undefined} />
      <QuantityField
        label="Pressure"
        source="measured"
        stepWords="by 0.05"
        value="1.00"
        unit="bar(g)"
        onStep={() => undefined}
        onOpen={() => undefined}
        lessLabel="Less pressure by 0.05 bar"
        moreLabel="More pressure by 0.05 bar"
        {...(refusal === null ? {} : { refusal })}
      />
      <FieldRow label="Temperature" source="measured" value="21" unit="°C" onPress={() => undefined} />
      <FieldRow label="Radius" source="assumed" value="12" unit="mm" onPress={() => undefined} />
    </FieldColumn>
  );
}

function Thumbs() {
  return (
    <ThumbZone
      label="Actions"
      main={
        <ThumbDome
          size="big"
          label={'Hold\nto keep'}
          hold="half-second"
          holdLabel="Hold: keep this lookup"
          onComplete={async () => {
            await later(1200);
            return asked.has('fail')
              ? { type: 'failed', words: 'Not logged. Kept as draft. Hold again.' }
              : { type: 'settled' };
          }}
        />
      }
      others={[<ThumbDome key="pin" label="Pin to bench" onComplete={() => undefined} />]}
    />
  );
}
