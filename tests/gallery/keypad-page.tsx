import { useState } from 'react';
import { Dialog } from '../../src/components/dialog';
import { FieldColumn } from '../../src/components/field-column';
import { FieldRow } from '../../src/components/field-row';
import { Keypad } from '../../src/components/keypad';
import { QuantityField } from '../../src/components/quantity-field';
import { SlideConfirm } from '../../src/components/slide-confirm';
import { ThumbDome } from '../../src/components/thumb-dome';
import { ThumbZone } from '../../src/components/thumb-zone';
import { Frame } from './frame';

const asked = new URLSearchParams(window.location.search);

export function KeypadPage() {
  const [unit, setUnit] = useState('bar_g');
  const [open, setOpen] = useState(asked.has('dialog'));
  const nothing = (): void => undefined;
  return (
    <Frame
      place="lookups"
      fields={
        <FieldColumn label="Inputs">
          <FieldRow label="Gap" source="rig, rev 7" value="3.0" unit="mm" onPress={nothing} />
          <QuantityField
            label="Pressure"
            source="measured"
            stepWords="by 0.05"
            value="1.00"
            unit="bar(g)"
            refusal="Above the vessel's 2.0 bar(g)."
            onStep={nothing}
            onOpen={nothing}
            lessLabel="Less"
            moreLabel="More"
          />
          <FieldRow
            label="Ambient"
            value={null}
            unit="bar(abs)"
            refusal="Enter the room's pressure."
            onPress={nothing}
          />
        </FieldColumn>
      }
      thumbs={
        <ThumbZone
          label="Actions"
          main={
            <ThumbDome
              size="big"
              label={'Hold\nto keep'}
              disabled
              reason="Enter the pressure first."
              onComplete={nothing}
            />
          }
        />
      }
    >
      <Keypad
        label="Pressure"
        initial="1.00"
        units={[
          { key: 'bar_g', label: 'bar(g)' },
          { key: 'bar_abs', label: 'bar(abs)' },
        ]}
        unit={unit}
        onUnit={setUnit}
        allowMinus
        words={{
          erase: 'Erase',
          clear: 'Clear',
          enter: 'Enter',
          cancel: 'Leave as it was',
          minus: 'minus',
          point: 'point',
          unit: 'Unit',
        }}
        onEnter={nothing}
        onCancel={nothing}
      />
      <div className="px-5 py-3">
        <SlideConfirm
          label="Slide to retire the part"
          to="Retire"
          cancelLabel="Keep it"
          onComplete={nothing}
          onCancel={nothing}
        />
      </div>
      {open ? (
        <Dialog
          title="A new version is ready"
          closeLabel="Later"
          onClose={() => setOpen(false)}
          actions={<ThumbDome label="Load it now" onComplete={nothing} />}
        >
          <p>No firing and no check is open. Loading takes a second; drafts are kept.</p>
        </Dialog>
      ) : null}
    </Frame>
  );
}
