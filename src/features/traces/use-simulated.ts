import { useEffect, useMemo, useState } from 'react';
import { browserCircuitRunner } from '../../data/ports/browser-circuit-runner';
import type { ReadingValues } from '../../domain/book/bodies/firing-bodies';
import type { RigSpec } from '../../domain/book/rig-spec';
import type { CircuitAnswer } from '../../domain/circuit/circuit-answer';
import { currentRise_s } from '../../domain/circuit/current-rise';
import { circuitOf, WAVE_POINTS, type RigTransient } from '../../domain/rules/rig-circuit';
import type { Result } from '../../domain/units/result';

export type SimulatedRig =
  | { readonly type: 'none' }
  | { readonly type: 'solving' }
  | { readonly type: 'refused'; readonly words: string }
  | { readonly type: 'solved'; readonly transient: RigTransient };

type At = Pick<ReadingValues, 'voltage_kV' | 'pressure_bar_g' | 'ambient_bar_abs' | 'temperature_C'>;

/** The rig's wave shape as a reading fired it, solved in a worker; `at` null for no reading. */
export function useSimulated(spec: RigSpec, at: At | null): SimulatedRig {
  const [runner] = useState(browserCircuitRunner);
  const [solved, setSolved] = useState<{
    readonly key: string;
    readonly answer: Result<CircuitAnswer>;
  } | null>(null);
  const key =
    at === null
      ? ''
      : JSON.stringify([at.voltage_kV, at.pressure_bar_g, at.ambient_bar_abs, at.temperature_C]);
  const rig = useMemo(() => {
    if (at === null) return null;
    return circuitOf(spec, {
      charge_kV: at.voltage_kV,
      pressure_bar_abs: at.pressure_bar_g + at.ambient_bar_abs,
      ambient_bar_abs: at.ambient_bar_abs,
      temperature_C: at.temperature_C,
    });
    // eslint-disable-next-line react-hooks/exhaustive-deps -- a reading is a new object whenever its list is; its figures count
  }, [spec, key]);
  useEffect(() => () => runner.close(), [runner]);
  useEffect(() => {
    if (rig === null || !rig.ok) return undefined;
    let stale = false;
    void runner.solve(rig.value.circuit, { samples: WAVE_POINTS }).answer.then((answer) => {
      if (!stale) setSolved({ key, answer });
    });
    return () => {
      stale = true;
    };
  }, [rig, key, runner]);

  return useMemo((): SimulatedRig => {
    if (rig === null) return { type: 'none' };
    if (!rig.ok) return { type: 'refused', words: rig.refusal.words };
    if (solved === null || solved.key !== key) return { type: 'solving' };
    if (!solved.answer.ok) return { type: 'refused', words: solved.answer.refusal.words };
    const answer = solved.answer.value;
    const rise_s = currentRise_s(answer.transient.waveform);
    return { type: 'solved', transient: { ...rig.value, answer, currentRise_s: rise_s, gain: null } };
  }, [rig, key, solved]);
}
