import { describe, expect, it } from 'vitest';
import type { FiringDoc } from '../../../domain/book/documents/firing';
import type { PartDoc } from '../../../domain/book/documents/part';
import type { RigDoc } from '../../../domain/book/documents/rig';
import { HERON_RIG, KETTLE } from '../rigs.fixture';
import { EMPTY_FIT, fitOf } from './fit-form';
import { partLedger, remainingWords, shotsText, usedWords } from '../../../domain/rules/part-ledger';

const [revision] = HERON_RIG.revisions;
if (revision === undefined) throw new Error('Heron has a revision');
const traceAt = (at: number) => ({ ...revision, at });

function part(place: PartDoc['fitted']['place'], shots_before: number | null = 0): PartDoc {
  return {
    kind: 'part',
    id: 'p1',
    parent: 'heron',
    fitted: {
      what: 'PET stack',
      place,
      where: '',
      serial: '',
      catalogue: null,
      fitted_on: '2026-11-20',
      shots_before,
      replaces: null,
      note: '',
    },
    trace: traceAt(10),
    irregular: null,
    retired: null,
  };
}

function firing(at: number, shots: number): FiringDoc {
  return {
    kind: 'firing',
    id: `f${at}`,
    parent: 'heron',
    number: `A-${at}`,
    rig_revision: 'rev-1',
    check: null,
    permit: null,
    unready: null,
    opened: traceAt(at),
    opened_irregular: null,
    readings: 0,
    irregular_readings: 0,
    shots,
    last_reading: null,
    closed: null,
    reviews: [],
  };
}

describe('wear ledger of a part', () => {
  it('counts the firings since it was fitted, each at the envelope of its revision', () => {
    const ledger = partLedger(part('first'), HERON_RIG, [firing(5, 900), firing(12, 1000), firing(15, 240)]);
    expect(ledger.life).toEqual({ here: 1240, all: 1240 });
    // 16 kV over 0.70 mm of film that stands 80 kV/mm: 22.86/80.
    expect(ledger.stress_ratio).toBeCloseTo(0.2857, 4);
    // One shot at its strength, eighth power: (80/22.857)^8 = 22,519 shots expected, 1,240 of them used.
    expect(ledger.wear?.used).toBeCloseTo(1240 / 22_519, 3);
    expect(ledger.wear?.remaining.value).toBeCloseTo(22_519 - 1240, -2);
    if (ledger.wear === null) throw new Error('no wear');
    expect(remainingWords(ledger.wear)).toMatch(/^[\d,]+ to [\d,]+ shots$/);
    expect(usedWords(ledger.wear.used)).toBe('6\u2009%');
  });

  it('takes what it endured elsewhere at the stress that it has here', () => {
    const fresh = partLedger(part('first'), HERON_RIG, []);
    const used = partLedger(part('first', 5000), HERON_RIG, []);
    expect(fresh.wear?.used).toBe(0);
    expect(used.wear?.used).toBeCloseTo(5000 / 22_519, 3);
    expect(partLedger(part('first', null), HERON_RIG, []).life.all).toBeNull();
  });

  it('gives no life where no law is known, and says so', () => {
    const kettle: RigDoc = { ...HERON_RIG, revisions: [{ ...revision, spec: KETTLE }] };
    const bank = partLedger(part('first'), kettle, [firing(12, 100)]);
    expect(bank.wear).toBeNull();
    expect(bank.words).toContain('maker');
    expect(bank.stress_ratio).toBeCloseTo(23 / 30, 4);
    const gap = partLedger(part('spark-gap'), HERON_RIG, [firing(12, 100)]);
    expect(gap.wear).toBeNull();
    expect(gap.life.here).toBe(100);
  });

  it('writes shots and shares so that they never read too small', () => {
    expect(shotsText(12_345)).toBe('12,345');
    expect(usedWords(0)).toBe('nothing');
    expect(usedWords(0.0004)).toBe('under 1\u2009%');
    expect(usedWords(0.051)).toBe('6\u2009%');
  });
});

describe('fitting a part', () => {
  const draft = { ...EMPTY_FIT, what: ' PET stack ', place: 'first' } as const;

  it('gives what would be written', () => {
    expect(fitOf({ ...draft, fitted_on: '20261120', shots_before: '' }, [])).toEqual({
      ok: true,
      body: {
        what: 'PET stack',
        place: 'first',
        where: '',
        serial: '',
        catalogue: null,
        fitted_on: '2026-11-20',
        shots_before: null,
        replaces: null,
        note: '',
      },
    });
  });

  it.each([
    [{ what: ' ' }, 'Say what the part is.'],
    [{ place: null }, 'Choose where it works.'],
    [{ fitted_on: '20261340' }, 'eight figures'],
    [{ shots_before: '1.5' }, 'whole number'],
    [{ replaces: 'gone' }, 'not on the rig any more'],
  ])('refuses %o in words', (change, words) => {
    const fit = fitOf({ ...draft, ...change }, [part('first')]);
    expect(fit.ok ? '' : fit.words).toContain(words);
  });
});
