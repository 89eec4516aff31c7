import { describe, expect, it } from 'vitest';
import type { LabSettings, RigSpec } from '../../domain/book/rig-spec';
import { circuitAnswer } from '../../domain/circuit/circuit-answer';
import { rigDerived } from '../../domain/rules/rig-derived';
import { WAVE_POINTS } from '../../domain/rules/rig-circuit';
import { breakChart } from './break-chart';
import { derivedRows } from '../../domain/report/derived-rows';
import { circuitToSolve, derivedOf, transientOf, withTransient } from './derived-view';
import { HERON, KETTLE } from './rigs.fixture';
import { waveChart } from './wave-chart';

const lab: LabSettings = {
  name: 'Bench',
  zone: 'Etc/UTC',
  ambient_bar_abs: 0.966,
  ambient_C: 21,
  discharged_below_V: 50,
  working_alone: 'allowed',
  emergency: { isolator: '', ring: [], first_aid: '' },
};

/** As the screen does it: the circuit goes to the worker, and what comes back is laid beside the rest. */
function solved(spec: RigSpec) {
  const rig = circuitToSolve(spec, derivedOf(spec, lab));
  if (!rig.ok) throw new Error(rig.refusal.words);
  const answer = circuitAnswer(rig.value.circuit, { samples: WAVE_POINTS });
  return transientOf(spec, rig.value, { answer, settings: lab });
}

describe('derived figures of a rig', () => {
  it.each([
    ['Heron', HERON],
    ['Kettle', KETTLE],
  ])('are those of the domain for %s, with the circuit solved apart from them', (_name, spec) => {
    const transient = solved(spec);
    expect(derivedRows(withTransient(spec, lab, transient))).toEqual(derivedRows(rigDerived(spec, lab)));
  });

  it('show the demo lab’s figures rounded away from the danger', () => {
    const rows = derivedRows(derivedOf(HERON, lab), ['stored', 'stress_first', 'reach', 'first', 'second']);
    // 0.90 J, 22.9 kV/mm, 3.89 and 3.16 nF by the demo's own computation; the energy rounds up.
    expect(rows.map(({ value, unit }) => `${value ?? 'none'} ${unit}`)).toEqual([
      '0.902 J',
      '22.9 kV/mm',
      '14.8 kV',
      '3.89 nF',
      '3.16 nF',
    ]);
    expect(rows[0]?.words).toContain('16\u2009kV and 1\u2009mA');
  });

  it('say in words what cannot be given, and show no NaN', () => {
    const helium = { ...HERON, gap: { ...HERON.gap, gas: 'He' } } as const;
    const derived = derivedOf(helium, lab);
    expect(circuitToSolve(helium, derived).ok).toBe(false);
    expect(breakChart(helium, lab, derived).ok).toBe(false);
    const rows = derivedRows(derived);
    expect(rows.find((row) => row.key === 'self_break')?.refusal).toMatch(/\w/);
    expect(JSON.stringify(rows)).not.toMatch(/NaN|Infinity/);
  });
});

describe('charts of a rig', () => {
  it('draw the wave shape upwards with its rise and where the channel breaks', () => {
    const transient = solved(HERON);
    if (!transient.ok) throw new Error(transient.refusal.words);
    const chart = waveChart(transient.value);
    const [voltage, current] = chart.curves ?? [];
    const peak = Math.max(...(voltage?.points ?? []).map((point) => point.y));
    expect(peak).toBeCloseTo(transient.value.answer.transient.peakVoltage_V / 1000, 6);
    expect(current?.label).toBe('channel, kA');
    const [span] = chart.spans ?? [];
    const rise_ns = transient.value.answer.transient.rise_s * 1e9;
    expect(Math.abs((span?.to ?? 0) - (span?.from ?? 0) - rise_ns) / rise_ns).toBeLessThan(0.05);
  });

  it('draw both sides over pressure, and nothing beyond the relief valve', () => {
    const chart = breakChart(HERON, lab, derivedOf(HERON, lab));
    if (!chart.ok) throw new Error(chart.refusal.words);
    expect(chart.value.wall?.from).toBe(1);
    expect(chart.value.window).toEqual({ min: 0.2, max: 0.8 });
    for (const { low, high } of chart.value.band?.points ?? []) expect(low).toBeLessThan(high);
  });
});
