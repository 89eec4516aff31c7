import { IDBFactory, IDBKeyRange } from 'fake-indexeddb';
import { describe, expect, it, vi } from 'vitest';
import { seededBytes } from '../fakes/chance';
import { virtualTime } from '../fakes/virtual-time';
import { openBookStore } from '../store/book-store';
import { openPeopleHere } from './people-here';
import { hashPin, isRightPin, PIN_ITERATIONS, pinDelayMs, pinObjection } from './pin';

const ADA = { id: 'ada', name: 'Ada' };
const PIN = '271828';

async function tablet() {
  const time = virtualTime();
  const indexedDB = new IDBFactory();
  const random = seededBytes(5);
  const load = async () => {
    const store = openBookStore('lab', { idb: { indexedDB, IDBKeyRange }, random, timers: time.timers });
    const people = openPeopleHere({
      store,
      clock: time.clock(),
      random,
      subtle: crypto.subtle,
      pin_iterations: 10,
    });
    await people.load();
    return people;
  };
  const people = await load();
  await people.grant(ADA);
  await people.setPin(ADA.id, PIN);
  return { time, people, load };
}

vi.setConfig({ testTimeout: 30_000 });

describe('PINs of the people who signed in here', () => {
  it('open for the right one and double the wait for each wrong one', async () => {
    const { time, people } = await tablet();
    expect((await people.check(ADA.id, PIN)).type).toBe('right');
    const waits: number[] = [];
    for (let failure = 1; failure <= 9; failure += 1) {
      const outcome = await people.check(ADA.id, '141421');
      if (outcome.type !== 'wrong') throw new Error(outcome.type);
      waits.push(outcome.wait_ms / 1000);
      expect((await people.check(ADA.id, PIN)).type).toBe('wait');
      await time.pass(outcome.wait_ms);
    }
    expect(waits).toEqual([1, 2, 4, 8, 16, 32, 64, 128, 256]);
    expect((await people.check(ADA.id, '141421')).type).toBe('sign-in-needed');
    await time.pass(10 * 3600_000);
    expect((await people.check(ADA.id, PIN)).type).toBe('sign-in-needed');
    expect(people.get(ADA.id)?.needs_sign_in).toBe(true);
  });

  it('do not forget the wait or the count when the app is started again', async () => {
    const { people, load, time } = await tablet();
    for (let failure = 1; failure <= 4; failure += 1) {
      await people.check(ADA.id, '141421');
      await time.pass(pinDelayMs(failure));
    }
    const again = await load();
    expect(again.get(ADA.id)).toMatchObject({ failures: 4, wait_ms: 8000 });
    expect((await again.check(ADA.id, PIN)).type).toBe('wait');
    await time.pass(8000);
    expect((await again.check(ADA.id, PIN)).type).toBe('right');
    expect(again.get(ADA.id)?.failures).toBe(0);
  });

  it('ask for a new PIN once ten were wrong and the person has signed in', async () => {
    const { people, time } = await tablet();
    for (let failure = 1; failure <= 10; failure += 1) {
      await people.check(ADA.id, '141421');
      await time.pass(pinDelayMs(failure));
    }
    await people.grant(ADA);
    expect(people.get(ADA.id)).toMatchObject({ has_pin: false, failures: 0 });
  });

  it('keep one person’s wrong PINs from holding up another', async () => {
    const { people } = await tablet();
    await people.grant({ id: 'milo', name: 'Milo' });
    await people.setPin('milo', PIN);
    await people.check(ADA.id, '141421');
    expect((await people.check('milo', PIN)).type).toBe('right');
  });

  it('refuse what is guessed at once', () => {
    for (const bad of ['12345', '123456', '987654', '111111', '12345a', '', '1'.repeat(13)])
      expect(pinObjection(bad)).not.toBeNull();
    expect(pinObjection(PIN)).toBeNull();
  });

  it('are kept as PBKDF2 with SHA-256 and 600,000 rounds', async () => {
    expect(PIN_ITERATIONS).toBe(600_000);
    const record = await hashPin(crypto.subtle, PIN, { random: seededBytes(1), iterations: 1000 });
    expect(await isRightPin(crypto.subtle, PIN, record)).toBe(true);
    expect(await isRightPin(crypto.subtle, '271829', record)).toBe(false);
    // RFC 7914, section 11: PBKDF2-HMAC-SHA-256 of "passwd" with salt "salt" and one round, first 32 bytes.
    const salt = new TextEncoder().encode('salt');
    const published = '55ac046e56e3089fec1691c22544b605f94185216dde0465e68b9d57c20dacbc';
    const hash = Uint8Array.from(published.match(/../g) ?? [], (pair) => Number.parseInt(pair, 16));
    expect(await isRightPin(crypto.subtle, 'passwd', { salt, hash, iterations: 1 })).toBe(true);
  });
});
