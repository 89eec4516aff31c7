import { describe, expect, it } from 'vitest';
import { testSettings, testSpec } from '../../../tests/support/test-lab';
import { answerLookup } from '../../data/lookup/answer-lookup';
import { GAP_LOOKUP } from '../../domain/lookup/gap-lookup';
import { keptBody, readKept, type Kept, type KeptFind } from '../../domain/lookup/kept';
import type { Known, StartFrom, Values } from '../../domain/lookup/lookup';
import { pinAsk, whatIfs } from './pin-ask';

const from: StartFrom = { spec: testSpec, settings: testSettings };
const start = GAP_LOOKUP.start(from);
const gapKey = GAP_LOOKUP.fields.find((field) => field.label === 'Gap')?.key ?? '';
const pressureKey = GAP_LOOKUP.fields.find((field) => field.label === 'Pressure')?.key ?? '';

function keptWith(
  values: Values,
  known: Readonly<Record<string, Known>> = {},
  find: KeptFind | null = null,
): Kept {
  const all = { ...start.values, ...values };
  const answer = GAP_LOOKUP.answer(all);
  if (!answer.ok) throw new Error(answer.refusal.words);
  const kept = readKept(
    keptBody({
      lookup: GAP_LOOKUP,
      values: all,
      known: { ...start.known, ...known },
      answer: answer.value,
      find,
      rig_revision: null,
      pin: 'pin',
    }),
  );
  if (kept === null) throw new Error('a body that was just written cannot be read');
  return kept;
}

describe('a pinned lookup', () => {
  it('takes what it had from the rig from its present revision', () => {
    const kept = keptWith({});
    const opened = { ...from, spec: { ...testSpec, gap: { ...testSpec.gap, gap_mm: 2.5 } } };
    const before = pinAsk(GAP_LOOKUP, kept, from);
    const after = pinAsk(GAP_LOOKUP, kept, opened);
    expect(before.values[gapKey]).toBe(3);
    expect(after.values[gapKey]).toBe(2.5);
  });

  it('keeps what a person set, and says so', () => {
    const kept = keptWith({ [pressureKey]: 0.7 }, { [pressureKey]: 'what-if' });
    expect(pinAsk(GAP_LOOKUP, kept, from).values[pressureKey]).toBe(0.7);
    expect(whatIfs(GAP_LOOKUP, kept)).toEqual(['Pressure']);
    expect(whatIfs(GAP_LOOKUP, keptWith({}))).toEqual([]);
  });

  it('solves again for what was sought', () => {
    const solvable = GAP_LOOKUP.solvable.findIndex((one) => one.field === gapKey);
    const wanted = GAP_LOOKUP.solvable[solvable];
    if (wanted === undefined) throw new Error('the gap lookup solves for no gap');
    const { field, figure, purpose = null } = wanted;
    const kept = keptWith({}, {}, { field, figure, purpose, target: 12 });
    const ask = pinAsk(GAP_LOOKUP, kept, from);
    expect(ask).toMatchObject({ kind: 'find', solvable, target: 12 });
    const reply = answerLookup(GAP_LOOKUP, ask);
    if (!reply.ok || reply.value.kind !== 'answer') throw new Error('no answer');
    expect(reply.value.found?.value).toBeGreaterThan(0.5);
    expect(reply.value.found?.value).toBeLessThan(3);
  });

  it('answers at its values where today’s app no longer solves for that', () => {
    const kept = keptWith({}, {}, { field: 'gone', figure: 'gone', purpose: null, target: 1 });
    expect(pinAsk(GAP_LOOKUP, kept, from).kind).toBe('answer');
  });
});
