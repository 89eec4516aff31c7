import { useState } from 'react';
import type { HoldOutcome } from '../../components/hold';
import { Keypad } from '../../components/keypad';
import { QuantityField } from '../../components/quantity-field';
import { SaysBlock } from '../../components/says-block';
import { ThumbDome } from '../../components/thumb-dome';
import { TwoFaces } from '../../components/two-faces';
import type { RigSpec } from '../../domain/book/rig-spec';
import { stepLimits } from '../../domain/rules/check-progress';
import { checkNumber } from '../../domain/units/check-number';
import { CHECK_KEYPAD_WORDS } from './keypad-words';
import { StepFrame } from './step-frame';
import { StepNote } from './step-note';
import {
  figure,
  limitWords,
  outsideWords,
  readValue,
  stepSize,
  type ReadingStep as Reading,
} from './step-reading';
import type { CheckWalk } from './use-check-walk';

/** A reading with its limits. A value outside is refused as done, and may be logged only as what it is. */
export function ReadingStep({ walk, step }: { readonly walk: CheckWalk; readonly step: Reading }) {
  const { draft, change, revision } = walk;
  const [refusal, setRefusal] = useState<string | null>(null);
  const text = draft.typed[step.key] ?? '';
  const value = text === '' ? null : readValue(step, text);
  const entered = value?.ok === true ? value.value : null;
  const outside = entered === null ? null : outsideWords(step, entered, revision.spec);
  const size = stepSize(step, revision.spec);
  const put = (next: string): void => {
    setRefusal(null);
    change((now) => ({ ...now, typed: { ...now.typed, [step.key]: next } }));
  };
  const openKeypad = (keypad: boolean): void => {
    setRefusal(null);
    change((now) => ({ ...now, keypad }));
  };
  const log = (): HoldOutcome | Promise<HoldOutcome> => {
    if (entered === null) {
      const words = `${step.quantity}: enter the reading first.`;
      setRefusal(words);
      return { type: 'failed', words };
    }
    return walk.done(step, { type: 'reading', value: entered, unit: step.unit });
  };
  const said = refusal ?? outside;
  return (
    <StepFrame
      walk={walk}
      main={
        <ThumbDome
          size="big"
          label={outside === null ? 'Hold\nto log' : 'Hold to log\nas outside'}
          hold="half-second"
          holdLabel={outside === null ? `Hold: ${step.title}` : 'Hold: log it outside its limits'}
          onComplete={log}
        />
      }
      fields={
        <QuantityField
          label={step.quantity}
          source={entered === null ? 'not entered' : 'entered'}
          stepWords={`by ${size}`}
          value={entered === null ? null : figure(entered)}
          unit={step.unit}
          onStep={(direction) => {
            const next = Number(((Math.round((entered ?? 0) / size) + direction) * size).toFixed(6));
            if (
              checkNumber(next, {
                field: step.key,
                name: step.quantity,
                unit: step.unit,
                min: -1e9,
                max: 1e9,
              }).ok
            )
              put(String(next));
          }}
          onOpen={() => {
            openKeypad(true);
          }}
          lessLabel={`${step.quantity} less by ${size} ${step.unit}`}
          moreLabel={`${step.quantity} more by ${size} ${step.unit}`}
          {...(said === null ? {} : { refusal: said })}
        />
      }
      panel={
        draft.keypad ? (
          <Keypad
            key={step.key}
            label={step.quantity}
            initial={text}
            {...(text === '' ? {} : { typed: text })}
            units={[{ key: 'only', label: step.unit }]}
            unit="only"
            allowMinus
            words={CHECK_KEYPAD_WORDS}
            {...(said === null ? {} : { refusal: said })}
            onText={put}
            onEnter={(typed) => {
              const read = readValue(step, typed);
              if (read.ok) openKeypad(false);
              else setRefusal(read.refusal.words);
            }}
            onCancel={() => {
              openKeypad(false);
            }}
          />
        ) : null
      }
    >
      <LimitsLine step={step} entered={entered} spec={revision.spec} />
      <StepNote walk={walk} step={step.key} />
    </StepFrame>
  );
}

interface LimitsLineProps {
  readonly step: Reading;
  readonly entered: number | null;
  readonly spec: RigSpec;
}

/** The limits are two faces; what was read stands in the void between them, or it does not belong there. */
function LimitsLine({ step, entered, spec }: LimitsLineProps) {
  const { lowest, highest } = stepLimits(step, spec);
  if (lowest === null || highest === null)
    return <SaysBlock lead="Limits:">{limitWords(step, spec)}.</SaysBlock>;
  const inside = entered !== null && outsideWords(step, entered, spec) === null;
  return (
    <div>
      <TwoFaces
        label={`Limits: ${limitWords(step, spec)}`}
        low={figure(lowest)}
        {...(inside ? { middle: figure(entered) } : {})}
        high={figure(highest)}
        unit={step.unit}
      />
    </div>
  );
}
