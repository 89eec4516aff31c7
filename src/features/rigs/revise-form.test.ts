import { describe, expect, it } from 'vitest';
import { rigSpecSchema } from '../../domain/book/rig-spec';
import { reviseFields } from './revise-fields';
import { EMPTY_DRAFT, revisionOf, stepText, voidedBy, type ReviseDraft } from './revise-form';
import { HERON, HERON_RIG } from './rigs.fixture';

const typed = (texts: ReviseDraft['texts'], rest: Partial<ReviseDraft> = {}) =>
  revisionOf(HERON, { ...EMPTY_DRAFT, texts, ...rest });

function field(key: string) {
  const found = reviseFields(HERON).find((one) => one.key === key);
  if (found === undefined) throw new Error(`no field ${key}`);
  return found;
}

describe('revising a rig', () => {
  it('changes only what was touched, and what it gives is a rig', () => {
    const revision = typed({ 'gap.gap_mm': '2.8', 'charging.supply_kV': '15' }, { why: 'wider gap' });
    expect(revision.spec).toEqual({
      ...HERON,
      gap: { ...HERON.gap, gap_mm: 2.8 },
      charging: { ...HERON.charging, supply_kV: 15 },
    });
    expect(revision.hindrance).toBeNull();
    expect(rigSpecSchema.safeParse(revision.spec).success).toBe(true);
  });

  it('knows a loosening from a tightening', () => {
    expect(typed({ 'envelope.max_kV': '17' }).loosens).toBe(true);
    expect(typed({ 'envelope.max_kV': '14' }).loosens).toBe(false);
    expect(typed({ 'nodes.0.bleed_Mohm': '' }).loosens).toBe(true);
  });

  it('takes an emptied bleed as not known and an emptied gap as nonsense', () => {
    expect(typed({ 'nodes.1.bleed_Mohm': '' }).spec.nodes[1]?.bleed_Mohm).toBeNull();
    const refused = typed({ 'gap.gap_mm': '' });
    expect(refused.refusals['gap.gap_mm']).toContain('enter a number');
    expect(refused.spec).toEqual(HERON);
  });

  it.each(['abc', '-3', '1e9', 'NaN', 'Infinity'])('refuses %s in words beside the field', (text) => {
    const revision = typed({ 'charging.supply_kV': text }, { why: 'nonsense' });
    expect(revision.refusals['charging.supply_kV']).toMatch(/^Supply voltage: /);
    expect(revision.hindrance).not.toBeNull();
    expect(revision.spec).toEqual(HERON);
  });

  it('refuses a pressure above the relief valve or the vessel, and a highest below the lowest', () => {
    expect(typed({ 'gap.highest_bar_g': '1.2' }).refusals['gap.highest_bar_g']).toContain('relief valve');
    expect(typed({ 'envelope.max_bar_g': '2.5' }).refusals['envelope.max_bar_g']).toContain('vessel');
    expect(typed({ 'gap.highest_bar_g': '0.1' }).refusals['gap.highest_bar_g']).toContain('below the lowest');
  });

  it('asks for a change and for a reason', () => {
    expect(typed({}).hindrance).toBe('Nothing has been changed yet.');
    expect(typed({ 'gap.gap_mm': '2.60' }).hindrance).toBe('Nothing has been changed yet.');
    expect(typed({ 'gap.gap_mm': '2.7' }, { why: '  ' }).hindrance).toBe('Say why the rig is revised.');
  });

  it('steps in decimal and stays within the range', () => {
    expect(stepText(field('gap.gap_mm'), 1, { text: undefined, spec: HERON })).toBe('2.7');
    expect(stepText(field('gap.gap_mm'), -1, { text: '0.05', spec: HERON })).toBe('0.01');
    expect(stepText(field('nodes.0.bleed_Mohm'), 1, { text: '', spec: HERON })).toBe('10');
    expect(stepText(field('gap.gap_mm'), 1, { text: 'abc', spec: HERON })).toBe('0.1');
  });

  it('says beforehand that the permit and the check go', () => {
    const [revision] = HERON_RIG.revisions;
    if (revision === undefined) throw new Error('no revision');
    const permit = {
      ...revision,
      entry: 'permit',
      rig_revision: 'rev-1',
      envelope: HERON.envelope,
      until_ms: 1000,
      withdrawn: null,
    };
    const ready_check = {
      check: 'check',
      rig_revision: 'rev-1',
      closed: revision,
      active: revision.stamp,
      voided: null,
      present: [],
      kit: [],
    };
    const rig = { ...HERON_RIG, permits: [permit], ready_check };
    expect(voidedBy(rig, 500)).toEqual({ permit, check: true, parting: false });
    expect(voidedBy(rig, 1500).permit).toBeNull();
    expect(voidedBy({ ...rig, heads: ['rev-1', 'rev-2'] }, 500)).toMatchObject({
      permit: null,
      parting: true,
    });
  });
});
