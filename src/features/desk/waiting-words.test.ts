import { describe, expect, it } from 'vitest';
import type { WaitingItem } from '../../domain/report/desk-shapes';
import { inOrder, waitingPair } from './waiting-words';

const MINUTE_MS = 60_000;

const item = (change: Partial<WaitingItem>): WaitingItem => ({
  type: 'firing',
  id: 'f-1',
  rig: 'kettle',
  rig_name: 'Kettle',
  number: 'A-119',
  words: '',
  count: 31,
  irregular: 0,
  kind: null,
  by: 'ada',
  received_ms: 0,
  revision: 812,
  ...change,
});

const pair = (change: Partial<WaitingItem>) =>
  waitingPair(item(change), { ada: 'Ada Brook' }, 75 * MINUTE_MS);

describe('what waits at the Desk', () => {
  it('says what it is, its substance, by whom and how old', () => {
    expect(pair({})).toEqual({
      key: 'firing/f-1',
      title: 'Firing to review',
      substance: 'Kettle A-119, 31 readings',
      by: 'Ada Brook',
      age: '1 h',
      href: '/desk/firings/f-1',
    });
  });

  it('names what is wrong in the gap', () => {
    expect(pair({ type: 'irregular', irregular: 3 }).substance).toBe('Kettle A-119, 3 of 31 readings');
    expect(pair({ type: 'unready', words: 'no permit' }).substance).toBe('Kettle A-119: no permit');
    expect(pair({ type: 'held-back', kind: 'permit.granted', words: 'superseded' }).substance).toBe(
      'Permit granted: superseded',
    );
    expect(pair({ type: 'parting', count: 2 })).toMatchObject({
      substance: 'Kettle, 2 revisions stand, the stricter limits rule',
      href: '/desk/rigs/kettle',
    });
  });

  it('leads from an irregular entry of no firing to its rig', () => {
    expect(pair({ type: 'irregular', kind: 'rig.revised', number: null, words: 'role' })).toMatchObject({
      title: 'Irregular entry',
      substance: 'Kettle, Rig revised: role',
      href: '/desk/rigs/kettle',
    });
  });

  it('leaves an author open who was left open', () => {
    expect(pair({ type: 'incident', by: null, words: 'stayed charged' }).by).toBe('author open');
  });

  it('keeps the gap to its size', () => {
    expect(pair({ type: 'incident', words: 'x'.repeat(500) }).substance).toHaveLength(90);
  });

  it('puts unready and irregular firings first, then the oldest', () => {
    const waiting = [
      item({ id: 'a', received_ms: 2 }),
      item({ id: 'b', type: 'incident' }),
      item({ id: 'c', type: 'irregular', received_ms: 9 }),
      item({ id: 'd', received_ms: 1 }),
      item({ id: 'e', type: 'unready', received_ms: 5 }),
    ];
    expect(inOrder(waiting).map(({ id }) => id)).toEqual(['e', 'c', 'd', 'a', 'b']);
  });
});
