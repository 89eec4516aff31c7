import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import {
  bodyText,
  chainHash,
  entrySha,
  isIntact,
  reasonText,
  sealedEntrySchema,
  sealEntry,
  stubSchema,
  type Reason,
  type UnsealedEntry,
} from './entry';
import { GENESIS_HASH } from './ids';

const lab = '11111111-1111-4111-8111-111111111111';
const id = '22222222-2222-4222-8222-222222222222';
const device = '33333333-3333-4333-8333-333333333333';
const person = '44444444-4444-4444-8444-444444444444';
const epoch = '55555555-5555-4555-8555-555555555555';
const life = '66666666-6666-4666-8666-666666666666';

const draft: UnsealedEntry = {
  lab,
  id,
  device,
  seq: 7,
  kind: 'rig.declared',
  version: 1,
  subject: id,
  author: person,
  witness: null,
  base: { epoch, revision: 0, hash: GENESIS_HASH },
  stamp: {
    wall_ms: 1_772_438_400_000,
    offset_min: 60,
    zone: 'Europe/Vienna',
    page_life: life,
    monotonic_ms: 1234.5,
    time_uncertain: false,
  },
};
const body = '{"state":"shorted","salt":"000102030405060708090a0b0c0d0e0f"}';

function sha256(text: string): string {
  return createHash('sha256').update(text, 'utf8').digest('hex');
}

/** Written out by hand from the words of protocol 3.3: every field as length, colon, text; null as `-:`. */
const BODY_SHA = sha256(body);
const BY_HAND =
  `36:${lab}36:${id}36:${device}1:7` +
  `12:rig.declared1:136:${id}36:${person}-:` +
  `36:${epoch}1:064:${GENESIS_HASH}` +
  `13:17724384000002:6013:Europe/Vienna36:${life}6:1234.55:false` +
  `64:${BODY_SHA}`;

describe('sealing an entry', () => {
  it('hashes the exact text, and the fields as they are written by hand', () => {
    const sealed = sealEntry(draft, body);
    expect(sealed.body).toBe(body);
    expect(sealed.body_sha).toBe(BODY_SHA);
    expect(sealed.entry_sha).toBe(sha256(BY_HAND));
  });

  it('keeps to figures that another program worked out (Python’s hashlib), and must never change', () => {
    const sealed = sealEntry(draft, body);
    expect(sealed.body_sha).toBe('6a50e9d0782aac8726ca95ba5835a92341fac9a37834aa9811c83da157dcc6c2');
    expect(sealed.entry_sha).toBe('e37f2c5afd4318214a361d5168a6e29d44d1ee3ab64fdf370f37d08dc7ca48f9');
    expect(
      chainHash(GENESIS_HASH, { revision: 1, entry_sha: sealed.entry_sha, verdict: 'applied', reason: null }),
    ).toBe('b8275eb97151eb7291252b4881af4d48c8c839023069f10c2f5ba91ebbd3063a');
  });

  it('puts the salt last in the body', () => {
    expect(bodyText({ state: 'shorted' }, '000102030405060708090a0b0c0d0e0f')).toBe(body);
  });

  it('gives another hash when any field changes', () => {
    const sealed = sealEntry(draft, body);
    const { stamp, base } = draft;
    const changed: Partial<UnsealedEntry>[] = [
      { lab: id },
      { id: lab },
      { device: lab },
      { seq: 8 },
      { kind: 'rig.created' },
      { version: 2 },
      { subject: lab },
      { author: null },
      { witness: person },
      { base: { ...base, epoch: lab } },
      { base: { ...base, revision: 1 } },
      { base: { ...base, hash: 'a'.repeat(64) } },
      { stamp: { ...stamp, wall_ms: stamp.wall_ms + 1 } },
      { stamp: { ...stamp, offset_min: 0 } },
      { stamp: { ...stamp, zone: 'Etc/UTC' } },
      { stamp: { ...stamp, page_life: lab } },
      { stamp: { ...stamp, monotonic_ms: 1234.6 } },
      { stamp: { ...stamp, time_uncertain: true } },
    ];
    const hashes = changed.map((one) => entrySha({ ...draft, ...one, body_sha: sealed.body_sha }));
    expect(new Set([sealed.entry_sha, ...hashes]).size).toBe(changed.length + 1);
  });

  it('notices a changed text, a changed field and a changed hash', () => {
    const sealed = sealEntry(draft, body);
    expect(isIntact(sealed)).toBe(true);
    expect(isIntact({ ...sealed, body: body.replace('shorted', 'short-off') })).toBe(false);
    expect(isIntact({ ...sealed, seq: 8 })).toBe(false);
    expect(isIntact({ ...sealed, entry_sha: 'a'.repeat(64) })).toBe(false);
    expect(isIntact(JSON.parse(JSON.stringify(sealed)) as typeof sealed)).toBe(true);
  });
});

describe('the chain', () => {
  const reason: Reason = { cause: 'rule', code: 'role', words: 'Nicht “erlaubt”', knew: null };
  const link = { revision: 2, entry_sha: 'e'.repeat(64), verdict: 'held-back', reason } as const;

  it('covers previous hash, revision, entry, verdict and reason, as written by hand', () => {
    const text = '{"cause":"rule","code":"role","words":"Nicht “erlaubt”","knew":null}';
    expect(reasonText(reason)).toBe(text);
    const byHand = `64:${'a'.repeat(64)}1:264:${'e'.repeat(64)}9:held-back${Buffer.byteLength(text)}:${text}`;
    expect(chainHash('a'.repeat(64), link)).toBe(sha256(byHand));
  });

  it('writes a reason in one form, whatever order its fields stand in', () => {
    const follows = { follows: id, knew: true, words: 'w', code: 'follows', cause: 'follows' } as const;
    expect(reasonText(follows)).toBe(
      `{"cause":"follows","code":"follows","words":"w","knew":true,"follows":"${id}"}`,
    );
    expect(reasonText(null)).toBeNull();
  });

  it('changes with every part', () => {
    const hashes = [
      chainHash('a'.repeat(64), link),
      chainHash('b'.repeat(64), link),
      chainHash('a'.repeat(64), { ...link, revision: 3 }),
      chainHash('a'.repeat(64), { ...link, verdict: 'irregular' }),
      chainHash('a'.repeat(64), { ...link, reason: { ...reason, knew: true } }),
      chainHash('a'.repeat(64), { ...link, reason: null }),
    ];
    expect(new Set(hashes).size).toBe(hashes.length);
  });
});

describe('the shape of an entry', () => {
  const sealed = sealEntry(draft, body);

  it('takes what was sealed', () => {
    expect(sealedEntrySchema.parse(sealed)).toEqual(sealed);
    expect(
      stubSchema.safeParse({ stub: true, lab, id, device, seq: 1, entry_sha: 'e'.repeat(64), why: '' })
        .success,
    ).toBe(true);
  });

  it.each([
    ['an id that is no UUID', { id: 'seven' }],
    ['an id in capitals', { id: '2222222A-2222-4222-8222-222222222222' }],
    ['an id of another version', { id: '22222222-2222-1222-8222-222222222222' }],
    ['seq 0', { seq: 0 }],
    ['a broken seq', { seq: 1.5 }],
    ['a kind with a space', { kind: 'rig declared' }],
    ['a kind of one word', { kind: 'rig' }],
    ['version 0', { version: 0 }],
    ['a short hash', { entry_sha: 'ab' }],
    ['a text beyond the limit', { body: 'x'.repeat(64_001) }],
    ['no author at all', { author: undefined }],
  ])('refuses %s', (_what, change) => {
    expect(sealedEntrySchema.safeParse({ ...sealed, ...change }).success).toBe(false);
  });
});
