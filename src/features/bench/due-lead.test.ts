import { describe, expect, it } from 'vitest';
import type { DueItem } from '../../domain/rules/due';
import { besides, leadPath, leftWords } from './due-lead';

const item = (key: string): DueItem => ({
  key,
  title: key,
  why: '',
  left_ms: null,
  danger: 'leave',
  lead: { type: 'permit' },
});

describe('how what is due is shown', () => {
  it('rounds the time left down', () => {
    expect(leftWords({ left_ms: null })).toBe('now');
    expect(leftWords({ left_ms: 59_999 })).toBe('now');
    expect(leftWords({ left_ms: 39.9 * 60_000 })).toBe('in 39 min');
    expect(leftWords({ left_ms: 13.9 * 24 * 3_600_000 })).toBe('in 13 d');
  });

  it('leads to where it is mended', () => {
    expect(leadPath({ type: 'people' }, 'r1')).toBe('/bench/r1/people');
    expect(leadPath({ type: 'check', purpose: 'make-safe' }, 'r1')).toBe('/checks/of/r1');
    expect(leadPath({ type: 'permit' }, 'r1')).toBe('/desk/rigs/r1');
  });

  it('does not say twice what the main dome says', () => {
    const items = [item('state'), item('permit')];
    expect(besides(items, { type: 'open-check', purpose: 'make-safe' })).toEqual([item('permit')]);
    expect(besides(items, { type: 'open-firing' })).toEqual(items);
  });
});
