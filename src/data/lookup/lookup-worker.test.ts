import { afterEach, describe, expect, it, vi } from 'vitest';
import { LOOKUPS } from '../../domain/lookup/lookups';
import { kettleLikeSpec, labSettings } from '../../domain/lookup/rig.fixture';
import type { Reply } from '../worker/latest-runner';
import { answerLookup } from './answer-lookup';
import type { LookupReply, LookupRequest } from './lookup-protocol';

/** Loads the worker's module into a scope of its own and gives what it does with a message, through a copy both ways. */
async function loadedWorker(): Promise<(request: LookupRequest) => Reply<LookupReply> | undefined> {
  const scope = new EventTarget();
  const replies: Reply<LookupReply>[] = [];
  vi.stubGlobal('addEventListener', scope.addEventListener.bind(scope));
  vi.stubGlobal('postMessage', (reply: Reply<LookupReply>) => replies.push(structuredClone(reply)));
  vi.resetModules();
  await import('./lookup-worker');
  return (request) => {
    scope.dispatchEvent(new MessageEvent('message', { data: structuredClone(request) }));
    return replies.at(-1);
  };
}

afterEach(() => {
  vi.unstubAllGlobals();
});

describe('lookup worker', () => {
  it('says of every lookup what the page would say', async () => {
    const ask = await loadedWorker();
    for (const [no, lookup] of LOOKUPS.entries()) {
      const { values } = lookup.start({ spec: kettleLikeSpec, settings: labSettings });
      const here = answerLookup(lookup, { kind: 'answer', values });
      const there = ask({ no, lookup: lookup.key, ask: { kind: 'answer', values } });
      expect(there?.no).toBe(no);
      expect(there?.result).toEqual(here);
    }
  });

  it('finds and sweeps', async () => {
    const ask = await loadedWorker();
    const [gap] = LOOKUPS;
    const values = gap?.start({ spec: kettleLikeSpec, settings: labSettings }).values ?? {};
    const found = ask({ no: 1, lookup: 'gap', ask: { kind: 'find', values, solvable: 0, target: 17 } });
    expect(found?.result).toMatchObject({ ok: true, value: { kind: 'answer', found: { value: 1.04 } } });
    const sweep = { kind: 'sweep', values, field: 'pressure', figures: ['low'], xs: [1, 2] } as const;
    const swept = ask({ no: 2, lookup: 'gap', ask: sweep });
    expect(swept?.result).toMatchObject({ ok: true, value: { kind: 'sweep', rows: [{ x: 1 }, { x: 2 }] } });
  });

  it('answers in words for what it does not know', async () => {
    const ask = await loadedWorker();
    expect(ask({ no: 1, lookup: 'nothing', ask: { kind: 'answer', values: {} } })?.result).toMatchObject({
      ok: false,
      refusal: { type: 'no-such-lookup' },
    });
    const missing = { kind: 'find', values: {}, solvable: 99, target: 1 } as const;
    expect(ask({ no: 2, lookup: 'gap', ask: missing })?.result).toMatchObject({ ok: false });
  });
});
