import { describe, expect, it, vi } from 'vitest';
import { traceReader } from './answer-trace';

const CSV = 'Time (us);CH1 (V)\n0,0;1,5\n0,1;9,5\n0,2;1,5\n0,3;1,5\n';
const survey = { kind: 'survey', slices: 10 } as const;

describe('reader of traces', () => {
  it('reads a file once, looks into it again without reading it, and goes over to the next', async () => {
    const answer = traceReader();
    const file = new Blob([CSV]);
    const opened = vi.spyOn(file, 'arrayBuffer');
    const first = await answer({ key: '1', file, ask: survey });
    expect(first).toMatchObject({
      ok: true,
      value: { survey: { points: 4, layout: { separator: ';', decimal: ',' } } },
    });
    const look = { kind: 'window', from_s: 0.05e-6, to_s: 0.15e-6, slices: 1 } as const;
    const window = await answer({ key: '1', file, ask: look });
    expect(window).toMatchObject({ ok: true, value: { envelopes: [{ high: Float64Array.of(9.5) }] } });
    expect(opened).toHaveBeenCalledTimes(1);
    const other = await answer({ key: '2', file: new Blob(['']), ask: survey });
    expect(other).toMatchObject({ ok: false, refusal: { type: 'empty' } });
  });

  it('says so when the file cannot be read any more, and reads it when it can again', async () => {
    const answer = traceReader();
    const file = new Blob([CSV]);
    vi.spyOn(file, 'arrayBuffer').mockRejectedValueOnce(new Error('moved'));
    expect(await answer({ key: '1', file, ask: survey })).toMatchObject({
      ok: false,
      refusal: { type: 'file-gone' },
    });
    expect(await answer({ key: '1', file, ask: survey })).toMatchObject({ ok: true });
  });
});
