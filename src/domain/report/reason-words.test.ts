import { describe, expect, it } from 'vitest';
import type { Reason } from '../book/entry';
import { reasonWords } from './reason-words';

const reason: Reason = {
  cause: 'rule',
  code: 'stood-down',
  words: 'The rig was stood down.',
  knew: true,
};

describe('the words of a reason', () => {
  it('say whether the tablet knew', () => {
    expect(reasonWords(reason)).toBe('The rig was stood down. The tablet knew.');
    expect(reasonWords({ ...reason, knew: false })).toBe(
      'The rig was stood down. The tablet could not know.',
    );
  });

  it('leave the knowing out where it has no meaning, and are empty without a reason', () => {
    expect(reasonWords({ ...reason, knew: null })).toBe('The rig was stood down.');
    expect(reasonWords(null)).toBe('');
  });
});
