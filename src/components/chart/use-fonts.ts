import { useLayoutEffect, useState, type RefObject } from 'react';
import type { SliceFonts } from './chart-layout';

const UNKNOWN: SliceFonts = { body: 0, lead: 0, high: 0, low: 0, read: 0 };

/**
 * Sizes of the type in px, as the style sheet has them now. The probes are the element's children, in the order of the fields, each
 * one em wide, so that they tell of a new ruler or text size by changing their own size.
 */
export function useFonts(probes: RefObject<HTMLElement | null>): SliceFonts {
  const [fonts, setFonts] = useState(UNKNOWN);
  useLayoutEffect(() => {
    const all = [...(probes.current?.children ?? [])];
    const measure = (): void => {
      const sizes = all.map((probe) => Number.parseFloat(getComputedStyle(probe).fontSize) || 0);
      const [body = 0, lead = 0, high = 0, low = 0, read = 0] = sizes;
      setFonts({ body, lead, high, low, read });
    };
    measure();
    const observer = new ResizeObserver(measure);
    for (const probe of all) observer.observe(probe);
    return () => observer.disconnect();
  }, [probes]);
  return fonts;
}
