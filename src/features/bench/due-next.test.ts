import { describe, expect, it } from 'vitest';
import type { CheckDoc } from '../../domain/book/documents/check';
import type { FiringDoc } from '../../domain/book/documents/firing';
import type { RigDoc } from '../../domain/book/documents/rig';
import type { DeclaredView } from '../../domain/rules/declared-view';
import type { Missing } from '../../domain/rules/readiness';
import { dueNext } from './due-next';

const rig = { ready_check: null } as RigDoc;
const view = (state: DeclaredView['state']): DeclaredView => ({
  state,
  trace: null,
  age_ms: null,
  why: state === 'not-known' ? 'tablet restarted' : null,
  stood_down: [],
});
const noCheck: Missing = {
  code: 'no-check',
  words: 'No before-firing check has been closed.',
  mend: 'you',
  since: null,
};
const noPermit: Missing = {
  code: 'no-permit',
  words: 'No firing permit has been granted.',
  mend: 'reviewer',
  since: null,
};
const facts = { rig, view: view('shorted'), missing: [noCheck], openFiring: undefined, openCheck: undefined };

describe('what is due next', () => {
  it('goes back to an open firing before anything else', () => {
    const openFiring = { id: 'f', number: 'A-1' } as FiringDoc;
    expect(dueNext({ ...facts, openFiring, openCheck: { id: 'c' } as CheckDoc })).toMatchObject({
      type: 'go-on-firing',
      firing: 'f',
    });
  });

  it('goes on with an open check', () => {
    const openCheck = { id: 'c', purpose: 'make-safe' } as CheckDoc;
    expect(dueNext({ ...facts, openCheck })).toMatchObject({ type: 'go-on-check', title: 'Make safe' });
  });

  it('asks for the before-firing check on a shorted rig', () => {
    expect(dueNext(facts)).toMatchObject({ type: 'open-check', purpose: 'before-firing' });
  });

  it('asks to make safe first when the state is not known', () => {
    expect(dueNext({ ...facts, view: view('not-known') })).toMatchObject({
      type: 'open-check',
      purpose: 'make-safe',
      why: 'tablet restarted',
    });
  });

  it('asks to make safe when the short is off and the check has lapsed', () => {
    expect(dueNext({ ...facts, view: view('short-off') })).toMatchObject({
      type: 'open-check',
      purpose: 'make-safe',
    });
  });

  it('offers firing while the check counts, and says what else is missing', () => {
    expect(dueNext({ ...facts, view: view('short-off'), missing: [] })).toMatchObject({
      type: 'open-firing',
    });
    expect(dueNext({ ...facts, view: view('short-off'), missing: [noPermit] })).toMatchObject({
      type: 'open-firing',
      why: noPermit.words,
    });
  });
});
