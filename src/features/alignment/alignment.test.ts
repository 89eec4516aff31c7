import { describe, expect, it } from 'vitest';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import type { RigSpec } from '../../domain/book/rig-spec';
import { bodySchema } from '../../domain/book/kinds';
import { afterLogging, gapSpecs, readTurns, tapArc, turnSpecs, type ArcPlace } from './alignment-form';
import { alignedSpec, allowedDifference_mm, gapsAfter, planFor, spread_pct } from './alignment-plan';
import { alignmentSetting, clockwiseScrew, screwTravel_mm } from './alignment-setting';
import { drawingPlan, timesWords } from './drawing-plan';

const setting = alignmentSetting(HERON_SPEC);
const without = (screws: RigSpec['channel']['screws']): RigSpec => {
  const { screws: _gone, ...channel } = HERON_SPEC.channel;
  return { ...HERON_SPEC, channel: screws === undefined ? channel : { ...channel, screws } };
};

describe('what the rig says of its channel', () => {
  it('says which screws are missing, and falls back to usual places and a usual feeler', () => {
    expect(setting).toMatchObject({ target_mm: 2.5, place_a_mm: 10, place_b_mm: 230, missing: null });
    expect(alignmentSetting(without(undefined))).toMatchObject({
      screws: null,
      missing: expect.stringContaining('no screws'),
    });
    const [only] = HERON_SPEC.channel.screws ?? [];
    if (only === undefined) throw new Error('Heron has screws');
    expect(alignmentSetting(without([only])).missing).toContain('Screw A alone');
    const { feeler_a_mm: _a, feeler_b_mm: _b, feeler_error_mm: _c, ...bare } = HERON_SPEC.channel;
    expect(alignmentSetting({ ...HERON_SPEC, channel: bare })).toMatchObject({
      place_a_mm: 0,
      place_b_mm: 240,
      feeler_mm: 0.015,
      feeler_assumed: true,
    });
  });

  it('closes by turning clockwise where the screw says so', () => {
    const screw = { name: 'S', position_mm: 0, pitch_mm: 0.5, lever: 2, closes: 'clockwise' as const };
    expect(clockwiseScrew(screw).sense).toBe(-1);
    expect(screwTravel_mm(screw, 4)).toBe(-0.5);
    expect(screwTravel_mm({ ...screw, closes: 'anticlockwise' }, 4)).toBe(0.5);
  });
});

describe('the recommendation', () => {
  // By hand: the line through 2.65 at 10 and 2.31 at 230 mm is 2.6886 at screw A (-15) and 2.2714 at screw B (255).
  // To 2.5 with 0.5 mm a turn: 0.377 clockwise closes at A, 0.457 anticlockwise opens at B; in eighths 3 and 4.
  it('turns each screw as worked by hand, and predicts what the same turns give', () => {
    const gaps = { a_mm: 2.65, b_mm: 2.31 };
    const plan = planFor(gaps, setting, { target_mm: 2.5, feeler_mm: 0.015 });
    if (plan?.ok !== true) throw new Error('no plan');
    expect(plan.value.exact_turns[0]).toBeCloseTo(0.377, 3);
    expect(plan.value.exact_turns[1]).toBeCloseTo(-0.457, 3);
    expect(plan.value.rounded_turns).toEqual([0.375, -0.5]);
    const after = gapsAfter(gaps, setting, [3, -4]);
    expect(after?.a_mm).toBeCloseTo(plan.value.predicted.left_mm, 12);
    expect(after?.b_mm).toBeCloseTo(plan.value.predicted.right_mm, 12);
  });

  it('has nothing to say without screws, and never closes the gap', () => {
    const bare = alignmentSetting(without(undefined));
    expect(planFor({ a_mm: 2.5, b_mm: 2.5 }, bare, { target_mm: 2.5, feeler_mm: 0.02 })).toBeUndefined();
    expect(gapsAfter({ a_mm: 2.5, b_mm: 2.5 }, bare, [1, 1])).toBeNull();
    expect(gapsAfter({ a_mm: 2.5, b_mm: 2.5 }, setting, [80, 80])).toBeNull();
  });

  it('bears a difference of about two per cent, rounded down', () => {
    expect(allowedDifference_mm(2.5, 0.966)).toBeCloseTo(0.06, 2);
    expect(allowedDifference_mm(Number.NaN, 0.966)).toBe(0.03);
    expect(spread_pct({ a_mm: 2.5, b_mm: 2.5 }, 0.966)).toBe(0);
    expect(spread_pct({ a_mm: 0, b_mm: 2.5 }, 0.966)).toBeNull();
  });
});

describe('the result as a revision', () => {
  const body = {
    rig_revision: 'r',
    gap_a_mm: 2.65,
    gap_b_mm: 2.31,
    place_a_mm: 10,
    place_b_mm: 230,
    feeler_error_mm: 0.015,
    note: '',
  };

  it('carries the gaps to the ends of the active length, in hundredths', () => {
    const next = alignedSpec(HERON_SPEC, body);
    if (!next.ok) throw new Error(next.refusal.words);
    expect(next.value.channel).toMatchObject({ spacing_a_mm: 2.67, spacing_b_mm: 2.29 });
    const revised = {
      number: '4A',
      based_on: '00000000-0000-4000-8000-000000000001',
      spec: next.value,
      why: 'x',
    };
    expect(bodySchema('rig.revised').safeParse(revised).success).toBe(true);
  });

  it('is refused where the line meets the other bar', () => {
    expect(alignedSpec(HERON_SPEC, { ...body, gap_a_mm: 0.1, gap_b_mm: 2.3 })).toMatchObject({
      ok: false,
      refusal: { type: 'bars-meet' },
    });
  });
});

describe('what is entered', () => {
  it('starts gaps empty and turns at the recommendation', () => {
    expect(gapSpecs(setting).map(({ key, initial }) => [key, initial])).toEqual([
      ['a', ''],
      ['b', ''],
      ['feeler', '0.015'],
      ['target', '2.5'],
    ]);
    expect(turnSpecs(setting, [3, -4]).map(({ initial }) => initial)).toEqual(['3', '-4']);
  });

  it('reads whole eighths, and something must have been turned', () => {
    const specs = turnSpecs(setting, [3, -4]);
    expect(readTurns(specs, {})).toEqual([3, -4]);
    expect(readTurns(specs, { turn0: '1.5' })).toBe('Turns: whole eighths.');
    expect(readTurns(specs, { turn0: '0', turn1: '0' })).toBe('No screw was turned.');
    expect(readTurns(specs, { turn0: '9999' })).toContain('Screw A');
  });

  it('keeps target and feeler after logging, and nothing else', () => {
    const texts = { a: '2.5', b: '2.4', target: '2.6', feeler: '0.02' };
    expect(afterLogging({ mode: 'gaps', texts, arcs: 'mid' })).toEqual({
      mode: null,
      texts: { target: '2.6', feeler: '0.02' },
      arcs: null,
    });
  });

  it.each<[ArcPlace | null, 'a' | 'mid' | 'b', ArcPlace | null]>([
    [null, 'a', 'a-end'],
    ['a-end', 'a', null],
    ['a-end', 'b', 'both-ends'],
    ['both-ends', 'a', 'b-end'],
    ['both-ends', 'mid', 'mid'],
    ['mid', 'b', 'b-end'],
    ['even', 'mid', 'mid'],
    ['mid', 'mid', null],
  ])('from %s a tap on %s makes %s', (before, part, after) => {
    expect(tapArc(before, part)).toBe(after);
  });
});

describe('the drawing', () => {
  it('is to scale along the channel and larger across it, and stays finite in no room', () => {
    const box = { width: 800, height: 240 };
    const plan = drawingPlan(setting, { gaps: { a_mm: 2.6, b_mm: 2.4 }, target_mm: 2.5, box });
    expect(plan.x(240) - plan.x(0)).toBeCloseTo(2 * (plan.x(120) - plan.x(0)), 9);
    expect(plan.floor - plan.face(2.6)).toBeCloseTo((2.6 / 2.4) * (plan.floor - plan.face(2.4)), 9);
    expect(plan.times).toBeGreaterThan(5);
    const none = drawingPlan(setting, {
      gaps: { a_mm: 0, b_mm: 0 },
      target_mm: 0,
      box: { width: 0, height: 0 },
    });
    expect(Number.isFinite(none.face(2)) && Number.isFinite(none.x(100))).toBe(true);
  });

  it.each([
    [14.6, '15'],
    [3.2, '3'],
    [Number.NaN, '1'],
  ])('says %d as %s times', (times, words) => {
    expect(timesWords(times)).toBe(words);
  });
});
