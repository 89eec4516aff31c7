import { useLayoutEffect, useState, type RefObject } from 'react';
import type { Size } from '../use-size';
import type { SliceFonts } from './chart-layout';

const UNKNOWN: SliceFonts = { body: 0, lead: 0, high: 0, low: 0, read: 0 };

/** Sizes of the type in px, as the style sheet has them now. The probes are the element's children, in the order of the fields. */
export function useFonts(probes: RefObject<HTMLElement | null>, size: Size): SliceFonts {
  const [fonts, setFonts] = useState(UNKNOWN);
  useLayoutEffect(() => {
    const sizes = [...(probes.current?.children ?? [])].map((probe) => Number.parseFloat(getComputedStyle(probe).fontSize) || 0);
    const [body = 0, lead = 0, high = 0, low = 0, read = 0] = sizes;
    setFonts((was) =>
      was.body === body && was.lead === lead && was.high === high && was.low === low && was.read === read
        ? was
        : { body, lead, high, low, read },
    );
    // The box changes with the window, the ruler and the text size: whatever moves the type moves it too.
  }, [probes, size]);
  return fonts;
}
