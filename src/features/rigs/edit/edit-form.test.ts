import { describe, expect, it } from 'vitest';
import { rigSpecSchema, type RigSpec } from '../../../domain/book/rig-spec';
import { specCheck } from '../../../domain/rules/spec-check';
import { rigFigures } from '../../../domain/rules/rig-figures';
import { HERON, KETTLE } from '../rigs.fixture';
import { allFields, sectionOf } from './edit-sections';
import { EMPTY_EDIT, provisionalSpec, readEdit, textOfDraft, type EditDraft } from './edit-form';
import { newRow, rowsOf, textsOf, type Texts } from './spec-texts';
import { startingValues } from './starting-values';

const LAB = { ambient_bar_abs: 0.966 };

function edited(texts: Texts, base: RigSpec = HERON) {
  return readEdit(textOfDraft({ ...EMPTY_EDIT, texts }, textsOf(base)), LAB);
}

/** Every optional field filled, so that nothing of the spec can be lost unseen. */
const FULL: RigSpec = {
  ...HERON,
  gap: {
    ...HERON.gap,
    electrodes: 'hex-bars',
    radius_mm: null,
    flats_mm: 13,
    corner_mm: 0.5,
    facing: 'edges',
  },
  second: {
    kind: 'bank',
    part: 'Ceramic',
    capacitance_nF: 3,
    rated_kV: 30,
    parts: 3,
    catalogue: 'polypropylene film',
  },
  channel: {
    ...HERON.channel,
    profile: 'half round',
    edge_mm: 2,
    width_mm: 3,
    flow_L_min: 4,
    feeler_a_mm: 10,
    feeler_b_mm: 230,
    feeler_error_mm: 0.02,
    screws: [
      { name: 'A', position_mm: -5, pitch_mm: 0.5, lever: 1, closes: 'clockwise' },
      { name: 'B', position_mm: 250, pitch_mm: 0.7, lever: 0.5, closes: 'anticlockwise' },
    ],
  },
  charging: { ...HERON.charging, inductor_uH: 10, inductor_ohm: 1 },
  beam: {
    ...HERON.beam,
    pulse_ns: 5,
    width_mm: 3,
    height_mm: 20,
    divergence_width_mrad: 2,
    divergence_height_mrad: 10,
    stop: 'Brick',
  },
  model: {
    ...HERON.model,
    gap_law: {
      law: 'rompe-weizel',
      end_ohm: 0.1,
      start_ohm: 100,
      fall_ns: null,
      constant_cm2_atm_V2s: 1,
      known: 'assumed',
    },
    channel_law: { over_static: 1.3, end_ohm: 0.2, start_ohm: 100, fall_ns: 2, known: 'measured' },
  },
};

describe('a rig laid out as fields', () => {
  it.each([
    ['Heron', HERON],
    ['Kettle', KETTLE],
    ['one with every field', FULL],
  ])('gives %s back as it was', (_name, spec) => {
    const { spec: back, refusals } = edited({}, spec);
    expect(refusals).toEqual({});
    expect(back).toEqual(spec);
  });

  it('changes only what was typed, in the unit it was typed in', () => {
    const { spec } = edited({ 'gap.gap_mm': '0.1 in', 'gap.highest_bar_g': '1.566 bar(abs)' });
    expect(spec).toEqual({ ...HERON, gap: { ...HERON.gap, gap_mm: 2.54, highest_bar_g: 0.6 } });
    expect(edited({ 'charging.ballast_Mohm': '20000 kΩ' }).spec?.charging.ballast_Mohm).toBe(20);
  });

  it('drops what has no meaning any more, and takes it back with its choice', () => {
    const bank = edited({
      'first.kind': 'bank',
      'first.part': 'Ceramic',
      'first.capacitance_nF': '3',
      'first.rated_kV': '30',
    });
    expect(bank.spec?.first).toEqual({ kind: 'bank', part: 'Ceramic', capacitance_nF: 3, rated_kV: 30 });
    const open = edited({
      'gap.vessel': 'none',
      'gap.lowest_bar_g': '0',
      'gap.highest_bar_g': '0',
      'envelope.max_bar_g': '0',
    });
    expect(open.spec?.gap.vessel).toBeNull();
    expect(edited({ 'first.kind': 'bank' }).refusals['first.part']).toBe('Part: say it in words.');
  });

  it('adds and takes out rows, and gives a new row no old text', () => {
    const texts = { ...textsOf(HERON), nodes: 'r0' };
    const row = newRow('nodes', texts);
    expect(row).toBe('r2');
    const { spec } = edited({
      shorting_points: `r1 r0 ${newRow('shorting_points', textsOf(HERON))}`,
      'shorting_points.r5': 'Ground strap',
    });
    expect(spec?.shorting_points).toEqual(['C2', 'C1', 'Ground strap']);
    expect(rowsOf('')).toEqual([]);
  });

  it('refuses in words beside the field, and knows the section of it', () => {
    const cases: readonly (readonly [string, string, RegExp])[] = [
      ['gap.gap_mm', 'abc', /^Gap: /],
      ['gap.gap_mm', '', /^Gap: enter a number/],
      ['charging.supply_kV', '1e9', /^Supply voltage: must be at most 200/],
      ['first.plies', '2.5', /whole number/],
      ['gap.vessel.proof_date', '20260231', /eight figures/],
      ['gap.highest_bar_g', '1.2', /relief valve/],
      ['envelope.max_kV', '17', /supply’s limit/],
      ['nodes.r1.name', 'C1, gap side', /another node/],
      ['nodes', '', /name every node/],
      ['gap.gas', 'steam', /choose one/],
      ['gap.gap_mm', '2 parsec', /unit/],
    ];
    for (const [key, text, words] of cases) {
      const { refusals, spec } = edited({ [key]: text });
      expect(refusals[key], key).toMatch(words);
      expect(sectionOf(key), key).not.toBeNull();
      expect(spec).toBeNull();
    }
  });

  it('takes an emptied bleed as not known, and cautions', () => {
    const { spec, cautions } = edited({ 'nodes.r1.bleed_Mohm': '' });
    expect(spec?.nodes[1]?.bleed_Mohm).toBeNull();
    expect(cautions[0]?.type).toBe('bleed-not-known');
    expect(edited({ 'gap.vessel.proof_date': '20260110' }).spec?.gap.vessel?.proof_date).toBe('2026-01-10');
  });
});

describe('starting values', () => {
  it.each(['lc-inversion', 'charge-transfer'] as const)('make a rig of a %s without a bleed', (topology) => {
    const suggested = startingValues(topology);
    const { spec, refusals } = readEdit(textOfDraft({ ...EMPTY_EDIT, suggested }, {}), LAB);
    expect(refusals).toEqual({});
    if (spec === null) throw new Error('no rig');
    expect(spec.topology).toBe(topology);
    expect(spec.nodes.every((node) => node.bleed_Mohm === null)).toBe(true);
    expect(specCheck(spec, LAB).cautions.every((one) => one.type === 'bleed-not-known')).toBe(true);
    const figures = rigFigures(spec, { discharged_below_V: 50 });
    expect(figures.ok && figures.value.wait.type).toBe('unknown');
  });

  it('fill what is open for the figures, and say which fields they took', () => {
    const textOf = textOfDraft(
      { ...EMPTY_EDIT, texts: { topology: 'charge-transfer', 'gap.gap_mm': '3' } },
      {},
    );
    const start = startingValues('charge-transfer');
    const found = provisionalSpec(textOf, (key) => start[key] ?? '', LAB);
    expect(found?.spec.gap.gap_mm).toBe(3);
    expect(found?.taken).toContain('charging.supply_kV');
    expect(found?.taken).not.toContain('gap.gap_mm');
  });
});

/** Mulberry32: small, fixed, and the same on every machine. */
function dice(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state + 0x6d2b79f5) | 0;
    let t = Math.imul(state ^ (state >>> 15), 1 | state);
    t = (t + Math.imul(t ^ (t >>> 7), 61 | t)) ^ t;
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

const NASTY = [
  '',
  ' ',
  '-',
  '.',
  '0',
  '-0',
  '-1',
  '1e308',
  '1e-308',
  '9'.repeat(400),
  'NaN',
  'Infinity',
  '1,5',
  '0x10',
  '2 in',
  '3 bar(abs)',
  '−2.5',
  '12 furlongs',
  'yes',
  'none',
  'given',
  'r0 r1 r2 r3',
  'r0 r0',
  'constructor',
  '__proto__',
  '<b>',
  '\u0000',
  'sheet',
  'bank',
  'hex-bars',
  'capped-rods',
  'rompe-weizel',
];

describe('any text in any field', () => {
  it('answers or refuses in words: 300 edits, no NaN, no throw', { timeout: 30_000 }, () => {
    const roll = dice(20_261_201);
    const pick = <T>(from: readonly T[]): T => from[Math.floor(roll() * from.length)] as T;
    let draft: EditDraft = EMPTY_EDIT;
    let written = 0;
    for (let i = 0; i < 300; i += 1) {
      if (i % 4 === 0) draft = EMPTY_EDIT;
      const base = textsOf(pick([HERON, KETTLE, FULL]));
      const keys = [
        ...allFields(textOfDraft(draft, base)).map((field) => field.key),
        'nodes',
        'shorting_points',
        'channel.screws',
      ];
      const text = roll() < 0.4 ? pick(NASTY) : String(Number((10 ** (roll() * 8 - 4)).toPrecision(3)));
      draft = { ...draft, texts: { ...draft.texts, [pick(keys)]: text } };
      const textOf = textOfDraft(draft, base);
      const { spec, refusals, cautions } = readEdit(textOf, LAB);
      const said = [...Object.values(refusals), ...cautions.map((one) => one.words)];
      for (const words of said)
        expect(words.replace(/"[^"]*"/g, '')).not.toMatch(/NaN|undefined|Infinity|\[object/);
      if (spec === null) expect(Object.keys(refusals).length).toBeGreaterThan(0);
      else {
        written += 1;
        expect(rigSpecSchema.safeParse(spec).success).toBe(true);
        // JSON has no number that is not finite: it would come back as null.
        expect(JSON.parse(JSON.stringify(spec))).toEqual(spec);
      }
      const start = startingValues('lc-inversion');
      const provisional = provisionalSpec(textOf, (key) => base[key] ?? start[key] ?? '', LAB);
      if (provisional !== null) expect(rigSpecSchema.safeParse(provisional.spec).success).toBe(true);
    }
    expect(written).toBeGreaterThan(30);
  });
});
