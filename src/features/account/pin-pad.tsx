import { useEffect, useRef, useState, type KeyboardEvent } from 'react';

interface Props {
  readonly label: string;
  /** Gives back what to say when it was not right, null when it was. */
  readonly onPin: (pin: string) => Promise<string | null>;
  readonly enterLabel?: string;
  /** Stands there before the first figure, such as why the last PIN was refused. */
  readonly saysFirst?: string | null;
}

const MAX_DIGITS = 12;
const FIGURES = ['1', '2', '3', '4', '5', '6', '7', '8', '9'] as const;

/** Figures are never shown, only how many there are. */
export function PinPad({ label, onPin, enterLabel = 'Open', saysFirst = null }: Props) {
  const [pin, setPin] = useState('');
  const [says, setSays] = useState(saysFirst);
  const [busy, setBusy] = useState(false);
  const root = useRef<HTMLDivElement>(null);
  useEffect(() => root.current?.focus(), []);
  const type = (figure: string) => {
    setSays(null);
    setPin((now) => (now.length < MAX_DIGITS ? now + figure : now));
  };
  const enter = async () => {
    if (busy || pin === '') return;
    setBusy(true);
    const words = await onPin(pin);
    setBusy(false);
    setPin('');
    setSays(words);
  };
  const keyboard = (event: KeyboardEvent) => {
    if (/^\d$/.test(event.key)) type(event.key);
    else if (event.key === 'Backspace') setPin((now) => now.slice(0, -1));
    else if (event.key === 'Enter' && event.target === root.current) void enter();
    else return;
    event.preventDefault();
  };
  return (
    <div className="pin-pad" role="group" aria-label={label} ref={root} tabIndex={-1} onKeyDown={keyboard}>
      <p>{label}</p>
      <output className="pin-dots" aria-label={`${pin.length} figures entered`}>
        {pin === '' ? '\u2013' : '●'.repeat(pin.length)}
      </output>
      {says === null ? null : (
        <p role="alert">
          <b>{says}</b>
        </p>
      )}
      <div className="pin-keys">
        {FIGURES.map((figure) => (
          <button key={figure} type="button" className="key" onClick={() => type(figure)}>
            {figure}
          </button>
        ))}
        <button type="button" className="key" onClick={() => setPin((now) => now.slice(0, -1))}>
          Erase
        </button>
        <button type="button" className="key" onClick={() => type('0')}>
          0
        </button>
        <button type="button" className="key enter" disabled={busy} onClick={() => void enter()}>
          {busy ? 'Wait' : enterLabel}
        </button>
      </div>
    </div>
  );
}
