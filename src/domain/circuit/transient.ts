import { lumpedVerdict, withoutSheet, type LumpedVerdict } from '../line/lumped-verdict';
import type { Warning } from '../units/answer';
import { ok, refused, type Refusal, type Result } from '../units/result';
import type { Circuit } from './circuit-input';
import { badCircuit } from './circuit-rules';
import { integrate, type IntegrateOptions, type Run } from './integrate';
import { ledgerOf, type EnergyLedger } from './ledger';
import { isMarginal } from './marginal';
import { riseOf } from './rise';
import { transientWarnings } from './transient-warnings';
import { drawWaveform, type Waveform } from './waveform';

/** What a circuit does after its gap closes at t = 0. */
export interface Transient {
  /** Highest size of the channel voltage, taken across capacitor or plates and so with the channel's inductance. */
  readonly peakVoltage_V: number;
  readonly peakVoltage_s: number;
  /** 10 to 90 % of that peak, first crossings. */
  readonly rise_s: number;
  readonly peakGap_A: number;
  readonly peakGap_s: number;
  /** Null while the channel stays dark. */
  readonly peakChannel_A: number | null;
  readonly peakChannel_s: number | null;
  /** Breakdown of the channel; null while it stays dark. */
  readonly fired_s: number | null;
  /** The result hangs on less than 2 %: it may as well be another one. */
  readonly marginal: boolean;
  readonly energy: EnergyLedger;
  readonly waveform: Waveform;
  readonly warnings: readonly Warning[];
  readonly steps: number;
}

export interface TransientOptions extends IntegrateOptions {
  /** Points of the waveform, 400 by default; 0 for none. */
  readonly samples?: number;
  /** Rise that is wanted of a circuit with a sheet in it. */
  readonly wantedRise_s?: number;
}

/** An energy audit worse than this is no result (physics D). */
const WORST_AUDIT = 1e-4;

/**
 * Transient of a charge transfer or an LC inversion with a closing spark gap and a channel that breaks down once
 * (physics D). Peaks within 1e-5 and energies within 1e-7 of the exact solution of the model; the model itself is far
 * less certain (see `circuitAnswer`). Refused for nonsense, for a window too long to follow, when stopped, and where a
 * sheet carries travelling waves: then no circuit of lumped parts gives a wave shape.
 */
export function solveTransient(circuit: Circuit, options: TransientOptions = {}): Result<Transient> {
  const bad = badCircuit(circuit);
  if (bad !== undefined) return refused(bad);
  const verdict = verdictOn(circuit, options.wantedRise_s ?? null);
  if (!verdict.ok) return verdict;
  if (verdict.value.type === 'travelling') return refused(travelling(verdict.value.words));
  const lumped = { ...circuit, gap_H: verdict.value.loop_H };
  const end = integrate(lumped, options);
  if (end.type === 'stopped') return refused(STOPPED);
  if (end.type === 'too-long') return refused(TOO_LONG);
  const transient = describe(lumped, {
    run: end.run,
    verdict: verdict.value,
    samples: options.samples ?? 400,
  });
  if (!transient.ok) return transient;
  const slow = verdictOn(circuit, transient.value.rise_s);
  if (slow.ok && slow.value.type === 'travelling') return refused(travelling(slow.value.words));
  return transient;
}

const STOPPED: Refusal = { type: 'stopped', words: 'The computation was stopped.' };
const TOO_LONG: Refusal = {
  type: 'too-long',
  field: 'window_s',
  words: 'Length of the transient: it holds too many rings to follow. Shorten it.',
};
const NO_RESULT: Refusal = {
  type: 'no-result',
  words: 'The energies of this transient do not add up, so no figure of it is shown.',
};

function travelling(words: string): Refusal {
  return { type: 'travelling-waves', field: 'feed', words };
}

function verdictOn({ gap_H, feed }: Circuit, rise_s: number | null): Result<LumpedVerdict> {
  if (feed === undefined || feed === null) return ok(withoutSheet(gap_H));
  return lumpedVerdict(gap_H, feed, rise_s);
}

function describe(
  circuit: Circuit,
  made: { readonly run: Run; readonly verdict: LumpedVerdict; readonly samples: number },
): Result<Transient> {
  const { run, verdict, samples } = made;
  const { channel_V, gap_A, channel_A } = run.watch.peaks();
  const { fired_s } = run.end;
  const energy = ledgerOf(circuit, run);
  const rise = riseOf(run.watch);
  const numbers = [channel_V.size, gap_A.size, channel_A.size, energy.audit];
  if (rise === null || !numbers.every(Number.isFinite) || Math.abs(energy.audit) > WORST_AUDIT) {
    return refused(NO_RESULT);
  }
  const marginal = isMarginal(circuit, run) || rise.doubtful;
  return ok({
    peakVoltage_V: channel_V.size,
    peakVoltage_s: channel_V.time_s,
    rise_s: rise.rise_s,
    peakGap_A: gap_A.size,
    peakGap_s: gap_A.time_s,
    peakChannel_A: fired_s === null ? null : channel_A.size,
    peakChannel_s: fired_s === null ? null : channel_A.time_s,
    fired_s,
    marginal,
    energy,
    waveform: drawWaveform(run.watch, { samples, fired_s }),
    warnings: transientWarnings(circuit, { run, energy, verdict, doubtfulRise: rise.doubtful }),
    steps: run.steps,
  });
}
