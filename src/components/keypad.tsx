import { useEffect, useRef, useState, type KeyboardEvent, type PointerEvent } from 'react';
import { Choice } from './choice';
import { ElectrodeBody } from './electrode-body';
import { keyOfKeyboard, shownText, typeKey, typeSecretKey, type KeypadKey } from './keypad-text';
import { Reading } from './reading';

export interface KeypadUnit {
  readonly key: string;
  readonly label: string;
}

export interface KeypadWords {
  readonly erase: string;
  readonly clear: string;
  readonly enter: string;
  readonly cancel: string;
  readonly minus: string;
  readonly point: string;
  /** Names the choice of units. */
  readonly unit: string;
}

export interface KeypadProps {
  readonly label: string;
  /** What stands in the field now; the first figure typed replaces it. */
  readonly initial: string;
  readonly units: readonly KeypadUnit[];
  readonly unit: string;
  readonly words: KeypadWords;
  readonly decimal?: '.' | ',';
  readonly allowMinus?: boolean;
  /** A PIN: digits alone, zeros in front kept, shown as dots. */
  readonly secret?: boolean;
  /** What had been typed before the page went away; typing goes on behind it. */
  readonly typed?: string;
  readonly refusal?: string;
  readonly onUnit?: (unit: string) => void;
  /** Told at every key, so that a draft can be kept. */
  readonly onText?: (text: string) => void;
  readonly onEnter: (text: string, unit: string) => void;
  readonly onCancel: () => void;
}

const FIGURES: readonly KeypadKey[] = ['7', '8', '9', '4', '5', '6', '1', '2', '3'];

/** The app's own number keys: never the system's, which would cover the figure and knows no unit. */
export function Keypad(props: KeypadProps) {
  const {
    label,
    initial,
    units,
    unit,
    words,
    decimal = '.',
    allowMinus = false,
    secret = false,
    refusal,
  } = props;
  const [typed, setTyped] = useState<string | null>(props.typed ?? null);
  const root = useRef<HTMLDivElement>(null);
  const text = typed ?? initial;
  const unitLabel = units.find((each) => each.key === unit)?.label ?? '';

  useEffect(() => {
    const before = document.activeElement;
    root.current?.focus();
    return () => {
      if (before instanceof HTMLElement && before.isConnected) before.focus();
    };
  }, []);

  const press = (key: KeypadKey): void => {
    if (key === '-' && !allowMinus) return;
    const edits = key === 'erase';
    const next = (secret ? typeSecretKey : typeKey)(typed ?? (edits ? initial : ''), key);
    setTyped(next);
    props.onText?.(next);
  };
  const enter = (): void => props.onEnter(text, unit);
  const keyboard = (event: KeyboardEvent): void => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const key = keyOfKeyboard(event.key);
    if (key !== null) press(key);
    else if (event.key === 'Escape') props.onCancel();
    else if (event.key === 'Enter' && event.target === root.current) enter();
    else return;
    event.preventDefault();
  };
  // Focus stays on the pad, so that a hardware Enter never repeats the key that was touched last.
  const keepFocus = (event: PointerEvent): void => {
    if (event.target instanceof Element && event.target.closest('.key') !== null) event.preventDefault();
  };
  const key = (what: KeypadKey, shown: string, name?: string) => (
    <button key={what} type="button" className="key" aria-label={name} onClick={() => press(what)}>
      {shown}
    </button>
  );

  return (
    <div
      ref={root}
      className="keypad"
      role="group"
      aria-label={label}
      tabIndex={-1}
      onKeyDown={keyboard}
      onMouseDown={(event) => {
        if (event.target instanceof Element && event.target.closest('.key') !== null) event.preventDefault();
      }}
      onPointerDown={keepFocus}
    >
      <div className="keypad-head">
        <span className="muted">{label}</span>
        <output className={`keypad-shown${typed === null ? ' carried' : ''}`} aria-live="polite">
          <Reading
            value={text === '' ? '\u2013' : secret ? <Dots count={text.length} /> : shownText(text, decimal)}
            unit={unitLabel}
            size="pin"
            carried={typed === null}
          />
        </output>
      </div>
      {refusal ? (
        <p className="field-refusal" role="alert">
          {refusal}
        </p>
      ) : null}
      {units.length > 1 ? (
        <Choice
          label={words.unit}
          options={units.map((each) => ({ value: each.key, label: each.label }))}
          value={unit}
          onChange={(next) => props.onUnit?.(next)}
        />
      ) : null}
      <div className="keys">
        <div className="keys-figures">
          {FIGURES.map((figure) => key(figure, figure))}
          {key('0', '0')}
          {secret ? <span /> : key('.', decimal, words.point)}
          {allowMinus ? key('-', '\u2212', words.minus) : <span />}
        </div>
        <div className="keys-acts">
          {key('erase', words.erase)}
          {key('clear', words.clear)}
          <button type="button" className="key" onClick={props.onCancel}>
            {words.cancel}
          </button>
          <button type="button" className="key enter" onClick={enter}>
            <ElectrodeBody facing="up" tone="raised" rim="brass" edge={0.06} sagitta={0.03} />
            <span>
              {words.enter} <b className="nowrap">{unitLabel}</b>
            </span>
          </button>
        </div>
      </div>
    </div>
  );
}

function Dots({ count }: { readonly count: number }) {
  return (
    <>
      <span aria-hidden="true">{'\u2022'.repeat(count)}</span>
      <span className="heard-only">{String(count)}</span>
    </>
  );
}
