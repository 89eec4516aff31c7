import { describe, expect, it } from 'vitest';
import type { RigDoc } from '../../domain/book/documents/rig';
import { likelyRig } from './emergency-rig';

const rig = (id: string, open_firings: readonly string[] = []): RigDoc => ({
  kind: 'rig',
  id,
  parent: null,
  name: id,
  revisions: [],
  heads: [],
  declared: null,
  last_short: null,
  stand_downs: [],
  hands: [],
  guests: [],
  kit: [],
  permits: [],
  permits_asked: [],
  ready_check: null,
  open_checks: [],
  open_firings,
  last_firing: null,
  holder: null,
  gas_changed: null,
  needs_newer_app: false,
});

describe('the rig that an emergency is about', () => {
  it('is the one that is firing, whatever was in hand', () => {
    expect(likelyRig([rig('heron'), rig('kettle', ['f1'])], 'heron')?.id).toBe('kettle');
  });

  it('is the one in hand while nothing fires, else the first', () => {
    expect(likelyRig([rig('heron'), rig('kettle')], 'kettle')?.id).toBe('kettle');
    expect(likelyRig([rig('heron'), rig('kettle')], 'gone')?.id).toBe('heron');
    expect(likelyRig([], null)).toBeUndefined();
  });
});
