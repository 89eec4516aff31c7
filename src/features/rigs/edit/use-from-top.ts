import { useEffect, useRef, type RefObject } from 'react';

/** What is new on screen begins at its top: the scroll of what stood there before says nothing about it. */
export function useFromTop(what: string): RefObject<HTMLDivElement | null> {
  const top = useRef<HTMLDivElement>(null);
  const shown = useRef<string | null>(null);
  useEffect(() => {
    // The first thing shown stays where a kill had left it.
    if (shown.current !== null && shown.current !== what) top.current?.scrollIntoView({ block: 'start' });
    shown.current = what;
  }, [what]);
  return top;
}
