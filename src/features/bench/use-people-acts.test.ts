import { describe, expect, it } from 'vitest';
import { guestBody, type GuestDraft } from './use-people-acts';

const reed: GuestDraft = {
  who: 'outside',
  person: null,
  name: ' J. Reed ',
  knows_isolator: 'yes',
  eyewear: null,
  words: '',
};

describe('checking a guest in', () => {
  it('says what is missing, one thing at a time', () => {
    expect(guestBody({ ...reed, who: null })).toBe('Say who it is.');
    expect(guestBody({ ...reed, name: ' ' })).toBe('Write the name down.');
    expect(guestBody({ ...reed, who: 'member' })).toBe('Choose who of the lab it is.');
    expect(guestBody({ ...reed, knows_isolator: null })).toBe('Say whether the isolator was shown.');
  });

  it('writes a name for somebody from outside and an id for somebody of the lab', () => {
    expect(guestBody(reed)).toEqual({
      person: null,
      name: 'J. Reed',
      knows_isolator: true,
      eyewear: null,
      words: '',
    });
    expect(guestBody({ ...reed, who: 'member', person: 'p', knows_isolator: 'no' })).toMatchObject({
      person: 'p',
      name: '',
      knows_isolator: false,
    });
  });
});
