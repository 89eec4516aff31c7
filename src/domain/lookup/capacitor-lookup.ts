import { bleedPower, bleedWait } from '../capacitor/bleed';
import { storedEnergy } from '../capacitor/energy';
import { ENERGY_DIGITS } from '../capacitor/energy-text';
import { hazardBand } from '../capacitor/hazard';
import { lifeShots, lifeStressRatio } from '../capacitor/life';
import { touchVerdict } from '../capacitor/touch';
import type { Answer, Warning } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { andThen, ok, type Result } from '../units/result';
import { bankBody } from './capacitor-lookup-bank';
import { CAPACITOR_FIELDS } from './capacitor-lookup-fields';
import { capacitorPlot } from './capacitor-lookup-plot';
import { sheetBody } from './capacitor-lookup-sheet';
import { capacitorStart } from './capacitor-lookup-start';
import { beside, entered, type Entered } from './entered';
import { figureOf, warningsOf } from './figures';
import type { Figure, Lookup, LookupAnswer } from './lookup';

/** One capacitor: what it stores and does to a person, how hard it works, and how long it bleeds (physics C, K and N). */
export const CAPACITOR_LOOKUP: Lookup = {
  key: 'capacitor',
  title: 'Capacitor',
  decides: 'What a capacitor stores, whether its film carries it, and how long it bleeds.',
  fields: CAPACITOR_FIELDS,
  first: 'voltage_kV',
  start: capacitorStart,
  answer: (values, wants = { plot: true }) =>
    andThen(entered(CAPACITOR_FIELDS, values), (input) =>
      beside(answer(input, wants.plot), CAPACITOR_FIELDS, NAMES),
    ),
  solvable: [
    { field: 'voltage_kV', figure: 'energy', purpose: 'store at most', rounding: 'down' },
    { field: 'voltage_kV', figure: 'margin', purpose: 'keep at least', rounding: 'down' },
    { field: 'plies', figure: 'margin', purpose: 'keep at least', rounding: 'up' },
    { field: 'ply_um', figure: 'margin', purpose: 'keep at least', rounding: 'up' },
    { field: 'plies', figure: 'capacitance', purpose: 'have at least', rounding: 'down' },
    { field: 'plate_pairs', figure: 'capacitance', purpose: 'have at least', rounding: 'up' },
    { field: 'width_mm', figure: 'capacitance', purpose: 'have at least', rounding: 'up' },
    { field: 'length_mm', figure: 'capacitance', purpose: 'have at least', rounding: 'up' },
    { field: 'parts', figure: 'capacitance', purpose: 'have at least', rounding: 'up' },
    { field: 'bleed_Mohm', figure: 'bleeds', purpose: 'bleed within', rounding: 'down' },
  ],
};

/** Refusals of the physics name its own inputs. */
const NAMES: Readonly<Record<string, string>> = {
  voltage_V: 'voltage_kV',
  capacitance_F: 'part_nF',
  thickness_m: 'ply_um',
  area_m2: 'width_mm',
  resistance_ohm: 'bleed_Mohm',
  discharged_below_V: 'below_V',
  layers: 'plate_pairs',
  air_m: 'air_um',
};

function answer(input: Entered, plot: boolean): Result<LookupAnswer> {
  const made = input.choice('kind') === 'sheet' ? sheetBody(input) : bankBody(input);
  if (!made.ok) return made;
  const body = made.value;
  const voltage_kV = input.number('voltage_kV');
  const energy = storedEnergy(body.stored.value, voltage_kV * 1000);
  if (!energy.ok) return energy;
  const hazard = hazardParts(input, body.stored.value);
  if (!hazard.ok) return hazard;
  const bleed = bleedParts(input, body.stored.value);
  if (!bleed.ok) return bleed;
  const touch = touchVerdict(body.stored.value, voltage_kV * 1000);
  const life = lifeFigures(input);
  return ok({
    figures: [
      figureOf(['capacitance', 'capacitance'], body.capacitance, {
        rounding: 'nearest',
        times: 1e9,
        unit: 'nF',
        weight: 'answer',
      }),
      energyFigure(energy.value, { hazard: hazard.value, large: input.choice('kind') === 'bank' }),
      ...body.figures,
      ...bleed.value.figures,
      ...life,
      ...(touch.ok ? [touchFigure(touch.value)] : []),
    ],
    says: hazard.value.words ?? NO_SUPPLY,
    model: `${body.capacitance.model}; half of C V squared`,
    valid: body.capacitance.valid,
    warnings: [...body.warnings, ...hazard.value.warnings, ...(touch.ok ? warningsOf([touch.value]) : [])],
    cautions: [
      ...bleed.value.cautions,
      ...body.cautions,
      'Short it with the stick and leave the short on. Local rules and the person responsible decide.',
    ],
    ...(plot ? { plot: capacitorPlot(input, body) } : {}),
  });
}

const NO_SUPPLY = 'Enter the supply\u2019s kV and mA: an energy says nothing without them.';

interface Hazard {
  readonly words: string | null;
  readonly warnings: readonly Warning[];
}

/** From the supply\u2019s limit, or from the voltage where that is higher. */
function hazardParts(input: Entered, capacitance_F: number): Result<Hazard> {
  const kV = input.maybe('supply_kV');
  const mA = input.maybe('supply_mA');
  if (kV === null || mA === null) return ok({ words: null, warnings: [] });
  const band = hazardBand(capacitance_F, { kV: Math.max(kV, input.number('voltage_kV')), mA });
  if (!band.ok) return band;
  return ok({ words: band.value.words, warnings: band.value.warnings });
}

function energyFigure(
  energy: Answer,
  { hazard, large }: { readonly hazard: Hazard; readonly large: boolean },
): Figure {
  return figureOf(['energy', 'stored energy'], energy, {
    rounding: 'up',
    weight: large ? 'answer' : 'main',
    digits: ENERGY_DIGITS,
    note: hazard.words ?? NO_SUPPLY,
  });
}

function touchFigure(touch: {
  readonly exceeds: boolean;
  readonly measured: Answer;
  readonly limit: Answer;
}): Figure {
  const scale =
    touch.limit.unit === 'C'
      ? ([1e6, '\u00b5C'] as const)
      : touch.limit.unit === 'F'
        ? ([1e6, '\u00b5F'] as const)
        : ([1, 'J'] as const);
  const limit = formatFigure(touch.limit.value * scale[0], { digits: { significant: 2 }, rounding: 'down' });
  return figureOf(['touch', 'against the touch limit'], touch.measured, {
    rounding: 'up',
    times: scale[0],
    unit: scale[1],
    digits: 2,
    weight: 'side',
    note: `limit ${limit}\u2009${scale[1]}: ${touch.exceeds ? 'over it, nobody may reach it' : 'under it, still painful'}`,
  });
}

interface Bleed {
  readonly figures: readonly Figure[];
  readonly cautions: readonly string[];
}

function bleedParts(input: Entered, capacitance_F: number): Result<Bleed> {
  const bleed_Mohm = input.maybe('bleed_Mohm');
  const from_V = 1000 * Math.max(input.maybe('supply_kV') ?? 0, input.number('voltage_kV'));
  const wait = bleedWait(
    [
      {
        name: 'This capacitor',
        capacitance_F,
        bleed_ohm: bleed_Mohm === null ? null : bleed_Mohm * 1e6,
      },
    ],
    { supply_V: from_V, discharged_below_V: input.number('below_V') },
  );
  if (!wait.ok) return wait;
  if (wait.value.type === 'unknown' || bleed_Mohm === null) {
    return ok({
      figures: [],
      cautions: [
        'No bleed is entered, so no wait is given: treat it as charged and short it with the stick.',
      ],
    });
  }
  const { wait_s, slowestTime } = wait.value;
  const power = bleedPower(bleed_Mohm * 1e6, from_V);
  return ok({
    figures: [
      figureOf(['bleeds', 'bleeds in'], slowestTime, { rounding: 'up' }),
      {
        key: 'wait',
        label: 'wait before the stick',
        value: wait_s,
        unit: 's',
        rounding: 'up',
        digits: 3,
        decimals: 0,
        weight: 'main',
        note: 'voltage not proven: short now',
      },
      ...(power.ok
        ? [
            figureOf(['bleed_power', 'power of the bleed resistor'], power.value, {
              rounding: 'up',
              weight: 'side' as const,
              note: 'it must stand the whole voltage as well',
            }),
          ]
        : []),
    ],
    cautions: ['A wait proves nothing: measure with a meter that was proved before and after.'],
  });
}

/** Only from shots that somebody gave: nothing here founds a life from a data sheet\u2019s strength. */
function lifeFigures(input: Entered): readonly Figure[] {
  const endured = input.maybe('endured_shots');
  const at_kV = input.maybe('endured_kV') ?? input.maybe('rated_kV');
  if (endured === null || at_kV === null) return [];
  const reversal = input.number('reversal_percent') / 100;
  const share = lifeStressRatio({
    voltage_V: (1000 * input.number('voltage_kV')) / (input.maybe('in_series') ?? 1),
    reversal,
    rated_V: at_kV * 1000,
    ratedReversal: input.maybe('endured_kV') === null ? 0 : reversal,
  });
  if (!share.ok) return [];
  const life = lifeShots({ ratedShots: endured, exponent: LIFE_EXPONENT }, share.value.value);
  if (!life.ok) return [];
  const shots = input.maybe('shots');
  return [
    figureOf(['life', 'life expected'], life.value, { rounding: 'down', digits: 1, unit: 'shots' }),
    ...(shots === null
      ? []
      : [
          {
            key: 'life_used',
            label: 'of that life used',
            value: (100 * shots) / life.value.value,
            low: (100 * shots) / life.value.band.high,
            high: (100 * shots) / life.value.band.low,
            unit: '%',
            rounding: 'up' as const,
            digits: 2,
            weight: 'main' as const,
          },
        ]),
  ];
}

/** Physics C: 7.5 to 8 by pulsed-power practice, from memory. */
const LIFE_EXPONENT = 7.5;
