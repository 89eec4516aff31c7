import { Choice } from '../../components/choice';
import { FigureFields, FigureKeypad } from '../../components/figure-fields';
import { Screen } from '../../components/frame';
import { ThumbDome } from '../../components/thumb-dome';
import { ThumbZone } from '../../components/thumb-zone';
import { WordsField } from '../../components/words-field';
import type { KitType } from '../../domain/book/bodies/kit-bodies';
import { KIT_TYPE_WORDS } from '../../domain/report/kit-words';
import { DUE_HOW } from './due-entry';
import { GASES } from './kit-form';
import { KIT_KEYPAD_WORDS } from './keypad-words';
import { useKitAdd, type KitAdd } from './use-kit-add';
import './kit.css';

const TYPES = (Object.keys(KIT_TYPE_WORDS) as readonly KitType[]).map((value) => ({
  value,
  label: KIT_TYPE_WORDS[value].one,
}));

/** A new piece of the register. */
export function KitAddRoute() {
  const add = useKitAdd();
  const { hindrance, figures } = add;
  return (
    <Screen
      fields={figures.specs.length === 0 ? null : <FigureFields label="Figures" form={figures} />}
      thumbs={
        figures.typing ? null : (
          <ThumbZone
            label="Actions"
            main={
              <ThumbDome
                size="big"
                hold="half-second"
                label={'Hold\nto log'}
                holdLabel="Hold: add to the register"
                disabled={hindrance !== null}
                {...(hindrance === null ? {} : { reason: hindrance })}
                onComplete={add.log}
              />
            }
            others={[<ThumbDome key="back" label="Back to the register" onComplete={add.leave} />]}
          />
        )
      }
    >
      {figures.typing ? <FigureKeypad form={figures} words={KIT_KEYPAD_WORDS} /> : <Form add={add} />}
    </Screen>
  );
}

function Form({ add }: { readonly add: KitAdd }) {
  const { draft, change, hindrance, save } = add;
  const asksGas = draft.type === 'regulator' || draft.type === 'cylinder';
  const about = draft.type === 'meter' ? 'Measures' : draft.type === 'key' ? 'Opens' : null;
  return (
    <div className="kit kit-form">
      <h1>Add to the register</h1>
      <Choice label="Kind" options={TYPES} value={draft.type} onChange={(type) => change({ type })} />
      <div className="kit-words">
        <WordsField
          label="Number"
          hint="as marked on it"
          rows={1}
          maxLength={120}
          value={draft.number}
          onChange={(number) => change({ number })}
        />
        <WordsField
          label="Name"
          rows={1}
          maxLength={120}
          value={draft.name}
          onChange={(name) => change({ name })}
        />
        {about === null ? null : (
          <WordsField
            label={about}
            rows={1}
            maxLength={120}
            value={draft.about}
            onChange={(words) => change({ about: words })}
          />
        )}
      </div>
      {asksGas ? (
        <Choice
          label="Gas"
          options={GASES.map((gas) => ({ value: gas, label: gas }))}
          value={draft.gas}
          onChange={(gas) => change({ gas })}
        />
      ) : null}
      <div>
        <p className="muted">{draft.type === 'meter' ? 'Next calibration' : 'Next inspection'}</p>
        <Choice label="Next due" options={DUE_HOW} value={draft.due} onChange={(due) => change({ due })} />
      </div>
      <WordsField label="Note" rows={1} value={draft.note} onChange={(note) => change({ note })} />
      <p role="status" className={hindrance === null ? '' : 'muted'}>
        {hindrance ?? 'Ready to log.'}
        {save === 'not-saved' ? ' The draft could not be kept on this tablet.' : ''}
      </p>
    </div>
  );
}
