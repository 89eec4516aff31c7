// @vitest-environment happy-dom
import { cleanup, fireEvent, render, screen, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { readOscillogram } from '../../domain/oscillogram/read-oscillogram';
import { surveyOf } from '../../domain/oscillogram/survey';
import { kettleLikeSpec } from '../../domain/lookup/rig.fixture';
import { rigTransient } from '../../domain/rules/rig-circuit';
import { EMPTY_TRACE, probeKey, type TraceDraft } from './trace-draft';
import { TraceView } from './trace-view';
import type { SimulatedRig } from './use-simulated';

/** 16 V in 10 ns, and one point of -9 V long after it. */
const rows = Array.from({ length: 2000 }, (_, i) => {
  const value = i === 1777 ? -9 : Math.min(16, Math.max(0, 1.6 * (i * 0.5 - 100)));
  return `${String(i * 0.5)},${String(value)},0`;
});
const read = readOscillogram(new TextEncoder().encode(`Time (ns),CH1 (V),CH2 (A)\n${rows.join('\n')}\n`));
if (!read.ok) throw new Error(read.refusal.words);
const survey = surveyOf(read.value, 200);
const { from_s, to_s } = survey.time;
const file = {
  name: 'shot-7.csv',
  blob: new Blob(),
  survey,
  window: { from_s, to_s },
  envelopes: survey.whole,
};
const DRAFT: TraceDraft = { ...EMPTY_TRACE, texts: { [probeKey(1)]: '1000' } };

function shown(rig: SimulatedRig, draft = DRAFT) {
  const change = vi.fn();
  const look = vi.fn();
  render(<TraceView {...{ file, draft, change, look, rig }} spec={kettleLikeSpec} />);
  return { change, look };
}

afterEach(cleanup);

describe('the view of a trace', () => {
  it('leaves the spike in the table and measures in kilovolts', () => {
    shown({ type: 'none' });
    const cells = within(screen.getByRole('table', { name: 'Trace of CH1' })).getAllByRole('cell');
    expect(cells.map((cell) => cell.textContent)).toContain('\u22129.0');
    const figures = screen.getByRole('table', { name: 'Figures of CH1' });
    expect(figures.textContent).toContain('16.0\u2009kV');
    expect(figures.textContent).toContain('8.00\u2009ns');
    expect(screen.getByText(/Name the reading/)).toBeDefined();
  });

  it('lays the simulated shape beside it where a reading is named', () => {
    const solved = rigTransient(kettleLikeSpec, {
      charge_kV: 15,
      pressure_bar_abs: 2,
      ambient_bar_abs: 1,
      temperature_C: 20,
    });
    if (!solved.ok) throw new Error(solved.refusal.words);
    shown({ type: 'solved', transient: solved.value });
    expect(screen.getByRole('columnheader', { name: 'simulated, kV' })).toBeDefined();
    expect(screen.getByText(/aligned where both pass 10 %/)).toBeDefined();
    expect(document.body.textContent).not.toMatch(/NaN|Infinity|undefined/);
  });

  it('says that nothing stands out of a flat channel', () => {
    shown({ type: 'none' }, { ...DRAFT, channel: 1 });
    expect(screen.getByText('No pulse.')).toBeDefined();
    expect(document.body.textContent).not.toMatch(/NaN|Infinity/);
  });

  it('keeps what was said of one channel apart from the others, and looks around', () => {
    const { change, look } = shown({ type: 'none' });
    fireEvent.click(screen.getByRole('radio', { name: 'turned over' }));
    expect(change).toHaveBeenCalledWith({ choices: { '1': { inverted: true } } });
    fireEvent.click(screen.getByRole('radio', { name: 'CH2' }));
    expect(change).toHaveBeenCalledWith({ channel: 1 });
    fireEvent.click(screen.getByRole('button', { name: 'Further in' }));
    expect(look).toHaveBeenCalledWith('in');
  });
});
