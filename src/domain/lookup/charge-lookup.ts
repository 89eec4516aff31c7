import { hazardBand } from '../capacitor/hazard';
import { planRate, timeToSelfBreak, type RatePlan } from '../charging/rate-limits';
import { supplyPower } from '../charging/relaxation';
import { supplyReach, type Charging } from '../charging/supply-reach';
import { selfBreak } from '../gap/self-break';
import { purgeFlow } from '../gap/upkeep';
import type { Warning } from '../units/answer';
import { formatFigure } from '../units/format-quantity';
import { andThen, ok, refused, type Result } from '../units/result';
import { CHARGE_FIELDS } from './charge-lookup-fields';
import { chargePlot } from './charge-lookup-plot';
import { chargeStart } from './charge-lookup-start';
import { beside, entered, type Entered } from './entered';
import { figureOf, warningsOf } from './figures';
import { gapSetupAt } from './gap-lookup';
import type { Figure, Lookup, LookupAnswer, Values } from './lookup';

/** Charging a gap until it fires by itself: how long, how often, and whether at all (physics C and M). */
export const CHARGE_LOOKUP: Lookup = {
  key: 'charge',
  title: 'Charge and rate',
  decides: 'Whether the supply makes the gap fire, how soon and how often, and what holds the rate.',
  fields: CHARGE_FIELDS,
  first: 'ballast_Mohm',
  start: chargeStart,
  answer: (values, wants = { plot: true }) =>
    andThen(entered(CHARGE_FIELDS, values), (input) =>
      beside(answer(input, { values, plot: wants.plot }), CHARGE_FIELDS, NAMES),
    ),
  solvable: [
    { field: 'ballast_Mohm', figure: 'by_charging', purpose: 'fire at least at', rounding: 'down' },
    { field: 'capacitance_nF', figure: 'by_charging', purpose: 'fire at least at', rounding: 'down' },
    { field: 'supply_kV', figure: 'by_charging', purpose: 'fire at least at', rounding: 'up' },
    { field: 'supply_kV', figure: 'reachable', purpose: 'reach at least', rounding: 'up' },
    { field: 'ballast_Mohm', figure: 'reachable', purpose: 'reach at least', rounding: 'down' },
    { field: 'bleed_Mohm', figure: 'reachable', purpose: 'reach at least', rounding: 'up' },
    { field: 'flow_L_min', figure: 'by_purge', purpose: 'fire at least at', rounding: 'up' },
  ],
};

/** Refusals of the physics name its own inputs. */
const NAMES: Readonly<Record<string, string>> = {
  capacitance_F: 'capacitance_nF',
  law_kV: 'break_kV',
  break_V: 'break_kV',
  supply_V: 'supply_kV',
  ballast_ohm: 'ballast_Mohm',
  u_gap_mm: 'gap_error_mm',
};

/** The self-break that it is charged to, from its low side to its high one. */
export interface ChargeSides {
  readonly low_kV: number;
  readonly law_kV: number;
  readonly high_kV: number;
  readonly warnings: readonly Warning[];
}

interface Asked {
  readonly values: Values;
  readonly plot: boolean;
}

function answer(input: Entered, { values, plot }: Asked): Result<LookupAnswer> {
  const sides = sidesAt(input, values);
  if (!sides.ok) return sides;
  const charging = chargingAt(input);
  const reach = supplyReach(charging, sides.value);
  if (!reach.ok) return reach;
  const capacitance_F = input.number('capacitance_nF') * 1e-9;
  const hazard = hazardBand(capacitance_F, { kV: charging.supply_kV, mA: charging.supply_mA });
  if (!hazard.ok) return hazard;
  const fires = reach.value.type !== 'never-fires';
  const plan = fires ? planAt(input, { charging, capacitance_F, break_kV: sides.value.law_kV }) : ok(null);
  if (!plan.ok) return plan;
  const power = plan.value === null ? [] : powerFigures(input, plan.value, sides.value.law_kV);
  return ok({
    figures: [
      ...timeFigures({ charging, capacitance_F, sides: sides.value }),
      ...(plan.value === null ? [] : rateFigures(input, plan.value)),
      figureOf(['reachable', 'the supply reaches'], reach.value.reachable, {
        rounding: 'down',
        note: 'past ballast and bleed, while the gap stays shut',
      }),
      figureOf(['needed', 'it must reach, to be sure'], reach.value.needed, { rounding: 'up' }),
      ...power,
      figureOf(['stored', 'stored at the supply\u2019s limit'], hazard.value.energy, {
        rounding: 'up',
        digits: 2,
        note: hazard.value.words,
      }),
      ...sideFigures(sides.value),
    ],
    says: [reach.value.words, ...(fires ? [] : [WHAT_TO_DO]), ...rateWords(input, plan.value)].join(' '),
    model: plan.value?.rate.model ?? reach.value.model,
    valid: plan.value?.valid ?? reach.value.valid,
    warnings: warningsOf([
      ...(plan.value === null ? [] : [plan.value, plan.value.rate]),
      reach.value,
      sides.value,
    ]),
    cautions: [
      reach.value.type === 'reaches'
        ? 'Between shots it stands charged, and after the last one too. Make safe before anyone reaches in.'
        : 'A gap that does not fire leaves it charged to what the supply reaches, for as long as it is on.',
      'Stress every part for the supply\u2019s full voltage. Local rules and the person responsible decide.',
    ],
    ...(plot
      ? {
          plot: chargePlot({
            charging,
            capacitance_F,
            sides: sides.value,
            reachable_kV: reach.value.reachable_kV,
          }),
        }
      : {}),
  });
}

const WHAT_TO_DO =
  'Lower the pressure or the gap, raise the supply, or take less ballast or a larger bleed. Bleed and short it first.';

function sidesAt(input: Entered, values: Values): Result<ChargeSides> {
  if (input.choice('break_by') === 'gap') {
    const setup = gapSetupAt(values);
    if (!setup.ok) return setup;
    const bar_abs = input.number('pressure') + input.number('ambient_bar_abs');
    return selfBreak({ ...setup.value, pressure: { bar_abs } });
  }
  const [low_kV, law_kV, high_kV] = [
    input.number('low_kV'),
    input.number('break_kV'),
    input.number('high_kV'),
  ];
  if (low_kV > law_kV) {
    return refused({
      type: 'sides-crossed',
      field: 'low_kV',
      words: 'Nothing fires below: must not lie above the self-break.',
    });
  }
  if (high_kV < law_kV) {
    return refused({
      type: 'sides-crossed',
      field: 'high_kV',
      words: 'May hold up to: must not lie below the self-break.',
    });
  }
  return ok({ low_kV, law_kV, high_kV, warnings: [] });
}

function chargingAt(input: Entered): Charging {
  const supply_W = input.maybe('supply_W');
  return {
    supply_kV: input.number('supply_kV'),
    supply_mA: input.number('supply_mA'),
    ...(supply_W === null ? {} : { supply_W }),
    ballast_Mohm: input.number('ballast_Mohm'),
    bleed_Mohm: input.maybe('bleed_Mohm'),
  };
}

interface Charged {
  readonly charging: Charging;
  readonly capacitance_F: number;
}

function planAt(
  input: Entered,
  { charging, ...gap }: Charged & { readonly break_kV: number },
): Result<RatePlan> {
  const flow_L_min = input.maybe('flow_L_min');
  const volume_cm3 = input.maybe('volume_cm3');
  return planRate(charging, {
    ...gap,
    blown: input.choice('blown') === 'blown',
    ...(flow_L_min === null || volume_cm3 === null ? {} : { purge: { flow_L_min, volume_cm3 } }),
  });
}

/** From empty to self-break; its band goes from the low side to the high one, or has no end where that is not reached. */
function timeFigures({
  charging,
  capacitance_F,
  sides,
}: Charged & { readonly sides: ChargeSides }): readonly Figure[] {
  const timeTo = (break_kV: number) => timeToSelfBreak(charging, { capacitance_F, break_kV });
  const time = timeTo(sides.law_kV);
  const common = {
    key: 'time',
    label: 'time to self-break',
    unit: 's',
    rounding: 'up',
    digits: 3,
    weight: 'answer',
  } as const;
  if (!time.ok) return [{ ...common, value: 0, words: 'never: it sits charged' }];
  const [low, high] = [timeTo(sides.low_kV), timeTo(sides.high_kV)];
  return [
    figureOf(
      ['time', 'time to self-break'],
      low.ok && high.ok
        ? { ...time.value, band: { low: low.value.value, high: high.value.value } }
        : { ...time.value, band: { low: time.value.value, high: time.value.value } },
      {
        rounding: 'up',
        weight: 'answer',
        note: high.ok
          ? 'from empty; the band goes from the low side to the high one'
          : 'from empty, if it breaks by the law; on its high side it never breaks',
      },
    ),
  ];
}

/** The rate to plan with: never more than was allowed. */
function heldRate(
  input: Entered,
  { rate }: RatePlan,
): { readonly value: number; readonly byEnvelope: boolean } {
  const allowed = input.maybe('envelope_Hz');
  return allowed !== null && allowed < rate.value
    ? { value: allowed, byEnvelope: true }
    : { value: rate.value, byEnvelope: false };
}

const LIMIT_NAMES: Readonly<Record<RatePlan['limitedBy'], readonly [key: string, label: string]>> = {
  charging: ['by_charging', 'rate by ballast and bleed'],
  'supply-current': ['by_current', 'rate by the supply\u2019s current'],
  'supply-power': ['by_power', 'rate by the supply\u2019s power'],
  'gap-recovery': ['by_recovery', 'rate by the gap\u2019s recovery'],
  'purge-flow': ['by_purge', 'rate by the purge flow'],
};

function rateFigures(input: Entered, plan: RatePlan): readonly Figure[] {
  const held = heldRate(input, plan);
  const rate = held.byEnvelope
    ? { ...plan.rate, value: held.value, band: { low: held.value, high: held.value } }
    : plan.rate;
  return [
    figureOf(['rate', 'rate at most'], rate, {
      rounding: 'down',
      digits: 2,
      weight: 'answer',
      note: held.byEnvelope ? ENVELOPE_WORDS : plan.words,
    }),
    ...plan.limits.map((limit) =>
      figureOf(LIMIT_NAMES[limit.type], limit.rate, {
        rounding: 'down',
        weight: limit.type === plan.limitedBy ? 'main' : 'side',
      }),
    ),
  ];
}

const ENVELOPE_WORDS = 'The rate that is allowed holds it.';

function rateWords(input: Entered, plan: RatePlan | null): readonly string[] {
  if (plan === null) return [];
  const held = heldRate(input, plan);
  const wanted = input.maybe('wanted_Hz');
  const limit = held.byEnvelope ? ENVELOPE_WORDS : plan.words;
  if (wanted === null) return [limit];
  const shown = formatFigure(wanted, { digits: { significant: 2 }, rounding: 'nearest' });
  return wanted <= held.value
    ? [`${shown}\u2009Hz can be had.`]
    : [`${shown}\u2009Hz cannot be had. ${limit}`];
}

/** What the wanted rate takes, or the highest one where none is wanted. */
function powerFigures(input: Entered, plan: RatePlan, break_kV: number): readonly Figure[] {
  const rate_Hz = Math.min(input.maybe('wanted_Hz') ?? Infinity, heldRate(input, plan).value);
  const capacitance_F = input.number('capacitance_nF') * 1e-9;
  const power = supplyPower({
    capacitance_F,
    break_V: break_kV * 1000,
    supply_V: input.number('supply_kV') * 1000,
    rate_Hz,
  });
  const volume_cm3 = input.maybe('volume_cm3');
  const flow = volume_cm3 === null ? null : purgeFlow({ volume_cm3, rate_Hz, volumes: VOLUMES_A_SHOT });
  const at = `at ${formatFigure(rate_Hz, { digits: { significant: 2 }, rounding: 'nearest' })}\u2009Hz`;
  return [
    ...(power.ok
      ? [figureOf(['power', 'power from the supply'], power.value, { rounding: 'up' as const, note: at })]
      : []),
    {
      key: 'current',
      label: 'mean current from the supply',
      value: capacitance_F * break_kV * 1000 * rate_Hz * 1000,
      unit: 'mA',
      rounding: 'up',
      digits: 3,
      weight: 'main',
      note: at,
    },
    ...(flow?.ok === true
      ? [
          figureOf(['flow', 'purge flow that this wants'], flow.value, {
            rounding: 'up' as const,
            note: 'three gap volumes a shot',
          }),
        ]
      : []),
  ];
}

const VOLUMES_A_SHOT = 3;

function sideFigures({ low_kV, law_kV, high_kV }: ChargeSides): readonly Figure[] {
  const kV = { unit: 'kV', digits: 3, decimals: 1, weight: 'side' } as const;
  return [
    { ...kV, key: 'low', label: 'nothing fires below', value: low_kV, rounding: 'down' },
    { ...kV, key: 'law', label: 'self-break by the law', value: law_kV, rounding: 'nearest' },
    { ...kV, key: 'high', label: 'may hold up to', value: high_kV, rounding: 'up' },
  ];
}
