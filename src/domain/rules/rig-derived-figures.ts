import type { CapacitorSpec, RigSpec } from '../book/rig-spec';
import { plyThickness_m } from '../capacitor/capacitance';
import { ENERGY_DIGITS } from '../capacitor/energy-text';
import { dielectricStress, stressMargin } from '../capacitor/stress';
import type { CircuitAnswer } from '../circuit/circuit-answer';
import { inversionPeak, transferPeak } from '../circuit/ideals';
import { planRate } from '../charging/rate-limits';
import type { SupplyReach } from '../charging/supply-reach';
import type { GapAnswer } from '../gap/self-break';
import { answer, type Answer } from '../units/answer';
import { computed } from '../units/computed';
import { formatQuantity } from '../units/format-quantity';
import { andThen, mapResult, ok, type Result } from '../units/result';
import { channelStatic, type RigTransient } from './rig-circuit';
import type { DerivedFigure, RigDerived } from './rig-derived';
import { chargingOf, storedAt_J, type RigFigures } from './rig-figures';

/** Stress under this share of what it stands is too close for duty with reversal (practice). */
const LEAST_MARGIN = 3;

interface Parts {
  readonly figures: Result<RigFigures>;
  readonly broken: Result<GapAnswer>;
  readonly at: RigDerived['at'];
}

type Row = Omit<DerivedFigure, 'caution'> & { readonly caution?: boolean };

function row({ caution = false, ...figure }: Row): DerivedFigure {
  return { ...figure, caution };
}

export function energyFigures(spec: RigSpec, { figures, broken, at }: Parts): readonly DerivedFigure[] {
  const { supply_kV, supply_mA } = spec.charging;
  const names = capacitorNames(spec);
  const supply = `supply ${supply_kV}\u2009kV and ${supply_mA}\u2009mA`;
  const pressure = `at ${formatQuantity(at.pressure_bar_g, 'bar(g)', { digits: { decimals: 2 }, rounding: 'nearest' })}`;
  const nanofarad = (farad: number): Answer =>
    exact(farad * 1e9, 'nF', 'Of the rig\u2019s parts as entered, at low voltage');
  return [
    row({
      key: 'first',
      label: names.first,
      figure: mapResult(figures, ({ first_F }) => nanofarad(first_F)),
      rounding: 'nearest',
      digits: 3,
      words: partWords(spec.first),
    }),
    row({
      key: 'second',
      label: names.second,
      figure: mapResult(figures, ({ second_F }) => nanofarad(second_F)),
      rounding: 'nearest',
      digits: 3,
      words: partWords(spec.second),
    }),
    row({
      key: 'stored',
      label: 'Stored at the supply\u2019s limit',
      figure: mapResult(figures, ({ stored_J }) => exact(stored_J, 'J', 'Half of C V squared')),
      rounding: 'up',
      digits: ENERGY_DIGITS,
      words: figures.ok ? figures.value.hazard.words : '',
      caution: true,
    }),
    row({
      key: 'stored_at_break',
      label: 'Stored at self-break',
      figure: andThen(broken, ({ law_kV }) =>
        mapResult(storedAt_J(spec, law_kV), (joule) => exact(joule, 'J', 'Half of C V squared')),
      ),
      rounding: 'up',
      digits: ENERGY_DIGITS,
      words: `By the law ${pressure}; a gap that stays shut lets the whole ${supply} through.`,
    }),
    row({
      key: 'self_break',
      label: 'Self-break',
      figure: mapResult(broken, sidesAnswer),
      rounding: 'nearest',
      digits: 3,
      words: `By the law ${pressure}`,
    }),
  ];
}

function sidesAnswer({ law_kV, low_kV, high_kV, model, valid, warnings }: GapAnswer): Answer {
  return { value: law_kV, unit: 'kV', band: { low: low_kV, high: high_kV }, model, valid, warnings };
}

export function reachFigure(reach: Result<SupplyReach>): DerivedFigure {
  return row({
    key: 'reach',
    label: 'The supply reaches',
    figure: mapResult(reach, ({ reachable_kV }) =>
      answer({
        value: reachable_kV,
        unit: 'kV',
        relative: 0.02,
        model: 'Ballast and bleed divide the supply',
        valid: 'steady state, no corona or leakage beside the bleed',
      }),
    ),
    rounding: 'down',
    digits: 3,
    words: reach.ok ? reach.value.words : '',
    caution: reach.ok && reach.value.type !== 'reaches',
  });
}

/** Both capacitors at the supply's limit, since a gap that stays shut lets it through. */
export function stressFigures(
  spec: RigSpec,
  { figures, reach }: { readonly figures: Result<RigFigures>; readonly reach: Result<SupplyReach> },
): readonly DerivedFigure[] {
  return (['first', 'second'] as const).flatMap((side) => {
    const capacitor = spec[side];
    const name = capacitorNames(spec)[side];
    const margin = marginOf(capacitor, spec.charging.supply_kV);
    const swing = side === 'second' ? swingWords(spec, { figures, reach }) : '';
    const little = margin.ok && margin.value.value < (capacitor.kind === 'sheet' ? LEAST_MARGIN : 1);
    return [
      row({
        key: `stress_${side}`,
        label: `Stress of ${name}`,
        figure: stressOf(capacitor, spec.charging.supply_kV),
        rounding: 'up',
        digits: 3,
        words: 'At the supply\u2019s limit',
      }),
      row({
        key: `margin_${side}`,
        label: `Margin of ${name}`,
        figure: margin,
        rounding: 'down',
        digits: 2,
        words: [marginWords(capacitor, little), swing].filter((one) => one !== '').join(' '),
        caution: little || swing !== '',
      }),
    ];
  });
}

function stressOf(capacitor: CapacitorSpec, supply_kV: number): Result<Answer> {
  if (capacitor.kind === 'bank') return ok(exact(supply_kV, 'kV', 'The supply\u2019s limit'));
  return andThen(plyThickness_m(capacitor.plies, capacitor.ply_um), (thickness_m) =>
    dielectricStress(supply_kV * 1000, thickness_m),
  );
}

function marginOf(capacitor: CapacitorSpec, supply_kV: number): Result<Answer> {
  if (capacitor.kind === 'sheet') {
    return andThen(plyThickness_m(capacitor.plies, capacitor.ply_um), (thickness_m) =>
      stressMargin(supply_kV * 1000, thickness_m, capacitor.strength_kV_mm),
    );
  }
  return computed([], () => ({
    value: capacitor.rated_kV / supply_kV,
    unit: '1',
    relative: 0,
    model: 'Rated voltage over the supply\u2019s limit',
    valid: 'the maker\u2019s rating; reversal and rate shorten life',
  }));
}

function marginWords(capacitor: CapacitorSpec, little: boolean): string {
  if (capacitor.kind === 'bank') {
    return `Rated ${capacitor.rated_kV}\u2009kV${little ? ', below the supply\u2019s limit.' : ''}`;
  }
  const tested = `Tested to ${capacitor.strength_kV_mm}\u2009kV/mm`;
  return little ? `${tested}; under 3: too little for duty with reversal. Expect punctures.` : tested;
}

/** A channel that stays dark lets the peaking capacitor swing past what charged the dump capacitor. */
function swingWords(
  { topology, second }: RigSpec,
  { figures, reach }: { readonly figures: Result<RigFigures>; readonly reach: Result<SupplyReach> },
): string {
  if (topology !== 'charge-transfer' || second.kind !== 'bank' || !figures.ok || !reach.ok) return '';
  const { first_F, second_F } = figures.value;
  const peak = transferPeak({ dump_F: first_F, peaking_F: second_F }, reach.value.reachable_kV * 1000);
  if (!peak.ok || peak.value.value <= second.rated_kV * 1000) return '';
  const shown = formatQuantity(peak.value.value / 1000, 'kV', {
    digits: { significant: 3 },
    rounding: 'up',
  });
  return `With a late gap and a dark channel it may swing up to ${shown}, past its rating; losses take some of that.`;
}

export function circuitFigures(
  spec: RigSpec,
  from: Parts & { readonly transient: Result<RigTransient> },
): readonly DerivedFigure[] {
  const { figures, transient, broken, at } = from;
  const assumed =
    transient.ok && transient.value.assumed.length > 0 ? ` ${assumedWords(transient.value)}` : '';
  const found = (key: DerivedFigure['key'], label: string, of: (one: RigTransient) => Result<Answer>) =>
    ({ key, label, figure: andThen(transient, of), digits: 3, words: '' }) as const;
  return [
    row({
      key: 'channel_static',
      label: 'Static break of the channel',
      figure: channelStatic(spec, at),
      rounding: 'nearest',
      digits: 3,
      words: 'At its narrower end and the lab\u2019s ambient',
    }),
    row({
      key: 'ideal_peak',
      label: 'Ideal channel voltage',
      figure: andThen(figures, ({ first_F, second_F }) =>
        andThen(broken, ({ law_kV }) =>
          kilovolt(
            spec.topology === 'lc-inversion'
              ? inversionPeak(law_kV * 1000)
              : transferPeak({ dump_F: first_F, peaking_F: second_F }, law_kV * 1000),
          ),
        ),
      ),
      rounding: 'nearest',
      digits: 3,
      words: 'A ceiling without losses',
    }),
    row({
      ...found('channel_peak', 'Channel peak', ({ answer: { peakVoltage } }) => kilovolt(ok(peakVoltage))),
      rounding: 'nearest',
      words: transient.ok ? `${firesWords(transient.value)}${assumed}` : '',
      caution: transient.ok && !(transient.value.answer.fires.asGiven && transient.value.answer.fires.always),
    }),
    row({
      ...found('time_to_peak', 'Time to the peak', ({ answer: { timeToPeak } }) => nanosecond(timeToPeak)),
      rounding: 'nearest',
    }),
    row({
      ...found('rise', 'Rise of the channel voltage', ({ answer: { rise } }) => nanosecond(rise)),
      rounding: 'up',
    }),
    row({
      ...found('current_rise', 'Rise of the channel current', ({ answer: solved, currentRise_s }) =>
        rigCurrentRise(solved, currentRise_s),
      ),
      rounding: 'up',
      words: transient.ok ? (transient.value.gain?.words ?? '') : '',
    }),
    row({
      ...found('gap_current', 'Peak current of the gap', ({ answer: { peakGapCurrent } }) =>
        ok(peakGapCurrent),
      ),
      rounding: 'nearest',
    }),
    row({
      ...found('channel_current', 'Peak current of the channel', ({ answer: { peakChannelCurrent } }) =>
        peakChannelCurrent === null ? DARK : ok(peakChannelCurrent),
      ),
      rounding: 'nearest',
    }),
  ];
}

const DARK: Result<Answer> = {
  ok: false,
  refusal: { type: 'channel-dark', words: 'The channel stays dark: no current flows in it.' },
};

/** Points of the wave shape lie half a per cent of the window apart. Own estimate, with what the laws leave open. */
const CURRENT_RISE_SHARE = 0.3;

/** Rise of the channel current, ns; refused while the channel stays dark. */
export function rigCurrentRise({ rise }: CircuitAnswer, currentRise_s: number | null): Result<Answer> {
  if (currentRise_s === null) return DARK;
  const { model, valid, warnings } = rise;
  return computed([], () => ({
    value: currentRise_s * 1e9,
    unit: 'ns',
    relative: CURRENT_RISE_SHARE,
    model,
    valid,
    warnings,
  }));
}

/** Whether the channel fires, as the transient and its variants say. */
export function firesWords({ answer: { fires, transient } }: Pick<RigTransient, 'answer'>): string {
  if (transient.marginal) {
    return 'Marginal: within 2\u2009% of the channel\u2019s breakdown it may fire or stay dark.';
  }
  if (fires.asGiven) {
    return fires.always
      ? 'The channel fires.'
      : 'The channel fires, but may stay dark: a misfire leaves the capacitors charged.';
  }
  return fires.always
    ? 'Misfire: the channel stays dark and may be left charged.'
    : 'The channel stays dark, but may fire: what is not known decides.';
}

export function assumedWords({ assumed }: Pick<RigTransient, 'assumed'>): string {
  return assumed.length === 0 ? '' : `Assumed: ${assumed.join('; ')}.`;
}

export function rateFigure(
  spec: RigSpec,
  { figures, broken }: Pick<Parts, 'figures' | 'broken'>,
): DerivedFigure {
  const common = { key: 'rate', label: 'Rate at most', rounding: 'down', digits: 2 } as const;
  const planned = andThen(figures, ({ first_F, second_F }) =>
    andThen(broken, ({ law_kV }) =>
      planRate(chargingOf(spec), {
        capacitance_F: spec.topology === 'lc-inversion' ? first_F + second_F : first_F,
        break_kV: law_kV,
        blown: false,
      }),
    ),
  );
  if (!planned.ok) return row({ ...common, figure: planned, words: '' });
  const { rate, words } = planned.value;
  const { max_rate_Hz } = spec.envelope;
  if (rate.value <= max_rate_Hz) return row({ ...common, figure: ok(rate), words });
  const figure = ok({ ...rate, value: max_rate_Hz, band: { low: max_rate_Hz, high: max_rate_Hz } });
  return row({ ...common, figure, words: 'The rig\u2019s envelope holds the rate.' });
}

function capacitorNames({ topology }: RigSpec): { readonly first: string; readonly second: string } {
  return topology === 'lc-inversion'
    ? { first: 'C1', second: 'C2' }
    : { first: 'Dump capacitor', second: 'Peaking capacitor' };
}

function partWords(capacitor: CapacitorSpec): string {
  if (capacitor.kind === 'bank') return capacitor.part;
  const { dielectric, plies, plate_pairs, ply_um } = capacitor;
  return `${dielectric}, ${plies} plies of ${ply_um}\u2009\u00b5m between foils, ${plate_pairs} active plate ${plate_pairs === 1 ? 'pair' : 'pairs'}`;
}

function kilovolt(volts: Result<Answer>): Result<Answer> {
  return mapResult(volts, (one) => scaled(one, 1e-3, 'kV'));
}

function nanosecond(seconds: Answer): Result<Answer> {
  return ok(scaled(seconds, 1e9, 'ns'));
}

function scaled(one: Answer, times: number, unit: string): Answer {
  const { low, high } = one.band;
  return { ...one, value: one.value * times, unit, band: { low: low * times, high: high * times } };
}

function exact(value: number, unit: string, model: string): Answer {
  return answer({ value, unit, relative: 0, model, valid: 'the rig as entered' });
}
