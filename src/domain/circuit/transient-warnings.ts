import type { LumpedVerdict } from '../line/lumped-verdict';
import { ROMPE_WEIZEL_RANGE } from '../spark/spark-resistance';
import type { Warning } from '../units/answer';
import { formatQuantity } from '../units/format-quantity';
import type { Circuit } from './circuit-input';
import type { Run } from './integrate';
import type { EnergyLedger } from './ledger';
import { isMarginal } from './marginal';

interface Made {
  readonly run: Run;
  readonly energy: EnergyLedger;
  readonly verdict: LumpedVerdict;
  readonly doubtfulRise: boolean;
}

/** Swings closer than this are one as high as the other. */
const SAME_HEIGHT = 0.01;
/** A feed that takes more has become part of the shot. */
const LARGE_FEED_SHARE = 0.05;

/** What has to be read beside a transient. */
export function transientWarnings(circuit: Circuit, made: Made): readonly Warning[] {
  return [
    ...breakWarnings(circuit, made),
    ...shapeWarnings(circuit, made),
    ...feedWarnings(circuit, made),
    ...lawWarnings(circuit, made),
  ];
}

function breakWarnings(circuit: Circuit, { run }: Made): readonly Warning[] {
  const { break_V } = circuit.channel;
  if (break_V === null) return [];
  const warnings: Warning[] = [];
  if (isMarginal(circuit, run)) {
    warnings.push({
      type: 'marginal',
      words: 'The channel voltage comes within 2\u2009% of its breakdown: it may fire or stay dark.',
    });
  }
  if (run.end.fired_s === null) {
    const top = kV(run.watch.peaks().channel_V.size, 'down');
    warnings.push({
      type: 'channel-dark',
      words: `The channel stays dark: its voltage goes up to ${top} and it breaks down at ${kV(break_V, 'up')}. It may be left charged.`,
    });
  }
  return warnings;
}

function shapeWarnings({ window_s }: Circuit, { run, doubtfulRise }: Made): readonly Warning[] {
  const top = run.watch.peaks().channel_V;
  const warnings: Warning[] = [];
  const others = run.watch.swings.filter((swing) => swing.time_s !== top.time_s);
  if (others.some((swing) => swing.size > (1 - SAME_HEIGHT) * top.size)) {
    warnings.push({
      type: 'two-peaks',
      words: 'Two swings are about as high: the time of the peak may be either.',
    });
  }
  if (others.some((swing) => swing.time_s < top.time_s)) {
    warnings.push({ type: 'late-peak', words: 'The highest voltage is not on the first swing.' });
  }
  if (doubtfulRise) {
    warnings.push({
      type: 'rise-doubtful',
      words: 'A swing ends close to a tenth or nine tenths of the peak: the rise may jump.',
    });
  }
  if (top.time_s >= window_s * (1 - 1e-9)) {
    warnings.push({
      type: 'window-short',
      words: 'The voltage still rises at the end: follow the transient for longer.',
    });
  }
  return warnings;
}

function feedWarnings(circuit: Circuit, { energy }: Made): readonly Warning[] {
  if (energy.feed_J <= LARGE_FEED_SHARE * energy.start_J) return [];
  const share = formatQuantity((100 * energy.feed_J) / energy.start_J, '%', {
    digits: { significant: 2 },
    rounding: 'up',
  });
  return circuit.topology === 'charge-transfer'
    ? [
        {
          type: 'bleed-loss',
          words: `The resistance across the peaking capacitor takes ${share} of the energy.`,
        },
      ]
    : [
        {
          type: 'charging-loss',
          words: `The charging inductor takes ${share} of the energy: it is too fast for this circuit.`,
        },
      ];
}

function lawWarnings({ gap }: Circuit, { verdict }: Made): readonly Warning[] {
  const warnings: Warning[] = [];
  if (gap.law === 'rompe-weizel') {
    const constant = gap.constant_cm2_atm_V2s;
    if (constant < ROMPE_WEIZEL_RANGE.low || constant > ROMPE_WEIZEL_RANGE.high) {
      warnings.push({
        type: 'constant-unusual',
        words: 'The constant of the gap\u2019s law lies outside what has been published: 0.5 to 1.2.',
      });
    }
  }
  if (verdict.type === 'steps') warnings.push({ type: 'wave-steps', words: verdict.words });
  return warnings;
}

function kV(volts: number, rounding: 'up' | 'down'): string {
  return formatQuantity(volts / 1000, 'kV', { digits: { significant: 3 }, rounding });
}
