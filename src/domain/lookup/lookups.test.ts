import { describe, expect, it } from 'vitest';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { KETTLE_SPEC } from '../../../seeds/rigs/kettle';
import { anyValues } from './any-values.fixture';
import { fieldOf } from './fields';
import type { Lookup, Values } from './lookup';
import { LOOKUPS } from './lookups';

/** The machine may be busy; the number of inputs decides, not the time. */
const LONG_MS = 60_000;

/** Around two rigs: a few fields at a time as somebody might choose them, the rest as the rig has them. */
function waysAround(lookup: Lookup): readonly Values[] {
  return [HERON_SPEC, KETTLE_SPEC].flatMap((spec, seed) => {
    const { values } = lookup.start({ spec, settings: DEMO_LAB_SETTINGS });
    const changed = anyValues(lookup, { seed, count: lookup.slow === true ? 40 : 150 }).map((drawn, i) => {
      const some = Object.entries(drawn).filter((_, at) => Math.imul(at + 3, i + 7) % 5 < 2);
      return { ...values, ...Object.fromEntries(some) };
    });
    return [values, ...changed];
  });
}

describe.each(LOOKUPS.map((lookup) => [lookup.key, lookup] as const))('the lookup %s', (_, lookup) => {
  it('has fields whose steps and sliders lie within their range, and help for each', () => {
    for (const field of lookup.fields) {
      expect(field.help.length, field.key).toBeGreaterThan(10);
      if (field.kind !== 'number') continue;
      const { min, max, slide, step } = field;
      expect(slide.from >= min && slide.to <= max && slide.from < slide.to && step > 0, field.key).toBe(true);
      expect(slide.scale === 'linear' || slide.from > 0, field.key).toBe(true);
    }
    expect(new Set(lookup.fields.map(({ key }) => key)).size).toBe(lookup.fields.length);
  });

  it('starts from nothing with everything assumed and no made-up ambient pressure', () => {
    const { values, known } = lookup.start({ spec: null, settings: null });
    expect(values['ambient_bar_abs'] ?? null).toBeNull();
    for (const field of lookup.fields) expect(known[field.key], field.key).toBe('assumed');
  });

  it(
    'gives each figure one key, a caution, and one or two large figures',
    () => {
      for (const way of waysAround(lookup)) {
        const answer = lookup.answer(way);
        if (!answer.ok) continue;
        const { figures, cautions } = answer.value;
        expect(new Set(figures.map(({ key }) => key)).size).toBe(figures.length);
        expect(cautions.length).toBeGreaterThan(0);
        const large = figures.filter(({ weight }) => weight === 'answer').length;
        expect(large === 1 || large === 2).toBe(true);
      }
    },
    LONG_MS,
  );

  it(
    'names only fields and figures that there are to solve for',
    () => {
      const seen = new Set<string>();
      for (const way of waysAround(lookup)) {
        const answer = lookup.answer(way, { plot: false });
        if (answer.ok) for (const { key } of answer.value.figures) seen.add(key);
      }
      for (const { field, figure, target } of lookup.solvable) {
        expect(fieldOf(lookup, field)?.kind, field).toBe('number');
        if (target !== undefined) expect(fieldOf(lookup, target)?.kind, target).toBe('number');
        expect([...seen], figure).toContain(figure);
      }
    },
    LONG_MS,
  );
});
