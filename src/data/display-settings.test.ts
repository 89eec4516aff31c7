import { describe, expect, it } from 'vitest';
import { DEFAULT_DISPLAY, keepDisplay, readDisplay } from './display-settings';

function store(initial: Record<string, string> = {}) {
  const kept = new Map(Object.entries(initial));
  return {
    getItem: (key: string) => kept.get(key) ?? null,
    setItem: (key: string, value: string) => void kept.set(key, value),
  };
}

describe('display settings', () => {
  it('come back as they were kept', () => {
    const where = store();
    const chosen = {
      hand: 'left',
      theme: 'daylight',
      eyewear: true,
      scale: 1.5,
      px_per_mm: 5.31,
      foot_key: 'F13',
      foot_does: 'burst',
    } as const;
    expect(keepDisplay(where, chosen)).toBe(true);
    expect(readDisplay(where)).toEqual(chosen);
  });

  it.each(['', 'null', '[]', '{"scale":9,"hand":3,"theme":"red","px_per_mm":-1,"foot_key":"a"}', '{broken'])(
    'read %j as the defaults',
    (text) => {
      expect(readDisplay(store({ 'holdoff.display': text }))).toEqual(DEFAULT_DISPLAY);
    },
  );

  it('say when nothing can be kept', () => {
    const full = {
      getItem: () => null,
      setItem: () => {
        throw new DOMException('full', 'QuotaExceededError');
      },
    };
    expect(keepDisplay(full, DEFAULT_DISPLAY)).toBe(false);
  });
});
