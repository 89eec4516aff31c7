import { describe, expect, it } from 'vitest';
import { DEMO_LAB_SETTINGS } from '../../../seeds/lab';
import { DEMO_RIGS } from '../../../seeds/rigs/demo-rigs';
import { rigBeam } from '../rules/rig-beam';
import { derivedFigure, rigDerived, type DerivedKey } from '../rules/rig-derived';
import { chargingOf, rigFigures, rigWait } from '../rules/rig-figures';
import { fieldOf, shownFields } from './fields';
import { figureText } from './figure-text';
import type { Figure, Lookup, Values } from './lookup';
import { LOOKUPS, lookupOf } from './lookups';

/** What the rig screens, the editor and the report show, and the figure of a lookup that must read the same. */
interface Same {
  readonly lookup: string;
  readonly figure: string;
  readonly derived: DerivedKey;
  readonly times: number;
}

const SAME = (
  [
    ['gap', 'law', 'self_break'],
    ['gap', 'supply', 'reach'],
    ['capacitor', 'capacitance', 'first'],
    ['capacitor', 'margin', 'margin_first'],
    ['circuit', 'peak', 'channel_peak'],
    ['circuit', 'rise', 'rise'],
    ['circuit', 'current_rise', 'current_rise'],
    ['circuit', 'time_to_peak', 'time_to_peak'],
    ['circuit', 'gap_current', 'gap_current', 1e-3],
    ['circuit', 'channel_current', 'channel_current', 1e-3],
    ['circuit', 'ideal_peak', 'ideal_peak'],
    ['circuit', 'static', 'channel_static'],
    ['circuit', 'stored', 'stored_at_break'],
    ['beam', 'od', 'eyewear'],
  ] as const satisfies readonly (readonly [string, string, DerivedKey, number?])[]
).map(([lookup, figure, derived, times = 1]): Same => ({ lookup, figure, derived, times }));

const RIGS = DEMO_RIGS.map(({ name, spec }) => [name, spec] as const);

function figureAt(lookup: Lookup, values: Values, key: string): Figure {
  const answer = lookup.answer(values);
  if (!answer.ok) throw new Error(`${lookup.key}: ${answer.refusal.words}`);
  const found = answer.value.figures.find((figure) => figure.key === key);
  if (found === undefined) throw new Error(`${lookup.key} gives no ${key}`);
  return found;
}

function closeTo(value: number, expected: number): void {
  expect(Math.abs(value - expected)).toBeLessThanOrEqual(1e-12 * Math.abs(expected));
}

describe.each(RIGS)('lookups filled in from %s', (_, spec) => {
  const derived = rigDerived(spec, DEMO_LAB_SETTINGS);
  const start = (lookup: Lookup) => lookup.start({ spec, settings: DEMO_LAB_SETTINGS });

  it.each(LOOKUPS.map((lookup) => [lookup.key, lookup] as const))('%s answers at once', (_key, lookup) => {
    const { values, known } = start(lookup);
    const answer = lookup.answer(values);
    if (!answer.ok) throw new Error(answer.refusal.words);
    for (const field of lookup.fields) expect(known[field.key], field.key).toBeDefined();
  });

  it.each(LOOKUPS.map((lookup) => [lookup.key, lookup] as const))(
    '%s answers or refuses in words for each of its choices',
    (_key, lookup) => {
      const { values } = start(lookup);
      for (const field of shownFields(lookup, values)) {
        if (field.kind !== 'choice') continue;
        for (const { value } of field.options) {
          const answer = lookup.answer({ ...values, [field.key]: value });
          if (answer.ok) continue;
          const { words, field: beside } = answer.refusal;
          expect(words.length, value).toBeGreaterThan(20);
          if (beside !== undefined) expect(fieldOf(lookup, beside), value).toBeDefined();
        }
      }
    },
  );

  it.each(LOOKUPS.map((lookup) => [lookup.key, lookup] as const))(
    '%s asks for the ambient where the lab has not said it',
    (_key, lookup) => {
      const { values } = lookup.start({ spec, settings: null });
      expect(values['ambient_bar_abs'] ?? null).toBeNull();
      const answer = lookup.answer(values);
      if (answer.ok) return;
      expect(answer.refusal).toMatchObject({ type: 'no-ambient', field: 'ambient_bar_abs' });
    },
  );

  it.each(SAME.filter(({ lookup }) => lookupOf(lookup) !== undefined))(
    '$lookup gives for $figure what the rig gives for $derived',
    (same) => {
      const lookup = lookupOf(same.lookup)!;
      const expected = derivedFigure(derived, same.derived);
      if (!expected.figure.ok) throw new Error(expected.figure.refusal.words);
      const shown = figureAt(lookup, start(lookup).values, same.figure);
      closeTo(shown.value, expected.figure.value.value * same.times);
      expect(shown.rounding).toBe(expected.rounding);
      if (shown.decimals !== undefined) return;
      expect(figureText(shown)).toEqual(
        figureText({ value: shown.value, digits: expected.digits, rounding: expected.rounding }),
      );
    },
  );

  it('holds both sides of the gap as the rig does', () => {
    if (!derived.selfBreak.ok) throw new Error(derived.selfBreak.refusal.words);
    const { low_kV, high_kV, stand_at_most_kV } = derived.selfBreak.value;
    const gap = lookupOf('gap')!;
    const values = start(gap).values;
    closeTo(figureAt(gap, values, 'low').value, low_kV);
    closeTo(figureAt(gap, values, 'high').value, high_kV);
    closeTo(figureAt(gap, values, 'stand').value, stand_at_most_kV);
    closeTo(Number(values['supply_kV']), chargingOf(spec).supply_kV);
  });

  it('takes energy, beam and wait from the rig\u2019s figures', () => {
    const figures = rigFigures(spec, DEMO_LAB_SETTINGS);
    if (!figures.ok) throw new Error(figures.refusal.words);
    const { stored_J } = figures.value;
    closeTo(Number(start(lookupOf('room')!).values['shot_J']), stored_J);
    const beam = rigBeam(spec, stored_J);
    if (!beam.ok) throw new Error(beam.refusal.words);
    for (const key of ['beam', 'dye'] as const) {
      const { values } = start(lookupOf(key)!);
      closeTo(Number(values[key === 'beam' ? 'pulse_energy_uJ' : 'pump_uJ']), beam.value.planned_uJ);
    }
    const wait = rigWait(spec, DEMO_LAB_SETTINGS);
    expect(wait).toEqual({ ok: true, value: figures.value.wait });
  });
});
