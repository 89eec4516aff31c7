import { useEffect, useMemo, useState } from 'react';
import { browserCircuitRunner } from '../../data/ports/browser-circuit-runner';
import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import type { CircuitAnswer } from '../../domain/circuit/circuit-answer';
import type { RigDerived } from '../../domain/rules/rig-derived';
import { WAVE_POINTS } from '../../domain/rules/rig-circuit';
import { refused, type Result } from '../../domain/units/result';
import { circuitToSolve, derivedOf, transientOf, withTransient } from './derived-view';

export interface RigDerivedView {
  readonly derived: RigDerived;
  /** The wave shape on screen is of an earlier state, or there is none yet. */
  readonly solving: boolean;
}

interface Solved {
  readonly key: string;
  readonly answer: Result<CircuitAnswer>;
}

/** Everything derived from a rig; its circuit is solved in a worker, and the latest one wins. */
export function useRigDerived(spec: RigSpec | null, settings: LabSettings | null): RigDerivedView | null {
  const [runner] = useState(browserCircuitRunner);
  const [solved, setSolved] = useState<Solved | null>(null);
  // A spec is a new object at every key; what it says is what counts.
  const key = spec === null || settings === null ? '' : JSON.stringify([spec, settings]);
  const asked = useMemo(() => {
    if (spec === null || settings === null) return null;
    return { spec, settings, key, rig: circuitToSolve(spec, derivedOf(spec, settings)) };
    // eslint-disable-next-line react-hooks/exhaustive-deps -- the key says what the spec says
  }, [key]);

  useEffect(() => () => runner.close(), [runner]);
  useEffect(() => {
    if (asked === null || !asked.rig.ok) return undefined;
    let stale = false;
    const { answer } = runner.solve(asked.rig.value.circuit, { samples: WAVE_POINTS });
    void answer.then((result) => {
      if (!stale) setSolved({ key: asked.key, answer: result });
    });
    return () => {
      stale = true;
    };
  }, [asked, runner]);

  return useMemo(() => {
    if (asked === null) return null;
    const { rig, spec: of, settings: lab } = asked;
    if (!rig.ok) return { derived: withTransient(of, lab, rig), solving: false };
    const solving = solved?.key !== asked.key;
    // The shape before stays on screen until the next one is there: a slider would make it blink otherwise.
    const transient =
      solved === null
        ? refused(SOLVING)
        : transientOf(of, rig.value, { answer: solved.answer, settings: lab });
    return { derived: withTransient(of, lab, transient), solving };
  }, [asked, solved]);
}

const SOLVING = { type: 'solving', words: 'The circuit is being solved.' };
