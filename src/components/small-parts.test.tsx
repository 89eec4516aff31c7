// @vitest-environment happy-dom
import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { Caution } from './caution';
import { ChannelDrawing } from './channel-drawing';
import { EmergencyTooth } from './emergency-tooth';
import { FacingPair } from './facing-pair';
import { HoldButton } from './hold-button';
import { Reading } from './reading';
import { SaysBlock } from './says-block';
import { SigmaScale } from './sigma-scale';
import { Table } from './table';
import { ThumbDome } from './thumb-dome';
import { ThumbZone } from './thumb-zone';
import { TwoFaces } from './two-faces';
import { WideMark } from './wide-mark';

describe('reading', () => {
  it('sets a thin space before the unit and none without one', () => {
    const { container, rerender } = render(<Reading value="18.9" unit="kV" />);
    expect(container.textContent).toBe('18.9\u2009kV');
    rerender(<Reading value="1,240" carried />);
    expect(container.textContent).toBe('1,240');
    expect(container.querySelector('.carried')).not.toBeNull();
  });
});

describe('two faces', () => {
  it('writes the unit once, at the high side', () => {
    render(<TwoFaces low="16.7" middle="18.8" high="24.3" unit="kV" label="between" />);
    expect(screen.getByRole('group', { name: 'between' }).textContent).toBe('16.718.824.3\u2009kV');
  });
});

describe('thumb zone', () => {
  it('keeps at most two domes above the main one, the lowest first', () => {
    const dome = (label: string) => <ThumbDome key={label} label={label} onComplete={() => undefined} />;
    render(
      <ThumbZone
        label="Actions"
        main={dome('main')}
        others={[dome('lower'), dome('upper'), dome('third')]}
      />,
    );
    expect(screen.getAllByRole('button').map((button) => button.textContent)).toEqual([
      'upper',
      'lower',
      'main',
    ]);
  });
});

describe('rims', () => {
  it.each([
    ['touch', null],
    ['half-second', '90 10'],
    ['second', '84 16'],
  ] as const)('tell a %s by their pieces', (hold, dash) => {
    const { container } = render(<HoldButton label="Do" hold={hold} onComplete={() => undefined} />);
    expect(container.querySelector('.electrode-rim')?.getAttribute('stroke-dasharray')).toBe(dash);
  });
});

describe('table', () => {
  it('has a caption, column heads and the picked row', () => {
    render(
      <Table
        caption="Readings"
        columns={[
          { key: 'n', head: 'No.', cell: (row: number) => row },
          { key: 'd', head: 'double', cell: (row: number) => row * 2, align: 'start' },
        ]}
        rows={[0, 1]}
        rowKey={String}
        picked="1"
        foot="2 of 2"
      />,
    );
    expect(screen.getByRole('table', { name: 'Readings' })).toBeDefined();
    expect(screen.getAllByRole('columnheader')).toHaveLength(2);
    expect(screen.getAllByRole('cell').map((cell) => cell.textContent)).toEqual([
      '0',
      '0',
      '1',
      '2',
      '2 of 2',
    ]);
    expect(document.querySelector('tr.picked')?.textContent).toBe('12');
  });
});

describe('channel', () => {
  it('toggles a part by a touch and draws an arc where one was seen', () => {
    const toggle = vi.fn();
    const parts = [
      { key: 'a', label: 'A end' },
      { key: 'm', label: 'mid' },
      { key: 'b', label: 'B end' },
    ];
    const { container } = render(
      <ChannelDrawing
        label="How it looked"
        parts={parts}
        arcs={['a', 'b']}
        even={false}
        length_mm={280}
        onToggle={toggle}
      />,
    );
    expect(container.querySelectorAll('.channel-arc')).toHaveLength(2);
    expect(container.querySelector('.channel-even')).toBeNull();
    fireEvent.click(screen.getByRole('button', { name: 'mid', pressed: false }));
    expect(toggle).toHaveBeenCalledExactlyOnceWith('m');
  });
});

describe('sigma scale', () => {
  const pointer = (container: HTMLElement): number =>
    Number(/M([\d.-]+)/.exec(container.querySelector('.sigma-pointer')?.getAttribute('d') ?? '')?.[1]);

  it('points at the middle for none and stays in sight beyond its faces', () => {
    const { container, rerender } = render(<SigmaScale sigma={0} label="0" />);
    expect(pointer(container)).toBe(160);
    rerender(<SigmaScale sigma={-40} label="far below" />);
    expect(pointer(container)).toBeGreaterThan(-16);
    expect(pointer(container)).toBeLessThan(0);
  });
});

describe('wide mark', () => {
  it('draws what goes from face to face in a place of its own', () => {
    const { container, rerender } = render(
      <WideMark state="bridged" title="Shorted">
        age
      </WideMark>,
    );
    expect(container.querySelectorAll('.wide-mark-wire circle')).toHaveLength(2);
    rerender(<WideMark state="jagged" title="Firing" />);
    expect(container.querySelector('.wide-mark-jag')).not.toBeNull();
    rerender(<WideMark state="dashed" title="Not known" />);
    expect(container.querySelector('.wide-mark-dash')).not.toBeNull();
  });
});

describe('words', () => {
  it('mark a caution as a note', () => {
    render(<Caution>It may stay charged.</Caution>);
    expect(screen.getByRole('note').textContent).toBe('It may stay charged.');
  });

  it('lead a sentence', () => {
    const { container } = render(<SaysBlock lead="Fits:">0.4 below.</SaysBlock>);
    expect(container.textContent).toBe('Fits: 0.4 below.');
  });
});

describe('what is pressed', () => {
  it('opens the emergency card inside the app', () => {
    const press = vi.fn();
    render(<EmergencyTooth label="Emergency" href="/emergency" onPress={press} />);
    expect(fireEvent.click(screen.getByRole('link', { name: 'Emergency' }))).toBe(false);
    expect(press).toHaveBeenCalledOnce();
  });

  it('opens what waits', () => {
    const press = vi.fn();
    render(
      <FacingPair title="To review" foot="Ada" footEnd="1 h" onPress={press}>
        Did not fit
      </FacingPair>,
    );
    fireEvent.click(screen.getByRole('button', { name: /To review.*Did not fit.*Ada.*1 h/ }));
    expect(press).toHaveBeenCalledOnce();
  });
});
