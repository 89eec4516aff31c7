import { describe, expect, it } from 'vitest';
import { CARRIABLE } from '../../domain/book/bodies/firing-bodies';
import { checkBody } from '../../domain/book/read-body';
import { READING, SETTINGS, SPEC } from './firing.fixture';
import { QUANTITY_TRAITS, shownQuantity } from './reading-fields';
import {
  afterLogging,
  EMPTY_DRAFT,
  enter,
  enterText,
  fieldOf,
  firstBase,
  formValues,
  isCarried,
  nextBase,
  sourceWords,
  stepQuantity,
  toCorrection,
  toReading,
  typedNotEntered,
  type ReadingDraft,
} from './reading-form';

const first = firstBase(SPEC, '7A', SETTINGS);

function must<T>(result: { ok: true; value: T } | { ok: false; refusal: { words: string } }): T {
  if (!result.ok) throw new Error(result.refusal.words);
  return result.value;
}

describe('the first reading of a firing', () => {
  it('stands on the rig and the lab and says so, and makes up no voltage and no shots', () => {
    expect(first.values).toMatchObject({
      pressure_bar_g: 0.8,
      gas: 'N2',
      ambient_bar_abs: 0.966,
      temperature_C: 21,
    });
    expect(sourceWords(first, EMPTY_DRAFT, 'pressure_bar_g')).toBe('rig, rev 7A');
    expect(sourceWords(first, EMPTY_DRAFT, 'ambient_bar_abs')).toBe('lab setting');
    expect(first.values.voltage_kV).toBeNull();
    expect(first.values.shots).toBeNull();
  });

  it('has no silent ambient where the lab gives none', () => {
    const bare = firstBase(SPEC, '7A', undefined);
    expect(bare.values.ambient_bar_abs).toBeNull();
    const draft = enter(enter(enter(EMPTY_DRAFT, 'voltage_kV', 18), 'shots', 1), 'temperature_C', 20);
    const refusal = toReading(bare, draft);
    expect(refusal.ok ? null : refusal.refusal.words).toBe('Ambient: enter a number before logging.');
  });

  it('refuses by field, in words, what is missing', () => {
    const refusal = toReading(first, EMPTY_DRAFT);
    expect(refusal.ok ? null : fieldOf(refusal.refusal)).toBe('voltage_kV');
    const shots = toReading(first, enter(EMPTY_DRAFT, 'voltage_kV', 18.9));
    expect(shots.ok ? null : shots.refusal.words).toBe('Shots: enter how many this burst had.');
    const how = toReading(first, enter(enter(EMPTY_DRAFT, 'voltage_kV', 18.9), 'shots', 40));
    expect(how.ok ? null : fieldOf(how.refusal)).toBe('how');
    const looked = toReading(
      first,
      enter(enter(enter(EMPTY_DRAFT, 'voltage_kV', 18.9), 'shots', 40), 'how', 'set'),
    );
    expect(looked.ok ? null : fieldOf(looked.refusal)).toBe('looked');
  });

  it('stores as carried over everything that nobody touched', () => {
    const measured = enter(enter(EMPTY_DRAFT, 'voltage_kV', 18.9), 'shots', 40);
    const draft = enter(enter(measured, 'how', 'self-break'), 'looked', 'even');
    const body = must(toReading(first, draft));
    expect(body.carried_over).not.toContain('voltage_kV');
    expect(body.carried_over).toContain('ambient_bar_abs');
    expect(body.carried_over).toEqual(['pressure_bar_g', 'gas', 'ambient_bar_abs', 'temperature_C']);
    expect(body).not.toHaveProperty('output_attenuators');
    expect(checkBody('firing.reading', body).type).toBe('ok');
  });
});

/** What the fixture's reading says of the carriable fields. */
const KNOWN = CARRIABLE.filter((key) => (READING[key] ?? null) !== null);

describe('the next reading', () => {
  const base = nextBase({ ...READING, note: 'loud', carried_over: ['how'] });

  it('repeats the one before with every field carried over and without its note', () => {
    const body = must(toReading(base, EMPTY_DRAFT));
    expect(body).toEqual({ ...READING, note: '', carried_over: KNOWN });
  });

  it('counts a field as touched when the same value was entered again', () => {
    const draft = must(enterText(EMPTY_DRAFT, 'pressure_bar_g', '1.02'));
    expect(isCarried(draft, 'pressure_bar_g')).toBe(false);
    expect(must(toReading(base, draft)).carried_over).not.toContain('pressure_bar_g');
    expect(sourceWords(base, draft, 'pressure_bar_g')).toBe('entered');
    expect(sourceWords(base, draft, 'flow_L_min')).toBe('carried over');
    expect(sourceWords(base, draft, 'humidity_pct')).toBe('not entered');
  });

  it('lets an optional field be emptied and no other', () => {
    const emptied = must(enterText(EMPTY_DRAFT, 'output_uJ', ''));
    expect(formValues(base, emptied).output_uJ).toBeNull();
    expect(sourceWords(base, emptied, 'output_uJ')).toBe('left out');
    expect(enterText(EMPTY_DRAFT, 'voltage_kV', '').ok).toBe(false);
  });

  it('keeps field and closing words after logging, and nothing else', () => {
    const draft: ReadingDraft = {
      ...enter(EMPTY_DRAFT, 'rate_Hz', 3),
      summary: 'good run',
      field: 'rate_Hz',
      note: 'x',
    };
    expect(afterLogging(draft)).toEqual({ ...EMPTY_DRAFT, summary: 'good run', field: 'rate_Hz' });
  });
});

describe('what a bench notes now and then', () => {
  const seen = {
    ...READING,
    output_attenuators: 4,
    output_eye: 3,
    beam_x_mm: 2,
    beam_y_mm: -1,
    trigger_delay_ns: 250,
    trigger_misses: 2,
    channel_gas: 'air' as const,
    dye_batch: 'R6G 14',
  };

  it('is left out of the entry until somebody says it, and then carried over', () => {
    const body = must(toReading(nextBase(seen), EMPTY_DRAFT));
    expect(body).toMatchObject({ output_attenuators: 4, output_eye: 3, beam_x_mm: 2, dye_batch: 'R6G 14' });
    expect(body.carried_over).toEqual(
      expect.arrayContaining(['output_attenuators', 'beam_x_mm', 'dye_batch']),
    );
    expect(body.carried_over).not.toContain('trigger_jitter_ns');
    expect(checkBody('firing.reading', body).type).toBe('ok');
  });

  it('assumes no misses of the next burst', () => {
    expect(must(toReading(nextBase(seen), EMPTY_DRAFT))).not.toHaveProperty('trigger_misses');
    expect(must(toCorrection(seen, enter(EMPTY_DRAFT, 'voltage_kV', 19.1))).trigger_misses).toBe(2);
  });

  it('takes an emptied batch as not said, and trims what was typed', () => {
    expect(must(toReading(nextBase(seen), enter(EMPTY_DRAFT, 'dye_batch', '  '))).dye_batch).toBeUndefined();
    expect(must(toReading(nextBase(seen), enter(EMPTY_DRAFT, 'dye_batch', ' C4 '))).dye_batch).toBe('C4');
  });

  it('counts attenuators and misses whole', () => {
    const half = enterText(EMPTY_DRAFT, 'output_attenuators', '2.5');
    expect(half.ok ? null : half.refusal.words).toBe('Attenuators: only whole numbers can be counted.');
  });

  it('reads a body of version 1 as one that says nothing of it', () => {
    expect(nextBase(READING).values).toMatchObject({ output_eye: null, channel_gas: null, beam_x_mm: null });
    expect(sourceWords(nextBase(READING), EMPTY_DRAFT, 'output_eye')).toBe('not entered');
  });
});

describe('entering and stepping', () => {
  it('refuses in words what no bench has', () => {
    const refused = enterText(EMPTY_DRAFT, 'pressure_bar_g', '101.3');
    expect(refused.ok ? null : refused.refusal.words).toBe('Pressure: must be at most 20\u2009bar(g).');
    const half = enterText(EMPTY_DRAFT, 'shots', '2.5');
    expect(half.ok ? null : half.refusal.words).toBe('Shots: only whole shots can be counted.');
  });

  it('goes to the next line of its grid, without the dust of binary fractions', () => {
    const up = must(stepQuantity(EMPTY_DRAFT, { key: 'voltage_kV', value: 18.9 }, 1));
    expect(up.entered.voltage_kV).toBe(19);
    const offGrid = must(stepQuantity(EMPTY_DRAFT, { key: 'pressure_bar_g', value: 1.02 }, 1));
    expect(offGrid.entered.pressure_bar_g).toBe(1.05);
    const down = must(stepQuantity(EMPTY_DRAFT, { key: 'pressure_bar_g', value: 1.02 }, -1));
    expect(down.entered.pressure_bar_g).toBe(1);
  });

  it('stops at the bounds', () => {
    expect(stepQuantity(EMPTY_DRAFT, { key: 'shots', value: 0 }, -1).ok).toBe(false);
  });

  it('never hides figures that were entered', () => {
    expect(shownQuantity(18.955, 'voltage_kV')).toBe('18.955');
    expect(shownQuantity(1, 'pressure_bar_g')).toBe('1.00');
    expect(shownQuantity(-0.05, 'pressure_bar_g')).toBe('\u22120.05');
    expect(shownQuantity(null, 'output_uJ')).toBeNull();
  });

  it('has bounds that the entry takes, for every field', () => {
    for (const [key, { rule }] of Object.entries(QUANTITY_TRAITS)) {
      const edge = { ...READING, [key]: rule.max };
      expect(checkBody('firing.reading', edge).type, key).toBe('ok');
      const low = { ...READING, [key]: rule.minExcluded === true ? 0.001 : rule.min };
      expect(checkBody('firing.reading', low).type, key).toBe('ok');
    }
  });
});

describe('figures that are typed and not entered', () => {
  it('stand in the way of logging, since the screen shows them', () => {
    const draft: ReadingDraft = { ...EMPTY_DRAFT, field: 'voltage_kV', typing: '19.' };
    expect(typedNotEntered(draft)?.words).toMatch(/^Voltage: 19\.\u2009kV is typed and not entered/);
    expect(typedNotEntered({ ...draft, typing: '' })).toBeNull();
    expect(typedNotEntered({ ...draft, typing: null })).toBeNull();
  });
});

describe('a correction', () => {
  it('holds the whole reading, and leaves as carried over what was and still is', () => {
    const before = { ...READING, carried_over: [...CARRIABLE] };
    const corrected = must(toCorrection(before, enter(EMPTY_DRAFT, 'voltage_kV', 19.8)));
    expect(corrected.voltage_kV).toBe(19.8);
    expect(corrected.shots).toBe(40);
    expect(corrected.carried_over).toEqual(CARRIABLE.filter((key) => key !== 'voltage_kV'));
  });

  it('does not call carried over what the first writer had read', () => {
    const corrected = must(toCorrection(READING, enter(EMPTY_DRAFT, 'voltage_kV', 19.8)));
    expect(corrected.carried_over).toEqual([]);
  });
});
