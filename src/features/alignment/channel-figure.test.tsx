import { fireEvent, render, screen } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';
import { HERON_SPEC } from '../../../seeds/rigs/heron';
import { alignmentSetting } from './alignment-setting';
import { ChannelFigure } from './channel-figure';

const setting = alignmentSetting(HERON_SPEC);
const figure = (parts: Partial<Parameters<typeof ChannelFigure>[0]> = {}) => {
  const onArcs = vi.fn();
  render(
    <ChannelFigure
      setting={setting}
      gaps={{ a_mm: 2.6, b_mm: 2.4 }}
      target_mm={2.5}
      after={null}
      turns={null}
      arcs={null}
      onArcs={onArcs}
      {...parts}
    />,
  );
  return onArcs;
};

describe('the drawn channel', () => {
  it('is tapped where arcs sit, and says which parts are marked', () => {
    const onArcs = figure({ arcs: 'a-end' });
    expect(screen.getByRole('button', { name: 'A end' }).getAttribute('aria-pressed')).toBe('true');
    expect(screen.getByRole('button', { name: 'mid' }).getAttribute('aria-pressed')).toBe('false');
    fireEvent.click(screen.getByRole('button', { name: 'B end' }));
    expect(onArcs).toHaveBeenLastCalledWith('both-ends');
    fireEvent.click(screen.getByRole('button', { name: 'A end' }));
    expect(onArcs).toHaveBeenLastCalledWith(null);
  });

  it('says that it exaggerates, and that nothing was measured', () => {
    figure({ gaps: null });
    expect(screen.getByText(/times larger than lengths/).textContent).toContain('Nothing measured yet');
  });
});
