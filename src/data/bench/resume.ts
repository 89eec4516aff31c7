import * as z from 'zod/mini';
import type { PagePort, SmallStore, Timers } from '../ports/ports';
import type { ResumeRecord } from '../store/book-keys';
import type { BookStore } from '../store/book-store';

const COALESCE_MS = 250;
const MIRROR_KEY = 'holdoff-resume';
const NOWHERE: ResumeRecord = { route: null, field: null, caret: null, scroll: 0 };
const resumeSchema = z.object({
  route: z.nullable(z.string()),
  field: z.nullable(z.string()),
  caret: z.nullable(z.number()),
  scroll: z.number(),
});

/** The last route, before any store is open: for the first paint only, the strict store decides. */
export function firstPaintRoute(small: SmallStore): string | null {
  return readMirror(small)?.route ?? null;
}

export interface ResumePorts {
  readonly store: BookStore;
  readonly small: SmallStore;
  readonly timers: Timers;
  readonly page: PagePort;
}

export type Resume = ReturnType<typeof openResume>;

/** Where the hands were: route, field, caret and scroll come back before the first paint (protocol 2.6). */
export function openResume({ store, small, timers, page }: ResumePorts) {
  let atStart = NOWHERE;
  let now = NOWHERE;
  let callOff: (() => void) | null = null;
  const flush = async () => {
    callOff?.();
    callOff = null;
    await store.setKey('resume', now);
  };
  const change = (next: Partial<ResumeRecord>) => {
    now = { ...now, ...next };
    small.set(MIRROR_KEY, JSON.stringify(now));
    callOff ??= timers.after(COALESCE_MS, () => void flush());
  };
  const stopListening = page.on('hidden', () => {
    if (callOff !== null) void flush();
  });
  return {
    load: async () => {
      now = (await store.key('resume')) ?? readMirror(small) ?? NOWHERE;
      atStart = now;
    },
    atStart: () => atStart,
    route: (route: string) => {
      if (route !== now.route) change({ route, field: null, caret: null, scroll: 0 });
    },
    field: (field: string, caret: number | null) => {
      change({ field, caret });
    },
    blur: () => {
      change({ field: null, caret: null });
    },
    scroll: (scroll: number) => {
      change({ scroll });
    },
    flush,
    close: () => {
      stopListening();
      callOff?.();
    },
  };
}

function readMirror(small: SmallStore): ResumeRecord | null {
  const text = small.get(MIRROR_KEY);
  if (text === null) return null;
  try {
    const parsed = resumeSchema.safeParse(JSON.parse(text));
    return parsed.success ? parsed.data : null;
  } catch {
    return null;
  }
}
