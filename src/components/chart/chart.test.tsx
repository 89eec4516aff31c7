// @vitest-environment happy-dom
import { fireEvent, render, screen, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { Chart } from './chart';
import type { ChartData } from './types';

const data: ChartData = {
  x: { min: 0, max: 2, unit: 'bar(g)', decimals: 2 },
  y: { min: 0, max: 40, unit: 'kV', decimals: 1 },
  band: {
    above: 'breaks',
    below: 'holds',
    points: [
      { x: 0, low: 9.16, high: 13.31 },
      { x: 1, low: 16.69, high: 24.25 },
      { x: 2, low: 24, high: 35 },
    ],
  },
  law: [
    { x: 0, y: 10 },
    { x: 1, y: 18.8 },
    { x: 2, y: 27 },
  ],
  limit: { y: 23.5, label: 'supply 23.5 kV' },
  wall: { from: 1.5, label: 'vessel 1.5 bar(g)' },
  point: { x: 1, low: 16.69, high: 24.25 },
  readings: [
    { x: 1, y: 18.9 },
    { x: 1.1, y: 17.6, odd: true, number: 'reading 22' },
  ],
  window: { min: 0.8, max: 1.2 },
};

const words = {
  showTable: 'Table',
  showChart: 'Chart',
  low: 'below',
  high: 'up to',
  law: 'law',
  own: 'own',
  number: 'No.',
};

// happy-dom lays nothing out: the chart is given a box and a text size, as a browser would.
beforeEach(() => {
  vi.spyOn(Element.prototype, 'getBoundingClientRect').mockReturnValue(new DOMRect(0, 0, 842, 540));
  const style = document.createElement('style');
  style.textContent = '.chart-probes i { font-size: 22px }';
  document.head.append(style);
});
afterEach(() => vi.restoreAllMocks());

describe('chart', () => {
  it('labels directly what it draws', () => {
    const { container } = render(<Chart title="Self-break" data={data} words={words} />);
    const texts = [...container.querySelectorAll('svg text')].map((text) => text.textContent);
    for (const label of [
      'breaks',
      'holds',
      'supply 23.5 kV',
      'vessel 1.5 bar(g)',
      'reading 22',
      'kV',
      'bar(g)',
    ]) {
      expect(texts).toContain(label);
    }
    expect(container.querySelectorAll('.chart-ring')).toHaveLength(1);
    expect(container.innerHTML).not.toMatch(/NaN|Infinity/);
  });

  it('ends at the wall', () => {
    render(<Chart title="Self-break" data={data} words={words} />);
    const reader = screen.getByRole('slider', { name: 'Self-break' });
    expect(reader.getAttribute('aria-valuemax')).toBe('1.5');
    fireEvent.keyDown(reader, { key: 'End' });
    expect(reader.getAttribute('aria-valuenow')).toBe('1');
  });

  it('reads off by keys: low side down, high side up', () => {
    render(<Chart title="Self-break" data={data} words={words} />);
    const reader = screen.getByRole('slider', { name: 'Self-break' });
    fireEvent.keyDown(reader, { key: 'ArrowRight' });
    fireEvent.keyDown(reader, { key: 'ArrowRight' });
    expect(reader.getAttribute('aria-valuetext')).toBe('1.00\u2009bar(g): 16.6 to 24.3, 18.8\u2009kV');
    fireEvent.keyDown(reader, { key: 'Escape' });
    expect(document.querySelector('.chart-cursor')).toBeNull();
  });

  it('reads off in the words of the screen', () => {
    render(
      <Chart
        title="Self-break"
        data={data}
        words={words}
        describe={({ x, low }) => `${x}: nothing below ${low}`}
      />,
    );
    expect(screen.getByRole('slider').getAttribute('aria-valuetext')).toBe('1: nothing below 16.69');
  });

  it('has its figures in a table behind it', () => {
    render(<Chart title="Self-break" data={data} words={words} />);
    const [curves, readings] = screen.getAllByRole('table', { name: 'Self-break' });
    expect(
      within(curves!)
        .getAllByRole('row')
        .map((row) => row.textContent),
    ).toEqual(['bar(g)below, kVup to, kVlaw, kV', '0.009.113.410.0', '1.0016.624.318.8']);
    expect(within(readings!).getByText('reading 22')).toBeDefined();
    fireEvent.click(screen.getByRole('button', { name: 'Table' }));
    expect(screen.getByRole('button', { name: 'Chart' }).getAttribute('aria-pressed')).toBe('true');
  });

  it('leaves the spike of an envelope in its table, though rows are left out', () => {
    const points = Array.from({ length: 900 }, (_, x) => ({
      x,
      low: x === 777 ? -9 : 0,
      high: x === 431 ? 7 : 1,
    }));
    const band = { points, above: '', below: '', extremes: true };
    const shown: ChartData = {
      x: { min: 0, max: 900, unit: 'ns' },
      y: { min: -10, max: 10, unit: 'kV' },
      band,
    };
    render(<Chart title="Trace" words={words} data={shown} />);
    const cells = within(screen.getByRole('table', { name: 'Trace' })).getAllByRole('cell');
    const texts = cells.map((cell) => cell.textContent);
    expect(texts).toContain('\u22129.0');
    expect(texts).toContain('7.0');
    expect(texts.length).toBeLessThan(200);
  });

  it('bears no data and a single point', () => {
    const { container } = render(
      <Chart
        title="Empty"
        words={words}
        data={{
          x: data.x,
          y: data.y,
          band: { points: [], above: 'breaks', below: 'holds' },
          own: { points: [{ x: 1, y: 2 }] },
        }}
      />,
    );
    expect(container.innerHTML).not.toMatch(/NaN|undefined/);
  });

  it('sets the slice beside the plot and says its words', () => {
    const { container } = render(
      <Chart
        title="Self-break"
        data={data}
        words={words}
        slice={{
          high: { value: '24.3', unit: 'kV', words: 'may hold up to', note: 'with UV' },
          low: { value: '16.7', unit: 'kV', words: 'nothing fires below' },
          middle: [{ label: 'law', value: '18.8' }],
          lean: 'high',
        }}
      />,
    );
    const slice = container.querySelector('.chart-slice');
    expect(slice?.classList.contains('stacked')).toBe(false);
    expect(slice?.textContent).toContain('may hold up to24.3\u2009kV');
    expect(slice?.querySelectorAll('.size-lean')).toHaveLength(1);
  });
});
