import type { Clock, Timers } from '../ports/ports';

interface Due {
  readonly at_ms: number;
  readonly run: () => void;
}

export interface VirtualTime {
  /** Of a page life that began at `began_ms` of the shared time. */
  readonly clock: () => Clock;
  readonly timers: Timers;
  readonly passed_ms: () => number;
  /** Work of real threads, such as WebCrypto: time does not pass before it has come to rest. */
  readonly working: <T>(work: Promise<T>) => Promise<T>;
  /** Sets the wall clock without letting time pass. */
  readonly setWall: (wall_ms: number) => void;
  /** Lets time pass and runs what falls due, letting promises settle in between. */
  readonly pass: (ms: number) => Promise<void>;
}

const START_WALL_MS = Date.UTC(2026, 7, 20, 9, 0, 0);

export function virtualTime(start_wall_ms = START_WALL_MS): VirtualTime {
  let passed_ms = 0;
  let busy = 0;
  const rest = async () => {
    do await settle();
    while (busy > 0);
  };
  let wall_offset_ms = start_wall_ms;
  const due = new Set<Due>();
  const earliest = (until_ms: number): Due | undefined =>
    [...due].filter((one) => one.at_ms <= until_ms).sort((a, b) => a.at_ms - b.at_ms)[0];
  return {
    clock: () => {
      const began_ms = passed_ms;
      return {
        wallMs: () => Math.floor(wall_offset_ms + passed_ms),
        monotonicMs: () => passed_ms - began_ms,
        offsetMin: () => 120,
        zone: () => 'Europe/Berlin',
      };
    },
    timers: {
      after: (ms, run) => {
        const one = { at_ms: passed_ms + ms, run };
        due.add(one);
        return () => {
          due.delete(one);
        };
      },
    },
    passed_ms: () => passed_ms,
    working: async (work) => {
      busy += 1;
      try {
        return await work;
      } finally {
        busy -= 1;
      }
    },
    setWall: (wall_ms) => {
      wall_offset_ms = wall_ms - passed_ms;
    },
    pass: async (ms) => {
      const until_ms = passed_ms + ms;
      await rest();
      for (let one = earliest(until_ms); one !== undefined; one = earliest(until_ms)) {
        due.delete(one);
        passed_ms = Math.max(passed_ms, one.at_ms);
        one.run();
        await rest();
      }
      passed_ms = until_ms;
      await rest();
    },
  };
}

const TURNS = 100;

/** Lets promises, the in-memory database and WebCrypto come to rest. */
export async function settle(turns = TURNS): Promise<void> {
  for (let turn = 0; turn < turns; turn += 1) await new Promise((resolve) => setImmediate(resolve));
}
