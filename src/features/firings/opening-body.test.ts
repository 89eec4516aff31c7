import { describe, expect, it } from 'vitest';
import type { Missing } from '../../domain/rules/readiness';
import { IDS, RIG, trace } from './firing.fixture';
import { openingBody } from './opening-body';

const permit = RIG.permits[0]!;
const ready_check = {
  check: 'check',
  rig_revision: IDS.revision,
  closed: trace('check'),
  active: trace('check').stamp,
  voided: null,
  present: [],
  kit: [],
};
const rig = { ...RIG, ready_check };
const missing = (code: string): Missing => ({
  code,
  words: 'Something is missing.',
  mend: 'you',
  since: null,
});

describe('what a firing is opened with', () => {
  it('stands on check and permit when nothing is missing', () => {
    const body = openingBody(rig, { permit, missing: [], why: null });
    expect(body.ok ? body.value : null).toEqual({
      rig: IDS.rig,
      rig_revision: IDS.revision,
      check: 'check',
      permit: IDS.permit,
      unready: null,
    });
  });

  it('never opens as ready while something is missing', () => {
    const body = openingBody(rig, { permit, missing: [missing('hands-in')], why: null });
    expect(body.ok ? null : body.refusal.words).toBe('Something is missing.');
  });

  it('is recorded as unready only with a reason, and names what was missing', () => {
    expect(openingBody(rig, { permit, missing: [missing('check-idle')], why: '  ' }).ok).toBe(false);
    const body = openingBody(rig, { permit, missing: [missing('check-idle')], why: 'bottle nearly empty' });
    expect(body.ok ? body.value : null).toMatchObject({
      check: null,
      permit: IDS.permit,
      unready: {
        missing: [{ code: 'check-idle', words: 'Something is missing.' }],
        why: 'bottle nearly empty',
      },
    });
  });

  it('keeps the check when something else was missing', () => {
    const body = openingBody(rig, {
      permit: null,
      missing: [missing('no-permit')],
      why: 'permit lapsed mid run',
    });
    expect(body.ok ? body.value : null).toMatchObject({ check: 'check', permit: null });
  });
});
