const SPEAKS_FOR_MS = 4000;

export interface NoiseStore {
  readonly words: () => string | null;
  readonly subscribe: (listener: () => void) => () => void;
  readonly heard: (count: number) => void;
  /** Takes what was counted since the last time. */
  readonly take: () => number;
  readonly giveBack: (count: number) => void;
}

/** Counts ignored touches and says so for some seconds. */
export function createNoiseStore(): NoiseStore {
  const listeners = new Set<() => void>();
  let words: string | null = null;
  let counted = 0;
  let timer: ReturnType<typeof setTimeout> | undefined;
  const say = (next: string | null) => {
    words = next;
    for (const listener of listeners) listener();
  };
  return {
    words: () => words,
    subscribe: (listener) => {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    heard: (count) => {
      counted += count;
      say('touches ignored: electrical noise');
      clearTimeout(timer);
      timer = setTimeout(() => say(null), SPEAKS_FOR_MS);
    },
    take: () => {
      const taken = counted;
      counted = 0;
      return taken;
    },
    giveBack: (count) => {
      counted += count;
    },
  };
}
