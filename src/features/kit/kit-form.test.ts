import { describe, expect, it } from 'vitest';
import { bodySchema } from '../../domain/book/kinds';
import { EMPTY_KIT, kitSpecs, readKit, type KitDraft } from './kit-form';
import { NOW_MS } from './kit.fixture';

const context = { now_ms: NOW_MS, zone: 'Europe/London', taken: ['E1'] };
const read = (parts: Partial<KitDraft>) =>
  readKit({ ...EMPTY_KIT, number: 'E9', name: 'Pair', due: 'none', ...parts }, context);
const line = { density1: '6', from1: '190', to1: '375' };

describe('adding to the register', () => {
  it('writes eyewear with every line that is filled', () => {
    const ready = read({ texts: { ...line, density3: '4', from3: '520', to3: '540' } });
    expect(ready).toMatchObject({
      type: 'ready',
      body: {
        number: 'E9',
        item: {
          densities: [
            { density: 6, from_nm: 190, to_nm: 375 },
            { density: 4, from_nm: 520, to_nm: 540 },
          ],
          visible_transmission_pct: null,
        },
      },
    });
  });

  it.each<[string, Partial<KitDraft>]>([
    ['Number: as it is', { number: ' ' }],
    ['in the register already', { number: 'E1' }],
    ['Name: say', { name: '' }],
    ['Density, line 1: enter a number', { texts: {} }],
    ['Line 2: density and both', { texts: { ...line, density2: '4' } }],
    ['shorter to the longer', { texts: { ...line, from1: '400' } }],
    ['Measures: say', { type: 'meter' }],
    ['Opens: say', { type: 'key' }],
    ['whole numbers', { type: 'spare', texts: { count: '1.5' } }],
    ['Opens at: enter a number', { type: 'relief-valve' }],
    ['no such day', { texts: { ...line, due_date: '20270231' }, due: 'date' }],
  ])('refuses in words: %s', (words, parts) => {
    expect(read(parts)).toMatchObject({ type: 'refused', words: expect.stringContaining(words) });
  });

  it.each<[KitDraft['type'], Partial<KitDraft>]>([
    ['shorting-stick', {}],
    ['meter', { about: 'kV' }],
    ['relief-valve', { texts: { set: '1.5' } }],
    ['regulator', { texts: { most: '2' } }],
    ['cylinder', { texts: { water: '10', pressure: '200' } }],
    ['key', { about: 'Supply' }],
    ['spare', { texts: { count: '4' } }],
  ])('gives a body that the Book takes: %s', (type, parts) => {
    const ready = read({ type, ...parts });
    if (ready.type !== 'ready') throw new Error(ready.words);
    expect(bodySchema('kit.added').safeParse(ready.body).success).toBe(true);
    expect(new Set(kitSpecs(type, 'months').map(({ key }) => key)).size).toBe(
      kitSpecs(type, 'months').length,
    );
  });
});
