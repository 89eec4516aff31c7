import { describe, expect, it } from 'vitest';
import { PureBook } from '../../../tests/support/pure-book';
import { KINDS, versionOf } from './kinds';
import { checkBody, readBody, readEntry } from './read-body';

const book = new PureBook();

describe('reading a body', () => {
  it('gives fields and meta of a kind that it knows, without salt and unknown fields', () => {
    const entry = book.sealRaw({
      kind: 'rig.declared',
      subject: null,
      body: { state: 'shorted', colour: 'blue' },
    });
    const outcome = readEntry(entry);
    expect(outcome).toMatchObject({
      type: 'readable',
      entry: { kind: 'rig.declared', body: { state: 'shorted' } },
    });
    if (outcome.type !== 'readable') return;
    expect(outcome.entry.body).toEqual({ state: 'shorted' });
    expect(Object.keys(outcome.entry.meta)).not.toContain('body');
    expect(outcome.entry.meta.id).toBe(entry.id);
  });

  it('keeps what a newer app wrote: another kind, a higher version', () => {
    expect(readEntry(book.sealRaw({ kind: 'laser.dreamt', subject: null, body: {} }))).toEqual({
      type: 'newer',
      words: 'This version does not know entries of the kind laser.dreamt.',
    });
    const next = versionOf('rig.declared') + 1;
    const newer = book.sealRaw({ kind: 'rig.declared', subject: null, body: {}, options: { version: next } });
    expect(readEntry(newer).type).toBe('newer');
    // A name that every object has is no kind.
    expect(readEntry(book.sealRaw({ kind: 'has.own', subject: null, body: {} })).type).toBe('newer');
    expect(readEntry({ ...newer, kind: 'constructor' }).type).toBe('newer');
  });

  it('says which field does not fit', () => {
    expect(readBody('rig.declared', 'not json')).toEqual({
      type: 'unreadable',
      words: 'The body is not JSON.',
    });
    expect(checkBody('rig.declared', { state: 'safe' })).toMatchObject({
      type: 'unreadable',
      words: expect.stringContaining('state') as string,
    });
    expect(checkBody('rig.declared', null)).toMatchObject({
      words: expect.stringContaining('the body') as string,
    });
    for (const kind of KINDS) expect([kind, checkBody(kind, 7).type]).toEqual([kind, 'unreadable']);
  });

  it('refuses readings that no gauge shows', () => {
    const base = {
      how: 'set',
      pressure_bar_g: 0,
      gas: 'N2',
      flow_L_min: null,
      rate_Hz: null,
      shots: 1,
      looked: 'even',
      output_uJ: null,
      ambient_bar_abs: 0.966,
      temperature_C: 21,
      humidity_pct: null,
      note: '',
      carried_over: [],
    };
    expect(checkBody('firing.reading', { ...base, voltage_kV: 18 }).type).toBe('ok');
    for (const wrong of [
      { voltage_kV: -1 },
      { voltage_kV: 1e9 },
      { voltage_kV: '18' },
      { voltage_kV: NaN },
      { voltage_kV: 18, pressure_bar_g: -1.2 },
      { voltage_kV: 18, shots: 1.5 },
      { voltage_kV: 18, gas: 'steam' },
    ]) {
      expect([wrong, checkBody('firing.reading', { ...base, ...wrong }).type]).toEqual([wrong, 'unreadable']);
    }
  });
});
