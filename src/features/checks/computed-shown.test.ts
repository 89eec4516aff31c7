import { describe, expect, it } from 'vitest';
import { RIG, SETTINGS } from './check.fixture';
import { computedShown, shownText, type ComputedFacts, type ComputedStep } from './computed-shown';

const facts: ComputedFacts = {
  rig: RIG,
  revision: RIG.revisions[0]!,
  settings: SETTINGS,
  now_ms: Date.UTC(2026, 11, 1),
};
const step = (shows: ComputedStep['shows']): ComputedStep => ({
  key: 'computed',
  type: 'computed',
  title: '',
  detail: '',
  shows,
  waive: 'never',
});
const text = (shows: ComputedStep['shows'], given = facts): string => {
  const shown = computedShown(step(shows), given);
  return shown.ok ? shownText(shown.value) : shown.refusal.words;
};

describe('computed steps', () => {
  it('never shows an energy without the supply beside it, rounded up', () => {
    // The dump capacitor's 5 nF at 25 kV store 1.5625 J; worked by hand.
    expect(text('stored-energy')).toMatch(/^1\.57\u2009J at the supply’s 25\u2009kV and 1\.5\u2009mA/);
  });

  it('gives self-break with both sides at both ends of the allowed pressures', () => {
    const shown = text('self-break');
    expect(shown).toMatch(
      /At 0\.8\u2009bar\(g\): nothing fires below 1\d\.\d\u2009kV, may hold up to 2\d\.\d\u2009kV/,
    );
    expect(shown).toContain('At 1.2\u2009bar(g)');
    expect(shown).toContain('Ambient 0.966\u2009bar(abs)');
  });

  it('shows the permit with its end and its limits', () => {
    expect(text('permit')).toBe(
      'Revision 7A, permit until 18 Dec. · At most 22\u2009kV, 1.2\u2009bar(g), 3\u2009Hz.',
    );
  });

  it('has nothing to confirm once the permit has lapsed', () => {
    const later = { ...facts, now_ms: Date.UTC(2026, 11, 19) };
    expect(computedShown(step('permit'), later).ok).toBe(false);
    expect(text('permit', later)).toBe('No firing permit covers revision 7A now: a reviewer can grant one.');
  });

  it('makes up no ambient', () => {
    expect(text('self-break', { ...facts, settings: undefined })).toMatch(/not on this tablet yet/);
  });
});
