import { describe, expect, it } from 'vitest';
import { gapFor } from '../gap/gap-solve';
import { selfBreak } from '../gap/self-break';
import { gapInputOf } from '../rules/rig-gap';
import { figureLine } from './figure-text';
import { GAP_LOOKUP } from './gap-lookup';
import type { Figure, LookupAnswer, Values } from './lookup';
import { kettleLikeSpec, labSettings } from './rig.fixture';

const start = GAP_LOOKUP.start({ spec: kettleLikeSpec, settings: labSettings });
const answered = (changes: Values = {}): LookupAnswer => {
  const answer = GAP_LOOKUP.answer({ ...start.values, ...changes });
  if (!answer.ok) throw new Error(answer.refusal.words);
  return answer.value;
};
const refusal = (changes: Values) => {
  const answer = GAP_LOOKUP.answer({ ...start.values, ...changes });
  return answer.ok ? null : answer.refusal;
};
const figure = (key: string, answer = answered()): Figure => {
  const found = answer.figures.find((each) => each.key === key);
  if (found === undefined) throw new Error(`no figure ${key}`);
  return found;
};

describe('gap lookup', () => {
  it('draws the rig’s own curve where it was read, on its own gas and electrodes, and moves no figure', () => {
    const own = { scale: 0.9, offset_mm: 0, from_bar_abs: 1.8, to_bar_abs: 2.1 };
    const { values } = GAP_LOOKUP.start({ spec: kettleLikeSpec, settings: labSettings, own });
    const drawn = answered(values);
    expect(drawn.figures).toEqual(answered().figures);
    const points = drawn.plot?.own?.points ?? [];
    expect(points[0]?.x).toBeCloseTo(1.8 - 0.966, 9);
    expect(points.at(-1)?.x).toBeCloseTo(2.1 - 0.966, 9);
    const law = drawn.plot?.law ?? [];
    for (const { x, y } of points) {
      const below = law.findLast((one) => one.x <= x);
      expect(y / (below?.y ?? NaN)).toBeGreaterThan(0.88);
      expect(y / (below?.y ?? NaN)).toBeLessThan(0.95);
    }
    expect(answered({ ...values, gas: 'air' }).plot?.own).toBeUndefined();
    expect(answered({ ...values, radius_mm: 20 }).plot?.own).toBeUndefined();
    expect(answered().plot?.own).toBeUndefined();
  });

  it('starts from the rig and the lab, and says which', () => {
    expect(start.values).toMatchObject({ gap_mm: 3, pressure: 1, radius_mm: 12, ambient_bar_abs: 0.966 });
    expect(start.known).toMatchObject({ gap_mm: 'rig', ambient_bar_abs: 'lab', radius_mm: 'assumed' });
  });

  it('gives the figures that the rig gives everywhere else', () => {
    const rig = selfBreak(
      gapInputOf(kettleLikeSpec, { pressure_bar_g: 1, ambient_bar_abs: 0.966, temperature_C: 21 }),
    );
    if (!rig.ok) throw new Error(rig.refusal.words);
    expect(figure('low').value).toBe(rig.value.low_kV);
    expect(figure('law').value).toBe(rig.value.law_kV);
    expect(figure('high').value).toBe(rig.value.high_kV);
  });

  it('writes low down, high up, and what may stand on the gap', () => {
    // Kettle at 1.00 bar(g), as the reference checks have it: 16.7, 18.8, 24.3 kV, stand at most 13.4 kV.
    expect([figureLine(figure('low')), figureLine(figure('law')), figureLine(figure('high'))]).toEqual([
      '16.7',
      '18.8',
      '24.3',
    ]);
    expect(figure('low').note).toBe('stand at most 13.4\u2009kV');
  });

  it('has no default for the ambient, with or without a rig', () => {
    for (const spec of [kettleLikeSpec, null]) {
      const { values } = GAP_LOOKUP.start({ spec, settings: null });
      expect(GAP_LOOKUP.answer(values)).toMatchObject({
        ok: false,
        refusal: {
          field: 'ambient_bar_abs',
          words: 'Ambient: enter the ambient pressure; it has no default.',
        },
      });
    }
  });

  it('answers without a rig once the ambient is known', () => {
    const { values } = GAP_LOOKUP.start({ spec: null, settings: labSettings });
    expect(GAP_LOOKUP.answer(values).ok).toBe(true);
  });

  it('says whether the supply reaches the gap, first of all cautions', () => {
    expect(answered().cautions[0]).toContain('beyond the supply');
    expect(answered({ supply_kV: null }).cautions).toEqual(['With a person near, no gas gap is a barrier.']);
    expect(answered().plot?.limit?.label).toBe('supply 23.5\u2009kV');
  });

  it('counts share, margin and early breaks from the low side', () => {
    const held = answered({ voltage_kV: 13 });
    expect(figure('share', held).value).toBeCloseTo((100 * 13) / figure('low').value, 9);
    expect(figure('margin', held).value).toBeGreaterThan(3);
    const early = figure('early_break', held);
    expect(early.low).toBeLessThanOrEqual(early.value);
    expect(answered().figures.some(({ key }) => key === 'share')).toBe(false);
  });

  it('takes bar(abs) for the same pressure, with the ambient', () => {
    const field = GAP_LOOKUP.fields.find(({ key }) => key === 'pressure');
    const abs = field?.kind === 'number' ? field.units?.[0] : undefined;
    expect(abs?.toOwn(1.966, start.values)).toBe(1);
    expect(abs?.fromOwn(1, start.values)).toBe(1.966);
    expect(abs?.toOwn(1.966, { ...start.values, ambient_bar_abs: null })).toBeNull();
  });

  it.each([
    [{ gas: 'He' }, undefined],
    [{ gas: 'laughing' }, 'gas'],
    [{ gap_mm: null }, 'gap_mm'],
    [{ gap_mm: -1 }, 'gap_mm'],
    [{ gap_mm: 1e9 }, 'gap_mm'],
    [{ gap_error_mm: 5 }, 'gap_error_mm'],
    [{ pressure: -0.97 }, 'pressure'],
    [{ pressure: Number.NaN }, 'pressure'],
    [{ temperature_C: -300 }, 'temperature_C'],
    [{ ambient_bar_abs: 7 }, 'ambient_bar_abs'],
    [{ radius_mm: -12 }, 'radius_mm'],
    [{ electrodes: 'pointed' }, 'electrodes'],
    [{ electrodes: 'hex-bars', flats_mm: null, corner_mm: 1, facing: 'flats' }, 'flats_mm'],
    [{ electrodes: 'hex-bars', flats_mm: 12, corner_mm: 0, facing: 'flats' }, 'corner_mm'],
    [{ electrodes: 'hex-bars', flats_mm: 12, corner_mm: 1, facing: null }, 'facing'],
    [{ electrodes: 'capped-rods', rod_length_mm: -1 }, 'rod_length_mm'],
    [{ voltage_kV: 1e6 }, 'voltage_kV'],
    [{ voltage_kV: 3, condition: 'new' }, 'condition'],
  ] as const)('refuses %j in words beside its field', (changes, field) => {
    const refused = refusal(changes);
    expect(refused?.words.length).toBeGreaterThan(10);
    if (field !== undefined) expect(refused?.field).toBe(field);
  });

  it('draws vessel, window and the end of the model, and no window without a permit', () => {
    const envelope = { max_kV: 22, max_bar_g: 1.1, max_rate_Hz: 5 };
    const { values } = GAP_LOOKUP.start({ spec: kettleLikeSpec, settings: labSettings, envelope });
    expect(GAP_LOOKUP.answer(values)).toMatchObject({
      value: { plot: { window: { min: 0.8, max: 1.1 }, wall: { from: 2 } } },
    });
    expect(answered().plot?.window).toBeUndefined();
    expect(answered({ vessel_bar_g: 6 }).plot?.notValid?.from).toBeGreaterThan(3.9);
    expect(answered().plot?.band?.points.every(({ low, high }) => low < high)).toBe(true);
  });

  it('takes the bars and rods of a rig, with the figures of the rig itself', () => {
    for (const shape of [
      { electrodes: 'hex-bars', radius_mm: null, flats_mm: 12, corner_mm: 1, facing: 'edges' },
      { electrodes: 'capped-rods', radius_mm: 6, rod_length_mm: 30 },
    ] as const) {
      const spec = { ...kettleLikeSpec, gap: { ...kettleLikeSpec.gap, ...shape } };
      const { values } = GAP_LOOKUP.start({ spec, settings: labSettings });
      const answer = GAP_LOOKUP.answer(values);
      const own = selfBreak(
        gapInputOf(spec, { pressure_bar_g: 1, ambient_bar_abs: 0.966, temperature_C: labSettings.ambient_C }),
      );
      expect(own.ok && answer.ok && answer.value.figures.find(({ key }) => key === 'law')?.value).toBe(
        own.ok && own.value.law_kV,
      );
    }
  });

  it('leaves the curve out where none is wanted', () => {
    const answer = GAP_LOOKUP.answer(start.values, { plot: false });
    expect(answer.ok && answer.value.plot).toBeUndefined();
  });

  it('solves for a gap as the domain does', () => {
    const pair = GAP_LOOKUP.solvable.find(({ field, figure: of }) => field === 'gap_mm' && of === 'low');
    const solved = pair?.exact?.(start.values, 17);
    const input = gapInputOf(kettleLikeSpec, {
      pressure_bar_g: 1,
      ambient_bar_abs: 0.966,
      temperature_C: 21,
    });
    const domain = gapFor(input, { purpose: 'hold-off-at-least', voltage_kV: 17 });
    expect(solved?.ok === true && domain.ok && solved.value.value === domain.value.value).toBe(true);
  });
});
