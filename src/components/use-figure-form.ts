import { useState } from 'react';
import { readFigure, stepFigure, type FigureSpec, type FigureTexts } from './figure-form';

interface FigureFormInput {
  readonly specs: readonly FigureSpec[];
  readonly texts: FigureTexts;
  /** Keeps the texts, at every key. */
  readonly setTexts: (change: (texts: FigureTexts) => FigureTexts) => void;
  /** The field that was chosen before the page went away. */
  readonly resumed?: string | null;
  readonly onChoose?: (key: string) => void;
}

/** Which of some figures is chosen, and what a step or a key does to it. */
export function useFigureForm({ specs, texts, setTexts, resumed = null, onChoose }: FigureFormInput) {
  const [chosen, setChosen] = useState<string | null>(resumed);
  const [typing, setTyping] = useState(false);
  const active = specs.find((spec) => spec.key === chosen) ?? specs[0] ?? null;
  const setText = (key: string, text: string): void => setTexts((now) => ({ ...now, [key]: text }));
  const choose = (key: string): void => {
    setChosen(key);
    onChoose?.(key);
  };
  return {
    specs,
    texts,
    active,
    typing: typing && active !== null,
    choose,
    open: () => setTyping(true),
    close: () => setTyping(false),
    isTouched: (spec: FigureSpec) => texts[spec.key] !== undefined,
    textOf: (spec: FigureSpec) => texts[spec.key] ?? spec.initial,
    /** Only what somebody typed is refused aloud: an untouched field says nothing yet. */
    refusalOf: (spec: FigureSpec) => {
      if (texts[spec.key] === undefined) return undefined;
      const read = readFigure(spec, texts);
      return read.type === 'refused' ? read.words : undefined;
    },
    step: (direction: -1 | 1) => {
      if (active !== null) setText(active.key, stepFigure(active, texts, direction));
    },
    type: (text: string) => {
      if (active !== null) setText(active.key, text);
    },
    /** Leaves the keypad when the text is a number of this field; otherwise the refusal stays beside it. */
    enter: (text: string) => {
      if (active === null) return;
      setText(active.key, text);
      if (readFigure(active, { ...texts, [active.key]: text }).type !== 'refused') setTyping(false);
    },
    /** Takes back what was typed. */
    revert: () => {
      if (active !== null)
        setTexts((now) => Object.fromEntries(Object.entries(now).filter(([key]) => key !== active.key)));
      setTyping(false);
    },
  };
}

export type FigureFormHandle = ReturnType<typeof useFigureForm>;
