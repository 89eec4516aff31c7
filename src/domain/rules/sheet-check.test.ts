import { describe, expect, it } from 'vitest';
import { MILO } from '../../../tests/support/pure-book';
import { PureBench } from '../../../tests/support/pure-bench';
import { testSheet } from '../../../tests/support/test-lab';
import type { SheetSpec, Step } from '../book/sheet-spec';
import { mayWaive } from './check-progress';
import { READY_SHEETS } from './ready-sheets/ready-sheets';
import { guardOf, sheetProblems, sheetRefusal } from './sheet-check';

const confirm = (title: string, more: Partial<Step> = {}): Step =>
  ({ type: 'confirm', key: 'one', title, detail: '', waive: 'operator', ...more }) as Step;
const reading = (more: Partial<Extract<Step, { type: 'reading' }>>): Step => ({
  type: 'reading',
  key: 'reading',
  title: 'Vessel',
  detail: '',
  waive: 'operator',
  quantity: 'Gauge pressure',
  unit: 'bar(g)',
  lowest: 0,
  highest: 1,
  highest_from_rig: null,
  ...more,
});
const sheet = (steps: readonly Step[], purpose: SheetSpec['purpose'] = 'dye-handling'): SheetSpec => ({
  ...testSheet,
  purpose,
  steps: [...steps],
});
const codes = (spec: SheetSpec) => sheetProblems(spec).map((one) => one.code);

describe('the rules of a sheet', () => {
  it('lets nobody waive what shorts, what stops the beam and the second person', () => {
    expect(codes(sheet([confirm('Anything', { guards: 'shorting' })]))).toEqual(['shorting-waivable']);
    expect(codes(sheet([confirm('Anything', { guards: 'beam-stop' })]))).toEqual(['beam-stop-waivable']);
    expect(codes(sheet([{ ...confirm('All clear'), type: 'second-person' } as Step]))).toEqual([
      'second-person-waivable',
    ]);
    expect(codes(sheet([confirm('Anything', { guards: 'shorting', waive: 'never' })]))).toEqual([]);
  });

  it('knows a short and a beam stop by their titles, and a photo of the shorts from a short', () => {
    expect(guardOf(confirm('C1: resistor tip, then hard short'))).toBe('shorting');
    expect(guardOf(confirm('Shorts left on'))).toBe('shorting');
    expect(guardOf(confirm('Beam stop in, door sign out'))).toBe('beam-stop');
    expect(guardOf(confirm('Shortly before lunch'))).toBeNull();
    expect(guardOf({ ...confirm('Photo of the shorts'), type: 'photo' } as Step)).toBeNull();
    expect(mayWaive(confirm('Hard short on C2'), 'lead')).toBe(false);
    expect(mayWaive(confirm('Flow'), 'operator')).toBe(true);
  });

  it('says beside the step what is wrong with its limits', () => {
    expect(sheetProblems(sheet([confirm('Flow'), reading({ lowest: 2, highest: 1 })]))).toEqual([
      expect.objectContaining({ code: 'limits-crossed', step: 1, weight: 'refusal' }),
    ]);
    expect(codes(sheet([reading({ highest_from_rig: 'envelope.max_kV' })]))).toEqual(['rig-limit-unit']);
    expect(sheetProblems(sheet([reading({ lowest: null, highest: null })]))[0]?.weight).toBe('advice');
  });

  it('makes nothing shorted by a sheet that shorts nothing, and advises the rest', () => {
    const made = sheet([confirm('Supply off')], 'make-safe');
    expect(sheetRefusal(made)?.code).toBe('no-shorting');
    const late = sheet(
      [
        confirm('Hard short', { guards: 'shorting', waive: 'never' }),
        { ...confirm('Wait', { key: 'wait' }), type: 'wait' } as Step,
      ],
      'make-safe',
    );
    expect(sheetRefusal(late)).toBeNull();
    expect(codes(late)).toEqual(['wait-after-short', 'no-reading', 'no-second-person']);
  });

  it('reads a sheet of version 1, which knew neither rigs nor marks', () => {
    const { book, rig } = new PureBench();
    const options = { by: MILO, version: 1 };
    const old = book.write('sheet.published', null, { spec: testSheet, replaces: null }, options);
    expect([old.verdict, old.entry.version]).toEqual(['applied', 1]);
    const sheetId = old.entry.id;
    const opened = book.write('check.opened', null, { rig, rig_revision: rig, sheet: sheetId });
    expect(opened.verdict).toBe('applied');
  });

  it('is for the rigs that it names alone', () => {
    const { book, rig } = new PureBench();
    const open = (rigs: string[]) => {
      const spec = { ...testSheet, rigs };
      const { id } = book.write('sheet.published', null, { spec, replaces: null }, { by: MILO }).entry;
      return (
        book.write('check.opened', null, { rig, rig_revision: rig, sheet: id }).reason?.code ?? 'applied'
      );
    };
    expect([open([]), open([rig]), open([MILO])]).toEqual(['applied', 'applied', 'sheet-rig']);
  });

  it('is asked by the server too', () => {
    const { book } = new PureBench();
    const publish = (spec: SheetSpec, replaces: string | null = null) =>
      book.write('sheet.published', null, { spec, replaces }, { by: MILO });
    const refused = publish(sheet([confirm('Beam stop in')]));
    expect([refused.verdict, refused.reason?.code]).toEqual(['held-back', 'beam-stop-waivable']);
    const first = publish(testSheet).entry.id;
    const second = publish(testSheet, first);
    expect(second.verdict).toBe('applied');
    expect(book.doc('sheet', second.entry.id)).toMatchObject({ version: 2, replaces: first });
    expect(publish(testSheet, first).reason?.code).toBe('sheet-replaced');
  });
});

describe('the ready sheets', () => {
  it.each(READY_SHEETS)('$key keeps every rule, without a word of advice', ({ spec }) => {
    expect(sheetProblems(spec)).toEqual([]);
    expect(spec.caution.length).toBeGreaterThan(80);
    expect(JSON.stringify(spec)).not.toMatch(/\b(is|are|be|now) safe\b/i);
  });

  it('cover both circuits when making safe, each by its own nodes', () => {
    const titles = (topology: 'lc-inversion' | 'charge-transfer') =>
      READY_SHEETS.filter(({ spec }) => spec.purpose === 'make-safe' && spec.topologies.includes(topology))
        .flatMap(({ spec }) => spec.steps)
        .map((step) => step.key);
    expect(titles('lc-inversion')).toEqual(
      expect.arrayContaining(['short-c1', 'short-c2', 'short-middle', 'short-channel', 'film-edges']),
    );
    expect(titles('charge-transfer')).toEqual(expect.arrayContaining(['short-dump', 'short-peaking']));
    expect(titles('charge-transfer')).not.toContain('short-c1');
  });
});
